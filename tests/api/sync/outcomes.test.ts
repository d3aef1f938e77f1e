import { v7 } from 'uuid';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { entryBy, layDown, senderFor, type Sender, type Yard } from '#tests/worlds/sender.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makeShop, type TestShop } from '#tests/worlds/shop.ts';

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
