import type { Transaction } from 'sequelize';
import { query } from '#server/models/query.ts';

export interface Numbers {
  first: number;
  last: number;
}

/**
 * Gives `count` new numbers of the shop's feed and holds the shop's row until the transaction ends, so that the order
 * of commits is the order of the feed. Whoever changes rows of a feed calls it before touching them (with 0 where
 * the count is not known yet), so that all take their locks in one order.
 */
export async function numberRows(transaction: Transaction, shopId: string, count: number): Promise<Numbers> {
  const [shop] = await query<{ seq: number }>(
    transaction,
    'UPDATE shops SET seq = seq + $2 WHERE shop_id = $1 RETURNING seq',
    [shopId, count],
  );
  if (!shop) throw new Error(`There is no shop ${shopId} in this transaction.`);
  return { first: shop.seq - count + 1, last: shop.seq };
}

/** The last number given in the shop's feed. */
export async function feedSeq(transaction: Transaction, shopId: string): Promise<number> {
  const [shop] = await query<{ seq: number }>(transaction, 'SELECT seq FROM shops WHERE shop_id = $1', [shopId]);
  if (!shop) throw new Error(`There is no shop ${shopId} in this transaction.`);
  return shop.seq;
}

/** Holds the shop's row until the transaction ends, as `numberRows` does; other tables may still refer to it. */
export async function lockShop(transaction: Transaction, shopId: string): Promise<{ timeZone: string }> {
  const [shop] = await query<{ timeZone: string }>(
    transaction,
    'SELECT time_zone AS "timeZone" FROM shops WHERE shop_id = $1 FOR NO KEY UPDATE',
    [shopId],
  );
  if (!shop) throw new Error(`There is no shop ${shopId} in this transaction.`);
  return shop;
}
