/** A clock that moves only when told to. */
export type Clock = {
  now: () => number;
  set: (ms: number) => void;
  advance: (ms: number) => void;
};

export function makeClock(startMs = Date.parse('2026-06-01T09:00:00Z')): Clock {
  let nowMs = startMs;
  return {
    now: () => nowMs,
    set: (ms) => (nowMs = ms),
    advance: (ms) => (nowMs += ms),
  };
}
