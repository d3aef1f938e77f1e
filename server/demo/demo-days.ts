import { addDays, dayAt, daysBetween, type Day } from '#shared/sync/day.ts';

const DAY_MS = 86_400_000;

function isWeekend(day: Day): boolean {
  const weekday = new Date(day).getUTCDay();
  return weekday === 0 || weekday === 6;
}

/** A working day counted back from the day that the demo is made, or a Saturday so many weeks back. */
export type When = number | `sat${number}`;

/** A Saturday counts as worked before this working day of its week and behind the one before. */
const SATURDAY_BEFORE = -3;
const WORKDAYS_A_WEEK = 5;

/** The working day on which whatever was said at `when` has been said. */
export function workdayAfter(when: When): number {
  if (typeof when === 'number') return when;
  return SATURDAY_BEFORE - WORKDAYS_A_WEEK * (Number(when.slice('sat'.length)) - 1);
}

/** The working days of a demo, counted from the day it is made: 0 is that day, or the Monday to come on a weekend. */
export class DemoDays {
  readonly today: Day;
  private readonly timeZone: string;
  private readonly clock: Intl.DateTimeFormat;
  // asking Intl takes most of the time that a demo takes
  private readonly dayOf = new Map<When, Day>();
  private readonly msOf = new Map<string, number>();

  constructor(nowMs: number, timeZone: string) {
    this.timeZone = timeZone;
    this.clock = new Intl.DateTimeFormat('en-GB', {
      timeZone,
      hour: '2-digit',
      minute: '2-digit',
      hourCycle: 'h23',
    });
    this.today = dayAt(nowMs, timeZone);
  }

  /** The day in the shop's time zone. */
  on(when: When): Day {
    const day = this.dayOf.get(when) ?? this.find(when);
    this.dayOf.set(when, day);
    return day;
  }

  /** The day `count` working days from today, or after it. */
  workday(count: number): Day {
    return this.on(count);
  }

  private find(when: When): Day {
    if (typeof when === 'number') return this.count(when);
    let day = this.on(workdayAfter(when));
    do day = addDays(day, -1);
    while (new Date(day).getUTCDay() !== 6);
    return day;
  }

  private count(count: number): Day {
    let day = this.today;
    while (isWeekend(day)) day = addDays(day, 1);
    for (let left = -count; left > 0; left -= 1) {
      do day = addDays(day, -1);
      while (isWeekend(day));
    }
    for (let left = count; left > 0; left -= 1) {
      do day = addDays(day, 1);
      while (isWeekend(day));
    }
    return day;
  }

  /** Milliseconds since 1970 of a time of day (`07:40`) in the shop's time zone. */
  at(day: Day, time: string): number {
    const ms = this.msOf.get(day + time) ?? this.compute(day, time);
    this.msOf.set(day + time, ms);
    return ms;
  }

  private compute(day: Day, time: string): number {
    const [hour, minute] = time.split(':').map(Number) as [number, number];
    const guess = Date.parse(`${day}T00:00:00Z`) + (hour * 60 + minute) * 60_000;
    return guess - this.offsetMs(guess - this.offsetMs(guess));
  }

  /** How far the zone's clock is ahead of UTC at `ms`. */
  private offsetMs(ms: number): number {
    const [hour, minute] = this.clock.format(ms).split(':').map(Number) as [number, number];
    const minutesLocal = hour * 60 + minute;
    const minutesUtc = Math.floor((ms % DAY_MS) / 60_000);
    const days = daysBetween(dayAt(ms, 'UTC'), dayAt(ms, this.timeZone));
    return (minutesLocal - minutesUtc) * 60_000 + days * DAY_MS;
  }
}
