import { mkdtemp, readdir, rm, writeFile } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { buffer } from 'node:stream/consumers';
import { afterEach, beforeEach, expect, test } from 'vitest';
import { openPictureFolder } from '#server/photos/folder-store.ts';
import type { PictureStore } from '#server/photos/store.ts';

const PICTURE = { shopId: '0193a000-0000-7000-8000-000000000001', sha256: 'ab'.repeat(32) };

let folder: string;
let store: PictureStore;

beforeEach(async () => {
  folder = await mkdtemp(path.join(os.tmpdir(), 'ribband-folder-'));
  store = await openPictureFolder(folder);
});
afterEach(() => rm(folder, { recursive: true, force: true }));

async function files(): Promise<string[]> {
  const all = await readdir(folder, { recursive: true, withFileTypes: true });
  return all
    .filter((one) => one.isFile())
    .map((one) => path.relative(folder, path.join(one.parentPath, one.name)));
}

test('what was put is there, in its size alone, and can be put anew', async () => {
  await store.put(PICTURE, 'full', Buffer.from('first'));
  await store.put(PICTURE, 'full', Buffer.from('second'));
  expect([await store.has(PICTURE, 'full'), await store.has(PICTURE, 'thumb')]).toEqual([true, false]);
  const stored = await store.read(PICTURE, 'full');
  expect([stored!.bytes, (await buffer(stored!.stream)).toString()]).toEqual([6, 'second']);
  expect(await store.read(PICTURE, 'view')).toBeNull();
  expect(await files()).toEqual([`${PICTURE.shopId}/ab/${PICTURE.sha256}.full`]);
});

test('a picture is removed in all its sizes, and no other is', async () => {
  const other = { ...PICTURE, sha256: 'cd'.repeat(32) };
  for (const size of ['thumb', 'full', 'made-thumb', 'view'] as const)
    await store.put(PICTURE, size, Buffer.from(size));
  await store.put(other, 'full', Buffer.from('other'));
  await store.remove(PICTURE);
  await store.remove({ ...PICTURE, shopId: '0193a000-0000-7000-8000-000000000002' });
  expect(await files()).toEqual([`${PICTURE.shopId}/cd/${other.sha256}.full`]);
});

test('what a server left half written when it was killed is cleared away by the next', async () => {
  await store.put(PICTURE, 'full', Buffer.from('whole'));
  await writeFile(path.join(folder, 'arriving', 'half'), 'hal');
  await openPictureFolder(folder);
  expect(await files()).toEqual([`${PICTURE.shopId}/ab/${PICTURE.sha256}.full`]);
});

test('a picture that cannot be put in its place leaves nothing on the way', async () => {
  await writeFile(path.join(folder, PICTURE.shopId), 'where a folder should be');
  await expect(store.put(PICTURE, 'full', Buffer.from('whole'))).rejects.toThrow();
  expect(await files()).toEqual([PICTURE.shopId]);
});
