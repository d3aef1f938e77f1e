import pg from 'pg';
import { v7 } from 'uuid';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { pino } from 'pino';
import { createApp } from '#server/app.ts';
import { listen } from '#server/main.ts';
import { judgeAllAgain } from '#server/sync/judge-again.ts';
import { formatStamp } from '#shared/sync/stamp.ts';
import { entryBy, layDown, senderFor, Sender, type Yard } from '#tests/worlds/sender.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makeShop, type TestShop } from '#tests/worlds/shop.ts';
import { asOwner, countRows } from '#tests/worlds/tables.ts';

// Goal: whatever fails within the server, a device's queue is never held up by it and nothing is lost. Method: faults
// are planted in the test's own database as triggers, which fail as a mistake of ours would.
let server: TestServer;
let shop: TestShop;
let foreman: Sender;
let crew: Sender;
let yard: Yard;

beforeAll(async () => {
  server = await startServer();
});
beforeEach(async () => {
  shop = await makeShop(server.database);
  foreman = await senderFor(server, shop.people.foreman);
  crew = await senderFor(server, shop.people.crew);
  yard = await layDown(foreman);
});
afterEach(() => asOwner(server, 'DROP FUNCTION IF EXISTS fail CASCADE'));
afterAll(() => server.close());

/** Has every write of an entry fail whose words hold `word`, by default with an error that is nobody's but ours. */
async function plantFault(word: string, act = `RAISE EXCEPTION 'planted'`): Promise<void> {
  await asOwner(
    server,
    `CREATE FUNCTION fail() RETURNS trigger LANGUAGE plpgsql SECURITY DEFINER AS $$ BEGIN
       IF NEW.row->>'text' LIKE '%${word}%' THEN ${act}; END IF;
       RETURN NEW;
     END $$;
     CREATE TRIGGER fail BEFORE INSERT OR UPDATE ON entries FOR EACH ROW EXECUTE FUNCTION fail()`,
  );
}

async function mend(): Promise<void> {
  await asOwner(server, 'DROP FUNCTION fail CASCADE');
}

async function rowOf(id: unknown) {
  return (await foreman.pullAll()).rows.find((row) => row.id === id)?.row ?? null;
}

function judgeAgain(): Promise<void> {
  const { database } = server;
  return judgeAllAgain({ database, log: pino({ level: 'silent' }), onChanged: () => {} });
}

describe('an op that the server fails at', () => {
  test('is set aside as the server\'s fault, and the others of its batch go on', async () => {
    await plantFault('tar');
    const batch = [entryBy(crew, yard), entryBy(crew, yard, { text: 'Pitch and tar.' }), entryBy(crew, yard)];
    const outcomes = await crew.send(...batch);
    expect(outcomes.map(({ outcome, reason }) => [outcome, reason])).toEqual([
      ['kept', undefined],
      ['set-aside', 'server-fault'],
      ['kept', undefined],
    ]);
    expect(outcomes.map(({ orderedAt }) => orderedAt)).toEqual(batch.map(({ at }) => at));
    expect(await rowOf(batch[1]!.id)).toMatchObject({ reason: 'server-fault', state: 'waiting', op: batch[1] });
    expect(await crew.send(...batch)).toEqual(outcomes);
  });

  test('keeps its place in the order of a device whose clock is ahead', async () => {
    await plantFault('tar');
    const yearAhead = server.clock.now() + 365 * 86_400_000;
    const texts = ['One.', 'Pitch and tar.', 'Three.'];
    const batch = texts.map((text, counter) => ({
      ...entryBy(crew, yard, { text }),
      at: formatStamp({ ms: yearAhead, counter }, crew.deviceId),
    }));
    const outcomes = await crew.send(...batch);
    const expected = texts.map((_text, counter) => formatStamp({ ms: server.clock.now(), counter }, crew.deviceId));
    expect(outcomes.map(({ orderedAt }) => orderedAt)).toEqual(expected);
  });

  test('is judged again when a server starts that does not fail at it, with the order and author it had', async () => {
    await plantFault('tar');
    const op = entryBy(crew, yard, { text: 'Pitch and tar.' });
    const addition = crew.op('entry.addTo', { entryId: op.data.entryId, additionId: v7(), text: 'Two coats.' });
    await crew.send(op, addition);
    await judgeAgain();
    expect(await rowOf(op.id)).toMatchObject({ reason: 'server-fault', state: 'waiting' });
    await mend();
    await judgeAgain();
    expect(await rowOf(op.id)).toMatchObject({ state: 'since-kept' });
    expect(await rowOf(op.data.entryId)).toMatchObject({
      authorId: crew.personId,
      stamps: { [op.id]: op.at },
      additions: [{ text: 'Two coats.' }],
    });
  });

  test('that waits beside one which is mended does not hold that one up', async () => {
    await plantFault('tar');
    const [bad, good] = [entryBy(crew, yard, { text: 'Pitch and tar.' }), entryBy(crew, yard, { text: 'Oil and tar.' })];
    await crew.send(bad, good);
    await mend();
    await plantFault('Pitch');
    await judgeAgain();
    expect(await rowOf(bad.id)).toMatchObject({ state: 'waiting' });
    expect(await rowOf(good.id)).toMatchObject({ state: 'since-kept' });
  });
});

test('what is still not understood is not sent round again at each start', async () => {
  await crew.send(crew.op('entry.polish', { entryId: v7() }));
  const before = await countRows(server.database, shop.shopId);
  await judgeAgain();
  expect(await countRows(server.database, shop.shopId)).toEqual(before);
});

test('a field that a newer phone says beside the data waits for a newer server as well', async () => {
  const op = { ...entryBy(crew, yard), mood: 'good' };
  expect(await crew.send(op)).toMatchObject([{ id: op.id, outcome: 'set-aside', reason: 'not-understood' }]);
});

test('what an older server did not understand counts once a newer one starts', async () => {
  const op = entryBy(crew, yard);
  // as an older server would have left it
  const outcome = (await crew.send({ ...op, kind: 'entry.writ' }))[0]!;
  expect(outcome.reason).toBe('not-understood');
  await asOwner(
    server,
    `ALTER TABLE ops DISABLE TRIGGER kept_as_they_came; UPDATE ops SET op = replace(op::text, 'entry.writ"', 'entry.write"')::json
     WHERE op_key = '${op.id}'; ALTER TABLE ops ENABLE TRIGGER kept_as_they_came`,
  );
  await judgeAgain();
  expect(await rowOf(op.id)).toMatchObject({ state: 'since-kept' });
  expect(await rowOf(op.data.entryId)).toMatchObject({ text: op.data.text, stamps: { [op.id]: op.at } });
});

describe('a database that is away', () => {
  test('in the middle of a merge: 503, nothing is changed or set aside, and the same batch is taken later', async () => {
    // the session that merges is cut off while it writes the entry
    await plantFault('tar', 'PERFORM pg_terminate_backend(pg_backend_pid())');
    const batch = [entryBy(crew, yard), entryBy(crew, yard, { text: 'Pitch and tar.' })];
    const before = await countRows(server.database, shop.shopId);
    const refused = await crew.sync({ ops: batch });
    expect([refused.status, refused.body]).toMatchObject([503, { title: 'Not ready' }]);
    expect(await countRows(server.database, shop.shopId)).toEqual(before);
    await mend();
    expect((await crew.send(...batch)).map(({ outcome }) => outcome)).toEqual(['kept', 'kept']);
  });

  test.each([
    ['deadlock_detected'],
    ['disk_full'],
    ['query_canceled'],
    ['read_only_sql_transaction'],
  ])('%s is nobody\'s fault: 503, and nothing is set aside', async (condition) => {
    await plantFault('tar', `RAISE ${condition}`);
    const before = await countRows(server.database, shop.shopId);
    expect((await crew.sync({ ops: [entryBy(crew, yard, { text: 'Pitch and tar.' })] })).status).toBe(503);
    expect(await countRows(server.database, shop.shopId)).toEqual(before);
  });

  test('from the start: 503', async () => {
    const lost = await startServer();
    const person = (await makeShop(lost.database)).people.crew;
    const sender = await senderFor(lost, person);
    const { pathname } = new URL(lost.databaseUrl);
    const client = new pg.Client({ connectionString: server.databaseUrl });
    await client.connect();
    const name = pathname.slice(1);
    await client.query(`ALTER DATABASE ${name} ALLOW_CONNECTIONS false`);
    await client.query('SELECT pg_terminate_backend(pid, 10000) FROM pg_stat_activity WHERE datname = $1', [name]);
    expect((await sender.sync()).status).toBe(503);
    await client.query(`ALTER DATABASE ${name} ALLOW_CONNECTIONS true`);
    await client.end();
    expect((await sender.sync()).status).toBe(200);
    await lost.close();
  });
});

test("a failing write leaves none of people's words in the log", async () => {
  await plantFault('tar');
  const lines: string[] = [];
  const log = pino({ level: 'info' }, { write: (line) => void lines.push(line) });
  const { database, pictures, hails, clock } = server;
  const talkative = await listen(createApp({ database, pictures, hails, now: clock.now, log }), 0, '127.0.0.1');
  const sender = new Sender({ ...server, url: talkative.url }, crew.session);
  await sender.send(entryBy(sender, yard, { text: 'Pitch and tar.' }));
  await mend();
  await plantFault('tar', 'RAISE disk_full');
  expect((await sender.sync({ ops: [entryBy(sender, yard, { text: 'Oil and tar.' })] })).status).toBe(503);
  await talkative.close();
  expect(lines.filter((line) => line.includes('planted'))).toHaveLength(2);
  expect(lines.filter((line) => line.includes('request failed'))).toHaveLength(1);
  expect(lines.filter((line) => /and tar|entry\.write/.test(line))).toEqual([]);
});
