import sharp from 'sharp';
import type { MadeSize } from './store.ts';

const LONGEST_SIDE_PX: Record<MadeSize, number> = { 'made-thumb': 320, view: 1600 };
const QUALITY = 82;

/** The media type of what is made. */
export const MADE_TYPE = 'image/jpeg';

/** A smaller JPEG of a picture, upright and in sRGB, never larger than the picture is; null where it cannot be decoded. */
export async function makeSize(full: Buffer, size: MadeSize): Promise<Buffer | null> {
  const side = LONGEST_SIDE_PX[size];
  // of a JPEG that breaks off, what is there is shown and the rest is grey; of other formats it would be left undefined.
  // How many px it has was judged when it came.
  const failOn = isJpeg(full) ? 'none' : 'error';
  const picture = sharp(full, { failOn, limitInputPixels: false }).autoOrient();
  const smaller = picture.resize({ width: side, height: side, fit: 'inside', withoutEnlargement: true });
  try {
    return await smaller.flatten({ background: '#ffffff' }).jpeg({ quality: QUALITY }).toBuffer();
  } catch {
    return null; // sharp has no other way to say so
  }
}

function isJpeg(bytes: Buffer): boolean {
  return bytes[0] === 0xff && bytes[1] === 0xd8;
}
