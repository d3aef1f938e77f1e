import { expect, test } from 'vitest';
import { isUuidV7 } from '#shared/sync/ids.ts';
import { idMaker } from '#src/replica/new-id.ts';
import { Seeded } from '#tests/worlds/seeded.ts';

test('ids are UUIDv7s that sort as they were made, even where the clock stands still or goes back', () => {
  let nowMs = Date.parse('2026-06-01T08:00:00Z');
  const newId = idMaker(() => nowMs, new Seeded(1).bytes);
  const ids = Array.from({ length: 300 }, (_, index) => {
    if (index === 100) nowMs -= 60_000;
    if (index === 200) nowMs += 120_000;
    return newId();
  });
  expect(ids.every(isUuidV7)).toBe(true);
  expect([...ids].sort()).toEqual(ids);
  expect(new Set(ids).size).toBe(300);
});

test('a millisecond whose counter is full borrows the next', () => {
  const newId = idMaker(
    () => 1000,
    () => new Uint8Array(16).fill(0xff),
  );
  const [first] = [newId()];
  expect(isUuidV7(first)).toBe(true);
  expect(newId() > first!).toBe(true);
});
