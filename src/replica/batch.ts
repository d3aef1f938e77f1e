import { OPS_PER_REQUEST_MAX, SYNC_BODY_BYTES_MAX } from '#shared/sync/protocol.ts';
import type { Op } from '#shared/sync/op.ts';

/** What a request carries beside its ops, at most, in bytes. */
const ENVELOPE_BYTES_MAX = 4096;

const encoder = new TextEncoder();

/** As many of the oldest ops as one request may carry, at least one; of that, `share` (above 0, at most 1). */
export function takeBatch<Item extends { op: Op }>(outbox: Item[], share: number): Item[] {
  const opsMax = OPS_PER_REQUEST_MAX * share;
  const bytesMax = (SYNC_BODY_BYTES_MAX - ENVELOPE_BYTES_MAX) * share;
  let bytes = 0;
  const batch: Item[] = [];
  for (const item of outbox) {
    bytes += encoder.encode(JSON.stringify(item.op)).length + 1;
    if (batch.length > 0 && (batch.length + 1 > opsMax || bytes > bytesMax)) break;
    batch.push(item);
  }
  return batch;
}
