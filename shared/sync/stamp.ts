import { z } from 'zod';

/**
 * A hybrid logical clock stamp as text that sorts: `<ms, 12 hex>-<counter, 4 hex>-<device uuid>`.
 * Algorithm: Kulkarni, Demirbas, Madappa, Avva and Leone, OPODIS 2014.
 */
export type Stamp = string;

export interface Clock {
  ms: number;
  counter: number;
}

const STAMP = /^([0-9a-f]{12})-([0-9a-f]{4})-([0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12})$/;
const COUNTER_MAX = 0xffff;

/** How far ahead of the server a device's stamp may be and still be believed, in milliseconds. */
export const STAMP_AHEAD_MAX_MS = 5 * 60_000;

export const stampSchema = z.string().regex(STAMP);

export function formatStamp(clock: Clock, deviceId: string): Stamp {
  return `${clock.ms.toString(16).padStart(12, '0')}-${clock.counter.toString(16).padStart(4, '0')}-${deviceId}`;
}

/** The parts of a stamp, or null where the text is none. */
export function parseStamp(text: unknown): (Clock & { deviceId: string }) | null {
  const parts = typeof text === 'string' ? STAMP.exec(text) : null;
  if (!parts) return null;
  return { ms: parseInt(parts[1]!, 16), counter: parseInt(parts[2]!, 16), deviceId: parts[3]! };
}

export function stampMs(stamp: Stamp): number {
  return parseInt(stamp.slice(0, 12), 16);
}

/** The ISO 8601 UTC time of a stamp. */
export function stampTime(stamp: Stamp): string {
  return new Date(stampMs(stamp)).toISOString();
}

// a counter that has run full borrows the next millisecond, so that order is kept
function after(clock: Clock): Clock {
  return clock.counter < COUNTER_MAX
    ? { ms: clock.ms, counter: clock.counter + 1 }
    : { ms: clock.ms + 1, counter: 0 };
}

/** The clock for something done here now; parts of a millisecond, as a corrected clock may have, are dropped. */
export function tick(last: Clock | null, nowMs: number): Clock {
  const ms = Math.floor(nowMs);
  return last && last.ms >= ms ? after(last) : { ms, counter: 0 };
}

/** The clock after hearing of `heard`, so that what is done next comes after it. */
export function hear(last: Clock | null, heard: Clock, nowMs: number): Clock {
  const latest = Math.max(last?.ms ?? 0, heard.ms, Math.floor(nowMs));
  const counters = [last, heard].filter((clock) => clock?.ms === latest).map((clock) => clock!.counter);
  return counters.length > 0 ? after({ ms: latest, counter: Math.max(...counters) }) : { ms: latest, counter: 0 };
}

/**
 * When an op counts as made: its own stamp unless that is too far ahead of the server's clock, then the server's
 * time; never before what the same device has sent earlier, so that a fast clock keeps the order of its own work.
 */
export function orderAt(stamp: Stamp | null, deviceId: string, lastOrderedAt: Stamp | null, nowMs: number): Stamp {
  const own = stamp && stampMs(stamp) <= nowMs + STAMP_AHEAD_MAX_MS ? stamp : formatStamp({ ms: nowMs, counter: 0 }, deviceId);
  if (!lastOrderedAt || own > lastOrderedAt) return own;
  return formatStamp(after(parseStamp(lastOrderedAt)!), deviceId);
}
