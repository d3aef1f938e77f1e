import type { Transaction } from 'sequelize';
import type { DeviceRow, Held } from '#shared/identity/device.ts';
import { isSameJson } from '#shared/sync/canonical.ts';
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
export async function hearDevice(transaction: Transaction, sender: Sender, known: KnownDevice, heard: Heard): Promise<number | null> {
  if (isNews(known, heard)) return tellOthers(transaction, sender, heard);
  const sql = 'UPDATE devices SET last_heard_at = $3 WHERE shop_id = $1 AND id = $2';
  await query(transaction, sql, [sender.shopId, sender.deviceId, new Date(heard.nowMs)]);
  return null;
}

/** Whether others have to be told of it. */
export function isNews(known: KnownDevice, { held, appVersion, nowMs }: Heard): boolean {
  if (held && !isSameJson(held, known.held)) return true;
  if (appVersion !== undefined && appVersion !== known.appVersion) return true;
  return known.toldHeardAt === null || nowMs - Date.parse(known.toldHeardAt) > TOLD_AGE_MAX_MS;
}

// changed where it stands, not read and written back: who signs in or is revoked meanwhile is not undone
const TELL = `
  UPDATE devices SET seq = $3, last_heard_at = $4, held = coalesce($5::json, held), app_version = coalesce($6, app_version),
    row = (row::jsonb || $7::jsonb)::json
  WHERE shop_id = $1 AND id = $2`;

async function tellOthers(transaction: Transaction, { shopId, deviceId }: Sender, { held, appVersion, nowMs }: Heard): Promise<number> {
  // the shop's row is locked before the device's, here as everywhere
  const { last: seq } = await numberRows(transaction, shopId, 1);
  const lastHeardAt = new Date(nowMs);
  const told: Partial<DeviceRow> = { lastHeardAt: lastHeardAt.toISOString() };
  if (held) told.held = held;
  if (appVersion !== undefined) told.appVersion = appVersion;
  const heldText = held ? JSON.stringify(held) : null;
  await query(transaction, TELL, [shopId, deviceId, seq, lastHeardAt, heldText, appVersion ?? null, JSON.stringify(told)]);
  return seq;
}
