import type { Transaction } from 'sequelize';
import type { PhotoRow } from '#shared/photo/photo.ts';
import { query } from '#server/models/query.ts';
import { numberRows } from '#server/sync/feed.ts';
import { ROW_TABLES } from '#server/sync/tables.ts';
import { writeRows } from '#server/sync/write-rows.ts';
import { withArrived } from './arrivals.ts';
import type { Picture } from './store.ts';

const ROWS = 'SELECT row FROM photos WHERE shop_id = $1 AND sha256 = $2 ORDER BY id';

/**
 * Gives every row of the photo that does not say so yet how much of it has come, and a new number in the feed. Returns
 * the last number; null where no row has changed. The caller holds the shop's lock.
 */
export async function tellArrival(
  transaction: Transaction,
  { shopId, sha256 }: Picture,
): Promise<number | null> {
  const before = (await query<{ row: PhotoRow }>(transaction, ROWS, [shopId, sha256])).map(({ row }) => row);
  const after = await withArrived(transaction, shopId, before);
  const changed = after.filter(({ arrived }, index) => arrived !== before[index]!.arrived);
  if (changed.length === 0) return null;
  const { first, last } = await numberRows(transaction, shopId, changed.length);
  const numbered = changed.map((row, index) => ({ id: row.id, seq: first + index, row }));
  await writeRows(transaction, shopId, ROW_TABLES.photo, numbered);
  return last;
}
