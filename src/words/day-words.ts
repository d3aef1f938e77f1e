import { addDays, dayAt, daysBetween, type Day } from '#shared/sync/day.ts';

const WEEKDAYS = ['Sun', 'Mon', 'Tue', 'Wed', 'Thu', 'Fri', 'Sat'] as const;
const MONTHS = ['Jan', 'Feb', 'Mar', 'Apr', 'May', 'Jun', 'Jul', 'Aug', 'Sep', 'Oct', 'Nov', 'Dec'] as const;
const LONG_WEEKDAYS = ['Sunday', 'Monday', 'Tuesday', 'Wednesday', 'Thursday', 'Friday', 'Saturday'] as const;
const LONG_MONTHS = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
] as const;
const WEEK_DAYS = 7;
const MINUTE_MS = 60_000;
const HOUR_MS = 60 * MINUTE_MS;
const DAY_MS = 24 * HOUR_MS;

const timeFormats = new Map<string, Intl.DateTimeFormat>();

/** 'Mon'. */
export function weekdayWords(day: Day): string {
  return WEEKDAYS[new Date(day).getUTCDay()]!;
}

/** Whether a week starts with this day: Monday, as ISO 8601 has it. */
export function isWeekStart(day: Day): boolean {
  return new Date(day).getUTCDay() === 1;
}

/** 'Mon 31 Aug'; with the year where it is not today's. */
export function dayWords(day: Day, today: Day): string {
  const date = new Date(day);
  const year = day.slice(0, 4) === today.slice(0, 4) ? '' : ` ${day.slice(0, 4)}`;
  return `${weekdayWords(day)} ${date.getUTCDate()} ${MONTHS[date.getUTCMonth()]}${year}`;
}

/** 'Monday 31 August'; with the year where it is not today's. */
export function longDayWords(day: Day, today: Day): string {
  const year = day.slice(0, 4) === today.slice(0, 4) ? '' : ` ${day.slice(0, 4)}`;
  const date = new Date(day);
  return `${LONG_WEEKDAYS[date.getUTCDay()]} ${date.getUTCDate()} ${LONG_MONTHS[date.getUTCMonth()]}${year}`;
}

/** 'August 2026', of a day in it. */
export function monthWords(day: Day): string {
  return `${LONG_MONTHS[new Date(day).getUTCMonth()]} ${day.slice(0, 4)}`;
}

/** 'today', 'yesterday', or the day written out. */
export function nearDayWords(day: Day, today: Day): string {
  if (day === today) return 'today';
  if (day === addDays(today, -1)) return 'yesterday';
  return dayWords(day, today);
}

/** '07:40', in the shop's time zone. */
export function timeWords(at: string, timeZone: string): string {
  let format = timeFormats.get(timeZone);
  if (!format) {
    format = new Intl.DateTimeFormat('en-GB', {
      timeZone,
      hour: '2-digit',
      minute: '2-digit',
      hourCycle: 'h23',
    });
    timeFormats.set(timeZone, format);
  }
  return format.format(Date.parse(at));
}

/** A time as near as it needs: '07:40' today, 'Tue 07:40' within the week, else 'Tue 8 Sep 07:40'. */
export function momentWords(at: string, timeZone: string, today: Day): string {
  const day = dayAt(Date.parse(at), timeZone);
  const time = timeWords(at, timeZone);
  if (day === today) return time;
  const ago = daysBetween(day, today);
  return ago > 0 && ago < WEEK_DAYS ? `${weekdayWords(day)} ${time}` : `${dayWords(day, today)} ${time}`;
}

/** How long something took or has lasted, in its largest unit: '12 minutes', '3 hours', '2 days'. */
export function spanWords(ms: number): string {
  if (ms < MINUTE_MS) return 'under a minute';
  if (ms < HOUR_MS) return counted(Math.floor(ms / MINUTE_MS), 'minute');
  if (ms < 2 * DAY_MS) return counted(Math.floor(ms / HOUR_MS), 'hour');
  return counted(Math.floor(ms / DAY_MS), 'day');
}

/** '1 entry', '3 entries'. */
export function counted(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}
