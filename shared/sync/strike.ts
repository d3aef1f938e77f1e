import { STRUCK_FIELD, headsOf, liveStatements, saidFields, stateFields } from './fields.ts';
import { itemsOf } from './items.ts';
import type { Op } from './op.ts';
import { madeAt, type Facts, type Row, type Statement } from './row.ts';
import { stampTime } from './stamp.ts';

/** Every op that stands in a row, for a strike's `saw`: the making op, every head, and the ops of its items. */
export function standingOps(row: Row): string[] {
  const heads = saidFields(row)
    .filter((field) => field !== STRUCK_FIELD)
    .flatMap((field) => headsOf(row, field));
  return [...new Set([row.madeBy, ...heads, ...itemsOf(row).map((item) => item.opId)])];
}

export function strikeRow<R extends Row>(row: R, why: string, saw: string[], op: Op<unknown>, facts: Facts): R {
  const struck = { by: op.personId, at: madeAt(facts), why };
  return stateFields(row, { [STRUCK_FIELD]: struck }, op, facts, { why, saw });
}

export function restoreRow<R extends Row>(row: R, why: string, op: Op<unknown>, facts: Facts): R {
  return stateFields(row, { [STRUCK_FIELD]: null }, op, facts, { why });
}

/** What stands in a struck row that its standing strike did not see. */
export function unseenByStrike(row: Row): { value: unknown; personId: string; at: string; opId: string }[] {
  if (!row.struck) return [];
  const seen = new Set(liveStatements(row, STRUCK_FIELD)[0]!.saw ?? []);
  const values = saidFields(row)
    .filter((field) => field !== STRUCK_FIELD)
    .flatMap((field) => liveStatements(row, field).map(valueOf));
  const items = itemsOf(row)
    .filter((item) => item.takenBack === null)
    .map((item) => ({ value: { added: item.id }, personId: item.personId, at: item.at, opId: item.opId }));
  return [...values, ...items].filter((said) => !seen.has(said.opId));
}

function valueOf(statement: Statement) {
  const { field, value, personId, at, opId } = statement;
  return { value: { field, value }, personId, at: stampTime(at), opId };
}
