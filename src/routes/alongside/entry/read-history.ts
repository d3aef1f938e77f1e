import type { EntryRow } from '#shared/entry/entry.ts';
import type { FindingRow } from '#shared/finding/finding.ts';
import type { PhotoRow } from '#shared/photo/photo.ts';
import type { SoundRow } from '#shared/sound/sound.ts';
import { dayAt } from '#shared/sync/day.ts';
import { liveStatements, saidFields, statementsOf, STRUCK_FIELD } from '#shared/sync/fields.ts';
import type { Statement } from '#shared/sync/row.ts';
import { stampTime } from '#shared/sync/stamp.ts';
import type { Bung } from '#src/components/bung-mark.tsx';
import type { View } from '#src/replica/view.ts';
import { fieldWords, readValue, type SaidValue } from '#src/words/said-words.ts';
import { dayWords, timeWords, weekdayWords } from '#src/words/day-words.ts';
import { whoWords } from '#src/words/who.ts';

/** The rows that have a page with their history. */
export type HistoryRow = EntryRow | FindingRow | SoundRow | PhotoRow;

/** One thing that somebody said about a row. */
export interface HistoryLine {
  key: string;
  at: string;
  /** '14:05' of today, or the weekday */
  time: string;
  /** the whole of the moment where it was not today */
  when: string | null;
  who: string;
  mark: Bung;
  /** 'wrote it', 'changed the words' */
  did: string;
  /** what it is since then; null where the words of `did` say all */
  value: SaidValue | null;
  /** the values it took the place of */
  before: SaidValue[];
  why: string | null;
}

/** Everything that was said about a row, the newest first: every earlier value, who said it, when and why. */
export function readHistory(view: View, row: HistoryRow): HistoryLine[] {
  const heldOps = new Set(view.held.map(({ op }) => op.id));
  const lines = [
    madeLine(view, row),
    ...additionLines(view, row),
    ...takenBackLines(view, row),
    ...statementLines(view, row),
  ];
  return lines
    .map((line) =>
      line.mark === 'sent' && heldOps.has(line.opId) ? { ...line, mark: 'held' as const } : line,
    )
    .map(({ opId: _opId, ...line }) => ({ ...line, ...moment(view, line.at) }))
    .sort((a, b) => (a.at < b.at ? 1 : a.at > b.at ? -1 : 0));
}

type Draft = Omit<HistoryLine, 'time' | 'when'> & { opId: string };

function moment(view: View, at: string): Pick<HistoryLine, 'time' | 'when'> {
  const day = dayAt(Date.parse(at), view.timeZone);
  const time = timeWords(at, view.timeZone);
  if (day === view.today) return { time, when: null };
  return { time: weekdayWords(day), when: `${dayWords(day, view.today)} ${time}` };
}

function madeLine(view: View, row: HistoryRow): Draft {
  return {
    key: row.madeBy,
    opId: row.madeBy,
    who: whoWords(view, row.makerId),
    mark: 'sent',
    ...making(row),
    value: saidFields(row).includes('text') ? { words: firstWords(row) } : null,
    before: [],
    why: null,
  };
}

function making(row: HistoryRow): { at: string; did: string } {
  if ('writtenAt' in row) return { at: row.writtenAt, did: 'wrote it' };
  return 'notedAt' in row ? { at: row.notedAt, did: 'noted it' } : { at: row.attachedAt, did: 'took it' };
}

function firstWords(row: HistoryRow): string {
  const standing = 'text' in row ? row.text : '';
  return String(statementsOf(row, 'text')[0]?.value ?? standing ?? '');
}

function additionsOf(row: HistoryRow): EntryRow['additions'] {
  return 'additions' in row ? row.additions : [];
}

function additionLines(view: View, row: HistoryRow): Draft[] {
  return additionsOf(row).map((addition) => ({
    key: addition.id,
    opId: addition.opId,
    at: addition.at,
    who: whoWords(view, addition.personId),
    mark: addition.takenBack ? 'struck' : 'sent',
    did: 'added',
    value: { words: addition.text },
    before: [],
    why: null,
  }));
}

function takenBackLines(view: View, row: HistoryRow): Draft[] {
  return additionsOf(row).flatMap((addition) => {
    if (!addition.takenBack) return [];
    const { by, at } = addition.takenBack;
    const opId = row.takeBacks?.find(({ itemId }) => itemId === addition.id)?.opId ?? '';
    const did = 'took back what was added';
    return [
      {
        key: `${addition.id}/back`,
        opId,
        at,
        who: whoWords(view, by),
        mark: 'sent',
        did,
        value: null,
        before: [{ words: addition.text }],
        why: null,
      },
    ];
  });
}

function statementLines(view: View, row: HistoryRow): Draft[] {
  return saidFields(row).flatMap((field) => {
    const said = statementsOf(row, field);
    const live = liveStatements(row, field);
    return said
      .filter((statement) => statement.opId !== row.madeBy)
      .map((statement) => statementLine(view, statement, said, live));
  });
}

function statementLine(view: View, statement: Statement, said: Statement[], live: Statement[]): Draft {
  const { field, value, opId, personId, at, over, why } = statement;
  const isStrike = field === STRUCK_FIELD;
  const replaced = said.filter((other) => other.opId !== opId && over.includes(other.opId));
  const isLoose = live.length > 1 && live.includes(statement);
  return {
    key: `${opId}/${field}`,
    opId,
    at: stampTime(at),
    who: whoWords(view, personId),
    mark: isStrike && value !== null ? 'struck' : isLoose ? 'loose' : 'sent',
    did: isStrike ? (value === null ? 'restored it' : 'struck it') : `changed ${didWords(view, field)}`,
    value: isStrike ? null : readValue(view, field, value),
    before: isStrike ? [] : replaced.map((other) => readValue(view, field, other.value)),
    why: why ?? null,
  };
}

const OWN_NAMES = /^(The|Your|Boat|Suspected|That) ?/;

function didWords(view: View, field: string): string {
  const words = fieldWords(view, field);
  return OWN_NAMES.test(words) ? words.charAt(0).toLowerCase() + words.slice(1) : words;
}
