import type { HoursGiven, HoursKind } from '#shared/entry/hours.ts';
import type { DaySheet } from './read-day-sheet.ts';

/** The kinds of one entry's hours to be set at one go. */
export interface KindsOfEntry {
  entryId: string;
  hours: HoursGiven;
}

export interface KindsToSet {
  /** figures whose kind somebody proposed */
  proposedCount: number;
  /** figures without a kind */
  unsetCount: number;
  proposed: KindsOfEntry[];
  unset: (kind: HoursKind) => KindsOfEntry[];
}

/** What is left to do about the kinds of a day's hours. */
export function readKindsToSet(sheet: DaySheet): KindsToSet {
  const figures = sheet.people.flatMap((person) =>
    person.entries.flatMap(({ id, figure, struck }) =>
      figure && figure.minutes > 0 && !struck ? [{ entryId: id, ...figure }] : [],
    ),
  );
  const proposed = figures.filter((figure) => figure.kind !== null && figure.proposed);
  const unset = figures.filter((figure) => figure.kind === null);
  return {
    proposedCount: proposed.length,
    unsetCount: unset.length,
    proposed: byEntry(
      proposed.map(({ entryId, personId, minutes, kind }) => ({ entryId, personId, minutes, kind })),
    ),
    unset: (kind) =>
      byEntry(unset.map(({ entryId, personId, minutes }) => ({ entryId, personId, minutes, kind }))),
  };
}

function byEntry(figures: (HoursGiven[number] & { entryId: string })[]): KindsOfEntry[] {
  const entries = new Map<string, HoursGiven>();
  for (const { entryId, ...figure } of figures)
    entries.set(entryId, [...(entries.get(entryId) ?? []), figure]);
  return [...entries].map(([entryId, hours]) => ({ entryId, hours }));
}
