import type { Transaction } from 'sequelize';
import { numberRows } from '#server/sync/feed.ts';
import { ROW_TABLES } from '#server/sync/tables.ts';
import { writeRows } from '#server/sync/write-rows.ts';
import type { Noted } from './arrivals.ts';

/**
 * Gives the rows of a photo how much of it has come, and a new number in the feed. Returns the last number; null where
 * there are none. The caller holds the shop's lock.
 */
export async function tellArrival(
  transaction: Transaction,
  shopId: string,
  { arrived, untold }: Noted,
): Promise<number | null> {
  if (untold.length === 0) return null;
  const { first, last } = await numberRows(transaction, shopId, untold.length);
  const told = untold.map((row, index) => ({ id: row.id, seq: first + index, row: { ...row, arrived } }));
  await writeRows(transaction, shopId, ROW_TABLES.photo, told);
  return last;
}
