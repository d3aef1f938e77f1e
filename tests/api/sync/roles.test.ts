import { v7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { roleSchema, type Role } from '#shared/identity/role.ts';
import { opKinds } from '#shared/sync/registry.ts';
import { entryBy, layDown, senderFor, type Sender, type Yard } from '#tests/worlds/sender.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makePerson, makeShop, type TestShop } from '#tests/worlds/shop.ts';

/** Rows and what hangs on them, as one person made it. */
interface Made extends Yard {
  entryId: string;
  additionId: string;
  startId: string;
  taskMarkId: string;
  stageMarkId: string;
  findingId: string;
  soundId: string;
  photoId: string;
  setAsideId: string;
}

type Data = (made: Made, sender: Sender) => Record<string, unknown>;
type Case = [kind: string, whose: 'own' | "another's", what: string, by: Role[], data: Data];

const FOREMAN: Role[] = ['foreman'];
const WORKS: Role[] = ['crew', 'foreman'];
const why = 'Put down twice.';
const workDate = '2026-06-01';
const place = { words: 'the garboard, port' };
const found = { kind: 'rot', place, known: 'probed', certainty: 'suspected', text: 'Soft for a hand.' };
const picture = { sha256: 'a1'.repeat(32), width: 1600, height: 1200, bytes: 400_000 };

// a strike and a restore of each entity are alike
function strikes(entity: string, whose: Case[1], by: Role[], id: (made: Made) => string): Case[] {
  const row = (made: Made) => ({ [`${entity}Id`]: id(made), why });
  return [
    [`${entity}.strike`, whose, '', by, (made) => ({ ...row(made), saw: [] })],
    [`${entity}.restore`, whose, '', by, row],
  ];
}

const CASES: Case[] = [
  ['boat.add', 'own', '', FOREMAN, () => ({ boatId: v7(), name: 'Whimbrel' })],
  ['boat.amend', 'own', '', FOREMAN, ({ boatId }) => ({ boatId, set: { name: 'Whimbrel' } })],
  ...strikes('boat', 'own', FOREMAN, ({ boatId }) => boatId),
  ['stage.add', 'own', '', FOREMAN, ({ boatId }) => ({ stageId: v7(), boatId, name: 'Frames', order: 2, after: [] })],
  ['stage.amend', 'own', '', FOREMAN, ({ stageId }) => ({ stageId, set: { name: 'Frames' } })],
  ['stage.mark', 'own', '', FOREMAN, ({ stageId }) => ({ stageId, markId: v7(), workDate })],
  ['stage.unmark', 'own', '', FOREMAN, ({ stageId, stageMarkId }) => ({ stageId, markIds: [stageMarkId] })],
  ...strikes('stage', 'own', FOREMAN, ({ stageId }) => stageId),
  ['task.add', 'own', '', WORKS, ({ boatId, stageId }) => ({ taskId: v7(), boatId, stageId, title: 'Bung the deck' })],
  ['task.amend', "another's", '', FOREMAN, ({ taskId }) => ({ taskId, set: { title: 'Bung the deck' } })],
  ['task.start', "another's", '', WORKS, ({ taskId }) => ({ taskId, startId: v7() })],
  ['task.stop', 'own', '', WORKS, ({ taskId, startId }) => ({ taskId, startIds: [startId] })],
  ['task.stop', "another's", '', FOREMAN, ({ taskId, startId }) => ({ taskId, startIds: [startId] })],
  ['task.mark', "another's", '', WORKS, ({ taskId }) => ({ taskId, markId: v7(), workDate })],
  ['task.unmark', 'own', '', WORKS, ({ taskId, taskMarkId }) => ({ taskId, markIds: [taskMarkId] })],
  ['task.unmark', "another's", '', FOREMAN, ({ taskId, taskMarkId }) => ({ taskId, markIds: [taskMarkId] })],
  ...strikes('task', "another's", FOREMAN, ({ taskId }) => taskId),
  ['entry.write', 'own', '', WORKS, (made, sender) => entryBy(sender, made).data],
  ['entry.amend', 'own', 'words', WORKS, ({ entryId }) => ({ entryId, set: { text: 'One strake.' } })],
  ['entry.amend', "another's", 'words', FOREMAN, ({ entryId }) => ({ entryId, set: { text: 'One strake.' } })],
  [
    'entry.amend',
    "another's",
    'hours of who wrote it',
    ['foreman', 'office'],
    ({ entryId }) => ({ entryId, set: { hours: [{ personId: authorOf.get(entryId), minutes: 60 }] } }),
  ],
  ['entry.addTo', "another's", '', WORKS, ({ entryId }) => ({ entryId, additionId: v7(), text: 'And the plugs.' })],
  ['entry.takeBack', 'own', '', WORKS, ({ entryId, additionId }) => ({ entryId, additionIds: [additionId] })],
  ['entry.takeBack', "another's", '', FOREMAN, ({ entryId, additionId }) => ({ entryId, additionIds: [additionId] })],
  ...strikes('entry', 'own', WORKS, ({ entryId }) => entryId),
  ...strikes('entry', "another's", FOREMAN, ({ entryId }) => entryId),
  ['finding.note', 'own', '', WORKS, ({ boatId }) => ({ findingId: v7(), boatId, ...found })],
  ['finding.amend', "another's", '', WORKS, ({ findingId }) => ({ findingId, set: { certainty: 'proved' } })],
  ...strikes('finding', "another's", WORKS, ({ findingId }) => findingId),
  ['sound.note', 'own', '', WORKS, ({ boatId }) => ({ soundId: v7(), boatId, place, known: 'sounded' })],
  ['sound.amend', "another's", '', WORKS, ({ soundId }) => ({ soundId, set: { known: 'opened' } })],
  ...strikes('sound', "another's", WORKS, ({ soundId }) => soundId),
  ['photo.attach', 'own', '', WORKS, ({ boatId }) => ({ photoId: v7(), boatId, ...picture })],
  ['photo.amend', "another's", '', WORKS, ({ photoId }) => ({ photoId, set: { caption: 'The garboard, port.' } })],
  ...strikes('photo', "another's", WORKS, ({ photoId }) => photoId),
  ['setAside.admit', "another's", '', FOREMAN, ({ setAsideId }) => ({ setAsideId })],
  ['setAside.dismiss', "another's", '', FOREMAN, ({ setAsideId }) => ({ setAsideId })],
];

const authorOf = new Map<string, string>();
let server: TestServer;
let shop: TestShop;
let senders: Record<Role, Sender>;
let mate: Sender;

beforeAll(async () => {
  server = await startServer();
  shop = await makeShop(server.database);
  senders = {} as Record<Role, Sender>;
  for (const role of roleSchema.options) senders[role] = await senderFor(server, shop.people[role]);
  mate = await senderFor(server, await makePerson(server.database, shop.shopId, ['crew']));
});
afterAll(() => server.close());

/** Fresh rows by `maker`, where the law lets them; what crew may not make is the foreman's. */
async function madeBy(maker: Sender): Promise<Made> {
  const { foreman, office } = senders;
  const yard = await layDown(foreman);
  const { stageId, taskId } = yard;
  const { boatId } = yard;
  const [additionId, startId, taskMarkId, stageMarkId] = [v7(), v7(), v7(), v7()];
  const [findingId, soundId, photoId] = [v7(), v7(), v7()];
  const entry = entryBy(maker, yard);
  const entryId = entry.data.entryId as string;
  authorOf.set(entryId, maker.personId);
  await foreman.send(foreman.op('stage.mark', { stageId, markId: stageMarkId, workDate }));
  const stray = office.op('boat.add', { boatId: v7(), name: 'Stint' });
  await office.send(stray);
  const outcomes = await maker.send(
    entry,
    maker.op('entry.addTo', { entryId, additionId, text: 'Bunged as well.' }),
    maker.op('task.start', { taskId, startId }),
    maker.op('task.mark', { taskId, markId: taskMarkId, workDate }),
    maker.op('finding.note', { findingId, boatId, ...found }),
    maker.op('sound.note', { soundId, boatId, place, known: 'sounded' }),
    maker.op('photo.attach', { photoId, boatId, ...picture }),
  );
  expect(outcomes.filter(({ outcome }) => outcome !== 'kept')).toEqual([]);
  return { ...yard, entryId, additionId, startId, taskMarkId, stageMarkId, findingId, soundId, photoId, setAsideId: stray.id };
}

test('the matrix names every kind of op that there is', () => {
  expect([...new Set(CASES.map(([kind]) => kind))].sort()).toEqual([...opKinds.keys()].sort());
});

describe.each(CASES)("%s, %s %s", (kind, whose, _what, by, data) => {
  test.each(roleSchema.options)(`by %s (of ${by.join(', ')})`, async (role) => {
    const sender = senders[role];
    // office and owners make nothing that could be their own
    const canMake = WORKS.includes(role);
    const made = await madeBy(whose === 'own' && canMake ? sender : mate);
    const [outcome] = await sender.send(sender.op(kind, data(made, sender)));
    if (by.includes(role)) expect(outcome!.outcome).not.toBe('set-aside');
    else expect(outcome).toMatchObject({ outcome: 'set-aside', reason: 'not-entitled' });
  });
});

test("crew named in another's entry set their own hours there and nothing else", async () => {
  const { crew } = senders;
  const yard = await layDown(senders.foreman);
  const entry = entryBy(mate, yard, { hours: [mate, crew].map(({ personId }) => ({ personId, minutes: 60 })) });
  await mate.send(entry);
  const { entryId } = entry.data;
  const hours = (sender: Sender) => [{ personId: sender.personId, minutes: 90 }];
  const outcomes = await crew.send(
    crew.op('entry.amend', { entryId, set: { hours: hours(crew) } }, { over: { [`hours/${crew.personId}`]: [entry.id] } }),
    crew.op('entry.amend', { entryId, set: { hours: hours(mate) } }),
    crew.op('entry.amend', { entryId, set: { hours: hours(crew), text: 'More.' } }),
  );
  expect(outcomes.map(({ outcome }) => outcome)).toEqual(['kept', 'set-aside', 'set-aside']);
});

test("no op with another shop's token reaches a row of this one", async () => {
  const strangers = await makeShop(server.database, 'Otter Bank Yard');
  const stranger = await senderFor(server, strangers.people.foreman);
  const made = await madeBy(mate);
  const before = await senders.foreman.pullAll();
  const ops = CASES.map(([kind, , , , data]) => stranger.op(kind, data(made, stranger)));
  const outcomes = await stranger.send(...ops);
  const kept = outcomes.flatMap(({ outcome }, index) => (outcome === 'set-aside' ? [] : [ops[index]!.kind]));
  expect(kept).toEqual(['boat.add']);
  expect(new Set(outcomes.flatMap(({ reason }) => reason ?? []))).toEqual(new Set(['no-such-row']));
  expect((await senders.foreman.pullAll(before.cursor)).rows).toEqual([]);
  const theirs = (await stranger.pullAll()).rows.filter(({ entity }) => !['setAside', 'person', 'device', 'shop'].includes(entity));
  expect(theirs.map(({ row }) => row?.name)).toEqual(['Whimbrel']);
});
