import { promisifyRequest } from 'idb-keyval';
import type { z } from 'zod';
import type { KeptDatabase } from './store.ts';

/** Where records that cannot be read are put, under `<store>/<key>`. */
export const BROKEN_STORE = 'broken';

/** The readable records of a store in the order of their keys. The others are put aside, so that they are neither lost nor met again. */
export async function readRecords<T>(
  database: KeptDatabase,
  store: string,
  schema: z.ZodType<T>,
): Promise<{ records: [string, T][] }> {
  const stored = await readEntries(database, store);
  const records: [string, T][] = [];
  const broken: [string, unknown][] = [];
  for (const [key, value] of stored) {
    const read = schema.safeParse(value);
    if (read.success) records.push([key, read.data]);
    else broken.push([key, value]);
  }
  if (broken.length > 0) await putAside(database, store, broken);
  return { records };
}

export async function readEntries(database: KeptDatabase, store: string): Promise<[string, unknown][]> {
  return database.transact([store], 'readonly', async (transaction) => {
    const from = transaction.objectStore(store);
    const [keys, values] = await Promise.all([
      promisifyRequest(from.getAllKeys()),
      promisifyRequest<unknown[]>(from.getAll()),
    ]);
    return keys.map((key, index) => [String(key), values[index]]);
  });
}

export async function putAside(
  database: KeptDatabase,
  store: string,
  broken: [string, unknown][],
): Promise<void> {
  await database.transact([store, BROKEN_STORE], 'readwrite', (transaction) => {
    for (const [key, value] of broken) {
      transaction.objectStore(BROKEN_STORE).put(value, `${store}/${key}`);
      transaction.objectStore(store).delete(key);
    }
  });
}
