import type { Parts } from '#server/parts.ts';
import type { Picture, SentSize } from './store.ts';

/** Whether what a phone sends of a photo has come and is still there. */
export async function isKept(
  { database, pictures }: Pick<Parts, 'database' | 'pictures'>,
  photo: Picture,
  size: SentSize,
): Promise<boolean> {
  const { shopId, sha256 } = photo;
  const file = await database.inShop(shopId, (transaction) =>
    database.models.PictureFile.findOne({ where: { shopId, kind: 'photo', sha256 }, transaction }),
  );
  const at = size === 'full' ? file?.fullAt : file?.thumbAt;
  return at ? pictures.has(photo, size) : false;
}
