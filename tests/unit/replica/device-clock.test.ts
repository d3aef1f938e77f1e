import { describe, expect, test } from 'vitest';
import { formatStamp, stampMs } from '#shared/sync/stamp.ts';
import { clockAfterAnswer, clockAheadMs, latestBelieved, measureOffset } from '#src/replica/device-clock.ts';
import { entryData, openShop, openTab } from '#tests/worlds/signed-in-phone.ts';

const MINUTE_MS = 60_000;
const YEAR_MS = 365 * 24 * 60 * MINUTE_MS;
const DEVICE_ID = '019e8000-0000-7000-8000-000000000001';

describe('the clock of a device', () => {
  test('is measured against the middle of the round trip', () => {
    expect(
      measureOffset(
        '2026-06-01T08:00:10.000Z',
        Date.parse('2026-06-01T08:00:00Z'),
        Date.parse('2026-06-01T08:00:04Z'),
      ),
    ).toBe(8000);
    expect(measureOffset('yesterday', 0, 0)).toBeNull();
  });

  test('is told of only when it is wrong by more than two minutes', () => {
    expect(clockAheadMs(2 * MINUTE_MS)).toBeNull();
    expect(clockAheadMs(-2 * MINUTE_MS - 1)).toBe(2 * MINUTE_MS + 1);
    expect(clockAheadMs(YEAR_MS)).toBe(-YEAR_MS);
  });

  test('does not hear a stamp from further ahead than the server believes', () => {
    const near = formatStamp({ ms: 1000 + 5 * MINUTE_MS, counter: 0 }, DEVICE_ID);
    const wild = formatStamp({ ms: 1001 + 5 * MINUTE_MS, counter: 0 }, DEVICE_ID);
    expect(latestBelieved([near, wild], 1000)).toBe(near);
    expect(latestBelieved([wild], 1000)).toBeNull();
  });

  test('comes after what it has heard', () => {
    expect(
      clockAfterAnswer({ ms: 5, counter: 1 }, formatStamp({ ms: 9, counter: 3 }, DEVICE_ID), 7, false),
    ).toEqual({ ms: 9, counter: 4 });
  });

  test('that had run ahead comes back once nothing with its stamps is held', () => {
    const ahead = { ms: YEAR_MS, counter: 7 };
    expect(clockAfterAnswer(ahead, null, 1000, true)).toEqual(ahead);
    expect(clockAfterAnswer(ahead, null, 1000, false)).toBeNull();
  });
});

test.each([
  ['a year ahead', YEAR_MS],
  ['a day behind', -24 * 60 * MINUTE_MS],
])('a phone that is %s says so, and goes on by the server’s time', async (_name, aheadMs) => {
  const shop = await openShop();
  const phone = shop.newPhone();
  phone.aheadMs = aheadMs;
  const { replica, power } = await openTab(phone, 'Ned');
  expect(replica.syncState().clockAheadMs).toBe(aheadMs);
  expect(replica.view().today).toBe('2026-06-01');
  shop.clock.advance(MINUTE_MS);
  const op = await replica.hold('entry.write', entryData(replica.newId(), shop));
  expect(Math.abs(stampMs(op.at) - shop.clock.now())).toBeLessThan(1000);
  power.cut();
  expect((await openTab(phone)).replica.syncState().clockAheadMs).toBe(aheadMs);
});

test('a phone that went a year ahead without signal keeps the order of its work, and comes back', async () => {
  const shop = await openShop();
  const phone = shop.newPhone();
  const { replica } = await openTab(phone, 'Ned');
  phone.aheadMs = YEAR_MS;
  const held = [];
  for (let count = 0; count < 3; count += 1)
    held.push(await replica.hold('entry.write', entryData(replica.newId(), shop)));
  await replica.syncNow();
  const orderedAts = held.map(({ id }) => shop.server.store.ops.get(id)!.orderedAt);
  expect(orderedAts).toEqual([...orderedAts].sort());
  expect(orderedAts.every((stamp) => stampMs(stamp) <= shop.clock.now())).toBe(true);
  const next = await replica.hold('entry.write', entryData(replica.newId(), shop));
  expect(Math.abs(stampMs(next.at) - shop.clock.now())).toBeLessThan(1000);
});
