import sharp, { type Metadata } from 'sharp';
import { cleanJpeg } from './clean-jpeg.ts';
import { cleanPng } from './clean-png.ts';
import { cleanWebp } from './clean-webp.ts';
import type { Orientation } from './orientation.ts';

const SIDE_PX_MAX = 16_384;
const PIXELS_MAX = 100_000_000;

type Clean = (bytes: Buffer, orientation: Orientation) => Buffer | null;

const FORMATS: { name: Metadata['format']; mediaType: string; begins: RegExp; clean: Clean }[] = [
  { name: 'jpeg', mediaType: 'image/jpeg', begins: /^\xff\xd8\xff/, clean: cleanJpeg },
  { name: 'png', mediaType: 'image/png', begins: /^\x89PNG\r\n/, clean: cleanPng },
  { name: 'webp', mediaType: 'image/webp', begins: /^RIFF[^]{4}WEBP/, clean: cleanWebp },
];
const BEGIN_BYTES = 12;

/** A picture as it is to be kept. */
export interface ReadPicture {
  /** without place data, pixels as they came */
  bytes: Buffer;
  mediaType: string;
  /** in px, once it stands upright */
  width: number;
  height: number;
}

export interface Refused {
  /** why it is not taken, in words */
  refused: string;
}

/** Judges bytes by their content; nothing is decoded but what they say of their size. */
export async function readPicture(bytes: Buffer): Promise<ReadPicture | Refused> {
  const begin = bytes.toString('latin1', 0, BEGIN_BYTES);
  const format = FORMATS.find(({ begins }) => begins.test(begin));
  if (!format) return { refused: 'This is no JPEG, PNG or WebP picture.' };
  const unreadable = { refused: `This begins as ${format.mediaType} but cannot be read as such.` };
  const said = await readHead(bytes);
  if (!said || said.format !== format.name) return unreadable;
  const { width, height } = said.autoOrient;
  if (Math.max(width, height) > SIDE_PX_MAX || width * height > PIXELS_MAX)
    return tooManyPixels(width, height);
  const cleaned = format.clean(bytes, said.orientation ?? 1);
  return cleaned ? { bytes: cleaned, mediaType: format.mediaType, width, height } : unreadable;
}

async function readHead(bytes: Buffer): Promise<Metadata | null> {
  try {
    return await sharp(bytes, { limitInputPixels: false }).metadata();
  } catch {
    return null; // sharp has no other way to say that it cannot read it
  }
}

function tooManyPixels(width: number, height: number): Refused {
  const limit = `at most ${SIDE_PX_MAX} px a side and ${PIXELS_MAX / 1_000_000} megapixels are taken`;
  return { refused: `This picture is ${width} x ${height} px; ${limit}.` };
}
