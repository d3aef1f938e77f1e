import type { EntryRow } from '#shared/entry/entry.ts';
import type { Hours } from '#shared/entry/hours.ts';
import { STAGE_FIELD, statementsOf } from '#shared/sync/fields.ts';
import type { Bung } from '#src/components/bung-mark.tsx';
import type { View } from '#src/replica/view.ts';
import { readEnds, type EndLine } from '#src/routes/alongside/read-ends.ts';
import { markOf, struckWords } from '#src/routes/alongside/read-mark.ts';
import { dayWords, momentWords, timeWords, weekdayWords } from '#src/words/day-words.ts';
import { HOURS_KIND_WORDS } from '#src/words/hours-words.ts';
import { boatWords } from '#src/words/where.ts';
import { whoWords } from '#src/words/who.ts';

export interface HoursLine {
  personId: string;
  who: string;
  minutes: number;
  /** null where nobody has said a kind */
  kind: string | null;
  isProposed: boolean;
}

export interface AdditionLine {
  id: string;
  who: string;
  at: string;
  text: string;
  isMine: boolean;
  takenBackBy: string | null;
}

/** An entry as a row of the line shows it. */
export interface EntryLine {
  id: string;
  mark: Bung;
  isHeld: boolean;
  /** '14:05', or the weekday where it was written on another day */
  time: string;
  author: string;
  words: string;
  /** null where it is the stage that is being looked at */
  stageName: string | null;
  hours: HoursLine[];
  additions: AdditionLine[];
  /** 'written later, Tue 8 Sep', 'heard later', 'moved here from Thimble' */
  flags: string[];
  /** who struck it, when and why */
  struck: string | null;
  ends: EndLine[];
}

/** An entry as this person's device knows it. `stageId` is the stage that is being looked at. */
export function readEntry(view: View, row: EntryRow, stageId: string | null | undefined): EntryLine {
  const ends = readEnds(view, 'entry', row);
  const isHeld = view.isHeld('entry', row.id);
  return {
    id: row.id,
    mark: markOf(row, ends, isHeld),
    isHeld,
    time:
      row.writtenOn === row.workDate ? timeWords(row.writtenAt, view.timeZone) : weekdayWords(row.writtenOn),
    author: whoWords(view, row.authorId),
    words: row.text,
    stageName:
      row.stageId && row.stageId !== stageId ? (view.find('stage', row.stageId)?.name ?? null) : null,
    hours: row.hours.map((figure) => readHoursLine(view, figure)),
    additions: readAdditions(view, row),
    flags: [...latenessFlags(view, row), ...movedFlag(view, row)],
    struck: struckWords(view, row),
    ends,
  };
}

function readHoursLine(view: View, { personId, minutes, kind, proposed }: Hours): HoursLine {
  const words = kind === null ? null : HOURS_KIND_WORDS[kind];
  return {
    personId,
    who: whoWords(view, personId),
    minutes,
    kind: words,
    isProposed: kind !== null && proposed,
  };
}

function readAdditions(view: View, row: EntryRow): AdditionLine[] {
  return row.additions.map((addition) => ({
    id: addition.id,
    who: whoWords(view, addition.personId),
    at: momentWords(addition.at, view.timeZone, view.today),
    text: addition.text,
    isMine: addition.personId === view.me.personId,
    takenBackBy: addition.takenBack && whoWords(view, addition.takenBack.by),
  }));
}

function latenessFlags(view: View, row: EntryRow): string[] {
  const written = row.writtenLater ? [`written later, ${dayWords(row.writtenOn, view.today)}`] : [];
  const heard =
    row.heardLater && row.receivedOn ? [`heard later, ${dayWords(row.receivedOn, view.today)}`] : [];
  return [...written, ...heard];
}

function movedFlag(view: View, row: EntryRow): string[] {
  const said = statementsOf(row, STAGE_FIELD).map(({ value }) => value as { boatId: string });
  const from = said.findLast(({ boatId }) => boatId !== row.boatId);
  return from ? [`moved here from ${boatWords(view, from.boatId)}`] : [];
}
