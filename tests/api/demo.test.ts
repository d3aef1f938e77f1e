import { createHash } from 'node:crypto';
import { afterAll, beforeAll, expect, test } from 'vitest';
import request from 'supertest';
import { v7 } from 'uuid';
import { DEMO_PASSWORD } from '#server/demo/demo-people.ts';
import { DEMO_SHOP_ID, demoAccounts, seedDemo } from '#server/demo/seed.ts';
import { query } from '#server/models/query.ts';
import type { Pictures } from '#server/demo/pictures/develop.ts';
import type { PhotoRow } from '#shared/photo/photo.ts';
import { makeClock } from '#tests/worlds/clock.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { standInPictures } from '#tests/worlds/stand-in-pictures.ts';

const TUESDAY_NOON = Date.parse('2026-05-05T16:00:00Z');

let server: TestServer;
let pictures: Pictures;

beforeAll(async () => {
  server = await startServer({ clock: makeClock(TUESDAY_NOON) });
  pictures = await standInPictures();
  await seedDemo(server.database, TUESDAY_NOON, 'America/New_York', { pictures, store: server.pictures });
});
afterAll(() => server.close());

const signIn = (email: string, shopId?: string) =>
  request(server.app)
    .post('/api/session')
    .send({
      email,
      password: DEMO_PASSWORD,
      device: { id: v7(), label: 'demo phone' },
      ...(shopId ? { shopId } : {}),
    });

test('every account that is printed can sign in and has the role it is printed with', async () => {
  const accounts = demoAccounts();
  expect(accounts.map(({ role }) => role).sort()).toEqual([
    'crew',
    'crew',
    'crew',
    'crew',
    'crew',
    'foreman',
    'office',
    'owner',
    'owner',
    'owner',
  ]);
  for (const { role, email } of accounts) {
    const answer = await signIn(email, DEMO_SHOP_ID);
    expect(answer.status, email).toBe(200);
    expect((answer.body as { person: { roles: string[] } }).person.roles).toContain(role);
  }
});

test('the first account that is printed for a role is in one shop and has that role alone', async () => {
  for (const wanted of ['crew', 'foreman', 'office', 'owner']) {
    const answer = await signIn(demoAccounts().find(({ role }) => role === wanted)!.email);
    expect((answer.body as { person: { roles: string[] } }).person.roles).toEqual([wanted]);
  }
});

test('one e-mail is in two shops and is asked which', async () => {
  const answer = await signIn('castor@wey.example');
  expect(answer.status).toBe(409);
  expect((answer.body as { shops: { name: string }[] }).shops.map(({ name }) => name).sort()).toEqual([
    'Hornbeam Slip Boat Shop',
    'Teasel Quay Boats',
  ]);
});

test('nothing was set aside as a fault, and one op waits for the foreman', async () => {
  const found = await server.database.inShop(DEMO_SHOP_ID, (transaction) =>
    server.database.models.SetAside.findAll({ where: { shopId: DEMO_SHOP_ID }, transaction }),
  );
  expect(found.map(({ reason, state }) => [reason, state])).toEqual([['not-entitled', 'waiting']]);
});

test('what a device holds and when it was last heard is as the demo tells it', async () => {
  const found = await server.database.inShop(DEMO_SHOP_ID, (transaction) =>
    server.database.models.Device.findAll({ where: { shopId: DEMO_SHOP_ID }, transaction }),
  );
  const devices = found.filter(({ row }) => row.label !== 'demo phone');
  const holding = devices
    .filter(({ row }) => (row.held?.ops ?? 0) > 0)
    .map(({ row }) => [row.label, row.held!.ops]);
  expect(holding.sort()).toEqual([
    ["Hob's first phone", 2],
    ["Hob's phone", 4],
  ]);
  expect(devices.every(({ lastHeardAt }) => lastHeardAt!.getTime() < TUESDAY_NOON)).toBe(true);
});

test('every photo has come whole, and gives the bytes that its op names', async () => {
  const photos = await server.database.inShop(DEMO_SHOP_ID, (transaction) =>
    query<{ row: PhotoRow }>(transaction, 'SELECT row FROM photos WHERE shop_id = $1', [DEMO_SHOP_ID]),
  );
  expect(photos).toHaveLength(pictures.size);
  const answer = await signIn('orrin@hornbeam.example', DEMO_SHOP_ID);
  const { accessToken } = answer.body as { accessToken: string };
  const bytesOf = (sha256: string, size: string) =>
    request(server.app)
      .get(`/api/photos/${sha256}?size=${size}`)
      .auth(accessToken, { type: 'bearer' })
      .buffer();
  for (const { row } of photos) {
    const { sha256, arrived, bytes } = row;
    expect(arrived).toBe('full');
    const full = await bytesOf(sha256, 'full');
    expect(full.status).toBe(200);
    expect(
      createHash('sha256')
        .update(full.body as Buffer)
        .digest('hex'),
    ).toBe(sha256);
    expect((full.body as Buffer).length).toBe(bytes);
  }
  const { sha256 } = photos[0]!.row;
  expect((await bytesOf(sha256, 'thumb')).status).toBe(200);
});
