import type { EntrySet } from '#shared/entry/entry.ts';
import type { HoursValue } from '#shared/entry/hours-field.ts';
import { differingStatements, STAGE_FIELD, STRUCK_FIELD } from '#shared/sync/fields.ts';
import type { EntryPage } from '#src/routes/alongside/entry/read-entry-page.ts';
import { personOfHours } from '#src/words/said-words.ts';
import type { EndLine } from '#src/routes/alongside/read-ends.ts';

export const SETTLED_WHY = 'settles what was said differently';

export interface Settling {
  kind: string;
  data: object;
}

/** The op that has one of a loose end's values stand, and names them all; null where this person may not, or it is settled otherwise. */
export function settlingOp({ row, actions }: EntryPage, end: EndLine, opId: string): Settling | null {
  if (end.kind !== 'field' || end.field === null) return null;
  const said = differingStatements(row, end.field).find((statement) => statement.opId === opId);
  if (!said) return null;
  if (end.field === STRUCK_FIELD) {
    const isAllowed = actions.strike || actions.restore;
    return isAllowed ? strikeOrRestore(row.id, said.value !== null) : null;
  }
  const set = setOf(end.field, said.value);
  return isOffered(actions, end.field)
    ? { kind: 'entry.amend', data: { entryId: row.id, set, why: SETTLED_WHY } }
    : null;
}

function strikeOrRestore(entryId: string, isStrike: boolean): Settling {
  return { kind: isStrike ? 'entry.strike' : 'entry.restore', data: { entryId, why: SETTLED_WHY } };
}

function setOf(field: string, value: unknown): EntrySet {
  const personId = personOfHours(field);
  if (personId !== null) return { hours: [{ personId, ...(value as HoursValue) }] };
  return (field === STAGE_FIELD ? value : { [field]: value }) as EntrySet;
}

function isOffered(actions: EntryPage['actions'], field: string): boolean {
  const personId = personOfHours(field);
  if (personId !== null) return actions.hoursOf.includes(personId);
  if (field === STAGE_FIELD) return actions.move;
  return field === 'workDate' ? actions.day : actions.words;
}
