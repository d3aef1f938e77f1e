import { createHash } from 'node:crypto';
import sharp from 'sharp';
import { PICTURE_NAMES, type PictureName } from '#server/demo/pictures/album.ts';
import type { Pictures, TakenPicture } from '#server/demo/pictures/develop.ts';

const SIDE_PX = 8;

/** A small JPEG in place of each of the demo's pictures, no two alike, where what they show does not matter. */
export async function standInPictures(): Promise<Pictures> {
  const taken = await Promise.all(
    PICTURE_NAMES.map(async (name, index) => [name, await standIn(index)] as [PictureName, TakenPicture]),
  );
  return new Map(taken);
}

async function standIn(index: number): Promise<TakenPicture> {
  const background = { r: (index * 3) % 256, g: 200 - index * 2, b: (index * 37) % 256 };
  const size = { width: SIDE_PX, height: SIDE_PX };
  const jpeg = await sharp({ create: { ...size, channels: 3, background } })
    .jpeg({ quality: 100 })
    .toBuffer();
  return { sha256: createHash('sha256').update(jpeg).digest('hex'), ...size, jpeg, thumb: jpeg };
}
