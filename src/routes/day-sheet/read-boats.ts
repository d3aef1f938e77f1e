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

export interface BriefEntry {
  id: string;
  mark: Bung;
  text: string;
  author: string;
  people: { personId: string; name: string; minutes: number }[];
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
}

/** A day's entries under their boats and stages; a boat stands here where something was logged, ticked or finished on her. */
export function readBoats(
  view: View,
  day: Day,
  entries: EntryRow[],
  looseIds: ReadonlySet<string>,
): BoatOnSheet[] {
  return view
    .all('boat')
    .map((boat): BoatOnSheet => {
      const own = entries.filter((entry) => entry.boatId === boat.id);
      return {
        boatId: boat.id,
        name: boat.name,
        dayOfStay: boat.arrivedOn && boat.arrivedOn <= day ? daysBetween(boat.arrivedOn, day) + 1 : null,
        minutes: totalMinutes(hoursLines(own)),
        stages: readStages(view, own, looseIds),
        ticks: ticksOn(view, boat.id, day),
        finished: finishedOn(view, boat.id, day),
      };
    })
    .filter((boat) => boat.stages.length + boat.ticks.length + boat.finished.length > 0)
    .sort((a, b) => b.minutes - a.minutes || a.name.localeCompare(b.name));
}

function readStages(view: View, entries: EntryRow[], looseIds: ReadonlySet<string>): StageOnSheet[] {
  const stageIds = [...new Set(entries.map((entry) => entry.stageId))];
  return stageIds.map((stageId) => {
    const own = entries.filter((entry) => entry.stageId === stageId);
    const lines = hoursLines(own);
    return {
      stageId,
      name: stageWords(view, stageId),
      minutes: totalMinutes(lines),
      kinds: readKinds(lines),
      entries: own.map((entry) => readBrief(view, entry, looseIds)),
    };
  });
}

/** Minutes by kind, the most first. */
export function readKinds(lines: HoursLine[]): { kind: HoursKind | null; minutes: number }[] {
  return [...sumHours(lines, 'kind')]
    .map(([kind, minutes]) => ({ kind: kind === '' ? null : (kind as HoursKind), minutes }))
    .sort((a, b) => b.minutes - a.minutes);
}

function readBrief(view: View, entry: EntryRow, looseIds: ReadonlySet<string>): BriefEntry {
  return {
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
