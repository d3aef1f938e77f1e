import type { Transaction } from 'sequelize';
import { mergeBatch, type Outcome } from '#shared/sync/merge.ts';
import type { BatchFrom } from '#shared/sync/store.ts';
import { isDatabaseAway } from '#server/models/database-away.ts';
import { query } from '#server/models/query.ts';
import { underSavepoint } from '#server/models/savepoint.ts';
import type { Parts } from '#server/parts.ts';
import { readBatchFrom, readDevice, type Sender } from './batch-from.ts';
import { lockShop } from './feed.ts';
import { hearDevice, isNews, type Heard } from './hear-device.ts';
import { logFault } from '#server/log-fault.ts';
import { PostgresStore } from './postgres-store.ts';

export interface Receipt {
  outcomes: Outcome[];
  /** how far the feed has come by it; null where nothing that others see has changed */
  seq: number | null;
}

/**
 * Takes in what a device sends: all of it in one transaction, which has been committed once this resolves. Ops that
 * cannot be merged are set aside as the server's fault; rejects only where the database is away.
 */
export async function receive(parts: Parts, sender: Sender, ops: unknown[], heard: Heard): Promise<Receipt> {
  if (ops.length === 0) return hearOnly(parts, sender, heard);
  try {
    return await receiveBy(mergeTogether, parts, sender, ops, heard);
  } catch (error) {
    if (isDatabaseAway(error)) throw error;
    logFault(parts.log, error, 'a batch could not be merged; its ops are taken one by one');
    return receiveBy(mergeApart, parts, sender, ops, heard);
  }
}

// without the shop's lock, unless there is something to tell
function hearOnly({ database }: Parts, sender: Sender, heard: Heard): Promise<Receipt> {
  return database.inShop(sender.shopId, async (transaction) => {
    const device = await readDevice(transaction, sender);
    // that a device was heard may be lost with the power, a feed's number that others may have seen may not
    if (!isNews(device, heard)) await query(transaction, `SELECT set_config('synchronous_commit', 'off', true)`);
    return { outcomes: [], seq: await hearDevice(transaction, sender, device, heard) };
  });
}

interface Batch {
  parts: Parts;
  transaction: Transaction;
  store: PostgresStore;
  sender: Sender;
  from: BatchFrom;
  ops: unknown[];
}

type Merge = (batch: Batch) => Promise<Outcome[]>;

function receiveBy(merge: Merge, parts: Parts, sender: Sender, ops: unknown[], heard: Heard): Promise<Receipt> {
  return parts.database.inShop(sender.shopId, async (transaction) => {
    const { timeZone } = await lockShop(transaction, sender.shopId);
    const device = await readDevice(transaction, sender);
    const from = await readBatchFrom(transaction, sender, device, timeZone, heard.nowMs);
    const store = new PostgresStore(transaction, sender.shopId);
    const outcomes = await merge({ parts, transaction, store, sender, from, ops });
    const told = await hearDevice(transaction, sender, device, heard);
    return { outcomes, seq: told ?? store.seq };
  });
}

const mergeTogether: Merge = ({ store, from, ops }) => mergeBatch(store, from, ops);

/** One op after another, each under a savepoint, so that the one that cannot be merged is found and set aside. */
const mergeApart: Merge = async ({ parts, transaction, store, sender, from, ops }) => {
  // else what a constraint refuses would come to light only at the commit
  await query(transaction, 'SET CONSTRAINTS ALL IMMEDIATE');
  const outcomes: Outcome[] = [];
  for (const op of ops) {
    const { lastOrderedAt } = await readDevice(transaction, sender);
    const after = { ...from, device: { ...from.device, lastOrderedAt } };
    try {
      outcomes.push(...(await underSavepoint(transaction, () => mergeBatch(store, after, [op]))));
    } catch (error) {
      if (isDatabaseAway(error)) throw error;
      logFault(parts.log, error, 'an op could not be merged; it is set aside');
      outcomes.push(...(await mergeBatch(store, after, [op], new Set([0]))));
    }
  }
  return outcomes;
};
