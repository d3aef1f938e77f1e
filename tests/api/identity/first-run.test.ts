import request from 'supertest';
import { v7 } from 'uuid';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { issueFirstRunCode } from '#server/identity/first-run.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';

let server: TestServer;
let code: string;

beforeEach(async () => {
  server = await startServer();
  code = (await issueFirstRunCode(server.database))!;
});
afterEach(() => server.close());

const shop = { name: 'Marram Boatworks', timeZone: 'America/Halifax', currency: 'CAD', units: 'imperial' };
const person = { name: 'Edda Quill', email: 'edda@ribband.test', password: 'pitch and oakum' };

function run(more: object = {}): request.Test {
  return request(server.app)
    .post('/api/first-run')
    .send({ code, shop, person, ...more });
}

test('the code makes a shop and its first foreman, who can sign in', async () => {
  const response = await run();
  expect(response.status).toBe(201);
  const { shopId, personId } = response.body as { shopId: string; personId: string };
  const session = await request(server.app)
    .post('/api/session')
    .send({ email: person.email, password: person.password, device: { id: v7(), label: 'laptop' } });
  expect(session.body.person).toEqual({ id: personId, name: 'Edda Quill', roles: ['foreman'], shopId });
  const kept = await server.database.inShop(shopId, (transaction) =>
    server.database.models.Shop.findOne({ transaction, rejectOnEmpty: true }),
  );
  expect(kept.row).toEqual({ id: shopId, ...shop });
  // the shop's row, the foreman, the device
  expect([kept.rowSeq, kept.seq]).toEqual([1, 3]);
});

test('the code may be typed small and without dashes', async () => {
  expect((await run({ code: code.toLowerCase().replaceAll('-', ' ') })).status).toBe(201);
});

test('another code makes nothing', async () => {
  expect((await run({ code: 'AAAA-AAAA-AAAA-AAAA' })).status).toBe(403);
  expect(await server.database.models.KnownShop.count()).toBe(0);
});

test('a code counts once, and there is none once there is a shop', async () => {
  expect((await run()).status).toBe(201);
  expect((await run()).status).toBe(409);
  expect(await issueFirstRunCode(server.database)).toBeNull();
});

test('of two who use it at the same moment one makes the shop', async () => {
  const answers = await Promise.all([run(), run()]);
  expect(answers.map((answer) => answer.status).sort()).toEqual([201, 409]);
  expect(await server.database.models.KnownShop.count()).toBe(1);
});

test('the next start prints another code, and the one before is void', async () => {
  const next = await issueFirstRunCode(server.database);
  expect((await run()).status).toBe(403);
  expect((await run({ code: next })).status).toBe(201);
});

test('guessing is told to wait', async () => {
  for (let done = 0; done < 20; done += 1) expect((await run({ code: `guess ${done}` })).status).toBe(403);
  expect((await run()).status).toBe(429);
});

test.each([
  ['shop.timeZone', { shop: { ...shop, timeZone: 'Europe/Atlantis' } }],
  ['shop.currency', { shop: { ...shop, currency: 'dollars' } }],
  ['person.password', { person: { ...person, password: 'short' } }],
])('a wrong %s is named and leaves the code good', async (path, wrong) => {
  const response = await run(wrong);
  expect([response.status, response.body.issues[0].path]).toEqual([400, path]);
  expect((await run()).status).toBe(201);
});
