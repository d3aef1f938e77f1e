import request from 'supertest';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { FAMILY_IDLE_MAX_MS } from '#server/identity/families.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { cookieOf, makePerson, makeShop, signIn, type TestShop } from '#tests/worlds/shop.ts';

let server: TestServer;
let shop: TestShop;

beforeAll(async () => {
  server = await startServer();
  shop = await makeShop(server.database);
});
afterAll(() => server.close());

function refresh(cookie: string, body?: object): request.Test {
  return request(server.app).post('/api/session/refresh').set('Cookie', cookie).send(body);
}

/** Refreshes, which must succeed, and returns the successor. */
async function next(cookie: string): Promise<string> {
  const response = await refresh(cookie);
  expect(response.status).toBe(200);
  return cookieOf(response);
}

test('a refresh answers as a sign-in does', async () => {
  const { person, deviceId, cookie } = await signIn(server, shop.people.crew);
  const response = await refresh(cookie);
  expect(response.body).toEqual({
    accessToken: expect.any(String),
    expiresInSeconds: 900,
    person: { id: person.id, name: person.name, roles: ['crew'], shopId: shop.shopId },
    device: { id: deviceId },
  });
  const devices = await request(server.app)
    .get('/api/devices')
    .auth(response.body.accessToken, { type: 'bearer' });
  expect(devices.status).toBe(200);
});

test('a lost answer is asked for again and gives the same successor', async () => {
  const { cookie } = await signIn(server, shop.people.crew);
  const successor = await next(cookie);
  expect(await next(cookie)).toBe(successor);
  expect(await next(successor)).not.toBe(successor);
});

test('two tabs that ask at the same moment both go on', async () => {
  const { cookie } = await signIn(server, shop.people.crew);
  const successors = await Promise.all([next(cookie), next(cookie), next(cookie)]);
  expect(new Set(successors).size).toBe(1);
});

test('a token is dead once its successor has been used, and using it ends the family', async () => {
  const { cookie } = await signIn(server, shop.people.crew);
  const second = await next(cookie);
  const third = await next(second);
  expect((await refresh(cookie)).status).toBe(401);
  expect((await refresh(third)).status).toBe(401);
  expect((await refresh(second)).status).toBe(401);
});

test('the end of one family leaves the others of the person alone', async () => {
  const stolen = await signIn(server, shop.people.crew);
  const other = await signIn(server, shop.people.crew);
  await next(await next(stolen.cookie));
  expect((await refresh(stolen.cookie)).status).toBe(401);
  await next(other.cookie);
});

test('a token that was not written here is refused and ends nothing', async () => {
  const { cookie } = await signIn(server, shop.people.crew);
  const [name, value] = cookie.split('=') as [string, string];
  const [shopId, family, number, seal] = value.split('.') as [string, string, string, string];
  for (const forged of [
    [shopId, family, '2', seal],
    [shopId, family, number, 'x'],
    [shopId, family, number],
    ['nonsense'],
  ]) {
    expect((await refresh(`${name}=${forged.join('.')}`)).status).toBe(401);
  }
  expect((await request(server.app).post('/api/session/refresh')).status).toBe(401);
  await next(cookie);
});

test('another person enrolled on the device can go on, and stays the one', async () => {
  const { crew, foreman } = shop.people;
  const { deviceId } = await signIn(server, crew);
  const { cookie } = await signIn(server, foreman, deviceId);
  const handed = await refresh(cookie, { personId: crew.id });
  expect(handed.body.person).toMatchObject({ id: crew.id, roles: ['crew'] });
  expect((await refresh(cookieOf(handed))).body.person.id).toBe(crew.id);
});

test('a person who has not signed in on the device cannot, and the family lives', async () => {
  const { cookie } = await signIn(server, shop.people.crew);
  expect((await refresh(cookie, { personId: shop.people.foreman.id })).status).toBe(403);
  await next(cookie);
});

test('who has left the shop is signed in no more', async () => {
  const leaver = await makePerson(server.database, shop.shopId, ['crew']);
  const { cookie, accessToken } = await signIn(server, leaver);
  await server.database.inShop(shop.shopId, (transaction) =>
    server.database.models.Person.update({ leftAt: new Date() }, { where: { id: leaver.id }, transaction }),
  );
  expect((await refresh(cookie)).status).toBe(401);
  expect((await request(server.app).get('/api/devices').auth(accessToken, { type: 'bearer' })).status).toBe(
    401,
  );
});

test('a phone that stays away for half a year has to sign in again, a day less not', async () => {
  const { cookie } = await signIn(server, shop.people.crew);
  server.clock.advance(FAMILY_IDLE_MAX_MS - 86_400_000);
  const successor = await next(cookie);
  server.clock.advance(FAMILY_IDLE_MAX_MS + 1);
  expect((await refresh(successor)).status).toBe(401);
});

test('signing out ends the family and takes the cookie back, and can be repeated', async () => {
  const { cookie } = await signIn(server, shop.people.crew);
  const out = await request(server.app).delete('/api/session').set('Cookie', cookie);
  expect(out.status).toBe(204);
  expect(out.get('Set-Cookie')![0]).toContain('ribband_refresh=;');
  expect((await refresh(cookie)).status).toBe(401);
  expect((await request(server.app).delete('/api/session').set('Cookie', cookie)).status).toBe(204);
  expect((await request(server.app).delete('/api/session')).status).toBe(204);
});

test('an access token holds for a quarter of an hour', async () => {
  const { accessToken } = await signIn(server, shop.people.crew);
  const ask = () => request(server.app).get('/api/devices').auth(accessToken, { type: 'bearer' });
  server.clock.advance(899_000);
  expect((await ask()).status).toBe(200);
  server.clock.advance(1_000);
  const late = await ask();
  expect([late.status, late.get('WWW-Authenticate')]).toEqual([401, 'Bearer']);
});
