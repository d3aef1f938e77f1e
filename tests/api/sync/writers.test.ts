import { afterAll, beforeAll, expect, test } from 'vitest';
import type { FeedRow } from '#shared/sync/protocol.ts';
import { v7 } from 'uuid';
import { entryBy, layDown, senderFor, type Sender, type SyncResponse, type Yard } from '#tests/worlds/sender.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makePerson, makeShop, type TestShop } from '#tests/worlds/shop.ts';

const WRITERS = 10;
const BATCHES = 8;
const OPS_A_BATCH = 5;

let server: TestServer;
let shop: TestShop;
let foreman: Sender;
let writers: Sender[];
let yard: Yard;

beforeAll(async () => {
  server = await startServer();
  shop = await makeShop(server.database);
  foreman = await senderFor(server, shop.people.foreman);
  yard = await layDown(foreman);
  writers = [];
  for (let n = 0; n < WRITERS; n += 1) {
    writers.push(await senderFor(server, await makePerson(server.database, shop.shopId, ['crew'])));
  }
});
afterAll(() => server.close());

/** Writes entries and ticks one and the same task; the ids of the entries. */
async function write(writer: Sender): Promise<string[]> {
  const ids: string[] = [];
  for (let n = 0; n < BATCHES; n += 1) {
    const entries = Array.from({ length: OPS_A_BATCH }, () => entryBy(writer, yard));
    const mark = writer.op('task.mark', { taskId: yard.taskId, markId: v7(), workDate: '2026-06-01' });
    const outcomes = await writer.send(...entries, mark);
    expect(outcomes.every(({ outcome }) => outcome === 'kept')).toBe(true);
    ids.push(...entries.map((entry) => entry.data.entryId as string));
  }
  return ids;
}

test('ten writers and a poller on one shop: it misses nothing, and numbers only rise', async () => {
  const seen: FeedRow[] = [];
  let cursor: string | null = null;
  let pagesMeanwhile = 0;
  const writing = Promise.all(writers.map(write));
  let isWriting = true;
  void writing.finally(() => (isWriting = false));
  for (let isLast = false; !isLast; ) {
    const isMeanwhile = isWriting;
    const { body }: SyncResponse = await foreman.sync({ cursor, limit: 7 });
    seen.push(...body.rows);
    cursor = body.cursor;
    if (isMeanwhile && body.rows.length > 0) pagesMeanwhile += 1;
    isLast = !isMeanwhile && !body.more;
  }
  const written = (await writing).flat();
  expect(pagesMeanwhile).toBeGreaterThan(3);

  const seqs = seen.map(({ seq }) => seq);
  expect(seqs.every((seq, index) => index === 0 || seq > seqs[index - 1]!)).toBe(true);
  const entries = seen.filter(({ entity }) => entity === 'entry').map(({ id }) => id);
  expect(entries.sort()).toEqual(written.sort());
  const task = seen.findLast(({ id }) => id === yard.taskId)!.row as { marks: unknown[]; done: boolean; twice: boolean };
  expect(task).toMatchObject({ done: true, twice: true });
  expect(task.marks).toHaveLength(WRITERS * BATCHES);
  // what was put together on the way is what a fresh replica gets
  const latest = new Map(seen.map((row) => [`${row.entity}/${row.id}`, row]));
  const byKey = (a: FeedRow, b: FeedRow) => a.seq - b.seq;
  expect([...latest.values()].sort(byKey)).toEqual((await foreman.pullAll()).rows);
});

test('shops do not wait for one another', async () => {
  const other = await makeShop(server.database, 'Otter Bank Yard');
  const stranger = await senderFor(server, other.people.foreman);
  await server.database.inShop(shop.shopId, async (transaction) => {
    await server.database.sequelize.query('SELECT 1 FROM shops FOR UPDATE', { transaction });
    const made = await layDown(stranger);
    expect((await stranger.send(entryBy(stranger, made)))[0]!.outcome).toBe('kept');
  });
});
