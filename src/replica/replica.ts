import type { Op, Reason } from '#shared/sync/op.ts';
import type { HoldOptions } from './compose-op.ts';
import type { Remembered } from './person-store.ts';
import type { Session } from './session.ts';
import type { SyncResult, SyncState } from './sync-state.ts';
import type { View } from './view.ts';

/** The phone's replica of the record. */
export interface Replica {
  readonly session: Session;
  /** Throws while nobody is signed in. */
  view(): View;
  subscribe(listener: () => void): () => void;
  /** Resolves once the op is durable. Throws a HoldError, with words, where it cannot be held. */
  hold(kind: string, data: object, options?: HoldOptions): Promise<Op>;
  /** A UUIDv7. */
  newId(): string;
  syncNow(): Promise<SyncResult>;
  syncState(): SyncState;
  /** What this device has sent and still keeps, the newest answer first. */
  sent(): SentItem[];
  readonly draft: {
    read<T>(key: string): T | undefined;
    write(key: string, value: unknown): Promise<void>;
    clear(key: string): Promise<void>;
  };
  readonly remember: {
    read(): Remembered;
    write(remembered: Partial<Remembered>): Promise<void>;
  };
}
