import type { UseStore } from 'idb-keyval';

interface Settings {
  indexedDB: IDBFactory;
  name: string;
  stores: string[];
  onBlocked: () => void;
}

// one more for each time that a list of stores has grown
const VERSION = 2;

/**
 * An IndexedDB database of key-value stores. Every transaction is strict: once it is done, it is on the disk.
 * It lets go when a newer version of the app wants the database, and opens again when it is next needed.
 */
export class KeptDatabase {
  private opening: Promise<IDBDatabase> | null = null;
  private readonly settings: Settings;

  constructor(settings: Settings) {
    this.settings = settings;
  }

  /**
   * Runs `work` in one transaction over `stores` and resolves with what it returns once that is durable; rejects, with
   * nothing changed, where it throws. `work` may await requests of the transaction and nothing else.
   */
  async transact<T>(
    stores: string[],
    mode: 'readonly' | 'readwrite',
    work: (transaction: IDBTransaction) => T | PromiseLike<T>,
  ): Promise<T> {
    const transaction = await this.begin(stores, mode);
    const done = ended(transaction);
    try {
      const result = await work(transaction);
      await done;
      return result;
    } catch (error) {
      abort(transaction);
      await done.catch(() => undefined);
      throw error;
    }
  }

  /** One of the stores, for the functions of idb-keyval. */
  store(name: string): UseStore {
    return (mode, callback) =>
      this.transact([name], mode === 'readonly' ? 'readonly' : 'readwrite', (transaction) =>
        callback(transaction.objectStore(name)),
      );
  }

  close(): void {
    void this.opening?.then((database) => database.close());
    this.opening = null;
  }

  // a connection can have been closed by the browser without a word: once, it is opened again
  private async begin(stores: string[], mode: IDBTransactionMode): Promise<IDBTransaction> {
    try {
      return (await this.open()).transaction(stores, mode, { durability: 'strict' });
    } catch (error) {
      if (!(error instanceof DOMException && error.name === 'InvalidStateError')) throw error;
      this.opening = null;
      return (await this.open()).transaction(stores, mode, { durability: 'strict' });
    }
  }

  private open(): Promise<IDBDatabase> {
    this.opening ??= this.connect().catch((error: unknown) => {
      this.opening = null;
      throw error;
    });
    return this.opening;
  }

  private connect(): Promise<IDBDatabase> {
    const { indexedDB, name, stores, onBlocked } = this.settings;
    return new Promise((resolve, reject) => {
      const request = indexedDB.open(name, VERSION);
      request.onupgradeneeded = () => {
        const database = request.result;
        for (const store of stores)
          if (!database.objectStoreNames.contains(store)) database.createObjectStore(store);
      };
      request.onblocked = onBlocked;
      request.onerror = () => reject(request.error!);
      request.onsuccess = () => {
        const database = request.result;
        const forget = () => (this.opening = null);
        database.onclose = forget;
        // an old tab must let go, or the new one waits for ever
        database.onversionchange = () => {
          database.close();
          forget();
        };
        resolve(database);
      };
    });
  }
}

function ended(transaction: IDBTransaction): Promise<void> {
  return new Promise((resolve, reject) => {
    transaction.addEventListener('complete', () => resolve());
    transaction.addEventListener('abort', () =>
      reject(transaction.error ?? new Error('The transaction was given up.')),
    );
  });
}

function abort(transaction: IDBTransaction): void {
  try {
    transaction.abort();
  } catch {
    // it had ended before
  }
}
