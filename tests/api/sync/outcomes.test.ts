import { v7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { canonicalJson } from '#shared/sync/canonical.ts';
import { sha256Hex } from '#shared/sync/ids.ts';
import { formatStamp } from '#shared/sync/stamp.ts';
import { entryBy, layDown, senderFor, type Sender, type Yard } from '#tests/worlds/sender.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makePerson, makeShop, type TestShop } from '#tests/worlds/shop.ts';
import { asOwner, countRows } from '#tests/worlds/tables.ts';

let server: TestServer;
let shop: TestShop;
let foreman: Sender;
let crew: Sender;
let yard: Yard;

beforeAll(async () => {
  server = await startServer();
  shop = await makeShop(server.database);
  foreman = await senderFor(server, shop.people.foreman);
  crew = await senderFor(server, shop.people.crew);
  yard = await layDown(foreman);
});
afterAll(() => server.close());

/** The text of an op as the log keeps it. */
async function loggedText(key: string): Promise<string | undefined> {
  const [line] = await asOwner(server, 'SELECT op::text FROM ops WHERE op_key = $1', [key]);
  return line?.op as string | undefined;
}

test('an entry that is sent is in the next answer of everybody who works here', async () => {
  const op = entryBy(crew, yard);
  const { status, body } = await crew.sync({ ops: [op] });
  expect(status).toBe(200);
  expect(body.outcomes).toEqual([{ id: op.id, outcome: 'kept', orderedAt: op.at }]);
  const own = body.rows.find((row) => row.id === op.data.entryId);
  expect(own).toMatchObject({
    entity: 'entry',
    gone: false,
    row: { id: op.data.entryId, text: op.data.text, madeBy: op.id, stamps: { [op.id]: op.at }, authorId: crew.personId },
  });
  const heard = await foreman.pullAll();
  expect(heard.rows.find((row) => row.id === op.data.entryId)).toEqual(own);
});

test('outcomes stand in the order of the ops, with null for an id that does not read as a UUID', async () => {
  const good = entryBy(crew, yard);
  const unknown = crew.op('entry.polish', { entryId: v7() });
  const upper = v7().toUpperCase();
  const stray = crew.op('entry.addTo', { entryId: v7(), additionId: v7(), text: 'And the plugs.' });
  const outcomes = await crew.send({ id: 7 }, good, 'not an op', null, unknown, { ...entryBy(crew, yard), id: upper }, stray);
  expect(outcomes.map(({ id, outcome, reason }) => [id, outcome, reason])).toEqual([
    [null, 'set-aside', 'malformed'],
    [good.id, 'kept', undefined],
    [null, 'set-aside', 'malformed'],
    [null, 'set-aside', 'malformed'],
    [unknown.id, 'set-aside', 'not-understood'],
    [upper, 'set-aside', 'malformed'],
    [stray.id, 'set-aside', 'no-such-row'],
  ]);
});

test('a batch that comes again gets the same answer and changes nothing', async () => {
  const entry = entryBy(crew, yard);
  const { entryId } = entry.data;
  const amend = (text: string) => crew.op('entry.amend', { entryId, set: { text } }, { over: { text: [entry.id] } });
  const batch = [entry, amend('One strake.'), { no: 'op' }, amend('Two strakes.'), crew.op('stage.mark', { stageId: yard.stageId })];
  const first = await crew.send(...batch);
  expect(first.map(({ outcome }) => outcome)).toEqual(['kept', 'loose-end', 'set-aside', 'loose-end', 'set-aside']);
  const before = await countRows(server.database, shop.shopId);
  expect(await crew.send(...batch)).toEqual(first);
  expect(await crew.send(...batch.toReversed())).toEqual(first.toReversed());
  expect(await countRows(server.database, shop.shopId)).toEqual(before);
});

test('two requests with the same batch at once are answered alike and taken once', async () => {
  const batch = Array.from({ length: 20 }, () => entryBy(crew, yard));
  const before = await countRows(server.database, shop.shopId);
  const answers = await Promise.all([crew.send(...batch), crew.send(...batch), crew.send(...batch)]);
  expect(new Set(answers.map((answer) => JSON.stringify(answer))).size).toBe(1);
  const after = await countRows(server.database, shop.shopId);
  expect([after.ops! - before.ops!, after.entries! - before.entries!]).toEqual([20, 20]);
});

test('an op id with other content is set aside and the first stands', async () => {
  const op = entryBy(crew, yard);
  const other = { ...op, data: { ...op.data, text: 'Something else.' } };
  const outcomes = await crew.send(op, other);
  expect(outcomes.map(({ outcome, reason }) => [outcome, reason])).toEqual([['kept', undefined], ['set-aside', 'id-reused']]);
  expect(JSON.parse((await loggedText(sha256Hex(canonicalJson(other))))!)).toEqual(other);
});

describe('text that PostgreSQL cannot keep in a text column', () => {
  test.each([
    ['U+0000', 'drilled\u0000bored'],
    ['a lone surrogate', 'a half \ud83d of a sign'],
    ['more than 20,000 units', 'x'.repeat(20_001)],
  ])('%s: the op is set aside as malformed, kept letter for letter, and seen', async (_what, text) => {
    const op = entryBy(crew, yard, { text });
    const [outcome] = await crew.send(op);
    expect(outcome).toMatchObject({ id: op.id, outcome: 'set-aside', reason: 'malformed' });
    expect(await loggedText(op.id)).toBe(JSON.stringify(op));
    const row = (await foreman.pullAll()).rows.find(({ id }) => id === op.id)!;
    expect(row).toMatchObject({ entity: 'setAside', row: { reason: 'malformed', state: 'waiting', op, authorId: crew.personId } });
  });

  test('in the kind, in a key, and in place of an op', async () => {
    const odd = [
      crew.op('entry\u0000.write', {}),
      crew.op('entry.write', { 'a\u0000b': 1, '\udc00': 2 }),
      'just \u0000 text',
      { id: '\u0000', kind: '\ud800' },
    ];
    const outcomes = await crew.send(...odd);
    expect(outcomes.map(({ reason }) => reason)).toEqual(odd.map(() => 'malformed'));
    expect(await crew.send(...odd)).toEqual(outcomes);
  });
});

test('what waits for a row counts once that row is there, and the repeat still gets the first outcome', async () => {
  const entry = entryBy(crew, yard);
  const addition = crew.op('entry.addTo', { entryId: entry.data.entryId, additionId: v7(), text: 'And the plugs.' });
  const first = await crew.send(addition);
  expect(first).toMatchObject([{ outcome: 'set-aside', reason: 'no-such-row' }]);
  await crew.send(entry);
  const { rows } = await crew.pullAll();
  expect(rows.find(({ id }) => id === addition.id)!.row).toMatchObject({ state: 'since-kept' });
  expect(rows.find(({ id }) => id === entry.data.entryId)!.row).toMatchObject({ additions: [{ text: 'And the plugs.' }] });
  expect(await crew.send(addition)).toEqual(first);
});

test('a reason or a caption may be as long as any text', async () => {
  const [why, entry, photoId] = ['so '.repeat(6_000), entryBy(crew, yard), v7()];
  const { entryId } = entry.data;
  const outcomes = await crew.send(
    entry,
    crew.op('entry.strike', { entryId, why, saw: [entry.id] }, { over: { struck: [entry.id] } }),
    crew.op('photo.attach', { photoId, sha256: 'a'.repeat(64), boatId: yard.boatId, caption: why, width: 4, height: 3, bytes: 12 }),
  );
  expect(outcomes.map(({ outcome }) => outcome)).toEqual(['kept', 'kept', 'kept']);
});

test('a task made for a finding waits for that finding', async () => {
  const { boatId, stageId } = yard;
  const findingId = v7();
  const task = crew.op('task.add', { taskId: v7(), boatId, stageId, title: 'New beam', findingId });
  expect(await crew.send(task)).toMatchObject([{ outcome: 'set-aside', reason: 'no-such-row' }]);
  const noted = { findingId, boatId, kind: 'rot', place: { number: 3 }, known: 'probed', certainty: 'proved', text: 'Beam 3 is soft.' };
  await crew.send(crew.op('finding.note', noted));
  const { rows } = await crew.pullAll();
  expect(rows.find(({ id }) => id === task.data.taskId)!.row).toMatchObject({ title: 'New beam', findingId });
});

test('a year 0 is no day, to the law as to the database', async () => {
  const [outcome] = await crew.send(entryBy(crew, yard, { workDate: '0000-01-01' }));
  expect(outcome).toMatchObject({ outcome: 'set-aside', reason: 'malformed' });
});

describe('who may be named as the author', () => {
  test('somebody who has not signed in on the device may not', async () => {
    const stranger = await makePerson(server.database, shop.shopId, ['foreman']);
    const op = entryBy(crew, yard, { hours: [] });
    const [outcome] = await crew.send({ ...op, personId: stranger.id });
    expect(outcome).toMatchObject({ outcome: 'set-aside', reason: 'not-entitled' });
    const row = (await crew.pullAll()).rows.find(({ id }) => id === op.id)!.row!;
    expect(row).toMatchObject({ authorId: crew.personId, reason: 'not-entitled' });
  });

  test('somebody else who has, may: the entry is theirs, by their roles', async () => {
    const mate = await senderFor(server, await makePerson(server.database, shop.shopId, ['crew']), crew.deviceId);
    const entry = entryBy(mate, yard);
    const mark = crew.op('stage.mark', { stageId: yard.stageId, markId: v7(), workDate: '2026-06-01' });
    const outcomes = await crew.send(entry, { ...mark, personId: mate.personId });
    expect(outcomes.map(({ outcome }) => outcome)).toEqual(['kept', 'set-aside']);
    const row = (await crew.pullAll()).rows.find(({ id }) => id === entry.data.entryId)!.row!;
    expect(row.authorId).toBe(mate.personId);
  });

  test('somebody who has left the shop has no roles, but what they said is theirs and the foreman may admit it', async () => {
    const mate = await senderFor(server, await makePerson(server.database, shop.shopId, ['crew']), crew.deviceId);
    const entry = entryBy(mate, yard);
    await asOwner(server, 'UPDATE people SET left_at = now() WHERE id = $1', [mate.personId]);
    const [outcome] = await crew.send(entry);
    expect(outcome).toMatchObject({ outcome: 'set-aside', reason: 'not-entitled' });
    await foreman.send(foreman.op('setAside.admit', { setAsideId: entry.id }));
    const row = (await foreman.pullAll()).rows.find(({ id }) => id === entry.data.entryId)!.row!;
    expect(row).toMatchObject({ authorId: mate.personId, stamps: { [entry.id]: outcome!.orderedAt } });
  });
});

describe('stamps', () => {
  test('a clock a year ahead gets the hour of its arrival and keeps the order of its own work, over several requests', async () => {
    const ahead = await senderFor(server, shop.people.crew);
    const yearAhead = server.clock.now() + 365 * 86_400_000;
    const early = { ...entryBy(ahead, yard), at: formatStamp({ ms: yearAhead, counter: 0 }, ahead.deviceId) };
    const later = { ...entryBy(ahead, yard), at: formatStamp({ ms: yearAhead + 5, counter: 0 }, ahead.deviceId) };
    const [first] = await ahead.send(early);
    const [second] = await ahead.send(later);
    expect(first!.orderedAt).toBe(formatStamp({ ms: server.clock.now(), counter: 0 }, ahead.deviceId));
    expect(second!.orderedAt).toBe(formatStamp({ ms: server.clock.now(), counter: 1 }, ahead.deviceId));
  });

  test("another device's stamp is malformed", async () => {
    const [outcome] = await crew.send({ ...entryBy(crew, yard), at: foreman.op('any', {}).at });
    expect(outcome).toMatchObject({ outcome: 'set-aside', reason: 'malformed' });
  });
});

describe('a revoked device', () => {
  test('has its ops set aside, is told nothing, and the foreman may admit them', async () => {
    const lost = await senderFor(server, shop.people.crew);
    const { cursor } = await lost.pullAll();
    await fetch(`${server.url}/api/devices/${lost.deviceId}/revoke`, {
      method: 'POST',
      headers: { Authorization: `Bearer ${foreman.session.accessToken}` },
    });
    const entry = entryBy(lost, yard);
    const { status, body } = await lost.sync({ cursor, ops: [entry] });
    expect(status).toBe(200);
    expect(body).toMatchObject({ rows: [], cursor, more: false, reset: false });
    expect(body.outcomes).toMatchObject([{ outcome: 'set-aside', reason: 'device-revoked' }]);
    expect((await lost.sync()).body).toMatchObject({ rows: [], cursor: '', more: false });
    await foreman.send(foreman.op('setAside.admit', { setAsideId: entry.id }));
    const { rows } = await foreman.pullAll();
    expect(rows.find(({ id }) => id === entry.data.entryId)!.row).toMatchObject({ text: entry.data.text });
    expect(rows.find(({ id }) => id === entry.id)!.row).toMatchObject({ state: 'admitted', by: foreman.personId });
  });
});
