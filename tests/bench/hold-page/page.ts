import { z } from 'zod';
import { browserWorld } from '#src/replica/browser-world.ts';
import { openReplica, type LiveReplica } from '#src/replica/live-replica.ts';
import type { Pair } from '#tests/bench/measuring.ts';

z.config({ jitless: true });

export interface HoldOrder {
  email: string;
  password: string;
  shopId: string;
  /** of an entry; its id is made here */
  entry: Record<string, unknown>;
  warmUps: number;
  rounds: number;
  /** after how many ops the outbox is sent and found empty */
  sendEvery: number;
}

declare global {
  interface Window {
    timeHolds: (order: HoldOrder) => Promise<Pair[]>;
  }
}

// what hold() does against the least that keeps one record for sure: in turns, so that both meet the same disk
window.timeHolds = async ({ entry, warmUps, rounds, sendEvery, ...who }) => {
  const replica = await openSynced(who);
  const database = await openBare();
  const pairs: Pair[] = [];
  for (let round = 0; round < warmUps + rounds; round += 1) {
    if (round % sendEvery === 0) await send(replica);
    const data = { ...entry, entryId: replica.newId() };
    let startedMs = performance.now();
    const op = await replica.hold('entry.write', data);
    const oursMs = performance.now() - startedMs;
    startedMs = performance.now();
    await put(database, op.at, { op, heldSince: new Date().toISOString() });
    pairs.push({ oursMs, bareMs: performance.now() - startedMs });
  }
  return pairs.slice(warmUps);
};

async function openSynced(who: Pick<HoldOrder, 'email' | 'password' | 'shopId'>): Promise<LiveReplica> {
  const replica = await openReplica(browserWorld('0.1.0', () => {}));
  const signedIn = await replica.session.signIn({ ...who, label: 'phone' });
  if (!('ok' in signedIn)) throw new Error(`Sign-in: ${JSON.stringify(signedIn)}`);
  return replica;
}

async function send(replica: LiveReplica): Promise<void> {
  const result = await replica.syncNow();
  if (replica.view().held.length > 0) throw new Error(`Ops stay held: ${JSON.stringify(result)}`);
}

function openBare(): Promise<IDBDatabase> {
  return new Promise((resolve, reject) => {
    const request = indexedDB.open('bare', 1);
    request.onupgradeneeded = () => request.result.createObjectStore('kept');
    request.onsuccess = () => resolve(request.result);
    request.onerror = () => reject(request.error!);
  });
}

function put(database: IDBDatabase, key: string, record: object): Promise<void> {
  return new Promise((resolve, reject) => {
    const transaction = database.transaction('kept', 'readwrite', { durability: 'strict' });
    transaction.objectStore('kept').put(record, key);
    transaction.oncomplete = () => resolve();
    transaction.onabort = () => reject(transaction.error!);
  });
}
