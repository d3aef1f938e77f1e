import imageCompression from 'browser-image-compression';
import libraryUrl from 'browser-image-compression/dist/browser-image-compression.js?url';
import { readJpegHead } from './jpeg.ts';
import { PictureError, type PreparedPicture } from './picture.ts';
import { sha256Of } from './sha256.ts';

const FULL_SIDE_PX_MAX = 2560;
const FULL_QUALITY = 0.82;
const THUMB_SIDE_PX_MAX = 480;
const THUMB_BYTES_MAX = 100 * 1024;
/** Tried one after another until the thumbnail is small enough. */
const THUMB_QUALITIES = [0.75, 0.5, 0.3, 0.1];
/** A phone that decodes more than this runs out of memory and dies with all that was not kept. */
const PIXELS_MAX = 120_000_000;
/** What a JPEG says of itself stands within its first bytes, this many at most. */
const HEAD_BYTES = 256 * 1024;
const SHRINK_MAX_MS = 60_000;

interface Shrinking {
  sidePxMax: number;
  quality: number;
  orientation: number;
}

/**
 * Makes a picture ready to be sent: upright, longest side 2560 px, JPEG, and a thumbnail. It is drawn anew, so that
 * nothing the camera wrote beside the pixels comes along, the place above all. Rejects with a PictureError.
 */
export async function preparePicture(file: File): Promise<PreparedPicture> {
  const head = readJpegHead(await file.slice(0, HEAD_BYTES).arrayBuffer());
  if (head?.size && head.size.width * head.size.height > PIXELS_MAX) throw tooLarge(file.name);
  const { orientation, takenAt } = head ?? { orientation: 1, takenAt: null };
  const full = await shrink(file, { sidePxMax: FULL_SIDE_PX_MAX, quality: FULL_QUALITY, orientation });
  const thumb = await makeThumb(full);
  const bytes = await full.arrayBuffer();
  const size = readJpegHead(bytes)?.size;
  if (!size) throw unreadable(file.name);
  const about = { sha256: await sha256Of(bytes), ...size, bytes: bytes.byteLength };
  return { full, thumb, ...about, ...(takenAt ? { takenAt } : {}) };
}

async function makeThumb(full: File): Promise<File> {
  let thumb = full;
  for (const quality of THUMB_QUALITIES) {
    thumb = await shrink(full, { sidePxMax: THUMB_SIDE_PX_MAX, quality, orientation: 1 });
    if (thumb.size <= THUMB_BYTES_MAX) break;
  }
  return thumb;
}

/** Draws a picture again, no longer than `sidePxMax`. */
async function shrink(file: File, shrinking: Shrinking): Promise<File> {
  // what a file is called says little about what is in it, and the library goes by that
  const picture = file.type.startsWith('image/') ? file : new File([file], file.name, { type: 'image/jpeg' });
  try {
    return await shrinkInWorker(picture, shrinking);
  } catch {
    return shrinkHere(picture, shrinking);
  }
}

// without `libURL` the library's worker is fetched from elsewhere; it must be absolute, since the worker is a blob
function shrinkInWorker(file: File, { sidePxMax, quality, orientation }: Shrinking): Promise<File> {
  return imageCompression(file, {
    libURL: new URL(libraryUrl, location.href).href,
    useWebWorker: true,
    maxWidthOrHeight: sidePxMax,
    initialQuality: quality,
    fileType: 'image/jpeg',
    preserveExif: false,
    // its own reader never answers for some files that break off
    exifOrientation: orientation,
    // else a picture that would become larger is made worse ten times over
    maxIteration: 1,
    alwaysKeepResolution: true,
    signal: AbortSignal.timeout(SHRINK_MAX_MS),
  });
}

async function shrinkHere(file: File, { sidePxMax, quality }: Shrinking): Promise<File> {
  const bitmap = await createImageBitmap(file).catch(() => {
    throw unreadable(file.name);
  });
  const scale = Math.min(1, sidePxMax / Math.max(bitmap.width, bitmap.height));
  const canvas = new OffscreenCanvas(Math.round(bitmap.width * scale), Math.round(bitmap.height * scale));
  const context = canvas.getContext('2d');
  if (!context) throw new PictureError(`‘${file.name}’ could not be made smaller on this device.`);
  context.fillStyle = 'white';
  context.fillRect(0, 0, canvas.width, canvas.height);
  context.imageSmoothingQuality = 'high';
  context.drawImage(bitmap, 0, 0, canvas.width, canvas.height);
  bitmap.close();
  const blob = await canvas.convertToBlob({ type: 'image/jpeg', quality });
  return new File([blob], file.name, { type: blob.type });
}

function unreadable(name: string): PictureError {
  return new PictureError(`‘${name}’ is no picture that this device can read. Choose a JPEG or PNG.`);
}

function tooLarge(name: string): PictureError {
  return new PictureError(`‘${name}’ has more pixels than this device can hold. Choose a smaller one.`);
}
