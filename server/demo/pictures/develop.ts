import { createHash } from 'node:crypto';
import sharp from 'sharp';
import { drawPicture, PICTURE_NAMES, type PictureName } from './album.ts';
import { photograph } from './photograph.ts';
import { grainAddress, type Grain } from './wood.ts';

/** A picture as a phone has it: what it sends, and the small one that it sends first. */
export interface TakenPicture {
  sha256: string;
  width: number;
  height: number;
  jpeg: Buffer;
  thumb: Buffer;
}

export type Pictures = ReadonlyMap<PictureName, TakenPicture>;

const AT_A_TIME = 3;
const THUMB_PX = 320;
const THUMB_QUALITY = 70;

/** Makes the demo's pictures; some twenty seconds of a machine with two cores. */
export async function developPictures(names: readonly PictureName[] = PICTURE_NAMES): Promise<Pictures> {
  const boards = new Map<Grain, Promise<string>>();
  const taken = new Map<PictureName, TakenPicture>();
  const waiting = [...names];
  const work = async () => {
    for (let name = waiting.shift(); name !== undefined; name = waiting.shift())
      taken.set(name, await develop(name, boards));
  };
  await Promise.all(Array.from({ length: AT_A_TIME }, work));
  return taken;
}

async function develop(name: PictureName, boards: Map<Grain, Promise<string>>): Promise<TakenPicture> {
  const { sketch, shot } = drawPicture(name);
  const used = new Map<Grain, string>();
  for (const grain of sketch.grains) {
    const address = boards.get(grain) ?? grainAddress(grain);
    boards.set(grain, address);
    used.set(grain, await address);
  }
  const jpeg = await photograph(sketch, shot, used);
  const thumb = await sharp(jpeg)
    .resize({ width: THUMB_PX, height: THUMB_PX, fit: 'inside' })
    .jpeg({ quality: THUMB_QUALITY })
    .toBuffer();
  const sha256 = createHash('sha256').update(jpeg).digest('hex');
  return { sha256, width: sketch.width, height: sketch.height, jpeg, thumb };
}
