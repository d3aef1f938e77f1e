import type { Op, Reason } from '#shared/sync/op.ts';
import type { HoldOptions } from './compose-op.ts';
import type { Remembered } from './person-store.ts';
import type { Session } from './session.ts';
import type { SyncResult, SyncState } from './sync-state.ts';
import type { View } from './view.ts';

/** An op that was sent, and what its first answer made of it; `answeredAt` is the server's time. */
export interface SentItem {
  op: Op;
  personId: string;
  outcome: 'kept' | 'loose-end' | 'set-aside';
  reason?: Reason;
  answeredAt: string;
}

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
