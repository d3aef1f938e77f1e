import { mkdir, readFile, rm } from 'node:fs/promises';
import path from 'node:path';
import { afterEach, expect, test, vi } from 'vitest';
import { isRunning, launch, makeDataFolder } from '#tests/worlds/launched.ts';
import type { Launched } from '#tests/worlds/launched.ts';

// The real `npm start`, with a PostgreSQL of its own, stopped and killed as a shop's machine would.
vi.setConfig({ testTimeout: 90_000 }); // a busy machine makes several starts in one test slow
const EMPTY = { RIBBAND_DEMO: '0' };
const cleanUps: (() => Promise<unknown>)[] = [];
afterEach(async () => {
  while (cleanUps.length > 0) await cleanUps.pop()!();
});

async function dataFolder(): Promise<string> {
  const folder = await makeDataFolder();
  cleanUps.push(folder.remove);
  return folder.path;
}

async function started(dataDir: string, variables: Record<string, string> = EMPTY): Promise<Launched> {
  const launched = await launch(dataDir, variables);
  cleanUps.push(() => stopped(launched));
  return launched;
}

async function stopped(launched: Launched): Promise<void> {
  launched.kill('SIGTERM');
  await launched.exited;
}

async function isHealthy(launched: Launched): Promise<boolean> {
  const response = await fetch(`${launched.url}/api/health`);
  return response.status === 200;
}

test('SIGTERM to npm stops the server and its PostgreSQL', async () => {
  const launched = await started(await dataFolder());
  expect(await isHealthy(launched)).toBe(true);
  const [serverPid, postgresPid] = [await launched.serverPid(), await launched.postgresPid()];
  expect([await isRunning(serverPid), await isRunning(postgresPid)]).toEqual([true, true]);

  await stopped(launched);
  expect([await isRunning(serverPid), await isRunning(postgresPid)]).toEqual([false, false]);
  await expect(fetch(launched.url)).rejects.toThrow();
});

test('a server killed hard leaves its PostgreSQL, and the next start takes it over and later stops it', async () => {
  const dataDir = await dataFolder();
  const first = await started(dataDir);
  const postgresPid = await first.postgresPid();
  process.kill(await first.serverPid(), 'SIGKILL');
  await first.exited;
  expect(await isRunning(postgresPid)).toBe(true);

  const second = await started(dataDir);
  expect(await isHealthy(second)).toBe(true);
  expect(await second.postgresPid()).toBe(postgresPid);
  await stopped(second);
  expect(await isRunning(postgresPid)).toBe(false);
});

test('after server and PostgreSQL were both killed hard the next start needs no help', async () => {
  const dataDir = await dataFolder();
  const first = await started(dataDir);
  process.kill(await first.postgresPid(), 'SIGKILL');
  process.kill(await first.serverPid(), 'SIGKILL');
  await first.exited;

  expect(await isHealthy(await started(dataDir))).toBe(true);
});

test('npm killed hard takes the server along, and the next start needs no help', async () => {
  const dataDir = await dataFolder();
  const first = await started(dataDir);
  first.kill('SIGKILL');
  await first.exited;

  const second = await started(dataDir);
  expect(await isHealthy(second)).toBe(true);
});

test('a data folder that the postgres user cannot enter still works, and it says where the database is', async () => {
  const dataDir = await dataFolder();
  await mkdir(dataDir, { mode: 0o700 });
  const launched = await started(dataDir);
  const { directory } = JSON.parse(await readFile(path.join(dataDir, 'postgres.json'), 'utf8')) as {
    directory: string;
  };
  const isElsewhere = path.dirname(directory) === '/var/lib/ribband';
  if (isElsewhere) cleanUps.unshift(() => rm(directory, { recursive: true }));
  expect(await isHealthy(launched)).toBe(true);
  // only root runs PostgreSQL as another user
  expect(isElsewhere).toBe(process.getuid?.() === 0);
  expect(launched.lines.some((line) => line.includes(directory))).toBe(isElsewhere);
});

test('two data folders run side by side', async () => {
  const both = await Promise.all([started(await dataFolder()), started(await dataFolder())]);
  expect(await Promise.all(both.map(isHealthy))).toEqual([true, true]);
  const [one, other] = await Promise.all(both.map((launched) => launched.postgresPid()));
  expect(one).not.toBe(other);
});

test('a second start on the same folder is refused and leaves the first alone', async () => {
  const dataDir = await dataFolder();
  const first = await started(dataDir);
  await expect(launch(dataDir, EMPTY)).rejects.toThrow('already runs');
  expect(await isHealthy(first)).toBe(true);
});

test('an environment that cannot be read is named, not traced', async () => {
  const attempt = launch(await dataFolder(), { PORT: 'abc', RIBBAND_DEMO: 'maybe' });
  await expect(attempt).rejects.toThrow(/PORT: must be a number\n {2}RIBBAND_DEMO: must be 0 or 1/);
});

test('an empty start prints a code that makes the first shop, once; later starts print none', async () => {
  const dataDir = await dataFolder();
  const first = await started(dataDir);
  const code = (await first.says(/enter the code/)).split(' ').at(-1);
  const body = JSON.stringify({
    code,
    shop: { name: 'Slip Nine', timeZone: 'Europe/Oslo', currency: 'NOK', units: 'metric' },
    person: { name: 'Ada Holm', email: 'ada@slipnine.test', password: 'larch on oak frames' },
  });
  const ask = () =>
    fetch(`${first.url}/api/first-run`, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json' },
      body,
    });
  expect((await ask()).status).toBe(201);
  expect((await ask()).status).toBe(409);
  await stopped(first);

  const second = await started(dataDir);
  await stopped(second);
  expect(second.lines.filter((line) => line.includes('code'))).toEqual([]);
});

test('a first start makes the demo shop, prints its accounts, and the foreman can sign in; a second start prints the same', async () => {
  const dataDir = await dataFolder();
  const first = await started(dataDir, {});
  await first.says(/^demo owner /);
  await stopped(first);
  const second = await started(dataDir, {});
  await second.says(/^demo owner /);

  const [, , email, password] = (await second.says(/^demo foreman /)).split(' ');
  const device = { id: '0197a3c0-0000-7000-8000-000000000001', label: 'Laptop' };
  const response = await fetch(`${second.url}/api/session`, {
    method: 'POST',
    headers: { 'Content-Type': 'application/json' },
    body: JSON.stringify({ email, password, device }),
  });
  expect(response.status).toBe(200);
  await stopped(second);
  const accounts = ({ lines }: Launched) => lines.filter((line) => /^demo \w+ \S+@\S+ \S+$/.test(line));
  expect(new Set(accounts(second).map((line) => line.split(' ')[1]))).toEqual(
    new Set(['crew', 'foreman', 'office', 'owner']),
  );
  expect(accounts(second)).toEqual(accounts(first));
});
