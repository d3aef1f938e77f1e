import { describe, expect, it } from 'vitest';
import { addDays, dayAt, daySchema, daysBetween } from '#shared/sync/day.ts';

// ISO 8601 calendar dates of the Gregorian calendar; offsets and changes of clocks by the IANA time zone database

describe('a day', () => {
  it.each(['2026-06-01', '2024-02-29', '2000-02-29', '1999-12-31'])('is read from %s', (day) => {
    expect(daySchema.safeParse(day).success).toBe(true);
  });

  it.each([
    '2026-02-29',
    '1900-02-29',
    '2026-13-01',
    '2026-04-31',
    '2026-6-1',
    '20260601',
    '2026-06-01T00:00:00Z',
    '',
  ])('is not read from %j', (day) => expect(daySchema.safeParse(day).success).toBe(false));

  it.each([
    ['2026-06-01T22:59:59Z', 'Europe/Dublin', '2026-06-01'],
    ['2026-06-01T23:00:00Z', 'Europe/Dublin', '2026-06-02'],
    ['2026-12-01T23:59:59Z', 'Europe/Dublin', '2026-12-01'],
    ['2026-01-01T04:59:59Z', 'America/New_York', '2025-12-31'],
    ['2026-01-01T05:00:00Z', 'America/New_York', '2026-01-01'],
    // clocks go forward at 02:00 on 8 March 2026 and back at 02:00 on 1 November 2026
    ['2026-03-09T03:59:59Z', 'America/New_York', '2026-03-08'],
    ['2026-11-02T04:59:59Z', 'America/New_York', '2026-11-01'],
    ['2026-05-31T09:59:59Z', 'Pacific/Kiritimati', '2026-05-31'],
    ['2026-05-31T10:00:00Z', 'Pacific/Kiritimati', '2026-06-01'],
    ['2026-06-01T18:29:59Z', 'Asia/Kolkata', '2026-06-01'],
    ['2026-06-01T18:30:00Z', 'Asia/Kolkata', '2026-06-02'],
  ])('at %s in %s is %s', (time, zone, day) => {
    expect(dayAt(Date.parse(time), zone)).toBe(day);
  });

  it('is counted on over months, leap days and changes of clocks', () => {
    expect(addDays('2024-02-28', 1)).toBe('2024-02-29');
    expect(addDays('2026-02-28', 1)).toBe('2026-03-01');
    expect(addDays('2026-01-01', -1)).toBe('2025-12-31');
    expect(addDays('2026-03-07', 2)).toBe('2026-03-09');
    expect(daysBetween('2026-03-07', '2026-03-09')).toBe(2);
    expect(daysBetween('2026-03-09', '2026-03-07')).toBe(-2);
    expect(daysBetween('2000-01-01', '2100-01-01')).toBe(36_525);
  });
});
