/** What a store of a phone's database holds, as a fault on the disk or another version of the app would find it. */
export function readStore(
  indexedDB: IDBFactory,
  name: string,
  store: string,
): Promise<[IDBValidKey, unknown][]> {
  return within(indexedDB, name, store, async (from) => {
    const [keys, values] = await Promise.all([done(from.getAllKeys()), done<unknown[]>(from.getAll())]);
    return keys.map((key, index) => [key, values[index]]);
  });
}

export function writeStore(
  indexedDB: IDBFactory,
  name: string,
  store: string,
  key: string,
  value: unknown,
): Promise<void> {
  return within(indexedDB, name, store, async (into) => void (await done(into.put(value, key))));
}

async function within<T>(
  indexedDB: IDBFactory,
  name: string,
  store: string,
  work: (store: IDBObjectStore) => Promise<T>,
): Promise<T> {
  const database = await done(indexedDB.open(name));
  try {
    return await work(database.transaction([store], 'readwrite').objectStore(store));
  } finally {
    database.close();
  }
}

function done<T>(request: IDBRequest<T>): Promise<T> {
  return new Promise((resolve, reject) => {
    request.onsuccess = () => resolve(request.result);
    request.onerror = () => reject(request.error!);
  });
}
