import { promisifyRequest } from 'idb-keyval';

/** The stores of pictures within one transaction. */
export interface PictureStores {
  queue: IDBObjectStore;
  bytes: IDBObjectStore;
  sizes: IDBObjectStore;
}

interface Large {
  key: string;
  bytes: number;
  since: string;
  /** what the file was called, where it was taken in here */
  name?: string;
}

/** Lets go of large pictures that are in no queue, the oldest first, until they take no more than `bytesMax`; answers the bytes freed. */
export async function evict(stores: PictureStores, bytesMax: number): Promise<number> {
  const large = await evictable(stores);
  let taken = large.reduce((sum, { bytes }) => sum + bytes, 0);
  let freed = 0;
  for (const { key, bytes } of large) {
    if (taken <= bytesMax) break;
    stores.bytes.delete(key);
    stores.sizes.delete(key);
    taken -= bytes;
    freed += bytes;
  }
  return freed;
}

/** Lets go of all pictures that are in no queue. */
export async function evictAll(stores: PictureStores): Promise<void> {
  const [queued, keys] = await Promise.all([keysOf(stores.queue), keysOf(stores.bytes)]);
  const kept = new Set(queued);
  for (const key of keys) {
    if (kept.has(sha256Of(key))) continue;
    stores.bytes.delete(key);
    stores.sizes.delete(key);
  }
}

/** Lets go of one picture in every size. */
export function dropBytes({ bytes, sizes }: PictureStores, sha256: string): void {
  for (const size of ['thumb', 'view', 'full']) {
    bytes.delete(`${sha256}/${size}`);
    sizes.delete(`${sha256}/${size}`);
  }
}

/** The pictures that went to the server from here and are still here. */
export async function sentWhole(
  queue: IDBObjectStore,
  sizes: IDBObjectStore,
): Promise<{ sha256: string; name: string; since: string }[]> {
  return (await evictable({ queue, sizes }))
    .filter(({ key }) => key.endsWith('/full'))
    .map(({ key, name = 'photo', since }) => ({ sha256: sha256Of(key), name, since }));
}

async function evictable({ queue, sizes }: Pick<PictureStores, 'queue' | 'sizes'>): Promise<Large[]> {
  const [queued, keys, values] = await Promise.all([
    keysOf(queue),
    keysOf(sizes),
    promisifyRequest<Omit<Large, 'key'>[]>(sizes.getAll()),
  ]);
  const kept = new Set(queued);
  return keys
    .map((key, index) => ({ key, ...values[index]! }))
    .filter(({ key }) => !kept.has(sha256Of(key)))
    .sort((a, b) => (a.since < b.since ? -1 : 1));
}

async function keysOf(store: IDBObjectStore): Promise<string[]> {
  return (await promisifyRequest(store.getAllKeys())).map(String);
}

function sha256Of(key: string): string {
  return key.split('/')[0]!;
}
