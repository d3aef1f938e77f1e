import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { MINUTES_PER_ENTRY_MAX, formatHours, hoursText, parseHours } from '#shared/measure/hours.ts';

describe('hours as people write them', () => {
  it.each([
    ['2.5', 150],
    ['2,5', 150],
    ['.25', 15],
    ['2 1/2', 150],
    ['2-1/2', 150],
    ['2½', 150],
    ['½', 30],
    ['3/4', 45],
    ['2:30', 150],
    ['2 h 30', 150],
    ['2h30 min', 150],
    ['45 min', 45],
    ['45m', 45],
    ['8', 480],
    ['8 h', 480],
    ['8 hours', 480],
    [' 1 h ', 60],
    ['2.', 120],
    ['0', 0],
    ['1/3', 20],
    ['24', 1440],
  ])('reads %j as %i minutes', (text, minutes) => {
    expect(parseHours(text)).toBe(minutes);
  });

  it.each([
    '',
    ' ',
    'h',
    'two',
    '2:60',
    '2:5',
    '1/0',
    '3/2',
    '-1',
    '2 1/2 1/2',
    '1.2.3',
    '25',
    '24:01',
    '1e2',
    '.',
    '2 1',
    '0x10',
  ])('does not guess at %j', (text) => {
    expect(parseHours(text)).toBeNull();
  });

  it('reads back every figure that it writes', () => {
    fc.assert(
      fc.property(fc.integer({ min: 0, max: MINUTES_PER_ENTRY_MAX }), (minutes) => {
        expect(parseHours(hoursText(minutes))).toBe(minutes);
      }),
      { numRuns: 500 },
    );
  });
});

describe('hours as people read them', () => {
  it('tells whole hours from the fraction', () => {
    expect(formatHours(150)).toEqual({ whole: 2, fraction: '1/2', oddMinutes: 0 });
    expect(formatHours(45)).toEqual({ whole: 0, fraction: '3/4', oddMinutes: 0 });
    expect(formatHours(480)).toEqual({ whole: 8, fraction: null, oddMinutes: 0 });
  });

  it('never rounds minutes away that are no quarter hour', () => {
    expect(formatHours(137)).toEqual({ whole: 2, fraction: null, oddMinutes: 17 });
    expect(hoursText(137)).toBe('2:17');
    expect(hoursText(7)).toBe('0:07');
  });
});
