import type { Transaction } from 'sequelize';
import type { Held } from '#shared/identity/device.ts';
import { isSameJson } from '#shared/sync/canonical.ts';
import { deviceRow, enrolledOn } from '#server/identity/device-rows.ts';
import type { Database } from '#server/models/database.ts';
import { query } from '#server/models/query.ts';
import type { KnownDevice, Sender } from './batch-from.ts';
import { numberRows } from './feed.ts';

/** How old what others know of a device's last sync may be before they are told again. */
const TOLD_AGE_MAX_MS = 5 * 60_000;

/** What a device says of itself with a sync. */
export interface Heard {
  held?: Held | undefined;
  appVersion?: string | undefined;
  nowMs: number;
}

/**
 * Writes down that a device was heard. Others are told (its row gets a new number, which is returned) only where that
 * says something new: two devices that hail each other by pulling would otherwise never come to rest.
 */
export async function hearDevice(
  database: Database,
  transaction: Transaction,
  sender: Sender,
  known: KnownDevice,
  heard: Heard,
): Promise<number | null> {
  if (isNews(known, heard)) return tellOthers(database, transaction, sender, heard);
  const sql = 'UPDATE devices SET last_heard_at = $3 WHERE shop_id = $1 AND id = $2';
  await query(transaction, sql, [sender.shopId, sender.deviceId, new Date(heard.nowMs)]);
  return null;
}

function isNews(known: KnownDevice, { held, appVersion, nowMs }: Heard): boolean {
  if (held && !isSameJson(held, known.held)) return true;
  if (appVersion !== undefined && appVersion !== known.appVersion) return true;
  return known.toldHeardAt === null || nowMs - Date.parse(known.toldHeardAt) > TOLD_AGE_MAX_MS;
}

async function tellOthers(database: Database, transaction: Transaction, sender: Sender, heard: Heard): Promise<number> {
  const { shopId, deviceId } = sender;
  // the shop's row is locked before the device's, here as everywhere
  const { last: seq } = await numberRows(transaction, shopId, 1);
  const device = await database.models.Device.findOne({ where: { shopId, id: deviceId }, transaction, rejectOnEmpty: true });
  const columns = {
    ...device.get(),
    seq,
    lastHeardAt: new Date(heard.nowMs),
    held: heard.held ?? device.held,
    appVersion: heard.appVersion ?? device.appVersion,
  };
  const row = deviceRow(columns, await enrolledOn(database, transaction, shopId, deviceId));
  const { lastHeardAt, held, appVersion } = columns;
  await device.update({ seq, lastHeardAt, held, appVersion, row }, { transaction });
  return seq;
}
