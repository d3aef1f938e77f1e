import request from 'supertest';
import { v7 } from 'uuid';
import { afterAll, beforeAll, expect, test } from 'vitest';
import type { DeviceRow } from '#shared/identity/device.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makeShop, signIn, type SignedIn, type TestShop } from '#tests/worlds/shop.ts';

let server: TestServer;
let shop: TestShop;
let foreman: SignedIn;

beforeAll(async () => {
  server = await startServer();
  shop = await makeShop(server.database);
  foreman = await signIn(server, shop.people.foreman);
});
afterAll(() => server.close());

async function devicesOf(session: SignedIn): Promise<DeviceRow[]> {
  const response = await request(server.app)
    .get('/api/devices')
    .auth(session.accessToken, { type: 'bearer' });
  expect(response.status).toBe(200);
  return (response.body as { devices: DeviceRow[] }).devices;
}

function revoke(by: SignedIn, id: string): request.Test {
  return request(server.app).post(`/api/devices/${id}/revoke`).auth(by.accessToken, { type: 'bearer' });
}

test('the foreman and the office see all devices, crew those they have signed in on', async () => {
  const crew = await signIn(server, shop.people.crew);
  const office = await signIn(server, shop.people.office);
  const all = [foreman, crew, office].map((session) => session.deviceId).sort();
  expect((await devicesOf(foreman)).map((device) => device.id).sort()).toEqual(all);
  expect((await devicesOf(office)).map((device) => device.id).sort()).toEqual(all);
  expect((await devicesOf(crew)).map((device) => device.id)).toEqual([crew.deviceId]);
});

test('a revoked device is signed out at once', async () => {
  const lost = await signIn(server, shop.people.crew);
  const response = await revoke(foreman, lost.deviceId);
  expect(response.status).toBe(200);
  expect(response.body.device).toMatchObject({
    id: lost.deviceId,
    revokedAt: new Date(server.clock.now()).toISOString(),
  });
  expect((await request(server.app).post('/api/session/refresh').set('Cookie', lost.cookie)).status).toBe(
    401,
  );
  expect(
    (await request(server.app).get('/api/devices').auth(lost.accessToken, { type: 'bearer' })).status,
  ).toBe(403);
});

test('a revoked device may sign in with the password, so that its unsent work can still come, and reads nothing', async () => {
  const lost = await signIn(server, shop.people.crew);
  await revoke(foreman, lost.deviceId);
  const again = await signIn(server, shop.people.crew, lost.deviceId);
  expect(
    (await request(server.app).get('/api/devices').auth(again.accessToken, { type: 'bearer' })).status,
  ).toBe(403);
  const shown = (await devicesOf(foreman)).find((device) => device.id === lost.deviceId);
  expect(shown?.revokedAt).not.toBeNull();
});

test('a device that is revoked twice keeps its first date and number', async () => {
  const lost = await signIn(server, shop.people.crew);
  const first = await revoke(foreman, lost.deviceId);
  const read = () =>
    server.database.inShop(shop.shopId, (transaction) =>
      server.database.models.Device.findOne({
        where: { id: lost.deviceId },
        transaction,
        rejectOnEmpty: true,
      }),
    );
  const { seq } = await read();
  server.clock.advance(60_000);
  expect((await revoke(foreman, lost.deviceId)).body).toEqual(first.body);
  expect((await read()).seq).toBe(seq);
});

test('a device that is not of the shop is not found', async () => {
  const elsewhere = await makeShop(server.database);
  const theirs = await signIn(server, elsewhere.people.crew);
  expect((await revoke(foreman, theirs.deviceId)).status).toBe(404);
  expect((await revoke(foreman, v7())).status).toBe(404);
  expect((await revoke(foreman, 'nothing')).status).toBe(404);
  expect(await devicesOf(theirs)).toMatchObject([{ id: theirs.deviceId, revokedAt: null }]);
});
