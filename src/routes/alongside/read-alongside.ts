import type { EntryRow } from '#shared/entry/entry.ts';
import { addDays, daysBetween, type Day } from '#shared/sync/day.ts';
import type { View } from '#src/replica/view.ts';
import { readEntry, type EntryLine } from '#src/routes/alongside/read-entry-line.ts';
import type { Where } from '#src/routes/alongside/read-boats.ts';
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
  entries: EntryLine[];
  /** the days without an entry between this day and the next older one */
  gap: Gap | null;
}

export interface AlongsideLine {
  boatName: string;
  stageName: string | null;
  days: DayOnLine[];
  /** days with entries that are older than those shown */
  olderDays: number;
}

const DAYS_NAMED_MAX = 3;

/** A boat's days, newest first: today always, then the newest `daysMax` days that have entries. Null without the boat. */
export function readAlongside(view: View, where: Where, daysMax: number): AlongsideLine | null {
  const boat = view.find('boat', where.boatId);
  if (!boat) return null;
  const byDay = entriesByDay(view, where.boatId);
  const days = [...byDay.keys()]
    .filter((day) => day !== view.today)
    .sort()
    .reverse();
  const shown = [view.today, ...days.slice(0, daysMax)].sort().reverse();
  return {
    boatName: boat.name,
    stageName: where.stageId ? (view.find('stage', where.stageId)?.name ?? null) : null,
    days: shown.map((day, index) => ({
      day,
      dayOfStay: dayOfStay(boat.arrivedOn, day),
      date: dayWords(day, view.today),
      isToday: day === view.today,
      ...readDay(view, byDay.get(day) ?? [], where),
      gap: readGap(day, shown[index + 1]),
    })),
    olderDays: Math.max(days.length - daysMax, 0),
  };
}

function entriesByDay(view: View, boatId: string): Map<Day, EntryRow[]> {
  const byDay = new Map<Day, EntryRow[]>();
  for (const entry of view.all('entry')) {
    if (entry.boatId !== boatId) continue;
    const known = byDay.get(entry.workDate);
    if (known) known.push(entry);
    else byDay.set(entry.workDate, [entry]);
  }
  return byDay;
}

function readDay(view: View, rows: EntryRow[], where: Where) {
  const standing = rows.filter((row) => !row.struck).flatMap((row) => row.hours);
  return {
    minutes: standing.reduce((sum, figure) => sum + figure.minutes, 0),
    entries: [...rows].sort(byNewest).map((row) => readEntry(view, row, where.stageId)),
  };
}

function byNewest(a: EntryRow, b: EntryRow): number {
  if (a.writtenAt !== b.writtenAt) return a.writtenAt < b.writtenAt ? 1 : -1;
  return a.id < b.id ? 1 : -1;
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
