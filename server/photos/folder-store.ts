import { randomUUID } from 'node:crypto';
import { mkdir, open, rename, rm, stat } from 'node:fs/promises';
import path from 'node:path';
import type { Picture, PictureStore, StoredBytes, StoredSize } from './store.ts';

const SIZES: StoredSize[] = ['thumb', 'full', 'made-thumb', 'view'];
const ARRIVING = 'arriving';

/**
 * Pictures as files of a folder, `<shop>/<first two of the hash>/<hash>.<size>`. What a server that was ended left half
 * written is cleared away, so that the folder must be in use by nobody else.
 */
export async function openPictureFolder(folder: string): Promise<PictureStore> {
  const arriving = path.join(folder, ARRIVING);
  await rm(arriving, { recursive: true, force: true });
  await mkdir(arriving, { recursive: true, mode: 0o700 });
  return new FolderStore(folder, arriving);
}

class FolderStore implements PictureStore {
  private readonly folder: string;
  private readonly arriving: string;

  constructor(folder: string, arriving: string) {
    this.folder = folder;
    this.arriving = arriving;
  }

  async has(picture: Picture, size: StoredSize): Promise<boolean> {
    return (await unlessMissing(stat(this.fileOf(picture, size)))) !== null;
  }

  async put(picture: Picture, size: StoredSize, bytes: Uint8Array): Promise<void> {
    const half = path.join(this.arriving, randomUUID());
    try {
      await writeDurably(half, bytes);
      const file = this.fileOf(picture, size);
      // nearly always its folder is there
      if ((await unlessMissing(rename(half, file).then(() => file))) === null) {
        await makeFolder(path.dirname(file));
        await rename(half, file);
      }
      await syncFolder(path.dirname(file));
    } catch (error) {
      await rm(half, { force: true });
      throw error;
    }
  }

  async read(picture: Picture, size: StoredSize): Promise<StoredBytes | null> {
    const file = await unlessMissing(open(this.fileOf(picture, size)));
    if (!file) return null;
    const { size: bytes } = await file.stat();
    return { bytes, stream: file.createReadStream() };
  }

  async remove(picture: Picture): Promise<void> {
    for (const size of SIZES) await rm(this.fileOf(picture, size), { force: true });
    await unlessMissing(syncFolder(path.dirname(this.fileOf(picture, 'full'))));
  }

  private fileOf({ shopId, sha256 }: Picture, size: StoredSize): string {
    return path.join(this.folder, shopId, sha256.slice(0, 2), `${sha256}.${size}`);
  }
}

async function writeDurably(file: string, bytes: Uint8Array): Promise<void> {
  const handle = await open(file, 'wx', 0o600);
  try {
    await handle.writeFile(bytes);
    await handle.datasync();
  } finally {
    await handle.close();
  }
}

/** A folder's new name is lost with the power until the folder that holds it is synced. */
async function makeFolder(folder: string): Promise<void> {
  const first = await mkdir(folder, { recursive: true, mode: 0o700 });
  if (first === undefined) return;
  for (let made = folder; made.length >= first.length; made = path.dirname(made))
    await syncFolder(path.dirname(made));
}

async function syncFolder(folder: string): Promise<void> {
  const handle = await open(folder);
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

async function unlessMissing<T>(work: Promise<T>): Promise<T | null> {
  try {
    return await work;
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code === 'ENOENT') return null;
    throw error;
  }
}
