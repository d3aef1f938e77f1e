import { mkdtemp, readdir, readFile, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { buildSite } from '#tests/e2e/build-site.ts';

// Goal: a phone with a poor signal has Alongside before the signal is gone.
// Method: the product's own build; what index.html and Alongside's own file name, and what those name in turn, each gzipped.

const ALONGSIDE_BYTES_MAX = 170 * 1024;

let outDir: string;
let names: string[];

beforeAll(async () => {
  outDir = await mkdtemp(join(tmpdir(), 'weight-'));
  await buildSite(outDir);
  names = await readdir(join(outDir, 'assets'));
});
afterAll(() => rm(outDir, { recursive: true }));

const sourceOf = (name: string) => readFile(join(outDir, 'assets', name), 'utf8');
const fileOf = (screen: string) =>
  names.find((name) => name.startsWith(`${screen}-`) && name.endsWith('.js'))!;

/** The files that must be there before a screen runs. */
async function filesFor(screen: string): Promise<string[]> {
  const html = await readFile(join(outDir, 'index.html'), 'utf8');
  const wanted = [...[...html.matchAll(/assets\/([\w.-]+\.js)/g)].map(([, name]) => name!), fileOf(screen)];
  const files = new Set<string>();
  for (let name = wanted.pop(); name !== undefined; name = wanted.pop()) {
    if (files.has(name)) continue;
    files.add(name);
    const named = (await sourceOf(name)).matchAll(/(?:from|import)\s*"\.\/([\w.-]+\.js)"/g);
    wanted.push(...[...named].map(([, file]) => file!));
  }
  return [...files];
}

it('the first usable Alongside takes no more than 170 KiB of gzipped JavaScript', async () => {
  const files = await filesFor('alongside-page');
  const sizes = await Promise.all(files.map(async (name) => gzipSync(await sourceOf(name)).length));
  const total = sizes.reduce((sum, size) => sum + size, 0);
  expect(files.length).toBeGreaterThan(5);
  expect(total).toBeGreaterThan(100 * 1024);
  expect(total).toBeLessThanOrEqual(ALONGSIDE_BYTES_MAX);
});

it('the forms, the sheets, the viewer and the search come when they are opened', async () => {
  const files = await filesFor('alongside-page');
  for (const screen of [
    'log-page',
    'found-page',
    'photos-page',
    'search-page',
    'boat-sheet',
    'photo-sheet',
  ]) {
    expect(names).toContain(fileOf(screen));
    expect(files).not.toContain(fileOf(screen));
  }
});
