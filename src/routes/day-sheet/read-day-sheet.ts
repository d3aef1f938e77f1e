import type { EntryRow } from '#shared/entry/entry.ts';
import { hoursLines, totalMinutes } from '#shared/entry/sums.ts';
import { addDays, type Day } from '#shared/sync/day.ts';
import { standingItems } from '#shared/sync/items.ts';
import type { View } from '#src/replica/view.ts';
import { dayWords } from '#src/words/day-words.ts';
import { readGaps } from '#src/words/heard.ts';
import { listWords } from '#src/words/name-words.ts';
import { boatWords } from '#src/words/where.ts';
import { whoWords } from '#src/words/who.ts';
import { readBoats, type BoatOnSheet } from './read-boats.ts';
import { peopleOf, readEntryLine, type EntryLine } from './read-entry.ts';
import { usualMinutes } from './read-missing.ts';
import { readNotes, type AloneOnSheet, type NotesOfDay } from './read-notes.ts';
import { readHeard, readNothing, type Heard, type Nothing } from './read-heard.ts';

export interface TickLine {
  key: string;
  title: string;
  boatName: string;
  /** 'twice: Wes and Rosa' */
  twice: string | null;
}

export interface PersonOnSheet {
  personId: string;
  name: string;
  isMe: boolean;
  minutes: number;
  /** what is expected of them that day, in minutes; 0 where nothing is */
  usualMinutes: number;
  entries: EntryLine[];
  /** noted or photographed by itself */
  alone: AloneOnSheet[];
  ticks: TickLine[];
  heard: Heard;
  /** set where nothing of this person's is about the day */
  nothing: Nothing | null;
  /** what a replaced device may have known of the day */
  gaps: string[];
}

export interface DaySheet {
  day: Day;
  isToday: boolean;
  minutes: number;
  /** people and boats that something was logged about */
  loggedCount: number;
  people: PersonOnSheet[];
  boats: BoatOnSheet[];
}

/** Everything about one day, by person and by boat. */
export function readDaySheet(view: View, day: Day): DaySheet {
  const entries = view
    .all('entry')
    .filter((entry) => entry.workDate === day)
    .sort(byWriting);
  const looseIds = new Set(view.all('looseEnd').map((end) => end.rowId));
  const notes = readNotes(view, day, entries, looseIds);
  const people = readPeople(view, day, entries, looseIds, notes);
  return {
    day,
    isToday: day === view.today,
    minutes: totalMinutes(hoursLines(entries)),
    loggedCount: people.filter((person) => !person.nothing).length,
    people,
    boats: readBoats(view, day, { entries, looseIds, notes }),
  };
}

function byWriting(a: EntryRow, b: EntryRow): number {
  if (a.writtenAt !== b.writtenAt) return a.writtenAt < b.writtenAt ? -1 : 1;
  return a.id < b.id ? -1 : 1;
}

function readPeople(
  view: View,
  day: Day,
  entries: EntryRow[],
  looseIds: ReadonlySet<string>,
  notes: NotesOfDay,
): PersonOnSheet[] {
  const ticks = ticksByPerson(view, day);
  const gaps = readGaps(view).filter((gap) => gap.fromDay <= day && day <= gap.toDay);
  const lines = hoursLines(entries);
  const everybody = view.all('person').map((person): PersonOnSheet & { isExpected: boolean } => {
    const { id, name, roles, leftAt } = person;
    const own = entries.filter((entry) => peopleOf(entry).includes(id));
    const alone = notes.alone(id);
    const ticked = ticks.get(id) ?? [];
    const hasNothing = own.length + ticked.length + alone.length === 0;
    return {
      personId: id,
      name,
      isMe: id === view.me.personId,
      minutes: totalMinutes(lines.filter((line) => line.personId === id)),
      usualMinutes: usualMinutes(view, person, day),
      entries: own.map((entry) => readEntryLine(view, entry, id, looseIds, notes)),
      alone,
      ticks: ticked,
      heard: readHeard(view, id),
      nothing: hasNothing ? readNothing(view, id, day) : null,
      gaps: gaps.filter((gap) => gap.personIds.includes(id)).map((gap) => gap.words),
      isExpected: roles.includes('crew') && leftAt === null,
    };
  });
  return everybody
    .filter((person) => !person.nothing || person.isExpected)
    .sort((a, b) => Number(a.nothing !== null) - Number(b.nothing !== null) || a.name.localeCompare(b.name));
}

function ticksByPerson(view: View, day: Day): Map<string, TickLine[]> {
  const ticks = new Map<string, TickLine[]>();
  for (const task of view.all('task')) {
    if (task.struck) continue;
    const standing = standingItems(task.marks);
    for (const mark of standing.filter((one) => one.workDate === day)) {
      const names = [...new Set(standing.map((one) => one.personId))].map((id) => whoWords(view, id));
      const twice = task.twice ? `twice: ${listWords(names)}` : null;
      const line = { key: mark.id, title: task.title, boatName: boatWords(view, task.boatId), twice };
      ticks.set(mark.personId, [...(ticks.get(mark.personId) ?? []), line]);
    }
  }
  return ticks;
}

/** The days beside one: their paths and words for the keys. */
export function readNeighbours(day: Day): {
  previous: Day;
  next: Day;
  previousWords: string;
  nextWords: string;
} {
  const [previous, next] = [addDays(day, -1), addDays(day, 1)];
  return { previous, next, previousWords: dayWords(previous, day), nextWords: dayWords(next, day) };
}
