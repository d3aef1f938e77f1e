import request from 'supertest';
import { v7 } from 'uuid';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makeBoat, makePerson, makeShop, signIn, type SignedIn, type TestShop } from '#tests/worlds/shop.ts';

let server: TestServer;
let shop: TestShop;
let foreman: SignedIn;

beforeAll(async () => {
  server = await startServer();
  shop = await makeShop(server.database);
  foreman = await signIn(server, shop.people.foreman);
});
afterAll(() => server.close());

function setOwners(boatId: string, personIds: string[]): request.Test {
  return request(server.app)
    .put(`/api/boats/${boatId}/owners`)
    .auth(foreman.accessToken, { type: 'bearer' })
    .send({ personIds });
}

function columns(id: string) {
  return server.database.inShop(shop.shopId, (transaction) =>
    server.database.models.Person.findOne({ where: { id }, transaction, rejectOnEmpty: true }),
  );
}

test('a boat changes hands: who gains her and who loses her begin a new feed, each with a number of its own', async () => {
  const boatId = await makeBoat(server.database, shop.shopId);
  const [seller, buyer, sister] = await Promise.all(
    [0, 1, 2].map(() => makePerson(server.database, shop.shopId, ['owner'])),
  );
  await setOwners(boatId, [seller!.id, sister!.id]);
  const stays = await columns(sister!.id);
  const response = await setOwners(boatId, [buyer!.id, sister!.id]);
  expect(response.body).toEqual({ boatId, personIds: [buyer!.id, sister!.id] });

  const [sold, bought] = [await columns(seller!.id), await columns(buyer!.id)];
  expect(sold).toMatchObject({ feedEpoch: 2, row: { boatIds: [] } });
  expect(bought).toMatchObject({ feedEpoch: 1, row: { boatIds: [boatId] } });
  expect(await columns(sister!.id)).toMatchObject({ feedEpoch: 1, seq: stays.seq });
  expect(new Set([sold.seq, bought.seq, stays.seq]).size).toBe(3);
});

test('saying the same again changes nothing', async () => {
  const boatId = await makeBoat(server.database, shop.shopId);
  const { owner } = shop.people;
  await setOwners(boatId, [owner.id]);
  const before = await columns(owner.id);
  expect((await setOwners(boatId, [owner.id, owner.id])).status).toBe(200);
  expect(await columns(owner.id)).toMatchObject({ seq: before.seq, feedEpoch: before.feedEpoch });
});

test('who is no owner, or not of the shop, cannot be one; and nobody else is made one then', async () => {
  const boatId = await makeBoat(server.database, shop.shopId);
  const elsewhere = await makeShop(server.database);
  const owner = await makePerson(server.database, shop.shopId, ['owner']);
  const response = await setOwners(boatId, [owner.id, shop.people.crew.id, elsewhere.people.owner.id]);
  expect(response.status).toBe(400);
  expect(response.body.issues.map((issue: { path: string }) => issue.path)).toEqual([
    'personIds.1',
    'personIds.2',
  ]);
  expect((await columns(owner.id)).row.boatIds).toEqual([]);
});

test('a boat that is not of the shop is not found', async () => {
  const elsewhere = await makeShop(server.database);
  const theirs = await makeBoat(server.database, elsewhere.shopId);
  for (const id of [theirs, v7(), 'nothing']) expect((await setOwners(id, [])).status).toBe(404);
});
