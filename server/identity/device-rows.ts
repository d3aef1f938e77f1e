import type { Transaction } from 'sequelize';
import type { DeviceRow } from '#shared/identity/device.ts';
import type { Database } from '#server/models/database.ts';
import type { DeviceColumns } from '#server/models/device.ts';

type Shown = Pick<
  DeviceColumns,
  'id' | 'label' | 'replaces' | 'lastHeardAt' | 'appVersion' | 'held' | 'revokedAt'
>;

/** A device as it stands in the feed. */
export function deviceRow(device: Shown, personIds: string[]): DeviceRow {
  return {
    id: device.id,
    label: device.label,
    personIds,
    replaces: device.replaces,
    lastHeardAt: device.lastHeardAt?.toISOString() ?? null,
    appVersion: device.appVersion,
    held: device.held,
    revokedAt: device.revokedAt?.toISOString() ?? null,
  };
}

/** Who has signed in on a device. */
export async function enrolledOn(
  database: Database,
  transaction: Transaction,
  shopId: string,
  deviceId: string,
): Promise<string[]> {
  const enrolled = await database.models.DevicePerson.findAll({
    where: { shopId, deviceId },
    order: ['personId'],
    transaction,
  });
  return enrolled.map((line) => line.personId);
}
