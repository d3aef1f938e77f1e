import { randomBytes } from 'node:crypto';
import pg from 'pg';
import { v7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { migrate } from '#server/migrations/migrate.ts';
import { openDatabase } from '#server/models/database.ts';
import { createTestDatabase, dropTestDatabase, type TestDatabase } from '#tests/worlds/postgres.ts';
import { makePerson, makeShop, type TestShop } from '#tests/worlds/shop.ts';

let world: TestDatabase;
let owner: pg.Client;
let [ours, theirs]: TestShop[] = [];
let tables: string[];

beforeAll(async () => {
  world = await createTestDatabase();
  ours = await makeShop(world.database);
  theirs = await makeShop(world.database);
  owner = new pg.Client({ connectionString: world.url });
  await owner.connect();
  const { rows } = await owner.query<{ table_name: string }>(
    `SELECT table_name FROM information_schema.columns
     WHERE table_schema = 'public' AND column_name = 'shop_id' AND table_name <> 'known_shops' ORDER BY table_name`,
  );
  tables = rows.map((row) => row.table_name);
});

afterAll(async () => {
  await owner.end();
  await world.drop();
});

test('every table with a shop has row security enabled and forced', async () => {
  const { rows } = await owner.query<{ relname: string; both: boolean }>(
    `SELECT relname, relrowsecurity AND relforcerowsecurity AS both FROM pg_class
     WHERE relkind = 'r' AND relnamespace = 'public'::regnamespace ORDER BY relname`,
  );
  expect(tables.length).toBeGreaterThan(12);
  expect(rows.filter((row) => row.both).map((row) => row.relname)).toEqual(tables);
});

test('every key of such a table leads with the shop', async () => {
  const { rows } = await owner.query<{ relname: string; leads: string }>(
    `SELECT class.relname, attribute.attname AS leads
     FROM pg_index index JOIN pg_class class ON class.oid = index.indrelid
     JOIN pg_attribute attribute ON attribute.attrelid = class.oid AND attribute.attnum = index.indkey[0]
     WHERE index.indisprimary AND class.relname = ANY ($1) ORDER BY class.relname`,
    [tables],
  );
  expect(rows).toEqual(tables.map((relname) => ({ relname, leads: 'shop_id' })));
});

test('the app is a role without superuser, bypass or login', async () => {
  const [role] = await world.database.sequelize.query(
    `SELECT current_user AS name, rolsuper, rolbypassrls, rolcanlogin FROM pg_roles WHERE rolname = current_user`,
  );
  expect(role).toEqual([{ name: 'ribband_app', rolsuper: false, rolbypassrls: false, rolcanlogin: false }]);
});

describe('the app', () => {
  test('sees nothing where no shop is set', async () => {
    for (const table of tables) {
      const [rows] = await world.database.sequelize.query(`SELECT count(*) FROM ${table}`);
      expect([table, rows]).toEqual([table, [{ count: 0 }]]);
    }
  });

  test('sees the people of the shop that is set, even where the query names no shop', async () => {
    const people = await world.database.inShop(ours!.shopId, (transaction) =>
      world.database.models.Person.findAll({ transaction }),
    );
    expect(people.length).toBe(4);
    expect(new Set(people.map((person) => person.shopId))).toEqual(new Set([ours!.shopId]));
  });

  test('forgets the shop when the transaction ends', async () => {
    const one = openDatabase(world.url, { connectionsMax: 1 });
    await one.inShop(ours!.shopId, () => Promise.resolve());
    expect(await one.models.Person.count()).toBe(0);
    await one.close();
  });

  test('sees the people of one shop by a single statement too, and forgets the shop with it, even where it fails', async () => {
    const one = openDatabase(world.url, { connectionsMax: 1 });
    const { shopId } = ours!;
    const people = await one.readInShop<{ shop_id: string }>(shopId, 'SELECT shop_id FROM people WHERE id <> :but', {
      but: ours!.people.crew.id,
    });
    expect(people).toEqual([1, 2, 3].map(() => ({ shop_id: shopId })));
    expect(await one.models.Person.count()).toBe(0);
    await expect(one.readInShop(shopId, 'SELECT 1 / 0 FROM people', {})).rejects.toThrow('division by zero');
    expect(await one.models.Person.count()).toBe(0);
    await one.close();
  });

  test("cannot write another shop's row", async () => {
    const writing = world.database.inShop(ours!.shopId, (transaction) =>
      world.database.models.DevicePerson.create(
        { shopId: theirs!.shopId, deviceId: v7(), personId: theirs!.people.crew.id },
        { transaction },
      ),
    );
    await expect(writing).rejects.toThrow('row-level security');
  });

  test("cannot change another shop's row, nor move one of its own there", async () => {
    const { Person } = world.database.models;
    await world.database.inShop(ours!.shopId, async (transaction) => {
      const [changed] = await Person.update(
        { name: 'x' },
        { where: { id: theirs!.people.crew.id }, transaction },
      );
      expect(changed).toBe(0);
    });
    const moving = world.database.inShop(ours!.shopId, (transaction) =>
      Person.update({ shopId: theirs!.shopId }, { where: { id: ours!.people.crew.id }, transaction }),
    );
    await expect(moving).rejects.toThrow('row-level security');
  });

  test('finds by e-mail nobody but the people of that e-mail', async () => {
    const email = 'both@ribband.test';
    await makePerson(world.database, ours!.shopId, ['crew'], email);
    await makePerson(world.database, theirs!.shopId, ['crew'], email);
    const found = await world.database.sequelize.transaction(async (transaction) => {
      await world.database.sequelize.query(`SELECT set_config('ribband.sign_in_email', $1, true)`, {
        bind: [email],
        transaction,
      });
      return world.database.models.Person.findAll({ transaction });
    });
    expect(found.map((person) => person.email)).toEqual([email, email]);
  });
});

test('even an owner of the tables is subject, unless a superuser', async () => {
  await owner.query('BEGIN');
  await owner.query('CREATE ROLE ribband_test_owner');
  for (const table of tables) await owner.query(`ALTER TABLE ${table} OWNER TO ribband_test_owner`);
  expect((await owner.query('SELECT FROM people')).rowCount).toBeGreaterThan(0);
  await owner.query('SET LOCAL ROLE ribband_test_owner');
  for (const table of tables) expect((await owner.query(`SELECT FROM ${table}`)).rowCount).toBe(0);
  await owner.query('ROLLBACK');
});

test('an owner who is no superuser can migrate, twice at once, and the app works then', async () => {
  const name = `ribband_test_${randomBytes(6).toString('hex')}`;
  await owner.query(`CREATE ROLE ${name} LOGIN CREATEROLE PASSWORD 'plain'`);
  await owner.query(`CREATE DATABASE ${name} OWNER ${name}`);
  const url = Object.assign(new URL(world.url), {
    username: name,
    password: 'plain',
    pathname: `/${name}`,
  }).href;
  const runs = await Promise.all([migrate(url), migrate(url)]);
  expect(runs.flat().sort()).toEqual(['0001-shops', '0002-identity', '0003-record', '0004-notes', '0005-picture-files']);
  const database = openDatabase(url);
  const shop = await makeShop(database);
  expect(
    await database.inShop(shop.shopId, (transaction) => database.models.Person.count({ transaction })),
  ).toBe(4);
  await database.close();
  await dropTestDatabase(name);
  await owner.query(`DROP ROLE ${name}`);
});

test('inShop can take a snapshot that refuses to write', async () => {
  const { models, inShop } = world.database;
  const writing = inShop(
    ours!.shopId,
    (transaction) =>
      models.Person.update({ name: 'x' }, { where: { id: ours!.people.crew.id }, transaction }),
    { readOnly: true },
  );
  await expect(writing).rejects.toThrow('read-only transaction');
});
