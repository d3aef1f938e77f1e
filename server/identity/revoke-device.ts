import type { Transaction } from 'sequelize';
import type { DeviceRow } from '#shared/identity/device.ts';
import { Problem } from '#server/middleware/problem.ts';
import type { Database } from '#server/models/database.ts';
import { numberRows } from '#server/sync/feed.ts';
import { deviceRow, enrolledOn } from './device-rows.ts';
import { endFamilies } from './families.ts';

/**
 * Revokes a device and ends what keeps it signed in. Doing it again changes nothing: `seq` is then null. Throws a 404.
 */
export async function revokeDevice(
  database: Database,
  transaction: Transaction,
  shopId: string,
  id: string,
  nowMs: number,
): Promise<{ device: DeviceRow; seq: number | null }> {
  const { last: seq } = await numberRows(transaction, shopId, 1);
  const device = await database.models.Device.findOne({
    where: { shopId, id },
    lock: transaction.LOCK.NO_KEY_UPDATE,
    transaction,
  });
  if (!device) throw new Problem(404, 'There is no such device in this shop.');
  if (device.revokedAt) return { device: device.row, seq: null };
  const revoked = { ...device.get(), revokedAt: new Date(nowMs) };
  const row = deviceRow(revoked, await enrolledOn(database, transaction, shopId, id));
  await device.update({ revokedAt: revoked.revokedAt, seq, row }, { transaction });
  await endFamilies(database, transaction, { shopId, deviceId: id }, nowMs);
  return { device: row, seq };
}
