import { STAMP_AHEAD_MAX_MS, hear, parseStamp, stampMs, type Clock, type Stamp } from '#shared/sync/stamp.ts';

/** How wrong a device's clock may be before its person is told, in milliseconds. */
const CLOCK_WRONG_MS = 2 * 60_000;

/** The server's time less the device's own: half of the round trip is taken to be the way back. */
export function measureOffset(serverTime: string, askedAtMs: number, answeredAtMs: number): number | null {
  const serverMs = Date.parse(serverTime);
  if (Number.isNaN(serverMs)) return null;
  return Math.round(serverMs + (answeredAtMs - askedAtMs) / 2 - answeredAtMs);
}

/** How far the device's own clock is ahead, where that is worth telling; null otherwise. */
export function clockAheadMs(offsetMs: number): number | null {
  return Math.abs(offsetMs) > CLOCK_WRONG_MS ? -offsetMs : null;
}

/** The latest of the stamps that are not from further ahead of `nowMs` (the server's time) than the server believes. */
export function latestBelieved(stamps: Iterable<Stamp>, nowMs: number): Stamp | null {
  let latest: Stamp | null = null;
  for (const stamp of stamps) {
    if ((latest === null || stamp > latest) && stampMs(stamp) <= nowMs + STAMP_AHEAD_MAX_MS) latest = stamp;
  }
  return latest;
}

/**
 * The clock once `latest` has been heard at `nowMs` (the server's time). A clock that had run ahead comes back, but not
 * while ops with its stamps are held.
 */
export function clockAfterAnswer(
  clock: Clock | null,
  latest: Stamp | null,
  nowMs: number,
  areOpsHeld: boolean,
): Clock | null {
  const isRunaway = clock !== null && clock.ms > nowMs + STAMP_AHEAD_MAX_MS && !areOpsHeld;
  const last = isRunaway ? null : clock;
  const heard = parseStamp(latest);
  return heard ? hear(last, heard, nowMs) : last;
}
