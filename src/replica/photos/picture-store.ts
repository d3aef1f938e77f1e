import { z } from 'zod';
import { by, openRecord, openRecords, type SealedDatabase } from '../sealed-records.ts';
import { Turns } from '../turns.ts';
import { dropBytes, evict, evictAll, sentWhole, type PictureStores } from './evict.ts';
import type { HeldPicture, PictureSize, PreparedPicture } from './picture.ts';

/** Pictures made here that the server does not have whole, by the SHA-256; sealed. */
export const QUEUE_STORE = 'pictureQueue';
/** Bytes, by `<sha256>/<size>`; sealed. */
export const BYTES_STORE = 'pictures';
/** How many bytes the large ones take and when they came here, under the same keys, for whoever must make room. */
export const SIZES_STORE = 'pictureSizes';
export const PICTURE_STORES = [QUEUE_STORE, BYTES_STORE, SIZES_STORE];

/** What is kept of pictures that the server has whole, thumbnails aside, in bytes; the oldest go first. */
export const SHOWN_BYTES_MAX = 200 * 1024 * 1024;

const queuedSchema = z.object({
  name: z.string(),
  since: z.iso.datetime(),
  /** photos of forms that are not logged yet */
  keptFor: z.array(z.string()),
  /** photos of the record: the picture goes to the server for them */
  attachedFor: z.array(z.string()),
  arrived: z.enum(['thumb', 'full']).nullable(),
  /** the whole picture was sent, and what came of it was not heard */
  isInDoubt: z.boolean(),
  /** why the server wants none of it */
  refused: z.string().nullable(),
});
export type Queued = z.infer<typeof queuedSchema>;
export type Queue = ReadonlyMap<string, Queued>;

const bytesSchema = z.object({
  type: z.string(),
  bytes: z.custom<Uint8Array<ArrayBuffer>>((value) => value instanceof Uint8Array),
});

interface Keeping {
  photoId: string;
  isAttached: boolean;
  name: string;
  /** ISO 8601 */
  since: string;
}

/** Which photo a picture is for. */
export interface PictureUse {
  sha256: string;
  photoId: string;
}

/** The pictures that the device keeps for a person: those still to be sent, and what was shown of the others. */
export class PictureStore {
  /** oldest first; replaced as a whole when something changes */
  queue: Queue = new Map();
  private readonly sealed: SealedDatabase;
  private readonly turns = new Turns();

  constructor(sealed: SealedDatabase) {
    this.sealed = sealed;
  }

  /** Reads the queue as it is kept; another tab may have changed it. */
  read(): Promise<void> {
    return this.turns.take(async () => {
      const { opened } = await openRecords(this.sealed, QUEUE_STORE, by(queuedSchema));
      this.queue = oldestFirst(opened);
    });
  }

  /** Keeps a picture's bytes and what it is for, as one. Resolves once durable; rejects with nothing of it kept. */
  keep(picture: PreparedPicture, { photoId, isAttached, name, since }: Keeping): Promise<void> {
    return this.turns.take(async () => {
      const { sha256 } = picture;
      const before = this.queue.get(sha256) ?? { name, since, ...NEW };
      const use = isAttached ? 'attachedFor' : 'keptFor';
      const queued = { ...before, [use]: [...before[use], photoId] };
      const record = await this.sealed.seal.seal(queued);
      const [full, thumb] = await Promise.all([this.sealBlob(picture.full), this.sealBlob(picture.thumb)]);
      await this.write(({ queue, bytes, sizes }) => {
        queue.put(record, sha256);
        bytes.put(thumb, `${sha256}/thumb`);
        bytes.put(full, `${sha256}/full`);
        sizes.put({ bytes: picture.full.size, since, name }, `${sha256}/full`);
      });
      this.queue = oldestFirst([...this.queue, [sha256, queued]]);
    });
  }

  /** Turns pictures over to the record, or from it back to a form; `nothing` lets go of those that are for nothing else. */
  assign(uses: PictureUse[], to: 'record' | 'form' | 'nothing'): Promise<void> {
    return this.turns.take(async () => {
      const next = new Map(this.queue);
      for (const use of uses) {
        const queued = next.get(use.sha256);
        if (queued) next.set(use.sha256, assigned(queued, use.photoId, to));
      }
      await this.save([...new Set(uses.map(({ sha256 }) => sha256))], next);
    });
  }

  /** Notes what came of sending a picture. One that has arrived whole, and is for no form, leaves the queue. */
  note(sha256: string, change: Partial<Pick<Queued, 'arrived' | 'isInDoubt' | 'refused'>>): Promise<void> {
    return this.turns.take(async () => {
      const queued = this.queue.get(sha256);
      if (queued) await this.save([sha256], new Map(this.queue).set(sha256, { ...queued, ...change }));
    });
  }

  /** A picture's bytes in the first of `sizes` that is here; null where none is. */
  async bytes(sha256: string, sizes: PictureSize[]): Promise<Blob | null> {
    for (const size of sizes) {
      const found = await openRecord(this.sealed, BYTES_STORE, `${sha256}/${size}`, bytesSchema);
      if (found) return new Blob([found.bytes], { type: found.type });
    }
    return null;
  }

  /** Keeps a picture that came from the server: thumbnails for good, larger ones while there is room. */
  async keepShown(sha256: string, size: 'thumb' | 'view', blob: Blob, since: string): Promise<void> {
    const sealed = await this.sealBlob(blob);
    await this.write(({ bytes, sizes }) => {
      bytes.put(sealed, `${sha256}/${size}`);
      if (size === 'view') sizes.put({ bytes: blob.size, since }, `${sha256}/view`);
    });
    if (size === 'view') await this.trim(SHOWN_BYTES_MAX);
  }

  /**
   * Lets go of large pictures that the server has, the oldest first, until they take no more than `bytesMax`. Answers
   * how many bytes that made free.
   */
  trim(bytesMax: number): Promise<number> {
    return this.write((stores) => evict(stores, bytesMax));
  }

  /** Has what was sent from here, and is still here, offered to the server again: it may have lost it. */
  offerAgain(): Promise<void> {
    return this.turns.take(async () => {
      const sent = await this.write(({ queue, sizes }) => sentWhole(queue, sizes));
      const again = sent.map(({ sha256, name, since }): [string, Queued] => [
        sha256,
        // which photos it was for no longer matters: they are the record's
        { ...NEW, name, since, attachedFor: [sha256], isInDoubt: true },
      ]);
      await this.save(
        again.map(([sha256]) => sha256),
        new Map(oldestFirst([...this.queue, ...again])),
      );
    });
  }

  /** Lets go of all that the server has. */
  forgetSent(): Promise<void> {
    return this.write((stores) => evictAll(stores));
  }

  private async save(changed: string[], next: Map<string, Queued>): Promise<void> {
    const records = await Promise.all(
      changed.map(async (sha256) => [sha256, await this.sealed.seal.seal(next.get(sha256))] as const),
    );
    await this.write((stores) => {
      for (const [sha256, record] of records) {
        const queued = next.get(sha256);
        if (queued && !isDone(queued)) {
          stores.queue.put(record, sha256);
          continue;
        }
        stores.queue.delete(sha256);
        next.delete(sha256);
        if (queued && queued.arrived !== 'full') dropBytes(stores, sha256);
      }
    });
    this.queue = next;
  }

  private async sealBlob(blob: Blob): Promise<unknown> {
    return this.sealed.seal.seal({ type: blob.type, bytes: new Uint8Array(await blob.arrayBuffer()) });
  }

  private write<T>(work: (stores: PictureStores) => T | Promise<T>): Promise<T> {
    return this.sealed.database.transact(PICTURE_STORES, 'readwrite', (transaction) =>
      work({
        queue: transaction.objectStore(QUEUE_STORE),
        bytes: transaction.objectStore(BYTES_STORE),
        sizes: transaction.objectStore(SIZES_STORE),
      }),
    );
  }
}

/** The pictures of the record that the server does not have whole, as screens tell them. */
export function heldPictures(queue: Queue): HeldPicture[] {
  return [...queue].flatMap(([sha256, { name, since, attachedFor, arrived, refused }]): HeldPicture[] => {
    if (attachedFor.length === 0 || arrived === 'full') return [];
    if (refused !== null) return [{ sha256, name, since, state: 'refused', words: refused }];
    return [{ sha256, name, since, state: arrived ?? 'waiting' }];
  });
}

const NEW = { keptFor: [], attachedFor: [], arrived: null, isInDoubt: false, refused: null };

function assigned(queued: Queued, photoId: string, to: 'record' | 'form' | 'nothing'): Queued {
  const without = (ids: string[]) => ids.filter((id) => id !== photoId);
  const [keptFor, attachedFor] = [without(queued.keptFor), without(queued.attachedFor)];
  if (to === 'form') keptFor.push(photoId);
  if (to === 'record') attachedFor.push(photoId);
  return { ...queued, keptFor, attachedFor };
}

// nobody waits for it any more: no form, and the record has it or does not want it
function isDone({ keptFor, attachedFor, arrived }: Queued): boolean {
  return keptFor.length === 0 && (attachedFor.length === 0 || arrived === 'full');
}

function oldestFirst(entries: Iterable<[string, Queued]>): Queue {
  return new Map([...entries].sort(([, a], [, b]) => (a.since < b.since ? -1 : a.since > b.since ? 1 : 0)));
}
