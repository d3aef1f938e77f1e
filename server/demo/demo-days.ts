import { addDays, dayAt, daysBetween, type Day } from '#shared/sync/day.ts';

const DAY_MS = 86_400_000;

function isWeekend(day: Day): boolean {
  const weekday = new Date(day).getUTCDay();
  return weekday === 0 || weekday === 6;
}

/** The working days of a demo, counted from the day it is made: 0 is that day, or the Monday to come on a weekend. */
export class DemoDays {
  readonly today: Day;
  private readonly timeZone: string;
  private readonly clock: Intl.DateTimeFormat;

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

  /** The day `count` working days from today; days to come are today's business alone. */
  workday(count: number): Day {
    let day = this.today;
    while (isWeekend(day)) day = addDays(day, 1);
    for (let left = -count; left > 0; left -= 1) {
      do day = addDays(day, -1);
      while (isWeekend(day));
    }
    return day;
  }

  /** Milliseconds since 1970 of a time of day (`07:40`) in the shop's time zone. */
  at(day: Day, time: string): number {
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
