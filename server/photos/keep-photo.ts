import { createHash } from 'node:crypto';
import { lockShop } from '#server/sync/feed.ts';
import type { Parts } from '#server/parts.ts';
import { noteArrival, type Arrival } from './arrivals.ts';
import { isKept } from './is-kept.ts';
import { readPicture, type ReadPicture, type Refused } from './read-picture.ts';
import { tellArrival } from './tell-arrival.ts';

export type PhotoParts = Pick<Parts, 'database' | 'pictures' | 'onChanged'>;

export interface Kept {
  /** false where it was there already */
  isNew: boolean;
}

/**
 * Takes in a photo's whole bytes or its thumbnail: durable, and told to whoever has a row of it, once this resolves.
 * Whether the op that names it has come does not matter.
 */
export async function keepPhoto(parts: PhotoParts, arrival: Arrival, bytes: Buffer): Promise<Kept | Refused> {
  const { photo, size } = arrival;
  if (size === 'full' && sha256Of(bytes) !== photo.sha256) {
    return { refused: 'The SHA-256 of these bytes is not the name under which they were sent.' };
  }
  const read = await readPicture(bytes);
  if ('refused' in read) return read;
  // the bytes first: rows must not tell of what is not there
  if (!(await isThere(parts, arrival))) await parts.pictures.put(photo, size, read.bytes);
  return noteAndTell(parts, arrival, read);
}

// under the name of whole bytes there can be no others; a thumbnail is told from another only by what is noted of it
function isThere(parts: PhotoParts, { photo, size }: Arrival): Promise<boolean> {
  return size === 'full' ? parts.pictures.has(photo, size) : isKept(parts, photo, size);
}

async function noteAndTell(
  { database, onChanged }: PhotoParts,
  arrival: Arrival,
  read: ReadPicture,
): Promise<Kept> {
  const { shopId } = arrival.photo;
  const { isNew, seq } = await database.inShop(shopId, async (transaction) => {
    // as the merge does, so that of bytes and op whichever comes second sees the other
    await lockShop(transaction, shopId);
    const noted = await noteArrival(transaction, arrival, read);
    return { isNew: noted !== null, seq: noted && (await tellArrival(transaction, shopId, noted)) };
  });
  if (seq !== null) onChanged(shopId, seq);
  return { isNew };
}

function sha256Of(bytes: Buffer): string {
  return createHash('sha256').update(bytes).digest('hex');
}
