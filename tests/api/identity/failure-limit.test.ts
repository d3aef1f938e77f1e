import request from 'supertest';
import { v7 } from 'uuid';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { pino } from 'pino';
import { createApp } from '#server/app.ts';
import { openDatabase } from '#server/models/database.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makeShop, PASSWORD, type TestShop } from '#tests/worlds/shop.ts';

let server: TestServer;
let shop: TestShop;

beforeEach(async () => {
  server = await startServer();
  shop = await makeShop(server.database);
});
afterEach(() => server.close());

function attempt(email: string, password: string, app = server.app): request.Test {
  return request(app)
    .post('/api/session')
    .send({ email, password, shopId: shop.shopId, device: { id: v7(), label: 'phone' } });
}

async function failTimes(count: number, email: string): Promise<void> {
  for (let done = 0; done < count; done += 1) expect((await attempt(email, 'wrong')).status).toBe(401);
}

test('the eleventh failure of an e-mail is told to wait, right password or not, and on a second server too', async () => {
  const { email } = shop.people.crew;
  await failTimes(10, email);
  const refused = await attempt(email.toUpperCase(), PASSWORD);
  expect(refused.status).toBe(429);
  expect(Number(refused.get('Retry-After'))).toBeGreaterThan(800);
  expect(Number(refused.get('Retry-After'))).toBeLessThanOrEqual(900);
  expect(refused.get('Content-Type')).toContain('application/problem+json');
  expect((await attempt(shop.people.foreman.email, PASSWORD)).status).toBe(200);

  const database = openDatabase(server.databaseUrl);
  const second = createApp({
    database,
    pictures: server.pictures,
    now: server.clock.now,
    hails: server.hails,
    log: pino({ level: 'silent' }),
  });
  expect((await attempt(email, PASSWORD, second)).status).toBe(429);
  await database.close();
});

test('an e-mail that nobody has is told to wait just so', async () => {
  await failTimes(10, 'nobody@ribband.test');
  expect((await attempt('nobody@ribband.test', 'wrong')).status).toBe(429);
});

test('after a quarter of an hour it may be tried again', async () => {
  const { email } = shop.people.crew;
  await failTimes(10, email);
  await server.database.sequelize.query(`UPDATE rate_limits SET resets_at = now() - interval '1 second'`);
  expect((await attempt(email, PASSWORD)).status).toBe(200);
});

test('what succeeds is not counted', async () => {
  for (let done = 0; done < 12; done += 1)
    expect((await attempt(shop.people.crew.email, PASSWORD)).status).toBe(200);
});

test('an address that fails with ever other e-mails is told to wait as well', async () => {
  await failTimes(1, 'first@ribband.test');
  await server.database.sequelize.query(
    `UPDATE rate_limits SET hits = 100 WHERE key LIKE 'sign-in-address:%'`,
  );
  expect((await attempt('second@ribband.test', 'wrong')).status).toBe(429);
});
