import type { Transaction } from 'sequelize';
import type { Arrived } from '#shared/photo/photo.ts';
import { query } from '#server/models/query.ts';
import type { ReadPicture } from './read-picture.ts';
import type { Picture, SentSize } from './store.ts';

/** Who sent something of a photo, and when. */
export interface Arrival {
  photo: Picture;
  size: SentSize;
  personId: string;
  nowMs: number;
}

const NOTE = {
  full: noteOf(['bytes', 'media_type', 'full_at', 'full_by', 'width', 'height']),
  thumb: noteOf(['thumb_bytes', 'thumb_type', 'thumb_at', 'thumb_by']),
};

// what came first stays: whoever sent it may have it back, and rows have told of it
function noteOf(columns: string[]): string {
  const at = columns.find((column) => column.endsWith('_at'));
  return `
    INSERT INTO picture_files (shop_id, kind, sha256, ${columns.join(', ')})
    VALUES ($1, 'photo', $2, ${columns.map((_column, index) => `$${index + 3}`).join(', ')})
    ON CONFLICT (shop_id, kind, sha256) DO UPDATE SET ${columns.map((name) => `${name} = excluded.${name}`).join(', ')}
    WHERE picture_files.${at} IS NULL
    RETURNING sha256`;
}

/** Writes down that a photo's thumbnail or whole bytes have come; false where that was known. The caller holds the shop's lock. */
export async function noteArrival(
  transaction: Transaction,
  arrival: Arrival,
  read: ReadPicture,
): Promise<boolean> {
  const { photo, size, personId, nowMs } = arrival;
  const said = [photo.shopId, photo.sha256, read.bytes.length, read.mediaType, new Date(nowMs), personId];
  const measured = size === 'full' ? [read.width, read.height] : [];
  const noted = await query(transaction, NOTE[size], [...said, ...measured]);
  return noted.length > 0;
}

const ARRIVED = `
  SELECT sha256, CASE WHEN full_at IS NOT NULL THEN 'full' WHEN thumb_at IS NOT NULL THEN 'thumb' END AS arrived
  FROM picture_files WHERE shop_id = $1 AND kind = 'photo' AND sha256 = ANY($2)`;

/** Rows of photos with how much of each has come, which no op says. The caller holds the shop's lock. */
export async function withArrived<Row extends { sha256: string }>(
  transaction: Transaction,
  shopId: string,
  rows: Row[],
): Promise<Row[]> {
  if (rows.length === 0) return [];
  const names = [...new Set(rows.map(({ sha256 }) => sha256))];
  const found = await query<{ sha256: string; arrived: Arrived }>(transaction, ARRIVED, [shopId, names]);
  const arrivedOf = new Map(found.map(({ sha256, arrived }) => [sha256, arrived]));
  return rows.map((row) => ({ ...row, arrived: arrivedOf.get(row.sha256) ?? null }));
}
