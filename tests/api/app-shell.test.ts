import { mkdir, mkdtemp, rm, writeFile } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, expect, test } from 'vitest';
import { startServer } from '#tests/worlds/server.ts';
import type { TestServer } from '#tests/worlds/server.ts';

let server: TestServer;
let distDir: string;
beforeAll(async () => {
  distDir = await mkdtemp(path.join(os.tmpdir(), 'ribband-dist-'));
  await mkdir(path.join(distDir, 'assets'));
  await writeFile(path.join(distDir, 'index.html'), '<title>the app</title>');
  await writeFile(path.join(distDir, 'sw.js'), '// worker');
  await writeFile(path.join(distDir, 'assets/main-1a2b3c.js'), '// script '.repeat(500));
  server = await startServer({ distDir });
});
afterAll(async () => {
  await server.close();
  await rm(distDir, { recursive: true });
});

const navigate = (to: string) =>
  fetch(server.url + to, { headers: { Accept: 'text/html,application/xhtml+xml,*/*;q=0.8' } });

test.each(['/', '/day-sheet/2026-06-01', '/entries/0190c5a0'])(
  'a person who opens %s gets the app, asked for anew each time',
  async (to) => {
    const response = await navigate(to);
    expect(await response.text()).toContain('the app');
    expect([response.status, response.headers.get('Cache-Control')]).toEqual([200, 'no-cache']);
  },
);

test.each(['/assets/gone-9f9f.js', '/robots.txt', '/icons/none.png'])(
  '%s is missing and says so',
  async (to) => {
    expect((await navigate(to)).status).toBe(404);
  },
);

test('a program that asks for no page gets none', async () => {
  expect((await fetch(`${server.url}/day-sheet`, { headers: { Accept: 'application/json' } })).status).toBe(
    404,
  );
});

test('hashed files are kept for ever and travel compressed, the worker is asked for anew', async () => {
  const script = await fetch(`${server.url}/assets/main-1a2b3c.js`);
  expect(script.headers.get('Cache-Control')).toBe('public, max-age=31536000, immutable');
  expect(script.headers.get('Content-Encoding')).toMatch(/^(gzip|br)$/);
  const worker = await fetch(`${server.url}/sw.js`);
  expect(worker.headers.get('Cache-Control')).toBe('no-cache');
});

test('scripts come from here alone, and nothing frames the app', async () => {
  const policy = (await navigate('/')).headers.get('Content-Security-Policy')!.split(';');
  expect(policy).toContain("script-src 'self' 'wasm-unsafe-eval'");
  expect(policy).toContain("worker-src 'self' blob:");
  expect(policy).toContain("frame-ancestors 'none'");
  expect(policy.join()).not.toMatch(/unsafe-inline|'unsafe-eval'|https?:|upgrade-insecure-requests/);
});
