import { describe, expect, test } from 'vitest';
import { loadTemplate } from '#shared/trade/load.ts';
import { readWhich } from '#src/routes/order-of-work/which-ones.ts';
import { NEW_WORK, planOf, readOutlook } from '#src/routes/order-of-work/work-draft.ts';

describe('which ribs are to be made', () => {
  test.each([
    ['', '', []],
    ['3', '', [{}, {}, {}]],
    [
      '',
      '4 port, 7-9 Starboard',
      [{ number: 4, side: 'port' }, ...[7, 8, 9].map((number) => ({ number, side: 'starboard' }))],
    ],
    ['2', '12', [{ number: 12 }, {}]],
    ['0', '', []],
  ])('%j, %j', (count, which, ones) => {
    expect(readWhich({ count, which })).toEqual(ones);
  });

  test.each([
    ['a few', '', 'Write how many in figures.'],
    ['-2', '', 'Write how many in figures.'],
    ['', 'the cracked ones', 'Write the numbers like 4 port, 7-9 starboard.'],
    ['', '9-7', 'Write the numbers like 4 port, 7-9 starboard.'],
    ['1', '4, 5', '2 are named, and 1 counted.'],
    ['61', '', 'At most 60 at once.'],
    ['', '1-40, 41-80', 'At most 60 at once.'],
  ])('%j, %j is asked about', (count, which, problem) => {
    expect(readWhich({ count, which })).toEqual({ problem });
  });
});

test('what a list comes to is told before it is made', async () => {
  const template = await loadTemplate('painted_lapstrake');
  const draft = { ...NEW_WORK, ribs: { count: '12', which: '' }, planks: { count: '2', which: '' } };
  const none = readOutlook(template, planOf(NEW_WORK, {})!);
  const some = readOutlook(template, planOf(draft, { lengthMm: 6096 })!);
  expect(some.stages).toBe(11);
  expect(some.tasks - none.tasks).toBe(12 * 2 + 2 * 2);
  expect((some.minutes - none.minutes) / 60).toBe(12 * (2.5 + 2) + 2 * (9 + 1) + 8);
  expect(planOf({ ...draft, ribs: { count: 'x', which: '' } }, {})).toBeNull();
});
