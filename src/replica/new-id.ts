import { v7 } from 'uuid';

const SEQUENCE_MAX = 0xffff_ffff;
// half of the counter's room is left to run on within a millisecond (RFC 9562, section 6.2)
const SEQUENCE_START_MAX = 0x7fff_ffff;

/** Makes UUIDv7s (RFC 9562) that sort in the order in which they are made, whatever the clock does meanwhile. */
export function idMaker(now: () => number, randomBytes: (count: number) => Uint8Array): () => string {
  let lastMs = -1;
  let sequence = 0;
  return () => {
    const random = randomBytes(16);
    const nowMs = Math.max(0, now());
    if (nowMs > lastMs) {
      lastMs = nowMs;
      sequence = new DataView(random.buffer, random.byteOffset).getUint32(0) & SEQUENCE_START_MAX;
    } else if (sequence < SEQUENCE_MAX) {
      sequence += 1;
    } else {
      lastMs += 1;
      sequence = 0;
    }
    return v7({ msecs: lastMs, seq: sequence, random });
  };
}
