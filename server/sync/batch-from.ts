import type { Transaction } from 'sequelize';
import type { Held } from '#shared/identity/device.ts';
import type { Role } from '#shared/identity/role.ts';
import type { Stamp } from '#shared/sync/stamp.ts';
import type { BatchFrom } from '#shared/sync/store.ts';
import { query } from '#server/models/query.ts';

/** Who sends, from which device. */
export interface Sender {
  shopId: string;
  deviceId: string;
  personId: string;
}

/** What is known of a device before it is heard. */
export interface KnownDevice {
  isRevoked: boolean;
  lastOrderedAt: Stamp | null;
  held: Held | null;
  appVersion: string | null;
  /** when it was last heard, as others have been told */
  toldHeardAt: string | null;
}

const DEVICE = `
  SELECT revoked_at IS NOT NULL AS "isRevoked", last_ordered_at AS "lastOrderedAt", held, app_version AS "appVersion",
    row->>'lastHeardAt' AS "toldHeardAt"
  FROM devices WHERE shop_id = $1 AND id = $2`;

export async function readDevice(transaction: Transaction, { shopId, deviceId }: Sender): Promise<KnownDevice> {
  const [device] = await query<KnownDevice>(transaction, DEVICE, [shopId, deviceId]);
  if (!device) throw new Error(`There is no device ${deviceId} in this shop.`);
  return device;
}

// who has left the shop has no role in force
const PEOPLE = `
  SELECT id, CASE WHEN left_at IS NULL THEN roles ELSE '{}' END AS roles FROM people
  WHERE shop_id = $1 AND (id = $3 OR id IN (SELECT person_id FROM device_people WHERE shop_id = $1 AND device_id = $2))`;

/** What the merge must know of where a batch comes from; the caller holds the shop's lock. */
export async function readBatchFrom(
  transaction: Transaction,
  sender: Sender,
  device: KnownDevice,
  timeZone: string,
  nowMs: number,
): Promise<BatchFrom> {
  const { shopId, deviceId, personId } = sender;
  const people = await query<{ id: string; roles: Role[] }>(transaction, PEOPLE, [shopId, deviceId, personId]);
  const { isRevoked, lastOrderedAt } = device;
  return {
    shop: { id: shopId, timeZone },
    device: { id: deviceId, isRevoked, lastOrderedAt },
    personId,
    people: new Map(people.map(({ id, roles }) => [id, roles])),
    nowMs,
  };
}
