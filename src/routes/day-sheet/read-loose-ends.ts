import type { HoursValue } from '#shared/entry/hours-field.ts';
import type { Day } from '#shared/sync/day.ts';
import { STRUCK_FIELD } from '#shared/sync/fields.ts';
import { itemsOf } from '#shared/sync/items.ts';
import type { LooseEnd } from '#shared/sync/loose-ends.ts';
import type { Row } from '#shared/sync/row.ts';
import { mayDo } from '#src/replica/may-do.ts';
import type { View } from '#src/replica/view.ts';
import { dayWords, momentWords } from '#src/words/day-words.ts';
import { openingWords } from '#src/words/name-words.ts';
import { fieldWords, readValue, saidWords } from '#src/words/said-words.ts';
import { boatWords } from '#src/words/where.ts';
import { whoWords } from '#src/words/who.ts';
import { restore, strike, takeValue, type Settlement } from './settle.ts';

export interface EndValue {
  opId: string;
  words: string;
  /** set where the value is hours, which are drawn */
  hours: HoursValue | null;
  who: string;
  when: string;
  why: string | null;
  stands: boolean;
  /** null where this person may not take it */
  take: Settlement | null;
}

export interface EndOnSheet {
  id: string;
  /** "Wes's hours" */
  about: string;
  /** 'Limber holes cut through …' */
  of: string;
  /** 'Penny Candle, Mon 4 May' */
  where: string;
  entryId: string | null;
  day: Day | null;
  values: EndValue[];
  /** for what was struck and changed since: what can be done with the whole */
  restore: Settlement | null;
  strike: Settlement | null;
}

/** What the merge could not settle alone: that of the day first, then the latest. */
export function readLooseEnds(view: View, day: Day): EndOnSheet[] {
  return view
    .all('looseEnd')
    .map((end) => readEnd(view, end))
    .sort(
      (a, b) => Number(b.day === day) - Number(a.day === day) || ((a.day ?? '') < (b.day ?? '') ? 1 : -1),
    );
}

function readEnd(view: View, end: LooseEnd): EndOnSheet {
  const row = view.find(end.entity, end.rowId) as Row;
  const workDate = (row as Row & { workDate?: Day }).workDate ?? null;
  const isField = end.kind === 'field';
  const allowed = (settlement: Settlement) =>
    mayDo(view, settlement.kind, settlement.data, row) ? settlement : null;
  return {
    id: end.id,
    about: isField ? fieldWords(view, end.field!) : 'Struck, and changed by somebody who did not know',
    of: titleOf(row),
    where: [end.boatId && boatWords(view, end.boatId), workDate && dayWords(workDate, view.today)]
      .filter(Boolean)
      .join(', '),
    entryId: end.entity === 'entry' ? end.rowId : null,
    day: workDate,
    values: end.values.map((value) => ({
      ...said(view, end, row, value.value),
      opId: value.opId,
      who: whoWords(view, value.personId),
      when: momentWords(value.at, view.timeZone, view.today),
      why: row.statements.find((statement) => statement.opId === value.opId)?.why ?? null,
      stands: value.stands,
      take: isField ? allowed(takeValue(end, value.value)) : null,
    })),
    restore: isField ? null : allowed(restore(end)),
    strike: isField ? null : allowed(strike(end)),
  };
}

function titleOf(row: Row): string {
  const { text, title, name } = row as Row & { text?: string; title?: string; name?: string };
  return openingWords(text ?? title ?? name ?? '', 90);
}

/** A strike's loose end says the field beside each value, or what was added. */
function said(view: View, end: LooseEnd, row: Row, value: unknown): Pick<EndValue, 'words' | 'hours'> {
  if (end.kind === 'field') return inField(view, end.field!, value);
  const unseen = value as { field?: string; value?: unknown; added?: string };
  if (unseen.field)
    return {
      words: `${fieldWords(view, unseen.field)}: ${valueWords(view, unseen.field, unseen.value)}`,
      hours: null,
    };
  const item = itemsOf(row).find(({ id }) => id === unseen.added) as { text?: string } | undefined;
  return { words: item?.text ? `Added: ${item.text}` : 'Ticked or started', hours: null };
}

function inField(view: View, field: string, value: unknown): Pick<EndValue, 'words' | 'hours'> {
  return {
    words: valueWords(view, field, value),
    hours: field.startsWith('hours/') ? (value as HoursValue) : null,
  };
}

function valueWords(view: View, field: string, value: unknown): string {
  if (field === STRUCK_FIELD && value === null) return 'keep it';
  return saidWords(readValue(view, field, value));
}
