import type { EntryRow } from '#shared/entry/entry.ts';
import type { HoursValue } from '#shared/entry/hours-field.ts';
import { peopleInHours } from '#shared/entry/kinds.ts';
import type { HoursKind } from '#shared/entry/hours.ts';
import { STAGE_FIELD, differingStatements, statementsOf } from '#shared/sync/fields.ts';
import type { Statement } from '#shared/sync/row.ts';
import { stampTime } from '#shared/sync/stamp.ts';
import type { Bung } from '#src/components/bung-mark.tsx';
import type { View } from '#src/replica/view.ts';
import type { NoteOnSheet, NotesOfDay, PhotoOnSheet } from './read-notes.ts';
import { dayWords, momentWords } from '#src/words/day-words.ts';
import { boatWords, stageWords } from '#src/words/where.ts';
import { whoWords } from '#src/words/who.ts';

/** One person's figure in an entry. */
export interface Figure {
  personId: string;
  minutes: number;
  kind: HoursKind | null;
  proposed: boolean;
  /** every change of the minutes, the latest first */
  corrections: Correction[];
  /** other figures that somebody still stands by, in minutes */
  others: number[];
}

export interface Correction {
  beforeMinutes: number;
  afterMinutes: number;
  who: string;
  when: string;
  why: string | null;
}

/** An entry as it stands under one person. */
export interface EntryLine {
  id: string;
  mark: Bung;
  boatName: string;
  stageName: string;
  text: string;
  /** who wrote it, where that is somebody else */
  author: string | null;
  /** null where the person gave no hours for themselves */
  figure: Figure | null;
  additions: { id: string; who: string; text: string }[];
  /** 'written later, Tue 8 Sep', 'moved from Brindle by Wes' */
  flags: string[];
  struck: string | null;
  /** found, and found sound, with it */
  notes: NoteOnSheet[];
  photos: PhotoOnSheet[];
}

/** Under whom an entry stands: whoever has, or ever had, hours in it; where nobody has, its author. */
export function peopleOf(entry: EntryRow): string[] {
  const people = peopleInHours(entry);
  return people.length > 0 ? people : [entry.authorId];
}

/** What an entry has come through, for its mark. */
export function markOf(view: View, entry: EntryRow, looseIds: ReadonlySet<string>): Bung {
  if (looseIds.has(entry.id)) return 'loose';
  if (entry.struck) return 'struck';
  return view.isHeld('entry', entry.id) ? 'held' : 'sent';
}

export function readEntryLine(
  view: View,
  entry: EntryRow,
  personId: string,
  looseIds: ReadonlySet<string>,
  notes: NotesOfDay,
): EntryLine {
  return {
    ...notes.ofEntry(entry.id),
    id: entry.id,
    mark: markOf(view, entry, looseIds),
    boatName: boatWords(view, entry.boatId),
    stageName: stageWords(view, entry.stageId),
    text: entry.text,
    author: entry.authorId === personId ? null : whoWords(view, entry.authorId),
    figure: readFigure(view, entry, personId),
    additions: readAdditions(view, entry),
    flags: [...latenessFlags(view, entry), ...movedFlags(view, entry)],
    struck: entry.struck && `struck by ${whoWords(view, entry.struck.by)}: ${entry.struck.why}`,
  };
}

export function readFigure(view: View, entry: EntryRow, personId: string): Figure | null {
  const own = entry.hours.find((figure) => figure.personId === personId);
  const corrections = readCorrections(view, entry, personId);
  const { minutes = 0, kind = null, proposed = true } = own ?? {};
  const others = otherMinutes(entry, personId, minutes);
  if (!own && corrections.length === 0 && others.length === 0) return null;
  return { personId, minutes, kind, proposed, corrections, others };
}

function otherMinutes(entry: EntryRow, personId: string, minutes: number): number[] {
  const said = differingStatements(entry, `hours/${personId}`).map(minutesOf);
  return [...new Set(said)].filter((other) => other !== minutes);
}

function minutesOf({ value }: Statement): number {
  return (value as HoursValue).minutes;
}

function readCorrections(view: View, entry: EntryRow, personId: string): Correction[] {
  const said = statementsOf(entry, `hours/${personId}`);
  return said
    .flatMap((statement) => {
      const replaced = said.filter(
        (other) => statement.over.includes(other.opId) && minutesOf(other) !== minutesOf(statement),
      );
      return replaced.map((other) => correction(view, other, statement));
    })
    .reverse();
}

function correction(view: View, before: Statement, after: Statement): Correction {
  return {
    beforeMinutes: minutesOf(before),
    afterMinutes: minutesOf(after),
    who: whoWords(view, after.personId),
    when: momentWords(stampTime(after.at), view.timeZone, view.today),
    why: after.why ?? null,
  };
}

function readAdditions(view: View, entry: EntryRow): EntryLine['additions'] {
  return entry.additions
    .filter((addition) => addition.takenBack === null)
    .map(({ id, personId, text }) => ({ id, who: whoWords(view, personId), text }));
}

function latenessFlags(view: View, entry: EntryRow): string[] {
  const written = entry.writtenLater ? [`written later, ${dayWords(entry.writtenOn, view.today)}`] : [];
  const isHeardLater = entry.heardLater && entry.receivedOn;
  return isHeardLater ? [...written, `heard later, ${dayWords(entry.receivedOn!, view.today)}`] : written;
}

function movedFlags(view: View, entry: EntryRow): string[] {
  const said = statementsOf(entry, STAGE_FIELD);
  const isMove = ({ value }: Statement) => (value as { boatId: string }).boatId !== entry.boatId;
  const from = said.findLast(isMove);
  const by = said.find((statement) => statement.over.includes(from?.opId ?? ''));
  if (!from || !by) return [];
  const why = by.why ? `: ${by.why}` : '';
  return [
    `moved from ${boatWords(view, (from.value as { boatId: string }).boatId)} by ${whoWords(view, by.personId)}${why}`,
  ];
}
