// What a JPEG says of itself before its pixels begin (ITU-T T.81, annex B). A reader of our own, since of all that a camera
// writes only three things are wanted, and every picture is read on a phone before it is on the screen.

const START = 0xffd8;
const SCAN = 0xda;
const APP1 = 0xe1;
/** Frame headers, baseline and progressive (table B.1); c4, c8 and cc are no frames. */
const FRAMES = [0xc0, 0xc1, 0xc2, 0xc3, 0xc5, 0xc6, 0xc7, 0xc9, 0xca, 0xcb, 0xcd, 0xce, 0xcf];

/** Tags of Exif 2.32, tables 4, 8 and 9. */
const ORIENTATION = 0x0112;
const EXIF_POINTER = 0x8769;
const TIME_ORIGINAL = 0x9003;
const OFFSET_ORIGINAL = 0x9011;
const TAG_BYTES = 12;

export interface JpegHead {
  /** in px as coded, before any turning; null where no frame header was met */
  size: { width: number; height: number } | null;
  /** how the picture is to be turned to stand upright (Exif 2.32, 4.6.4); 1 is as it is */
  orientation: number;
  /** ISO 8601, where the camera wrote down when the picture was taken */
  takenAt: string | null;
}

/** Reads the beginning of a file; null where it is no JPEG. What breaks off or makes no sense is as if it were not there. */
export function readJpegHead(bytes: ArrayBuffer): JpegHead | null {
  const view = new DataView(bytes);
  if (view.byteLength < 4 || view.getUint16(0) !== START) return null;
  const head: JpegHead = { size: null, orientation: 1, takenAt: null };
  unlessBeyond(() => readSegments(view, head));
  return head;
}

/** What `read` answers; null where it would read beyond the end of what there is. */
function unlessBeyond<T>(read: () => T): T | null {
  try {
    return read();
  } catch (error) {
    if (error instanceof RangeError) return null; // a DataView throws so
    throw error;
  }
}

function readSegments(view: DataView, head: JpegHead): void {
  for (let at = 2; view.getUint8(at) === 0xff;) {
    const marker = view.getUint8(at + 1);
    if (marker === 0xff) {
      at += 1; // any number of them may stand before a marker
      continue;
    }
    if (marker === SCAN) return;
    const length = view.getUint16(at + 2);
    if (FRAMES.includes(marker)) {
      head.size = { height: view.getUint16(at + 5), width: view.getUint16(at + 7) };
    } else if (marker === APP1 && textAt(view, at + 4, 6) === 'Exif\0\0') {
      Object.assign(
        head,
        unlessBeyond(() => readExif(view, at + 10)),
      );
    }
    at += 2 + length;
  }
}

/** A TIFF block (TIFF 6.0, section 2) that begins at `start`; everything in it is told from there. */
function readExif(view: DataView, start: number): Pick<JpegHead, 'orientation' | 'takenAt'> {
  const block = new DataView(view.buffer, start);
  const isLittle = textAt(block, 0, 2) === 'II';
  const first = readDirectory(block, block.getUint32(4, isLittle), isLittle);
  const orientation = first.get(ORIENTATION);
  const turned = orientation === undefined ? 1 : block.getUint16(orientation, isLittle);
  const pointer = first.get(EXIF_POINTER);
  return {
    orientation: turned >= 1 && turned <= 8 ? turned : 1,
    takenAt:
      pointer === undefined
        ? null
        : unlessBeyond(() => readTime(block, block.getUint32(pointer, isLittle), isLittle)),
  };
}

function readTime(block: DataView, directoryAt: number, isLittle: boolean): string | null {
  const tags = readDirectory(block, directoryAt, isLittle);
  const textOf = (tag: number, length: number) => {
    const at = tags.get(tag);
    // four bytes and less stand in the directory itself, longer values elsewhere
    return at === undefined ? null : textAt(block, block.getUint32(at, isLittle), length);
  };
  return isoTime(
    textOf(TIME_ORIGINAL, 19),
    unlessBeyond(() => textOf(OFFSET_ORIGINAL, 6)),
  );
}

/** Where the value of each tag stands. */
function readDirectory(block: DataView, at: number, isLittle: boolean): Map<number, number> {
  const count = block.getUint16(at, isLittle);
  const tags = new Map<number, number>();
  for (let index = 0; index < count; index += 1) {
    const tagAt = at + 2 + index * TAG_BYTES;
    tags.set(block.getUint16(tagAt, isLittle), tagAt + 8);
  }
  return tags;
}

/** `2026:09:08 10:05:33`, which without an offset is local time where the picture was taken: taken to be this device's. */
function isoTime(text: string | null, offset: string | null): string | null {
  const parts = /^(\d{4}):(\d\d):(\d\d) (\d\d:\d\d:\d\d)$/.exec(text ?? '');
  if (!parts) return null;
  const [, year, month, day, time] = parts;
  const zone = offset !== null && /^[+-]\d\d:\d\d$/.test(offset) ? offset : '';
  const ms = Date.parse(`${year}-${month}-${day}T${time}${zone}`);
  return Number.isNaN(ms) ? null : new Date(ms).toISOString();
}

function textAt(view: DataView, at: number, length: number): string {
  let text = '';
  for (let index = 0; index < length; index += 1) text += String.fromCharCode(view.getUint8(at + index));
  return text;
}
