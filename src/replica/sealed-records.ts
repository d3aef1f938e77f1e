import { get } from 'idb-keyval';
import type { z } from 'zod';
import type { Seal } from './seal.ts';
import type { KeptDatabase } from './store.ts';
import { putAside, readEntries } from './stored-records.ts';

/** A database whose records are sealed. */
export interface SealedDatabase {
  database: KeptDatabase;
  seal: Seal;
}

/** What a sealed record holds, or null where it is not there or cannot be read. */
export async function openRecord<T>(
  { database, seal }: SealedDatabase,
  store: string,
  key: string,
  schema: z.ZodType<T>,
): Promise<T | null> {
  const stored: unknown = await get(key, database.store(store));
  return stored === undefined ? null : openStored(seal, stored, schema);
}

/** All readable records of a store in the order of their keys; the others are put aside. */
export async function openRecords<T>(
  { database, seal }: SealedDatabase,
  store: string,
  schema: z.ZodType<T>,
): Promise<{ opened: [string, T][]; areSomeBroken: boolean }> {
  const stored = await readEntries(database, store);
  const values = await Promise.all(
    stored.map(async ([key, value]) => [key, value, await openStored(seal, value, schema)] as const),
  );
  const broken = values
    .filter(([, , read]) => read === null)
    .map(([key, value]): [string, unknown] => [key, value]);
  if (broken.length > 0) await putAside(database, store, broken);
  const opened = values.flatMap(([key, , read]): [string, T][] => (read === null ? [] : [[key, read]]));
  return { opened, areSomeBroken: broken.length > 0 };
}

async function openStored<T>(seal: Seal, stored: unknown, schema: z.ZodType<T>): Promise<T | null> {
  try {
    const read = schema.safeParse(await seal.open(stored));
    return read.success ? read.data : null;
  } catch {
    return null;
  }
}
