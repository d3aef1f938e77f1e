import { orientationOnly, type Orientation } from './orientation.ts';

// ITU-T T.81, table B.1
const START = 0xd8;
const END = 0xd9;
const SCAN = 0xda;
const APP0 = 0xe0;
const APP1 = 0xe1;
const APP2 = 0xe2;
const APP14 = 0xee;
const APP15 = 0xef;
const COMMENT = 0xfe;

/** What begins an application segment that is kept: how the pixels are to be read, and in which colours. */
const KEPT_APPS: Record<number, string> = { [APP0]: 'JFIF\0', [APP2]: 'ICC_PROFILE\0', [APP14]: 'Adobe' };

/**
 * A JPEG of the same coded pixels without anything that may tell where, when or with what it was taken: of Exif only the
 * orientation is left, of other application segments only colours; comments and whatever follows the end are gone. One
 * that breaks off within its pixels stays so. null where it is no JPEG.
 */
export function cleanJpeg(bytes: Buffer, orientation: Orientation): Buffer | null {
  if (bytes[0] !== 0xff || bytes[1] !== START) return null;
  const parts = [bytes.subarray(0, 2)];
  if (orientation !== 1) parts.push(exifSegment(orientation));
  let hasScan = false;
  for (let at = 2; at < bytes.length;) {
    const from = at;
    if (bytes[at] !== 0xff) return null;
    while (bytes[at] === 0xff) at += 1; // any number of them may stand before a marker
    const marker = bytes[at];
    at += 1;
    if (marker === END) return hasScan ? Buffer.concat([...parts, Buffer.of(0xff, END)]) : null;
    const segment = at + 2 <= bytes.length ? bytes.subarray(at, at + bytes.readUInt16BE(at)) : null;
    if (marker === undefined || !segment || segment.length < 2) break;
    at += segment.length;
    if (marker === SCAN) {
      hasScan = true;
      at = endOfScan(bytes, at);
    }
    if (isKept(marker, segment)) parts.push(bytes.subarray(from, at));
  }
  return hasScan ? Buffer.concat(parts) : null;
}

function isKept(marker: number, segment: Buffer): boolean {
  if (marker === COMMENT) return false;
  if (marker < APP0 || marker > APP15) return true;
  const begins = KEPT_APPS[marker];
  return begins !== undefined && segment.subarray(2, 2 + begins.length).equals(Buffer.from(begins, 'latin1'));
}

/** Where the marker after the coded pixels stands: within them, 0xff is followed by 0, by 0xff or by a restart's number. */
function endOfScan(bytes: Buffer, from: number): number {
  // found natively: a scan is nearly all of a photo
  for (let at = bytes.indexOf(0xff, from); at !== -1 && at + 1 < bytes.length; at = bytes.indexOf(0xff, at + 1)) {
    const next = bytes[at + 1]!;
    if (next !== 0 && next !== 0xff && (next < 0xd0 || next > 0xd7)) return at;
  }
  return bytes.length;
}

function exifSegment(orientation: Orientation): Buffer {
  const block = Buffer.concat([Buffer.from('Exif\0\0', 'latin1'), orientationOnly(orientation)]);
  const head = Buffer.from([0xff, APP1, 0, 0]);
  head.writeUInt16BE(block.length + 2, 2);
  return Buffer.concat([head, block]);
}
