import { gzipSync } from 'node:zlib';
import request from 'supertest';
import { v7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { OPS_PER_REQUEST_MAX, SYNC_BODY_BYTES_MAX, syncAnswerSchema, type SyncAnswer } from '#shared/sync/protocol.ts';
import { entryBy, layDown, senderFor, type Sender, type Yard } from '#tests/worlds/sender.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makeShop, type TestShop } from '#tests/worlds/shop.ts';
import { countRows } from '#tests/worlds/tables.ts';

// Goal: whatever a request as a whole has wrong with it is refused before anything is taken.
let server: TestServer;
let shop: TestShop;
let crew: Sender;
let yard: Yard;

beforeAll(async () => {
  server = await startServer();
  shop = await makeShop(server.database);
  crew = await senderFor(server, shop.people.crew);
  yard = await layDown(await senderFor(server, shop.people.foreman));
});
afterAll(() => server.close());

function bodyWith(changes: Record<string, unknown>): string {
  return JSON.stringify({ deviceId: crew.deviceId, cursor: null, ops: [entryBy(crew, yard)], ...changes });
}

async function opsInLog(): Promise<number> {
  return (await countRows(server.database, shop.shopId)).ops!;
}

describe('a request that is refused', () => {
  const long = 'a'.repeat(SYNC_BODY_BYTES_MAX);
  test.each<[what: string, status: number, at: string | null, changes: () => Record<string, unknown>]>([
    ['a field that is not known', 400, 'dryRun', () => ({ dryRun: true })],
    ['ops that are no list', 400, 'ops', () => ({ ops: {} })],
    ['no cursor', 400, 'cursor', () => ({ cursor: undefined })],
    ['a limit of 0', 400, 'limit', () => ({ limit: 0 })],
    ['a limit over 1000', 400, 'limit', () => ({ limit: 1001 })],
    ['a version that cannot be kept', 400, 'appVersion', () => ({ appVersion: '1\u0000' })],
    ['held of another shape', 400, 'held.ops', () => ({ held: { ops: -1, photos: 0 } })],
    ['a device that is not the token\'s', 403, null, () => ({ deviceId: v7() })],
    ['501 ops', 413, null, () => ({ ops: Array.from({ length: OPS_PER_REQUEST_MAX + 1 }, () => entryBy(crew, yard)) })],
    ['over 1 MiB', 413, null, () => ({ ops: [long] })],
  ])('%s: %i', async (_what, status, at, changes) => {
    const before = await opsInLog();
    const response = await crew.post(bodyWith(changes()));
    const problem = response.body as unknown as { status: number; issues?: { path: string }[] };
    expect([response.status, problem.status]).toEqual([status, status]);
    expect(problem.issues?.map(({ path }) => path) ?? null).toEqual(at === null ? null : [at]);
    expect(await opsInLog()).toBe(before);
  });

  test('an op nested deeper than any parser likes: 400', async () => {
    const deep = `{"deviceId":"${crew.deviceId}","cursor":null,"ops":[${'['.repeat(200_000)}${']'.repeat(200_000)}]}`;
    expect((await crew.post(deep)).status).toBe(400);
  });

  test('no JSON: 400', async () => {
    expect((await crew.post('{"deviceId":')).status).toBe(400);
  });

  test('no token, or one from elsewhere: 401', async () => {
    expect((await request(server.app).post('/api/sync').send({})).status).toBe(401);
    expect((await request(server.app).post('/api/sync').set('Authorization', 'Bearer a.b.c').send({})).status).toBe(401);
  });

  test('1.1 MiB after unzipping, however small it comes: 413', async () => {
    const zipped = gzipSync(bodyWith({ ops: ['a'.repeat(1.1 * 1024 * 1024)] }));
    expect(zipped.length).toBeLessThan(10_000);
    expect((await crew.post(zipped, { 'Content-Encoding': 'gzip' })).status).toBe(413);
  });

  test('half a gigabyte folded small is given up early', async () => {
    // members of a gzip file may follow one another (RFC 1952, 2.2)
    const bomb = Buffer.concat(Array<Buffer>(512).fill(gzipSync(Buffer.alloc(1024 * 1024, 'a'))));
    const before = process.memoryUsage().rss;
    expect((await crew.post(bomb, { 'Content-Encoding': 'gzip' })).status).toBe(413);
    expect(process.memoryUsage().rss - before).toBeLessThan(200 * 1024 * 1024);
  });
});

test('500 ops at once are taken, gzip both ways', async () => {
  const ops = Array.from({ length: OPS_PER_REQUEST_MAX }, () => entryBy(crew, yard));
  const response = await request(server.app)
    .post('/api/sync')
    .set({ Authorization: `Bearer ${crew.session.accessToken}`, 'Content-Type': 'application/json' })
    .set({ 'Content-Encoding': 'gzip', 'Accept-Encoding': 'gzip' })
    .serialize((body: unknown) => body as string)
    .send(gzipSync(bodyWith({ ops })));
  expect([response.status, response.get('Content-Encoding')]).toEqual([200, 'gzip']);
  expect(response.get('Cache-Control')).toBe('no-store');
  const { outcomes } = response.body as SyncAnswer;
  expect(outcomes.map(({ id, outcome }) => [id, outcome])).toEqual(ops.map(({ id }) => [id, 'kept']));
});

test('the answer is as its schema says', async () => {
  const { body } = await crew.sync({ ops: [entryBy(crew, yard), {}], appVersion: '1.4.0' });
  expect(syncAnswerSchema.strict().safeParse(body).error).toBeUndefined();
  expect(body).toMatchObject({ backedUpTo: null, replayFrom: null, reset: false, serverTime: new Date(server.clock.now()).toISOString() });
});

test('the route is in the OpenAPI document', async () => {
  const { body } = await request(server.app).get('/api/openapi.json');
  expect(body.paths).toHaveProperty(['/api/sync', 'post', 'requestBody', 'content', 'application/json', 'schema', 'properties', 'held']);
  expect(body.paths).toHaveProperty(['/api/events', 'get', 'responses', '200', 'content', 'text/event-stream']);
});
