import { addDays, daysBetween, type Day } from '#shared/sync/day.ts';
import type { View } from '#src/replica/view.ts';
import { readBoatRows, type DayRows } from '#src/routes/alongside/read-boat-rows.ts';
import type { Where } from '#src/routes/alongside/read-boats.ts';
import { readItems, type LineItem } from '#src/routes/alongside/read-line-items.ts';
import { readOwnDay, type OwnDay } from '#src/routes/alongside/read-own-day.ts';
import { counted, dayWords, isWeekStart, weekdayWords } from '#src/words/day-words.ts';
import { listWords } from '#src/words/name-words.ts';

export interface Gap {
  days: { isWeekStart: boolean }[];
  words: string;
}

export interface DayOnLine {
  day: Day;
  /** 1 is the day of her arrival; null before it, or where it is not known */
  dayOfStay: number | null;
  date: string;
  isToday: boolean;
  /** of what stands, in minutes */
  minutes: number;
  items: LineItem[];
  /** the days without anything between this day and the next older one */
  gap: Gap | null;
}

export interface AlongsideLine {
  boatName: string;
  stageName: string | null;
  days: DayOnLine[];
  /** what this person did on her today */
  own: OwnDay;
  /** days with something on them that are older than those shown */
  olderDays: number;
  /** the newest day shown is not today, since an earlier one was asked for */
  isEarlier: boolean;
}

const DAYS_NAMED_MAX = 3;

const NO_ROWS: DayRows = { entries: [], findings: [], sounds: [], photos: [], ticks: [] };

/**
 * A boat's days, newest first: today always, then the newest `daysMax` days that have something on them. With `upTo`,
 * the days from there back, without today. Null without the boat.
 */
export function readAlongside(
  view: View,
  where: Where,
  daysMax: number,
  upTo: Day | null = null,
): AlongsideLine | null {
  const boat = view.find('boat', where.boatId);
  if (!boat) return null;
  const rows = readBoatRows(view, where.boatId);
  const isEarlier = upTo !== null && upTo < view.today;
  const known = [...rows.days.keys()].filter((day) => day !== view.today && (!isEarlier || day <= upTo));
  const days = known.sort().reverse();
  const shown = (isEarlier ? days.slice(0, daysMax) : [view.today, ...days.slice(0, daysMax)])
    .sort()
    .reverse();
  return {
    boatName: boat.name,
    stageName: where.stageId ? (view.find('stage', where.stageId)?.name ?? null) : null,
    days: shown.map((day, index) => {
      const dayRows = rows.days.get(day) ?? NO_ROWS;
      return {
        day,
        dayOfStay: dayOfStay(boat.arrivedOn, day),
        date: dayWords(day, view.today),
        isToday: day === view.today,
        minutes: minutesOf(dayRows),
        items: readItems(view, rows, dayRows, where.stageId),
        gap: readGap(day, shown[index + 1]),
      };
    }),
    own: readOwnDay(view, rows),
    olderDays: Math.max(days.length - daysMax, 0),
    isEarlier,
  };
}

function minutesOf({ entries }: DayRows): number {
  const standing = entries.filter((row) => !row.struck).flatMap((row) => row.hours);
  return standing.reduce((sum, figure) => sum + figure.minutes, 0);
}

/** The day of a boat's stay, counted from 1 on the day of her arrival. */
export function dayOfStay(arrivedOn: Day | null | undefined, day: Day): number | null {
  if (!arrivedOn) return null;
  const ago = daysBetween(arrivedOn, day);
  return ago < 0 ? null : ago + 1;
}

function readGap(day: Day, older: Day | undefined): Gap | null {
  const count = older === undefined ? 0 : daysBetween(older, day) - 1;
  if (count < 1) return null;
  const days = Array.from({ length: count }, (_none, index) => addDays(day, -1 - index));
  return { days: days.map((each) => ({ isWeekStart: isWeekStart(each) })), words: gapWords(days) };
}

function gapWords(days: Day[]): string {
  if (days.length > DAYS_NAMED_MAX) return `${counted(days.length, 'day')} without an entry`;
  return `${listWords(days.toReversed().map(weekdayWords))}: no entry`;
}
