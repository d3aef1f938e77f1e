import { v7 } from 'uuid';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import type { Role } from '#shared/identity/role.ts';
import type { FeedRow } from '#shared/sync/protocol.ts';
import { entryBy, layDown, senderFor, type Sender, type Yard } from '#tests/worlds/sender.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makePerson, makeShop, type TestShop } from '#tests/worlds/shop.ts';
import { asOwner } from '#tests/worlds/tables.ts';

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
afterAll(() => server.close());

function ask(method: string, path: string, body: object = {}): Promise<Response> {
  return fetch(`${server.url}${path}`, {
    method,
    headers: { Authorization: `Bearer ${foreman.session.accessToken}`, 'Content-Type': 'application/json' },
    body: JSON.stringify(body),
  });
}

function entitiesOf(rows: FeedRow[]): string[] {
  return [...new Set(rows.map(({ entity }) => entity))].sort();
}

/** Two that change one entry's words, neither having heard the other. */
async function disagree(): Promise<{ entryId: string; over: string[] }> {
  const entry = entryBy(crew, yard);
  const entryId = entry.data.entryId as string;
  const amend = (text: string) => crew.op('entry.amend', { entryId, set: { text } }, { over: { text: [entry.id] } });
  const both = [amend('Two hung.'), amend('Three hung.')];
  await crew.send(entry, ...both);
  return { entryId, over: both.map(({ id }) => id) };
}

test('numbers rise strictly, and a batch has the rows in the order in which they refer to one another', async () => {
  const { rows } = await foreman.pullAll();
  const seqs = rows.map(({ seq }) => seq);
  expect(seqs).toEqual([...new Set(seqs)].sort((a, b) => a - b));
  const made = rows.filter(({ entity }) => ['boat', 'stage', 'task'].includes(entity));
  expect(made.map(({ entity }) => entity)).toEqual(['boat', 'stage', 'task']);
  expect(made[2]!.seq - made[0]!.seq).toBe(2);
});

test.each([1, 3, 7, 1000])('pages of %i give the same rows as one great page', async (limit) => {
  await crew.send(...Array.from({ length: 12 }, () => entryBy(crew, yard)), {});
  await disagree();
  const whole = await foreman.pullAll();
  const paged = await foreman.pullAll(null, limit);
  expect(paged.rows).toEqual(whole.rows);
  expect((await foreman.sync({ cursor: paged.cursor })).body).toMatchObject({ rows: [], more: false, reset: false });
});

test('what changes is sent again under a new number, what does not is not', async () => {
  const { cursor } = await foreman.pullAll();
  const start = crew.op('task.start', { taskId: yard.taskId, startId: v7() });
  await crew.send(start);
  const { rows } = await foreman.pullAll(cursor);
  expect(rows.filter(({ entity }) => entity !== 'device')).toMatchObject([{ entity: 'task', id: yard.taskId, row: { starts: [{ opId: start.id }] } }]);
});

test('a loose end comes and, once settled, is gone', async () => {
  const { entryId, over } = await disagree();
  const { rows, cursor } = await foreman.pullAll();
  const end = rows.find(({ entity }) => entity === 'looseEnd')!;
  expect(end).toMatchObject({ gone: false, row: { kind: 'field', field: 'text', rowId: entryId } });
  await foreman.send(foreman.op('entry.amend', { entryId, set: { text: 'Three hung.' } }, { over: { text: over } }));
  const after = await crew.pullAll(cursor);
  expect(after.rows.find(({ id }) => id === end.id)).toMatchObject({ entity: 'looseEnd', row: null, gone: true });
});

describe('an owner', () => {
  let owner: Sender;
  beforeEach(async () => {
    await ask('PUT', `/api/boats/${yard.boatId}/owners`, { personIds: [shop.people.owner.id] });
    await layDown(foreman);
    await disagree();
    const { boatId } = yard;
    const place = { words: 'the garboard, port' };
    await crew.send(
      crew.op('finding.note', { findingId: v7(), boatId, kind: 'rot', place, known: 'probed', certainty: 'suspected', text: 'Soft.' }),
      crew.op('sound.note', { soundId: v7(), boatId, place, known: 'sounded' }),
      crew.op('photo.attach', { photoId: v7(), boatId, sha256: 'a1'.repeat(32), width: 800, height: 600, bytes: 90_000 }),
    );
    owner = await senderFor(server, shop.people.owner);
    await owner.sync(); // else the first pull may come before or after the word that the device was heard
  });

  test('hears of the shop, themselves, their device, their boat and her stages, and of no entry, task, finding, photo or loose end', async () => {
    const kept = entitiesOf((await foreman.pullAll()).rows);
    expect(kept).toEqual(expect.arrayContaining(['entry', 'task', 'finding', 'sound', 'photo', 'looseEnd']));
    const { rows } = await owner.pullAll();
    expect(entitiesOf(rows)).toEqual(['boat', 'device', 'person', 'shop', 'stage']);
    expect(rows.filter(({ entity }) => entity === 'boat').map(({ id }) => id)).toEqual([yard.boatId]);
    expect(rows.filter(({ entity }) => entity === 'stage').map(({ id }) => id)).toEqual([yard.stageId]);
    expect(rows.filter(({ entity }) => entity === 'person').map(({ id }) => id)).toEqual([owner.personId]);
    expect(rows.filter(({ entity }) => entity === 'device').map(({ id }) => id)).toEqual([owner.deviceId]);
  });

  test('hears no word of who said what: neither heads nor stamps nor marks', async () => {
    await foreman.send(foreman.op('stage.mark', { stageId: yard.stageId, markId: v7(), workDate: '2026-06-01' }));
    const { rows } = await owner.pullAll();
    const stage = rows.find(({ entity }) => entity === 'stage')!.row!;
    expect(stage).toMatchObject({ name: 'Planking', done: true, doneOn: '2026-06-01', heads: {}, stamps: {} });
    for (const field of ['marks', 'statements', 'makerId']) expect(stage).not.toHaveProperty(field);
    expect(JSON.stringify(rows)).not.toContain(foreman.personId);
  });

  test('is told that a stage is gone when it is struck', async () => {
    const { cursor } = await owner.pullAll();
    await foreman.send(foreman.op('stage.strike', { stageId: yard.stageId, why: 'Not to be done.', saw: [] }));
    expect((await owner.pullAll(cursor)).rows).toMatchObject([{ entity: 'stage', id: yard.stageId, row: null, gone: true }]);
  });

  test('loses a boat: reset, and she is not in the new pull', async () => {
    const { cursor } = await owner.pullAll();
    await ask('PUT', `/api/boats/${yard.boatId}/owners`, { personIds: [] });
    const { body } = await owner.sync({ cursor });
    expect(body.reset).toBe(true);
    expect(entitiesOf(body.rows)).toEqual(['device', 'person', 'shop']);
  });

  test('pages through what is theirs alone', async () => {
    expect((await owner.pullAll(null, 1)).rows).toEqual((await owner.pullAll()).rows);
  });
});

test('crew see names and roles of people but no e-mails save their own, and only devices that are theirs', async () => {
  const { rows } = await crew.pullAll();
  const people = rows.filter(({ entity }) => entity === 'person').map(({ row }) => row!);
  expect(people).toHaveLength(4);
  expect(people.filter((person) => person.email).map(({ id }) => id)).toEqual([crew.personId]);
  expect(rows.filter(({ entity }) => entity === 'device').map(({ id }) => id)).toEqual([crew.deviceId]);
  expect((await foreman.pullAll()).rows.filter(({ entity }) => entity === 'device')).toHaveLength(2);
});

test("what was set aside is its author's and the foreman's to see", async () => {
  const mate = await senderFor(server, await makePerson(server.database, shop.shopId, ['crew']));
  const op = crew.op('boat.add', { boatId: v7(), name: 'Stint' });
  await crew.send(op);
  const sees = async (sender: Sender) => (await sender.pullAll()).rows.some(({ id }) => id === op.id);
  expect([await sees(crew), await sees(foreman), await sees(mate)]).toEqual([true, true, false]);
});

describe('a cursor that does not fit', () => {
  const forged = (parts: unknown) => Buffer.from(JSON.stringify(parts)).toString('base64url');
  const partsOf = (cursor: string) => JSON.parse(Buffer.from(cursor, 'base64url').toString()) as [string, string, number, number];

  test.each(['', 'rubbish', '%%%', '\u0000', forged({}), forged([]), forged([1, 2, 3, 4]), forged(['a', 'b', -1, 1e99])])(
    'unreadable (%j): reset, and the ops are taken as ever',
    async (cursor) => {
      const op = entryBy(crew, yard);
      const { status, body } = await crew.sync({ cursor, ops: [op] });
      expect(status).toBe(200);
      expect(body).toMatchObject({ outcomes: [{ id: op.id, outcome: 'kept' }], reset: true, replayFrom: null });
      expect(entitiesOf(body.rows)).toContain('shop');
    },
  );

  test('a change of roles: reset on the first page, not on those that follow', async () => {
    const { cursor } = await crew.pullAll();
    await ask('PATCH', `/api/people/${crew.personId}`, { roles: ['crew', 'office'] satisfies Role[] });
    const first = (await crew.sync({ cursor, limit: 3 })).body;
    expect(first).toMatchObject({ reset: true, more: true, replayFrom: null });
    expect(first.rows).toHaveLength(3);
    const rest = [];
    for (let page = first; page.more; ) {
      page = (await crew.sync({ cursor: page.cursor, limit: 3 })).body;
      expect(page.reset).toBe(false);
      rest.push(...page.rows);
    }
    expect([...first.rows, ...rest]).toEqual((await crew.pullAll()).rows);
    // office reads the e-mails of all
    expect(rest.concat(first.rows).filter(({ row }) => row?.email)).toHaveLength(4);
  });

  test("another person's on the same device: reset", async () => {
    const { cursor } = await foreman.pullAll();
    const mate = await senderFor(server, shop.people.crew, foreman.deviceId);
    expect((await mate.sync({ cursor })).body).toMatchObject({ reset: true, replayFrom: null });
  });

  test('of a database since restored: reset, and ops are to be sent again from the last receipt it knows', async () => {
    await crew.send(entryBy(crew, yard));
    const receiptMs = server.clock.now();
    const { cursor } = await crew.pullAll();
    server.clock.advance(60_000);
    await asOwner(server, 'UPDATE shops SET incarnation = gen_random_uuid() WHERE shop_id = $1', [shop.shopId]);
    const { body } = await crew.sync({ cursor });
    expect(body).toMatchObject({ reset: true, replayFrom: new Date(receiptMs).toISOString() });
    expect((await crew.sync({ cursor: body.cursor })).body).toMatchObject({ reset: false, replayFrom: null, rows: [] });
  });

  test('beyond the feed: as of a restored database', async () => {
    const [incarnation, personId, epoch] = partsOf((await crew.pullAll()).cursor);
    const { body } = await crew.sync({ cursor: forged([incarnation, personId, epoch, 10_000]) });
    expect(body.reset).toBe(true);
    expect(body.replayFrom).toBe(new Date(server.clock.now()).toISOString());
  });

  test('in a shop where nothing ever came, from the beginning', async () => {
    const empty = await makeShop(server.database);
    const first = await senderFor(server, empty.people.crew);
    const [, personId, epoch] = partsOf((await first.pullAll()).cursor);
    const { body } = await first.sync({ cursor: forged([v7(), personId, epoch, 1]) });
    expect(body).toMatchObject({ reset: true, replayFrom: '1970-01-01T00:00:00.000Z' });
  });
});

describe('a device that is heard', () => {
  const held = { ops: 3, photos: 1, oldest: '2026-05-30T16:00:00.000Z' };
  const told = async () => (await foreman.pullAll()).rows.find(({ id }) => id === crew.deviceId)!;

  test('tells what it holds, its version and when it was heard', async () => {
    await crew.sync({ held, appVersion: '1.4.0', sentAt: '2026-06-01T09:00:00.000Z' });
    const lastHeardAt = new Date(server.clock.now()).toISOString();
    expect((await told()).row).toMatchObject({ held, appVersion: '1.4.0', lastHeardAt, personIds: [crew.personId] });
  });

  test('says nothing new within five minutes, something after, and at once where it holds something else', async () => {
    await crew.sync({ held, appVersion: '1.4.0' });
    const first = await told();
    server.clock.advance(5 * 60_000);
    await crew.sync({ held: { photos: 1, oldest: held.oldest, ops: 3 }, appVersion: '1.4.0' });
    await crew.sync();
    expect((await told()).seq).toBe(first.seq);
    server.clock.advance(1);
    await crew.sync({ held, appVersion: '1.4.0' });
    const second = await told();
    expect(second.seq).toBeGreaterThan(first.seq);
    await crew.sync({ held: { ...held, ops: 2 } });
    const third = await told();
    expect(third.seq).toBeGreaterThan(second.seq);
    expect(third.row).toMatchObject({ held: { ...held, ops: 2 }, appVersion: '1.4.0' });
    await crew.sync({ appVersion: '1.5.0' });
    expect((await told()).row).toMatchObject({ held: { ...held, ops: 2 }, appVersion: '1.5.0' });
  });

  test('is written down at every sync, told or not', async () => {
    await crew.sync();
    server.clock.advance(1000);
    await crew.sync();
    const [line] = await asOwner(server, 'SELECT last_heard_at FROM devices WHERE id = $1', [crew.deviceId]);
    expect(line!.last_heard_at).toEqual(new Date(server.clock.now()));
  });

  test('does not wait for one who holds the shop, nor hold the shop itself', async () => {
    await crew.sync();
    await server.database.inShop(shop.shopId, async (transaction) => {
      await server.database.sequelize.query('SELECT 1 FROM shops FOR NO KEY UPDATE', { transaction });
      expect((await crew.sync()).status).toBe(200);
    });
  });
});
