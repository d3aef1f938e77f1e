import type { Transaction } from 'sequelize';
import type { SetAsideRow } from '#shared/set-aside/set-aside.ts';
import { judgeSetAside } from '#shared/sync/merge.ts';
import { understandLogged } from '#shared/sync/merging.ts';
import { isDatabaseAway } from '#server/models/database-away.ts';
import { query } from '#server/models/query.ts';
import { underSavepoint } from '#server/models/savepoint.ts';
import type { Parts } from '#server/parts.ts';
import { feedSeq, lockShop } from './feed.ts';
import { logFault } from '#server/log-fault.ts';
import { PostgresStore } from './postgres-store.ts';

type JudgeParts = Pick<Parts, 'database' | 'log' | 'onChanged'>;

/**
 * Judges what an older server did not understand or failed at, in every shop; to be called when a server starts. What
 * this one cannot take in either stays as it is.
 */
export async function judgeAllAgain(parts: JudgeParts): Promise<void> {
  const shops = await parts.database.models.KnownShop.findAll({ order: ['createdAt'] });
  for (const { shopId } of shops) {
    const seq = await parts.database.inShop(shopId, (transaction) => judgeShopAgain(parts, transaction, shopId));
    if (seq !== null) parts.onChanged(shopId, seq);
  }
}

async function judgeShopAgain({ log }: JudgeParts, transaction: Transaction, shopId: string): Promise<number | null> {
  await lockShop(transaction, shopId);
  // else what a constraint refuses would come to light only at the commit
  await query(transaction, 'SET CONSTRAINTS ALL IMMEDIATE');
  const store = new PostgresStore(transaction, shopId);
  const before = await feedSeq(transaction, shopId);
  for (const row of await worthJudging(transaction, store, shopId)) {
    try {
      await underSavepoint(transaction, () => judgeSetAside(store, shopId, [row]));
    } catch (error) {
      if (isDatabaseAway(error)) throw error;
      logFault(log, error, 'an op that was set aside still cannot be merged');
    }
  }
  const after = await feedSeq(transaction, shopId);
  return after > before ? after : null;
}

async function worthJudging(transaction: Transaction, store: PostgresStore, shopId: string): Promise<SetAsideRow[]> {
  const found = await query<{ row: SetAsideRow }>(
    transaction,
    `SELECT row FROM set_asides WHERE shop_id = $1 AND state = 'waiting' AND reason IN ('not-understood', 'server-fault') ORDER BY seq`,
    [shopId],
  );
  const rows = found.map(({ row }) => row);
  const logged = await store.readOps(rows.map((row) => row.opKey));
  // else each start would send what is still not understood to every device again
  return rows.filter((row) => row.reason === 'server-fault' || understandLogged(logged.get(row.opKey)!) !== 'not-understood');
}
