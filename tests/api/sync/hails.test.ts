import { once } from 'node:events';
import { createServer } from 'node:http';
import type { AddressInfo } from 'node:net';
import { pino } from 'pino';
import { afterAll, afterEach, beforeAll, expect, test } from 'vitest';
import { createApp } from '#server/app.ts';
import { HailStream } from '#server/hails/hail-stream.ts';
import { Hails } from '#server/hails/hails.ts';
import { listen } from '#server/main.ts';
import { HailEar } from '#tests/worlds/hail-ear.ts';
import { entryBy, layDown, senderFor, type Sender, type Yard } from '#tests/worlds/sender.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makeShop, type TestShop } from '#tests/worlds/shop.ts';
import { asOwner } from '#tests/worlds/tables.ts';

const HAIL_MAX_MS = 2000;

let server: TestServer;
let shop: TestShop;
let foreman: Sender;
let crew: Sender;
let yard: Yard;
const ears: HailEar[] = [];

beforeAll(async () => {
  server = await startServer();
  shop = await makeShop(server.database);
  foreman = await senderFor(server, shop.people.foreman);
  crew = await senderFor(server, shop.people.crew);
  yard = await layDown(foreman);
});
afterEach(() => {
  for (const ear of ears.splice(0)) ear.leave();
});
afterAll(() => server.close());

async function earOf(sender: Sender, url = server.url): Promise<HailEar> {
  const ear = await HailEar.open(url, sender.session.accessToken);
  ears.push(ear);
  await ear.hears(0);
  return ear;
}

/** Sends an entry; how far the feed is then. */
async function logged(sender: Sender): Promise<number> {
  const { body } = await sender.sync({ ops: [entryBy(sender, yard)] });
  return Math.max(...body.rows.map((row) => row.seq));
}

async function withinMs(ms: number, hail: Promise<void>): Promise<boolean> {
  const startMs = performance.now();
  await hail;
  return performance.now() - startMs < ms;
}

/** Cuts the connections that carry hails. */
async function cutLine(): Promise<void> {
  const cut = await asOwner(
    server,
    `SELECT pg_terminate_backend(pid) FROM pg_stat_activity
     WHERE datname = current_database() AND query ~ 'LISTEN|pg_notify' AND pid <> pg_backend_pid()`,
  );
  expect(cut).toHaveLength(1);
}

test('who listens is told at once where the feed stands, uncompressed', async () => {
  const seq = await logged(crew);
  const ear = await earOf(foreman);
  await ear.hears(seq);
  expect(ear.text).toBe(`:\n\nevent: changed\ndata: {"seq":${seq}}\n\n`);
});

test("another's sync is heard within two seconds", async () => {
  const ear = await earOf(foreman);
  const seq = await logged(crew);
  expect(await withinMs(HAIL_MAX_MS, ear.hears(seq))).toBe(true);
});

test('a hail goes to the devices on every server of the database', async () => {
  const log = pino({ level: 'silent' });
  const { database, databaseUrl: url, clock } = server;
  const hails = new Hails({ url, database, log });
  const other = await listen(createApp({ database, pictures: server.pictures, hails, now: clock.now, log }), 0, '127.0.0.1');
  const ear = await earOf(foreman, other.url);
  const seq = await logged(crew);
  expect(await withinMs(HAIL_MAX_MS, ear.hears(seq))).toBe(true);
  await hails.close();
  await other.close();
});

test('a change of people is hailed too', async () => {
  const ear = await earOf(crew);
  const before = ear.seqs.at(-1)!;
  await fetch(`${server.url}/api/people/${shop.people.owner.id}`, {
    method: 'PATCH',
    headers: { Authorization: `Bearer ${foreman.session.accessToken}`, 'Content-Type': 'application/json' },
    body: JSON.stringify({ name: 'Isolde Wray' }),
  });
  expect(await withinMs(HAIL_MAX_MS, ear.hears(before + 1))).toBe(true);
});

test('another shop hears nothing', async () => {
  const strangers = await makeShop(server.database, 'Otter Bank Yard');
  const stranger = await senderFor(server, strangers.people.foreman);
  const [ear, own] = [await earOf(stranger), await earOf(foreman)];
  await own.hears(await logged(crew));
  expect(ear.seqs).toHaveLength(1);
});

test('hails come again after the connection that carries them was cut', async () => {
  const ear = await earOf(foreman);
  await cutLine();
  const seq = await logged(crew);
  expect(await withinMs(HAIL_MAX_MS, ear.hears(seq))).toBe(true);
});

test('what was announced elsewhere while the connection was cut is told once it is back', async () => {
  const ear = await earOf(foreman);
  // another server's commit, whose hail nobody here has heard
  const [{ seq }] = (await asOwner(server, 'UPDATE shops SET seq = seq + 1 WHERE shop_id = $1 RETURNING seq::int', [shop.shopId])) as [
    { seq: number },
  ];
  await cutLine();
  expect(await withinMs(HAIL_MAX_MS, ear.hears(seq))).toBe(true);
});

test('two devices that pull at every hail come to rest', async () => {
  const [one, other] = [await earOf(foreman), await earOf(crew)];
  let pulls = 0;
  const pulling: Promise<unknown>[] = [];
  const pullAtHail = (ear: HailEar, sender: Sender) =>
    ear.onHail(() => {
      pulls += 1;
      pulling.push(sender.sync({ held: { ops: 0, photos: 0, oldest: null }, appVersion: '1' }));
    });
  pullAtHail(one, foreman);
  pullAtHail(other, crew);
  server.clock.advance(6 * 60_000);
  const seq = await logged(crew);
  await Promise.all([one.hears(seq), other.hears(seq)]);
  for (let before = -1; before !== pulling.length; ) {
    before = pulling.length;
    await Promise.all(pulling);
    const standing = (await foreman.sync()).body.rows.at(-1)!.seq;
    await Promise.all([one.hears(standing), other.hears(standing)]);
  }
  // each tells once that it was heard again, which the other pulls; that pull tells nothing new
  expect(pulls).toBeGreaterThan(1);
  expect(pulls).toBeLessThan(10);
});

test('a stream ends with its token', async () => {
  const sender = await senderFor(server, shop.people.office);
  server.clock.advance(15 * 60_000 - 100);
  const ear = await earOf(sender);
  await ear.end();
  server.clock.advance(1000);
  await expect(HailEar.open(server.url, sender.session.accessToken)).rejects.toThrow('401');
});

test('a revoked device is not told anything', async () => {
  const sender = await senderFor(server, shop.people.crew);
  const chief = await senderFor(server, shop.people.foreman);
  await fetch(`${server.url}/api/devices/${sender.deviceId}/revoke`, {
    method: 'POST',
    headers: { Authorization: `Bearer ${chief.session.accessToken}` },
  });
  await expect(HailEar.open(server.url, sender.session.accessToken)).rejects.toThrow('403');
});

test('a line of comment keeps a silent stream alive', async () => {
  const http = createServer((_request, response) => void new HailStream(response, 60_000, 20)).listen(0, '127.0.0.1');
  await once(http, 'listening');
  const { port } = http.address() as AddressInfo;
  const ear = await HailEar.open(`http://127.0.0.1:${port}`, 'any');
  ears.push(ear);
  while (ear.text !== ':\n\n:\n\n:\n\n') await new Promise((resolve) => setImmediate(resolve));
  expect(ear.seqs).toEqual([]);
  ear.leave();
  http.closeAllConnections();
  http.close();
});

test('a server that closes ends the streams at once', async () => {
  const closing = await startServer();
  const people = (await makeShop(closing.database)).people;
  const ear = await HailEar.open(closing.url, (await senderFor(closing, people.foreman)).session.accessToken);
  expect(await withinMs(1000, Promise.all([closing.close(), ear.end()]).then(() => {}))).toBe(true);
});
