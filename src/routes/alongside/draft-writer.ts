/** Where drafts are kept: the replica's. */
interface DraftStore {
  write(key: string, value: unknown): Promise<void>;
  clear(key: string): Promise<void>;
}

type Kept = { value: unknown } | 'nothing';

/**
 * Keeps the newest state of a draft, one write at a time: what is typed while a write runs goes with the next,
 * so that the store is never more than one write behind the thumb, and a late write never brings back what was cleared.
 */
export class DraftWriter {
  private next: Kept | null = null;
  private running: Promise<void> | null = null;
  private readonly store: DraftStore;
  private readonly key: string;
  private readonly onFailure: (error: unknown) => void;

  constructor(store: DraftStore, key: string, onFailure: (error: unknown) => void) {
    this.store = store;
    this.key = key;
    this.onFailure = onFailure;
  }

  /** Resolves once this state, or a newer one, is kept, or could not be. */
  keep(value: unknown): Promise<void> {
    return this.take({ value });
  }

  clear(): Promise<void> {
    return this.take('nothing');
  }

  private take(next: Kept): Promise<void> {
    this.next = next;
    this.running ??= this.run().finally(() => {
      this.running = null;
    });
    return this.running;
  }

  private async run(): Promise<void> {
    while (this.next !== null) {
      const next = this.next;
      this.next = null;
      try {
        if (next === 'nothing') await this.store.clear(this.key);
        else await this.store.write(this.key, next.value);
      } catch (error) {
        this.onFailure(error);
      }
    }
  }
}
