import { buffer } from 'node:stream/consumers';
import type { Parts } from '#server/parts.ts';
import { query } from '#server/models/query.ts';
import { MADE_TYPE, makeSize } from './make-size.ts';
import type { MadeSize, Picture, PictureStore, SentSize, StoredBytes } from './store.ts';
import { Turns } from './turns.ts';

export type AskedSize = 'thumb' | 'view' | 'full';

export interface OpenPhoto extends StoredBytes {
  mediaType: string;
}

/** Nothing to give: it is not there or no row shows it; or its bytes cannot be decoded, so that nothing can be made of them. */
export type NoPhoto = 'missing' | 'undecodable';

type OpenParts = Pick<Parts, 'database' | 'pictures'>;

interface Shown {
  mediaType: string | null;
  thumbType: string | null;
}

// a row shows it; or whoever asks has sent it themselves, and its op is still on the way
const SHOWN = `
  SELECT media_type AS "mediaType", thumb_type AS "thumbType" FROM picture_files
  WHERE shop_id = $1 AND kind = 'photo' AND sha256 = $2 AND
    ($3::uuid IN (full_by, thumb_by) OR EXISTS (SELECT FROM photos WHERE shop_id = $1 AND sha256 = $2))`;

// a large picture takes much memory while it is decoded
const making = new Turns();

/** A photo as somebody who works in the shop may read it. */
export async function openPhoto(
  { database, pictures }: OpenParts,
  personId: string,
  photo: Picture,
  size: AskedSize,
): Promise<OpenPhoto | NoPhoto> {
  const [shown] = await database.inShop(photo.shopId, (transaction) =>
    query<Shown>(transaction, SHOWN, [photo.shopId, photo.sha256, personId]),
  );
  if (!shown) return 'missing';
  if (size === 'full') return openSent(pictures, photo, 'full', shown.mediaType);
  if (size === 'view') return openMade(pictures, photo, 'view');
  const sent = await openSent(pictures, photo, 'thumb', shown.thumbType);
  return sent === 'missing' ? openMade(pictures, photo, 'made-thumb') : sent;
}

/** `mediaType` null: it has not come. */
async function openSent(
  pictures: PictureStore,
  photo: Picture,
  size: SentSize,
  mediaType: string | null,
): Promise<OpenPhoto | 'missing'> {
  const stored = mediaType ? await pictures.read(photo, size) : null;
  return stored && mediaType ? { ...stored, mediaType } : 'missing';
}

async function openMade(
  pictures: PictureStore,
  photo: Picture,
  size: MadeSize,
): Promise<OpenPhoto | NoPhoto> {
  const stored = (await pictures.read(photo, size)) ?? (await making.take(() => make(pictures, photo, size)));
  return typeof stored === 'string' ? stored : { ...stored, mediaType: MADE_TYPE };
}

async function make(pictures: PictureStore, photo: Picture, size: MadeSize): Promise<StoredBytes | NoPhoto> {
  const meanwhile = await pictures.read(photo, size);
  if (meanwhile) return meanwhile;
  const full = await pictures.read(photo, 'full');
  if (!full) return 'missing';
  const made = await makeSize(await buffer(full.stream), size);
  if (!made) return 'undecodable';
  await pictures.put(photo, size, made);
  return (await pictures.read(photo, size)) ?? 'missing';
}
