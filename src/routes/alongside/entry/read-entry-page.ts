import type { EntryRow } from '#shared/entry/entry.ts';
import { peopleInHours } from '#shared/entry/kinds.ts';
import type { View } from '#src/replica/view.ts';
import { mayAmend, mayDo, mayStrike } from '#src/replica/may-do.ts';
import { readBoatRows } from '#src/routes/alongside/read-boat-rows.ts';
import { readEntry } from '#src/routes/alongside/read-entry-line.ts';
import { readEntryItem, type EntryItem } from '#src/routes/alongside/read-line-items.ts';
import { readHistory, type HistoryLine } from '#src/routes/alongside/entry/read-history.ts';
import { dayWords } from '#src/words/day-words.ts';
import { whereWords } from '#src/words/where.ts';
import { capital, whoWords } from '#src/words/who.ts';

export interface EntryActions {
  words: boolean;
  move: boolean;
  day: boolean;
  /** the people whose figure this person may change */
  hoursOf: string[];
  /** may name people who are not in the hours yet */
  hoursOfAnybody: boolean;
  addTo: boolean;
  /** photographs, findings and what was found sound can come with it */
  addNotes: boolean;
  strike: boolean;
  restore: boolean;
}

export interface EntryPage {
  row: EntryRow;
  line: EntryItem;
  where: string;
  day: string;
  history: HistoryLine[];
  actions: EntryActions;
  /** what this person may not do here, and who may; null where they may do all */
  refusal: string | null;
}

/** An entry with its history and what this person may do with it; null where it is not on this device. */
export function readEntryPage(view: View, entryId: string): EntryPage | null {
  const row = view.find('entry', entryId);
  if (!row) return null;
  const actions = readActions(view, row);
  return {
    row,
    line: readEntryItem(view, readBoatRows(view, row.boatId), readEntry(view, row, row.stageId)),
    where: whereWords(view, row.boatId, row.stageId),
    day: dayWords(row.workDate, view.today),
    history: readHistory(view, row),
    actions,
    refusal: readRefusal(view, row, actions),
  };
}

function readActions(view: View, row: EntryRow): EntryActions {
  const standing = row.struck === null;
  const hoursFor = (personId: string) => ({ hours: [{ personId, minutes: 0, kind: null }] });
  const strike = mayStrike(view, 'entry', row);
  const hoursOf = peopleInHours(row).filter((personId) => mayAmend(view, row, hoursFor(personId)));
  return {
    words: standing && mayAmend(view, row, { text: '' }),
    move: standing && mayAmend(view, row, { boatId: row.boatId }),
    day: standing && mayAmend(view, row, { workDate: row.workDate }),
    hoursOf: standing ? hoursOf : [],
    hoursOfAnybody: standing && mayAmend(view, row, hoursFor('somebody')),
    addTo: standing && mayDo(view, 'entry.addTo', {}, row),
    addNotes: standing && mayDo(view, 'photo.attach', {}, undefined),
    // struck again, by one who knows what came since, it is a loose end no more
    strike: strike && (standing || isStruckAndChanged(view, row)),
    restore: strike && !standing,
  };
}

function isStruckAndChanged(view: View, row: EntryRow): boolean {
  return view.all('looseEnd').some((end) => end.rowId === row.id && end.kind === 'struck-and-changed');
}

function readRefusal(view: View, row: EntryRow, actions: EntryActions): string | null {
  if (row.struck) {
    return actions.restore ? null : `Only ${authorOr(view, row)} can bring it back.`;
  }
  if (actions.words && actions.strike) return null;
  const own =
    actions.hoursOf.length > 0 && !actions.hoursOfAnybody ? ' Your own hours are yours to change.' : '';
  const add = actions.addTo ? ' You can add to it.' : '';
  return `Only ${authorOr(view, row)} can change it or strike it.${own}${add}`;
}

function authorOr(view: View, row: EntryRow): string {
  return row.authorId === view.me.personId
    ? 'the foreman'
    : `${capital(whoWords(view, row.authorId))} or the foreman`;
}
