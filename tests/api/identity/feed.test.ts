import { afterAll, beforeAll, expect, test } from 'vitest';
import { numberRows } from '#server/sync/feed.ts';
import { createTestDatabase, type TestDatabase } from '#tests/worlds/postgres.ts';
import { makePerson, makeShop, type TestShop } from '#tests/worlds/shop.ts';

let world: TestDatabase;
let shop: TestShop;

beforeAll(async () => {
  world = await createTestDatabase();
  shop = await makeShop(world.database);
});
afterAll(() => world.drop());

function number(shopId: string, count: number) {
  return world.database.inShop(shopId, (transaction) => numberRows(transaction, shopId, count));
}

test('numbers are given in blocks without gap or overlap, whoever asks at the same time', async () => {
  const { last: start } = await number(shop.shopId, 0);
  const blocks = await Promise.all([1, 4, 2, 3, 5].map((count) => number(shop.shopId, count)));
  const given = blocks.flatMap(({ first, last }) =>
    Array.from({ length: last - first + 1 }, (_, index) => first + index),
  );
  expect(given.sort((a, b) => a - b)).toEqual(Array.from({ length: 15 }, (_, index) => start + 1 + index));
});

test('what is rolled back gives its numbers back', async () => {
  const { last: before } = await number(shop.shopId, 0);
  const failing = world.database.inShop(shop.shopId, async (transaction) => {
    await numberRows(transaction, shop.shopId, 7);
    throw new Error('undone');
  });
  await expect(failing).rejects.toThrow('undone');
  expect((await number(shop.shopId, 0)).last).toBe(before);
});

test("a shop's numbers cannot be taken from within another", async () => {
  const other = await makeShop(world.database);
  const taking = world.database.inShop(other.shopId, (transaction) =>
    numberRows(transaction, shop.shopId, 1),
  );
  await expect(taking).rejects.toThrow('There is no shop');
});

test('whoever holds the numbers of one shop holds up that shop alone', async () => {
  const other = await makeShop(world.database);
  await world.database.inShop(shop.shopId, async (transaction) => {
    await numberRows(transaction, shop.shopId, 1);
    await makePerson(world.database, other.shopId, ['crew']);
    const waiting = world.database.inShop(shop.shopId, async (second) => {
      await world.database.sequelize.query(`SET LOCAL lock_timeout = '50ms'`, { transaction: second });
      return numberRows(second, shop.shopId, 1);
    });
    await expect(waiting).rejects.toThrow('lock timeout');
  });
});
