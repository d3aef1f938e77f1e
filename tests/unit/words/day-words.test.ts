import { describe, expect, test } from 'vitest';
import {
  counted,
  dayWords,
  isWeekStart,
  momentWords,
  nearDayWords,
  spanWords,
  timeWords,
} from '#src/words/day-words.ts';

const TODAY = '2026-09-02';

describe('a day in words', () => {
  test('is weekday, figure and month, with the year where it is another', () => {
    expect(dayWords('2026-08-31', TODAY)).toBe('Mon 31 Aug');
    expect(dayWords('2025-12-31', TODAY)).toBe('Wed 31 Dec 2025');
  });

  test('is today or yesterday where it is', () => {
    expect(nearDayWords(TODAY, TODAY)).toBe('today');
    expect(nearDayWords('2026-09-01', TODAY)).toBe('yesterday');
    expect(nearDayWords('2026-08-28', TODAY)).toBe('Fri 28 Aug');
  });

  test('starts a week on Monday', () => {
    expect(isWeekStart('2026-08-31')).toBe(true);
    expect(isWeekStart('2026-08-30')).toBe(false);
  });
});

describe('a moment in words', () => {
  test('is told in the time zone of the shop', () => {
    expect(timeWords('2026-09-02T11:40:00.000Z', 'America/New_York')).toBe('07:40');
    expect(timeWords('2026-09-02T22:05:00.000Z', 'Europe/Berlin')).toBe('00:05');
  });

  test('is a time today, a weekday within the week, a date before that', () => {
    const zone = 'America/New_York';
    expect(momentWords('2026-09-02T18:05:00.000Z', zone, TODAY)).toBe('14:05');
    expect(momentWords('2026-08-28T11:35:00.000Z', zone, TODAY)).toBe('Fri 07:35');
    expect(momentWords('2026-08-20T11:35:00.000Z', zone, TODAY)).toBe('Thu 20 Aug 07:35');
    expect(momentWords('2027-09-02T11:35:00.000Z', zone, TODAY)).toBe('Thu 2 Sep 2027 07:35');
  });

  test('lies a span away, told in its largest unit', () => {
    expect(spanWords(20_000)).toBe('under a minute');
    expect(spanWords(60_000)).toBe('1 minute');
    expect(spanWords(3 * 3_600_000 + 5)).toBe('3 hours');
    expect(spanWords(47 * 3_600_000)).toBe('47 hours');
    expect(spanWords(365 * 24 * 3_600_000)).toBe('365 days');
  });
});

test('a count has its noun', () => {
  expect(counted(1, 'entry', 'entries')).toBe('1 entry');
  expect(counted(3, 'entry', 'entries')).toBe('3 entries');
});
