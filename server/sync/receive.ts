import type { Transaction } from 'sequelize';
import { mergeBatch, type Outcome } from '#shared/sync/merge.ts';
import { isDatabaseAway } from '#server/models/database-away.ts';
import { query } from '#server/models/query.ts';
import { underSavepoint } from '#server/models/savepoint.ts';
import type { Parts } from '#server/parts.ts';
import { readBatchFrom, readDevice, type Sender } from './batch-from.ts';
import { lockShop } from './feed.ts';
import { hearDevice, type Heard } from './hear-device.ts';
import { logFault } from './log-fault.ts';
import { PostgresStore } from './postgres-store.ts';

export interface Receipt {
  outcomes: Outcome[];
  /** how far the feed has come by it; null where nothing that others see has changed */
  seq: number | null;
}

type Merge = (transaction: Transaction, store: PostgresStore) => Promise<Outcome[]>;

/**
 * Takes in what a device sends: all of it in one transaction, which has been committed once this resolves. Ops that
 * cannot be merged are set aside as the server's fault; rejects only where the database is away.
 */
export async function receive(parts: Parts, sender: Sender, ops: unknown[], heard: Heard): Promise<Receipt> {
  if (ops.length === 0) return hearOnly(parts, sender, heard);
  try {
    return await mergeAs(parts, sender, heard, (transaction, store) => mergeTogether(transaction, store, sender, ops, heard.nowMs));
  } catch (error) {
    if (isDatabaseAway(error)) throw error;
    logFault(parts.log, error, 'a batch could not be merged; its ops are taken one by one');
    return mergeAs(parts, sender, heard, (transaction, store) => mergeApart(parts, transaction, store, sender, ops, heard.nowMs));
  }
}

// without the shop's lock, unless there is something to tell
function hearOnly({ database }: Parts, sender: Sender, heard: Heard): Promise<Receipt> {
  return database.inShop(sender.shopId, async (transaction) => {
    const device = await readDevice(transaction, sender);
    return { outcomes: [], seq: await hearDevice(database, transaction, sender, device, heard) };
  });
}

function mergeAs({ database }: Parts, sender: Sender, heard: Heard, merge: Merge): Promise<Receipt> {
  return database.inShop(sender.shopId, async (transaction) => {
    const store = new PostgresStore(transaction, sender.shopId);
    const outcomes = await merge(transaction, store);
    const device = await readDevice(transaction, sender);
    const told = await hearDevice(database, transaction, sender, device, heard);
    return { outcomes, seq: told ?? store.seq };
  });
}

async function mergeTogether(
  transaction: Transaction,
  store: PostgresStore,
  sender: Sender,
  ops: unknown[],
  nowMs: number,
): Promise<Outcome[]> {
  const { timeZone } = await lockShop(transaction, sender.shopId);
  const device = await readDevice(transaction, sender);
  return mergeBatch(store, await readBatchFrom(transaction, sender, device, timeZone, nowMs), ops);
}

/** One op after another, each under a savepoint, so that the one that cannot be merged is found and set aside. */
async function mergeApart(
  parts: Parts,
  transaction: Transaction,
  store: PostgresStore,
  sender: Sender,
  ops: unknown[],
  nowMs: number,
): Promise<Outcome[]> {
  const { timeZone } = await lockShop(transaction, sender.shopId);
  // else what a constraint refuses would come to light only at the commit
  await query(transaction, 'SET CONSTRAINTS ALL IMMEDIATE');
  const outcomes: Outcome[] = [];
  for (const op of ops) {
    const device = await readDevice(transaction, sender);
    const from = await readBatchFrom(transaction, sender, device, timeZone, nowMs);
    try {
      outcomes.push(...(await underSavepoint(transaction, () => mergeBatch(store, from, [op]))));
    } catch (error) {
      if (isDatabaseAway(error)) throw error;
      logFault(parts.log, error, 'an op could not be merged; it is set aside');
      outcomes.push(...(await mergeBatch(store, from, [op], new Set([0]))));
    }
  }
  return outcomes;
}
