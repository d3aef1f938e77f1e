import type { HoursValue } from '#shared/entry/hours-field.ts';
import { STAGE_FIELD, STRUCK_FIELD } from '#shared/sync/fields.ts';
import type { LooseEnd } from '#shared/sync/loose-ends.ts';

/** An op to be held, once its reason is known where it asks for one. */
export interface Settlement {
  kind: string;
  data: Record<string, unknown>;
  asksWhy: boolean;
}

type SetAside = 'setAside';
type RowEnd = LooseEnd & { entity: Exclude<LooseEnd['entity'], SetAside> };

const HOURS_PREFIX = 'hours/';

/** The op by which one of a loose end's values is taken; what it replaces, all of them, is named when it is held. */
export function takeValue(end: LooseEnd, value: unknown): Settlement {
  const { entity, rowId, field } = end as RowEnd;
  const id = { [`${entity}Id`]: rowId };
  if (field === STRUCK_FIELD) return value === null ? restore(end) : strike(end);
  return { kind: `${entity}.amend`, data: { ...id, set: setOf(field!, value) }, asksWhy: false };
}

export function strike({ entity, rowId }: LooseEnd): Settlement {
  return { kind: `${entity}.strike`, data: { [`${entity}Id`]: rowId, saw: [] }, asksWhy: true };
}

export function restore({ entity, rowId }: LooseEnd): Settlement {
  return { kind: `${entity}.restore`, data: { [`${entity}Id`]: rowId }, asksWhy: true };
}

// hours state both figure and kind; boat and stage are one field
function setOf(field: string, value: unknown): Record<string, unknown> {
  if (field.startsWith(HOURS_PREFIX)) {
    const { minutes, kind } = value as HoursValue;
    return { hours: [{ personId: field.slice(HOURS_PREFIX.length), minutes, kind }] };
  }
  if (field === STAGE_FIELD) return { ...(value as object) };
  return { [field]: value };
}
