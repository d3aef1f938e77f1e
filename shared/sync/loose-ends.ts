import { differingStatements, saidFields } from './fields.ts';
import { computedId } from './ids.ts';
import type { RecordEntity, Row } from './row.ts';
import { stampTime } from './stamp.ts';
import { unseenByStrike } from './strike.ts';

export type LooseEndKind = 'field' | 'struck-and-changed';

/** Something that the merge could not settle alone and a person must. Derived from a row, never written. */
export interface LooseEnd {
  id: string;
  boatId?: string;
  kind: LooseEndKind;
  entity: RecordEntity;
  rowId: string;
  field?: string;
  /** `at` is an ISO time; `stands` marks the one that stands meanwhile */
  values: { value: unknown; personId: string; at: string; opId: string; stands: boolean }[];
}

function base(shopId: string, entity: RecordEntity, row: Row, about: string) {
  return {
    id: computedId(shopId, `${entity}/${row.id}/${about}`),
    ...(row.boatId ? { boatId: row.boatId } : {}),
    entity,
    rowId: row.id,
  };
}

function fieldEnds(shopId: string, entity: RecordEntity, row: Row): LooseEnd[] {
  return saidFields(row).flatMap((field) => {
    const values = differingStatements(row, field).map(({ value, personId, at, opId }, index) => ({
      value,
      personId,
      at: stampTime(at),
      opId,
      stands: index === 0,
    }));
    return values.length > 0 ? [{ ...base(shopId, entity, row, field), kind: 'field' as const, field, values }] : [];
  });
}

function strikeEnds(shopId: string, entity: RecordEntity, row: Row): LooseEnd[] {
  const unseen = unseenByStrike(row);
  if (unseen.length === 0) return [];
  const values = unseen.map((said) => ({ ...said, stands: false }));
  return [{ ...base(shopId, entity, row, 'struck-and-changed'), kind: 'struck-and-changed', values }];
}

/** The loose ends of a row; their ids are the same on every device. */
export function looseEndsOf(shopId: string, entity: RecordEntity, row: Row): LooseEnd[] {
  if (row.statements.length === 0) return [];
  return [...fieldEnds(shopId, entity, row), ...strikeEnds(shopId, entity, row)];
}
