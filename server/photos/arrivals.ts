import type { Transaction } from 'sequelize';
import type { Arrived, PhotoRow } from '#shared/photo/photo.ts';
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

const HOW_MUCH = `CASE WHEN full_at IS NOT NULL THEN 'full' WHEN thumb_at IS NOT NULL THEN 'thumb' END`;

const NOTE = {
  full: noteOf(['bytes', 'media_type', 'full_at', 'full_by', 'width', 'height']),
  thumb: noteOf(['thumb_bytes', 'thumb_type', 'thumb_at', 'thumb_by']),
};

// What came first stays: whoever sent it may have it back, and rows have told of it. A line each row of the photo, one
// without a row where there is none, and no line where it was known.
function noteOf(columns: string[]): string {
  const at = columns.find((column) => column.endsWith('_at'));
  return `
    WITH noted AS (
      INSERT INTO picture_files (shop_id, kind, sha256, ${columns.join(', ')})
      VALUES ($1, 'photo', $2, ${columns.map((_column, index) => `$${index + 3}`).join(', ')})
      ON CONFLICT (shop_id, kind, sha256) DO UPDATE SET ${columns.map((name) => `${name} = excluded.${name}`).join(', ')}
      WHERE picture_files.${at} IS NULL
      RETURNING ${HOW_MUCH} AS arrived
    )
    SELECT noted.arrived, photo.row FROM noted LEFT JOIN photos photo ON photo.shop_id = $1 AND photo.sha256 = $2
    ORDER BY photo.id`;
}

/** What has come of a photo, and the rows of it that do not say so yet. */
export interface Noted {
  arrived: Arrived;
  untold: PhotoRow[];
}

/** Writes down that a photo's thumbnail or whole bytes have come; null where that was known. The caller holds the shop's lock. */
export async function noteArrival(
  transaction: Transaction,
  arrival: Arrival,
  read: ReadPicture,
): Promise<Noted | null> {
  const { photo, size, personId, nowMs } = arrival;
  const said = [photo.shopId, photo.sha256, read.bytes.length, read.mediaType, new Date(nowMs), personId];
  const measured = size === 'full' ? [read.width, read.height] : [];
  const lines = await query<NotedLine>(transaction, NOTE[size], [...said, ...measured]);
  if (!lines[0]) return null;
  const { arrived } = lines[0];
  return { arrived, untold: lines.flatMap(({ row }) => (row && row.arrived !== arrived ? row : [])) };
}

interface NotedLine {
  arrived: Arrived;
  row: PhotoRow | null;
}

const ARRIVED = `
  SELECT sha256, ${HOW_MUCH} AS arrived
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
