import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { buildSite } from '#tests/e2e/build-site.ts';
import { BuiltScripts } from '#tests/e2e/screen-files.ts';

// Goal: a phone with a poor signal has Alongside before the signal is gone.
// Method: the product's own build; what index.html and Alongside's own file name, and what those name in turn, each gzipped.

const ALONGSIDE_BYTES_MAX = 170 * 1024;

let outDir: string;
let scripts: BuiltScripts;

beforeAll(async () => {
  outDir = await mkdtemp(join(tmpdir(), 'weight-'));
  await buildSite(outDir);
  scripts = await BuiltScripts.read(outDir);
});
afterAll(() => rm(outDir, { recursive: true }));

it('the first usable Alongside takes no more than 170 KiB of gzipped JavaScript', async () => {
  const files = await scripts.filesFor('alongside-page');
  const total = await scripts.gzippedBytes(files);
  expect(files.length).toBeGreaterThan(5);
  expect(total).toBeGreaterThan(100 * 1024);
  expect(total).toBeLessThanOrEqual(ALONGSIDE_BYTES_MAX);
});

it('the forms, the sheets, the viewer and the search come when they are opened', async () => {
  const files = await scripts.filesFor('alongside-page');
  for (const screen of [
    'log-page',
    'found-page',
    'photos-page',
    'search-page',
    'boat-sheet',
    'photo-sheet',
  ]) {
    const file = scripts.fileOf(screen);
    expect(scripts.names).toContain(file);
    expect(files).not.toContain(file);
  }
});
