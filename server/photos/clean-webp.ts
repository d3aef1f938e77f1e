import { orientationOnly, type Orientation } from './orientation.ts';

// RFC 9649: a RIFF file of chunks, each a name, a length and data padded to an even number of bytes
const HEAD_BYTES = 12;
const CHUNK_HEAD_BYTES = 8;
const KEPT = new Set(['VP8X', 'VP8 ', 'VP8L', 'ALPH', 'ANIM', 'ANMF', 'ICCP']);

/** Flags of the chunk VP8X: whether there are chunks EXIF and XMP. */
const HAS_EXIF = 0x08;
const HAS_XMP = 0x04;

/** A WebP of the same coded pixels; of all that it says about itself only colours and orientation are left. null where it is no WebP. */
export function cleanWebp(bytes: Buffer, orientation: Orientation): Buffer | null {
  if (bytes.toString('latin1', 0, 4) !== 'RIFF' || bytes.toString('latin1', 8, HEAD_BYTES) !== 'WEBP')
    return null;
  const end = Math.min(bytes.length, bytes.readUInt32LE(4) + 8);
  const chunks: Buffer[] = [];
  for (let at = HEAD_BYTES; at + CHUNK_HEAD_BYTES <= end;) {
    const length = bytes.readUInt32LE(at + 4);
    const chunk = bytes.subarray(at, at + CHUNK_HEAD_BYTES + length + (length % 2));
    at += chunk.length;
    if (KEPT.has(chunk.toString('latin1', 0, 4))) chunks.push(chunk);
  }
  const [first] = chunks;
  if (!first) return null;
  // without VP8X it has neither Exif nor anything else to be cut
  if (first.toString('latin1', 0, 4) !== 'VP8X' || first.length <= CHUNK_HEAD_BYTES) return riff(chunks);
  const isTurned = orientation !== 1;
  const flags = first[CHUNK_HEAD_BYTES]! & ~(HAS_EXIF | HAS_XMP);
  const told = Buffer.from(first);
  told[CHUNK_HEAD_BYTES] = isTurned ? flags | HAS_EXIF : flags;
  return riff([told, ...chunks.slice(1), ...(isTurned ? [exifChunk(orientation)] : [])]);
}

function riff(chunks: Buffer[]): Buffer {
  const body = Buffer.concat([Buffer.from('WEBP', 'latin1'), ...chunks]);
  return Buffer.concat([chunkHead('RIFF', body.length), body]);
}

function exifChunk(orientation: Orientation): Buffer {
  const block = orientationOnly(orientation);
  return Buffer.concat([chunkHead('EXIF', block.length), block]);
}

function chunkHead(name: string, length: number): Buffer {
  const head = Buffer.alloc(CHUNK_HEAD_BYTES);
  head.write(name, 'latin1');
  head.writeUInt32LE(length, 4);
  return head;
}
