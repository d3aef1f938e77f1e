import type { Day } from '../sync/day.ts';
import type { EntryRow } from './entry.ts';
import type { HoursKind } from './hours.ts';

/** One figure of one person in one entry: what every sum is made of. */
export interface HoursLine {
  entryId: string;
  boatId: string;
  stageId: string | null;
  day: Day;
  personId: string;
  kind: HoursKind | null;
  proposed: boolean;
  minutes: number;
}

/** By what hours are summed. */
export type Cut = 'person' | 'boat' | 'stage' | 'day' | 'kind';

const KEYS: Record<Cut, (line: HoursLine) => string> = {
  person: (line) => line.personId,
  boat: (line) => line.boatId,
  stage: (line) => line.stageId ?? NO_STAGE,
  day: (line) => line.day,
  kind: (line) => line.kind ?? NO_KIND,
};

/** The key of hours in an entry without a stage. */
export const NO_STAGE = '';
/** The key of hours whose kind nobody has said. */
export const NO_KIND = '';

/** The figures that count: every person's in every entry that is not struck, each entry once however often it is given. */
export function hoursLines(entries: readonly EntryRow[]): HoursLine[] {
  const once = new Map(entries.map((entry) => [entry.id, entry]));
  return [...once.values()].filter((entry) => entry.struck === null).flatMap(linesOf);
}

function linesOf({ id, boatId, stageId, workDate, hours }: EntryRow): HoursLine[] {
  return hours.map((figure) => ({ entryId: id, boatId, stageId, day: workDate, ...figure }));
}

export function totalMinutes(lines: readonly HoursLine[]): number {
  return lines.reduce((sum, line) => sum + line.minutes, 0);
}

/** Minutes by person, boat, stage, day or kind; the sums of every cut come to the same total. */
export function sumHours(lines: readonly HoursLine[], cut: Cut): Map<string, number> {
  const sums = new Map<string, number>();
  for (const line of lines) {
    const key = KEYS[cut](line);
    sums.set(key, (sums.get(key) ?? 0) + line.minutes);
  }
  return sums;
}
