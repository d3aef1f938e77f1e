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
  return stored === undefined ? null : openStored(seal, stored, by(schema));
}

/** What a value is as a schema reads it; null where it is not. */
export function by<T>(schema: z.ZodType<T>): (value: unknown) => T | null {
  return (value) => schema.safeParse(value).data ?? null;
}

/** All records of a store that `read` does not answer with null, in the order of their keys; the others are put aside. */
export async function openRecords<T>(
  { database, seal }: SealedDatabase,
  store: string,
  read: (value: unknown) => T | null,
): Promise<{ opened: [string, T][]; areSomeBroken: boolean }> {
  const stored = await readEntries(database, store);
  const values = await Promise.all(stored.map(([, value]) => openStored(seal, value, read)));
  const opened: [string, T][] = [];
  const broken: [string, unknown][] = [];
  stored.forEach(([key, value], index) => {
    const made = values[index]!;
    if (made === null) broken.push([key, value]);
    else opened.push([key, made]);
  });
  if (broken.length > 0) await putAside(database, store, broken);
  return { opened, areSomeBroken: broken.length > 0 };
}

async function openStored<T>(
  seal: Seal,
  stored: unknown,
  read: (value: unknown) => T | null,
): Promise<T | null> {
  try {
    return read(await seal.open(stored));
  } catch {
    return null;
  }
}
