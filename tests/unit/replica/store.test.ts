import { IDBFactory } from 'fake-indexeddb';
import { get, set } from 'idb-keyval';
import { expect, test, vi } from 'vitest';
import { KeptDatabase } from '#src/replica/store.ts';

function openKept(indexedDB: IDBFactory, onBlocked = () => {}) {
  return new KeptDatabase({ indexedDB, name: 'kept', stores: ['a', 'b'], onBlocked });
}

function openRaw(indexedDB: IDBFactory, version?: number): Promise<IDBDatabase> {
  return new Promise((resolve) => {
    const request = indexedDB.open('kept', version);
    request.onsuccess = () => resolve(request.result);
  });
}

test('idb-keyval reads and writes through it', async () => {
  const kept = openKept(new IDBFactory());
  await set('key', { value: 1 }, kept.store('a'));
  expect(await get('key', kept.store('a'))).toEqual({ value: 1 });
  expect(await get('key', kept.store('b'))).toBeUndefined();
});

test('every transaction is strict', async () => {
  const indexedDB = new IDBFactory();
  const kept = openKept(indexedDB);
  await set('key', 1, kept.store('a'));
  const prototype = Object.getPrototypeOf(await openRaw(indexedDB)) as IDBDatabase;
  const begin = vi.spyOn(prototype, 'transaction');
  await set('key', 2, kept.store('a'));
  await kept.transact(['a', 'b'], 'readwrite', () => {});
  expect(begin.mock.calls.map(([, , options]) => options?.durability)).toEqual(['strict', 'strict']);
  begin.mockRestore();
});

test('what throws within a transaction undoes the whole of it', async () => {
  const kept = openKept(new IDBFactory());
  const work = kept.transact(['a', 'b'], 'readwrite', (transaction) => {
    transaction.objectStore('a').put(1, 'key');
    throw new Error('no');
  });
  await expect(work).rejects.toThrow('no');
  expect(await get('key', kept.store('a'))).toBeUndefined();
});

test('it lets go when a newer version of the app wants the database', async () => {
  const indexedDB = new IDBFactory();
  const kept = openKept(indexedDB);
  await set('key', 1, kept.store('a'));
  const newer = await openRaw(indexedDB, 2);
  expect(newer.version).toBe(2);
});

test('it opens again after the browser has closed it without a word', async () => {
  const indexedDB = new IDBFactory();
  const connections: IDBDatabase[] = [];
  const open = (...args: Parameters<IDBFactory['open']>) => {
    const request = indexedDB.open(...args);
    request.addEventListener('success', () => connections.push(request.result));
    return request;
  };
  const kept = openKept({ open } as IDBFactory);
  await set('key', 1, kept.store('a'));
  connections[0]!.close();
  expect(await get('key', kept.store('a'))).toBe(1);
  expect(connections).toHaveLength(2);
});
