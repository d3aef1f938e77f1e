import { crc32 } from 'node:zlib';
import { orientationOnly, type Orientation } from './orientation.ts';

// PNG (third edition), 5.2 and 5.3: a signature, then chunks of length, type, data and CRC
const SIGNATURE = Buffer.from('\x89PNG\r\n\x1a\n', 'latin1');
const CHUNK_FRAME_BYTES = 12;

/** How the pixels are to be read, and in which colours. */
const KEPT = new Set(
  'IHDR PLTE IDAT IEND tRNS cHRM gAMA iCCP sBIT sRGB cICP mDCV cLLI bKGD pHYs acTL fcTL fdAT'.split(' '),
);

/** A PNG of the same coded pixels; of all that it says about itself only colours and orientation are left. null where it is no PNG. */
export function cleanPng(bytes: Buffer, orientation: Orientation): Buffer | null {
  if (!bytes.subarray(0, SIGNATURE.length).equals(SIGNATURE)) return null;
  const parts: Buffer[] = [SIGNATURE];
  for (let at = SIGNATURE.length; at + CHUNK_FRAME_BYTES <= bytes.length;) {
    const type = bytes.toString('latin1', at + 4, at + 8);
    const chunk = bytes.subarray(at, at + bytes.readUInt32BE(at) + CHUNK_FRAME_BYTES);
    at += chunk.length;
    if (KEPT.has(type)) parts.push(chunk);
    if (type === 'IHDR' && orientation !== 1) parts.push(exifChunk(orientation));
    if (type === 'IEND') break;
  }
  return parts.length > 1 ? Buffer.concat(parts) : null;
}

function exifChunk(orientation: Orientation): Buffer {
  const block = Buffer.concat([Buffer.from('eXIf', 'latin1'), orientationOnly(orientation)]);
  const frame = Buffer.alloc(8);
  frame.writeUInt32BE(block.length - 4, 0);
  frame.writeUInt32BE(crc32(block), 4);
  return Buffer.concat([frame.subarray(0, 4), block, frame.subarray(4)]);
}
