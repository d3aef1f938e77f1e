import type { EntryRow } from '#shared/entry/entry.ts';
import type { HoursKind } from '#shared/entry/hours.ts';
import { hoursLines, sumHours, totalMinutes, type HoursLine } from '#shared/entry/sums.ts';
import { daysBetween, type Day } from '#shared/sync/day.ts';
import { standingItems } from '#shared/sync/items.ts';
import type { Bung } from '#src/components/bung-mark.tsx';
import type { View } from '#src/replica/view.ts';
import { stageWords } from '#src/words/where.ts';
import { whoWords } from '#src/words/who.ts';
import { markOf } from './read-entry.ts';
import type { NoteOnSheet, NotesOfDay } from './read-notes.ts';

export interface BriefEntry {
  id: string;
  mark: Bung;
  text: string;
  author: string;
  people: { personId: string; name: string; minutes: number }[];
  /** 'Found: rot, floor 7': what came with it, and what was found sound */
  found: string[];
  photoCount: number;
}

export interface StageOnSheet {
  stageId: string | null;
  name: string;
  minutes: number;
  kinds: { kind: HoursKind | null; minutes: number }[];
  entries: BriefEntry[];
}

export interface BoatOnSheet {
  boatId: string;
  name: string;
  /** day 1 is her arrival; null where that is not known */
  dayOfStay: number | null;
  minutes: number;
  stages: StageOnSheet[];
  /** 'Scarf the stringer (Rosa)' */
  ticks: string[];
  /** stages that were marked finished that day */
  finished: string[];
  /** 'Found: rot, floor 7 (Wes)': noted by itself */
  found: string[];
  /** photographs that were taken by themselves */
  photoCount: number;
}

/** What the day's cut by boat is made of. */
interface OfDay {
  entries: EntryRow[];
  looseIds: ReadonlySet<string>;
  notes: NotesOfDay;
}

/** A day's entries under their boats and stages; a boat stands here where something was logged, ticked or finished on her. */
export function readBoats(view: View, day: Day, ofDay: OfDay): BoatOnSheet[] {
  const { entries, notes } = ofDay;
  return view
    .all('boat')
    .map((boat): BoatOnSheet => {
      const own = entries.filter((entry) => entry.boatId === boat.id);
      return {
        boatId: boat.id,
        name: boat.name,
        dayOfStay: boat.arrivedOn && boat.arrivedOn <= day ? daysBetween(boat.arrivedOn, day) + 1 : null,
        minutes: totalMinutes(hoursLines(own)),
        stages: readStages(view, own, ofDay),
        ticks: ticksOn(view, boat.id, day),
        finished: finishedOn(view, boat.id, day),
        ...aloneOn(view, boat.id, notes),
      };
    })
    .filter((boat) => hasSomething(boat))
    .sort((a, b) => b.minutes - a.minutes || a.name.localeCompare(b.name));
}

function hasSomething({ stages, ticks, finished, found, photoCount }: BoatOnSheet): boolean {
  return stages.length + ticks.length + finished.length + found.length + photoCount > 0;
}

function aloneOn(view: View, boatId: string, notes: NotesOfDay): Pick<BoatOnSheet, 'found' | 'photoCount'> {
  const alone = view
    .all('person')
    .flatMap(({ id, name }) => notes.alone(id).map((own) => ({ ...own, name })))
    .filter((own) => own.boatId === boatId);
  return {
    found: alone.flatMap((own) => standingTitles(own.notes).map((title) => `${title} (${own.name})`)),
    photoCount: alone.reduce((count, own) => count + photosIn(own), 0),
  };
}

function standingTitles(notes: NoteOnSheet[]): string[] {
  return notes.filter(({ struck }) => !struck).map(({ title }) => title);
}

function photosIn({ notes, photos }: { notes: NoteOnSheet[]; photos: unknown[] }): number {
  return notes.reduce((count, note) => count + note.photos.length, photos.length);
}

function readStages(view: View, entries: EntryRow[], ofDay: OfDay): StageOnSheet[] {
  const stageIds = [...new Set(entries.map((entry) => entry.stageId))];
  return stageIds.map((stageId) => {
    const own = entries.filter((entry) => entry.stageId === stageId);
    const lines = hoursLines(own);
    return {
      stageId,
      name: stageWords(view, stageId),
      minutes: totalMinutes(lines),
      kinds: readKinds(lines),
      entries: own.map((entry) => readBrief(view, entry, ofDay)),
    };
  });
}

/** Minutes by kind, the most first. */
export function readKinds(lines: HoursLine[]): { kind: HoursKind | null; minutes: number }[] {
  return [...sumHours(lines, 'kind')]
    .map(([kind, minutes]) => ({ kind: kind === '' ? null : (kind as HoursKind), minutes }))
    .sort((a, b) => b.minutes - a.minutes);
}

function readBrief(view: View, entry: EntryRow, { looseIds, notes }: OfDay): BriefEntry {
  const own = notes.ofEntry(entry.id);
  return {
    found: standingTitles(own.notes),
    photoCount: photosIn(own),
    id: entry.id,
    mark: markOf(view, entry, looseIds),
    text: entry.text,
    author: whoWords(view, entry.authorId),
    people: entry.hours.map(({ personId, minutes }) => ({
      personId,
      name: whoWords(view, personId),
      minutes,
    })),
  };
}

function ticksOn(view: View, boatId: string, day: Day): string[] {
  return view
    .all('task')
    .filter((task) => task.boatId === boatId && !task.struck)
    .flatMap((task) => {
      const marks = standingItems(task.marks).filter((mark) => mark.workDate === day);
      const names = [...new Set(marks.map((mark) => whoWords(view, mark.personId)))];
      return names.length > 0 ? [`${task.title} (${names.join(', ')}${task.twice ? ', twice' : ''})`] : [];
    });
}

function finishedOn(view: View, boatId: string, day: Day): string[] {
  return view
    .all('stage')
    .filter((stage) => stage.boatId === boatId && !stage.struck)
    .filter((stage) => standingItems(stage.marks).some((mark) => mark.workDate === day))
    .map((stage) => stage.name);
}
