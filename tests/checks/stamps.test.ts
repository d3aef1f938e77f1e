import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { formatStamp, hear, orderAt, parseStamp, stampTime, tick, type Clock } from '#shared/sync/stamp.ts';

// Goal: stamps are hybrid logical clocks as Kulkarni, Demirbas, Madappa, Avva and Leone published them (OPODIS 2014).
// Method: a trace worked out by hand from the algorithm, then the properties that the paper proves, on random runs.

const DEVICE = '017f22e2-79b0-7cc3-98c4-dc0c0c07398f';
const at = (ms: number, counter: number): Clock => ({ ms, counter });

describe('the hybrid logical clock', () => {
  it('follows the trace of the published algorithm', () => {
    const clocks: (Clock | null)[] = [null, null, null, null];
    const sends = (node: number, nowMs: number) => (clocks[node] = tick(clocks[node]!, nowMs));
    const receives = (node: number, nowMs: number, heard: Clock) =>
      (clocks[node] = hear(clocks[node]!, heard, nowMs));

    const first = sends(0, 10);
    expect(first).toEqual(at(10, 0));
    expect(receives(1, 1, first)).toEqual(at(10, 1));
    const second = sends(1, 2);
    expect(second).toEqual(at(10, 2));
    expect(receives(2, 1, second)).toEqual(at(10, 3));
    const third = sends(2, 2);
    expect(third).toEqual(at(10, 4));
    expect(receives(3, 2, third)).toEqual(at(10, 5));
    const fourth = sends(3, 3);
    expect(fourth).toEqual(at(10, 6));
    expect(receives(0, 11, fourth)).toEqual(at(11, 0));
    expect(sends(0, 11)).toEqual(at(11, 1));
    expect(sends(0, 13)).toEqual(at(13, 0));
    expect(receives(1, 13, at(13, 4))).toEqual(at(13, 5));
    expect(receives(1, 13, at(13, 2))).toEqual(at(13, 6));
    expect(receives(1, 14, at(9, 9))).toEqual(at(14, 0));
  });

  it('keeps the counter where its own, the heard and the physical time are all one', () => {
    // where the authors' PlusCal starts at 0 again; the paper's equality form does not
    expect(hear(at(5, 3), at(5, 1), 5)).toEqual(at(5, 4));
  });

  const step = fc.record({
    node: fc.nat(3),
    from: fc.nat(3),
    isSend: fc.boolean(),
    passesMs: fc.nat(3),
  });
  const SKEW_MS = 40;

  it('rises strictly on every node, goes from send to receive, and never runs further ahead than the clocks differ', () => {
    const run = fc.tuple(
      fc.array(fc.nat(SKEW_MS), { minLength: 4, maxLength: 4 }),
      fc.array(step, { maxLength: 80 }),
    );
    fc.assert(
      fc.property(run, ([aheadMs, steps]) => {
        const clocks: (Clock | null)[] = [null, null, null, null];
        const sent: (Clock | null)[] = [null, null, null, null];
        let worldMs = 1000;
        for (const { node, from, isSend, passesMs } of steps) {
          worldMs += passesMs;
          const nowMs = worldMs + aheadMs[node]!;
          const before = clocks[node]!;
          const heard = isSend ? null : sent[from]!;
          const now = heard ? hear(before, heard, nowMs) : tick(before, nowMs);
          if (before) expect(formatStamp(now, DEVICE) > formatStamp(before, DEVICE)).toBe(true);
          if (heard) expect(formatStamp(now, DEVICE) > formatStamp(heard, DEVICE)).toBe(true);
          expect(now.ms).toBeGreaterThanOrEqual(nowMs);
          expect(now.ms - nowMs).toBeLessThanOrEqual(SKEW_MS);
          clocks[node] = now;
          if (!heard) sent[node] = now;
        }
      }),
    );
  });
});

describe('a stamp', () => {
  const clock = fc.record({ ms: fc.nat({ max: 2 ** 48 - 1 }), counter: fc.nat(0xffff) });

  it('is read as it was written, and sorts as text as the clock does', () => {
    fc.assert(
      fc.property(clock, clock, (a, b) => {
        expect(parseStamp(formatStamp(a, DEVICE))).toEqual({ ...a, deviceId: DEVICE });
        const isBefore = a.ms < b.ms || (a.ms === b.ms && a.counter < b.counter);
        expect(formatStamp(a, DEVICE) < formatStamp(b, DEVICE)).toBe(isBefore);
      }),
    );
  });

  it('says its time in ISO 8601', () => {
    // the time inside RFC 9562's example of appendix A.6
    expect(stampTime(formatStamp(at(0x017f22e279b0, 7), DEVICE))).toBe('2022-02-22T19:22:22.000Z');
  });

  it('borrows the next millisecond when its counter has run full', () => {
    expect(tick(at(10, 0xffff), 10)).toEqual(at(11, 0));
    expect(hear(at(10, 1), at(10, 0xffff), 10)).toEqual(at(11, 0));
  });

  it('holds whole milliseconds, though a corrected clock may not', () => {
    expect(tick(null, 10.75)).toEqual(at(10, 0));
    expect(tick(at(10, 0), 10.75)).toEqual(at(10, 1));
    expect(hear(null, at(9, 0), 10.75)).toEqual(at(10, 0));
  });

  it.each([
    ['', 'nothing'],
    ['017f22e279b0-0000-', 'no device'],
    ['017F22E279B0-0000-' + DEVICE, 'capitals'],
  ])('is not read from %j, which has %s', (text) => expect(parseStamp(text)).toBeNull());
});

describe('when an op counts as made', () => {
  const NOW_MS = 1_000_000_000;
  const stampAt = (ms: number, counter = 0) => formatStamp(at(ms, counter), DEVICE);

  it('is its own stamp up to five minutes ahead of the server', () => {
    expect(orderAt(stampAt(NOW_MS + 300_000), DEVICE, null, NOW_MS)).toBe(stampAt(NOW_MS + 300_000));
    expect(orderAt(stampAt(NOW_MS - 1e8), DEVICE, null, NOW_MS)).toBe(stampAt(NOW_MS - 1e8));
  });

  it('is the server’s time beyond that', () => {
    expect(orderAt(stampAt(NOW_MS + 300_001), DEVICE, null, NOW_MS)).toBe(stampAt(NOW_MS));
  });

  it('never comes before what the same device sent earlier, and rises strictly', () => {
    const ms = fc.integer({ min: NOW_MS - 1e7, max: NOW_MS + 1e11 });
    fc.assert(
      fc.property(fc.array(ms, { maxLength: 30 }), (stamps) => {
        let last: string | null = null;
        for (const stamp of stamps) {
          const ordered = orderAt(stampAt(stamp), DEVICE, last, NOW_MS);
          if (last) expect(ordered > last).toBe(true);
          expect(parseStamp(ordered)!.ms).toBeLessThanOrEqual(NOW_MS + 300_000);
          last = ordered;
        }
      }),
    );
  });
});
