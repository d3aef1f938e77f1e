import type { EntryRow } from '#shared/entry/entry.ts';
import type { RecordEntity, Row } from '#shared/sync/row.ts';
import { opKinds } from '#shared/sync/registry.ts';
import type { View } from './view.ts';

/** Whether this person's op of a kind would count, by the very rule that the server judges it by. */
export function mayDo(view: View, kind: string, data: object, row: Row | undefined): boolean {
  const { personId, roles } = view.me;
  return opKinds.get(kind)?.mayMake({ personId, roles }, data, row) ?? false;
}

/** Whether this person may set a field of an entry. */
export function mayAmend(view: View, row: EntryRow, set: object): boolean {
  return mayDo(view, 'entry.amend', { entryId: row.id, set }, row);
}

/** Whether this person may strike and restore a row. */
export function mayStrike(view: View, entity: Exclude<RecordEntity, 'setAside'>, row: Row): boolean {
  return mayDo(view, `${entity}.strike`, {}, row);
}
