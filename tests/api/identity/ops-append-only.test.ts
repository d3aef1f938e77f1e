import pg from 'pg';
import { v7 } from 'uuid';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makeShop, signIn, type SignedIn } from '#tests/worlds/shop.ts';

let server: TestServer;
let crew: SignedIn;
let owner: pg.Client;
const opKey = v7();

beforeAll(async () => {
  server = await startServer();
  const shop = await makeShop(server.database);
  crew = await signIn(server, shop.people.crew);
  owner = new pg.Client({ connectionString: server.databaseUrl });
  await owner.connect();
  await keep(opKey, { id: opKey, text: 'a \u0000 in an op' });
});

afterAll(async () => {
  await owner.end();
  await server.close();
});

function keep(key: string, op: unknown): Promise<unknown> {
  const { shopId } = crew.person;
  const receipt = {
    receivedAt: new Date(),
    receivedOn: '2026-06-01',
    orderedAt: 'x',
    orderedOn: '2026-06-01',
  };
  const judged = { roles: ['crew'], outcome: 'set-aside', reason: 'malformed' };
  return server.database.inShop(shopId, (transaction) =>
    server.database.models.Op.create(
      {
        shopId,
        opKey: key,
        op,
        sha256: 'x',
        deviceId: crew.deviceId,
        personId: null,
        kind: null,
        ...receipt,
        ...judged,
      },
      { transaction },
    ),
  );
}

test('an op is kept as it came, with what no other column could hold', async () => {
  const { rows } = await owner.query<{ op: string }>('SELECT op::text AS op FROM ops');
  expect(rows).toEqual([{ op: JSON.stringify({ id: opKey, text: 'a \u0000 in an op' }) }]);
});

test('an op is kept once', async () => {
  await expect(keep(opKey, {})).rejects.toThrow('duplicate key');
});

test.each(['UPDATE ops SET outcome = $$kept$$', 'DELETE FROM ops', 'TRUNCATE ops CASCADE'])(
  'the app may not %s',
  async (sql) => {
    const asApp = server.database.inShop(crew.person.shopId, (transaction) =>
      server.database.sequelize.query(sql, { transaction }),
    );
    await expect(asApp).rejects.toThrow('permission denied');
  },
);

test.each(['UPDATE ops SET outcome = $$kept$$', 'DELETE FROM ops', 'TRUNCATE ops CASCADE'])(
  'the owner may not %s',
  async (sql) => {
    await expect(owner.query(sql)).rejects.toThrow('Ops are kept as they came');
  },
);
