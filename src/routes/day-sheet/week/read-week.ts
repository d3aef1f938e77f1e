import { hoursLines, sumHours, totalMinutes, type HoursLine } from '#shared/entry/sums.ts';
import type { HoursKind } from '#shared/entry/hours.ts';
import { addDays, type Day } from '#shared/sync/day.ts';
import type { Bung } from '#src/components/bung-mark.tsx';
import type { View } from '#src/replica/view.ts';
import { boatWords } from '#src/words/where.ts';
import { readKinds } from '#src/routes/day-sheet/read-boats.ts';
import { markOf, peopleOf } from '#src/routes/day-sheet/read-entry.ts';
import { readMissing, usualMinutes, type MissingOfPerson } from '#src/routes/day-sheet/read-missing.ts';

/** One person's day. */
export interface WeekCell {
  day: Day;
  minutes: number;
  /** logged something, with hours or without */
  hasEntries: boolean;
  /** what of the day is not as it should be */
  mark: Extract<Bung, 'held' | 'loose'> | null;
  /** less than the shop's day, on a day that is over */
  isShort: boolean;
}

interface WeekRow {
  id: string;
  name: string;
  minutes: number;
}

export interface Week {
  /** Monday to Sunday */
  days: Day[];
  today: Day;
  people: (WeekRow & { cells: WeekCell[] })[];
  boats: (WeekRow & { byDay: number[] })[];
  kinds: { kind: HoursKind | null; minutes: number }[];
  byDay: number[];
  minutes: number;
  missing: MissingOfPerson[];
}

/** A week at a glance: people by days and boats by days, out of the same figures, so that every cut has one total. */
export function readWeek(view: View, day: Day): Week {
  const days = daysOfWeek(day);
  const entries = view.all('entry').filter(({ workDate }) => days.includes(workDate));
  const lines = hoursLines(entries);
  return {
    days,
    today: view.today,
    people: readPeople(view, days, lines),
    boats: readBoats(view, days, lines),
    kinds: readKinds(lines),
    byDay: byDay(days, lines),
    minutes: totalMinutes(lines),
    missing: readMissing(
      view,
      days.filter((one) => one <= view.today),
    ),
  };
}

/** Monday to Sunday around a day, as ISO 8601 has it. */
export function daysOfWeek(day: Day): Day[] {
  const sinceMonday = (new Date(day).getUTCDay() + 6) % 7;
  return Array.from({ length: 7 }, (_, index) => addDays(day, index - sinceMonday));
}

function readPeople(view: View, days: Day[], lines: HoursLine[]): Week['people'] {
  const sums = sumHours(lines, 'person');
  const marks = readMarks(view, days);
  return view
    .all('person')
    .map((person) => {
      const own = lines.filter(({ personId }) => personId === person.id);
      const cells = days.map((day): WeekCell => {
        const minutes = totalMinutes(own.filter((line) => line.day === day));
        const key = `${person.id} ${day}`;
        return {
          day,
          minutes,
          hasEntries: marks.has(key),
          mark: marks.get(key) ?? null,
          isShort: day < view.today && minutes < usualMinutes(view, person, day),
        };
      });
      const isExpected = days.some((day) => usualMinutes(view, person, day) > 0);
      const { id, name } = person;
      return { id, name, minutes: sums.get(id) ?? 0, cells, isExpected };
    })
    .filter(({ cells, isExpected }) => isExpected || cells.some(({ hasEntries }) => hasEntries))
    .sort((a, b) => a.name.localeCompare(b.name))
    .map(({ isExpected: _isExpected, ...row }) => row);
}

/** By person and day, for whom an entry stands: its worst mark, null where all is sent. */
function readMarks(view: View, days: Day[]): Map<string, WeekCell['mark']> {
  const looseIds = new Set(view.all('looseEnd').map((end) => end.rowId));
  const marks = new Map<string, WeekCell['mark']>();
  for (const entry of view.all('entry')) {
    const mark = markOf(view, entry, looseIds);
    if (!days.includes(entry.workDate) || mark === 'struck') continue;
    for (const personId of peopleOf(entry)) {
      const key = `${personId} ${entry.workDate}`;
      const own = mark === 'loose' || mark === 'held' ? mark : null;
      marks.set(key, marks.get(key) === 'loose' ? 'loose' : (own ?? marks.get(key) ?? null));
    }
  }
  return marks;
}

function readBoats(view: View, days: Day[], lines: HoursLine[]): Week['boats'] {
  return [...sumHours(lines, 'boat')]
    .map(([id, minutes]) => ({
      id,
      name: boatWords(view, id),
      minutes,
      byDay: byDay(
        days,
        lines.filter(({ boatId }) => boatId === id),
      ),
    }))
    .sort((a, b) => b.minutes - a.minutes || a.name.localeCompare(b.name));
}

function byDay(days: Day[], lines: HoursLine[]): number[] {
  const sums = sumHours(lines, 'day');
  return days.map((day) => sums.get(day) ?? 0);
}
