import { z } from 'zod';

/** A calendar day in the shop's time zone, `YYYY-MM-DD`. */
export type Day = string;

// PostgreSQL's dates have no year 0
export const daySchema = z.iso.date().refine((day) => day >= '0001-01-01', 'a day from year 1 on');

const formats = new Map<string, Intl.DateTimeFormat>();

function formatFor(timeZone: string): Intl.DateTimeFormat {
  let format = formats.get(timeZone);
  if (!format) {
    // Canadian English writes a date as ISO 8601 does
    format = new Intl.DateTimeFormat('en-CA', { timeZone, year: 'numeric', month: '2-digit', day: '2-digit' });
    formats.set(timeZone, format);
  }
  return format;
}

/** The day it is in `timeZone` at `ms` (milliseconds since 1970, UTC). Throws a RangeError for an unknown zone. */
export function dayAt(ms: number, timeZone: string): Day {
  return formatFor(timeZone).format(ms);
}

/** The day `count` days after `day` (before, where negative). */
export function addDays(day: Day, count: number): Day {
  const [year, month, date] = day.split('-').map(Number) as [number, number, number];
  return new Date(Date.UTC(year, month - 1, date + count)).toISOString().slice(0, 10);
}

/** How many days `to` lies after `from`. */
export function daysBetween(from: Day, to: Day): number {
  return Math.round((Date.parse(to) - Date.parse(from)) / 86_400_000);
}
