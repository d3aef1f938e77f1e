import type { Op, Reason } from '#shared/sync/op.ts';
import type { HoldOptions } from './compose-op.ts';
import type { Remembered } from './person-store.ts';
import type {
  FailedPicture,
  HeldPicture,
  KeptPicture,
  PhotoAbout,
  PickProgress,
  PictureSize,
} from './photos/picture.ts';
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

/** What to hold, and what cannot be told from its data. */
export interface Holding extends HoldOptions {
  kind: string;
  data: object;
}

/** The phone's replica of the record. */
export interface Replica {
  readonly session: Session;
  /** Throws while nobody is signed in. */
  view(): View;
  subscribe(listener: () => void): () => void;
  /** Resolves once the op is durable. Throws a HoldError, with words, where it cannot be held. */
  hold(kind: string, data: object, options?: HoldOptions): Promise<Op>;
  /**
   * As `hold`, all in one write: after a kill either all of them are there or none is. A later one may change what an
   * earlier one makes.
   */
  holdAll(holdings: Holding[]): Promise<Op[]>;
  /** A UUIDv7. */
  newId(): string;
  /** Sends what is held and hears what is new. Pictures go behind that; it does not wait for them. */
  syncNow(): Promise<SyncResult>;
  /** As `syncNow`, then waits for the pictures; those that the server refused are tried again. */
  sendNow(): Promise<SyncResult>;
  syncState(): SyncState;
  /** What this device has sent and still keeps, the newest answer first. */
  sent(): SentItem[];
  /**
   * Prepares pictures and attaches each as soon as its bytes are durable. None of them holds up the others. Takes
   * nothing where they do not fit on this device.
   */
  attachPhotos(
    files: readonly File[],
    about: PhotoAbout,
    onProgress?: (progress: PickProgress) => void,
  ): Promise<Attached>;
  /** Prepares and keeps pictures for a form that is not logged yet; what it answers goes into the form's draft. */
  keepPictures(files: readonly File[], onProgress?: (progress: PickProgress) => void): Promise<Kept>;
  /**
   * Makes kept pictures photos of the record, in one write with what is held `along` with them (and before them).
   * Asked again with the same pictures, it attaches none twice. Throws a HoldError where their bytes are gone.
   */
  attachKept(
    kept: KeptPicture[],
    about: PhotoAbout | ((picture: KeptPicture) => PhotoAbout),
    along?: Holding[],
  ): Promise<Op[]>;
  /** Lets go of kept pictures that will not be attached. */
  dropKept(kept: KeptPicture[]): Promise<void>;
  /** A picture from this device, or else from the server; null where it cannot be had now. */
  picture(sha256: string, size: PictureSize): Promise<Blob | null>;
  /** The record's pictures that this device has not brought to the server yet, oldest first; the same list while nothing changes. */
  heldPictures(): HeldPicture[];
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

export interface Attached {
  attached: string[];
  failed: FailedPicture[];
}

export interface Kept {
  kept: KeptPicture[];
  failed: FailedPicture[];
}
