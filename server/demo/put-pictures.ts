import type { Transaction } from 'sequelize';
import { noteArrival } from '#server/photos/arrivals.ts';
import { readPicture, type ReadPicture } from '#server/photos/read-picture.ts';
import type { PictureStore, SentSize } from '#server/photos/store.ts';
import type { DemoBatch } from './demo-script.ts';
import type { Pictures } from './pictures/develop.ts';

interface Arrived {
  sha256: string;
  size: SentSize;
  read: ReadPicture;
}

/** Pictures whose bytes are kept, by hash: what remains is to write down that they came. */
export type KeptPictures = ReadonlyMap<string, Arrived[]>;

/** Keeps the bytes as an upload would, thumbnails first. Durable once this resolves. */
export async function keepPictures(
  store: PictureStore,
  shopId: string,
  pictures: Pictures,
): Promise<KeptPictures> {
  const kept = new Map<string, Arrived[]>();
  for (const { sha256, jpeg, thumb } of pictures.values()) {
    const arrived: Arrived[] = [];
    for (const [size, bytes] of [
      ['thumb', thumb],
      ['full', jpeg],
    ] as const) {
      const read = await readPicture(bytes);
      if ('refused' in read) throw new Error(`a picture of the demo is refused: ${read.refused}`);
      await store.put({ shopId, sha256 }, size, read.bytes);
      arrived.push({ sha256, size, read });
    }
    kept.set(sha256, arrived);
  }
  return kept;
}

/** Writes down that the pictures of a batch's photos have come with it. */
export async function noteArrivals(
  transaction: Transaction,
  shopId: string,
  batch: DemoBatch,
  kept: KeptPictures,
): Promise<void> {
  for (const { kind, data, personId } of batch.ops) {
    if (kind !== 'photo.attach') continue;
    const { sha256 } = data as { sha256: string };
    for (const { size, read } of kept.get(sha256) ?? [])
      await noteArrival(
        transaction,
        { photo: { shopId, sha256 }, size, personId, nowMs: batch.receivedMs },
        read,
      );
  }
}
