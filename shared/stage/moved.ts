import { STAGE_FIELD } from '../sync/fields.ts';
import type { RowLookup } from '../sync/op-kind.ts';
import type { Ref } from '../sync/row.ts';
import type { StageRow } from './stage.ts';

export interface Moved {
  boatId?: string;
  stageId?: string | null;
}

/** The rows that a move names. */
export function movedRefs(set: Moved): Ref[] {
  const boats: Ref[] = set.boatId ? [{ entity: 'boat', id: set.boatId }] : [];
  const stages: Ref[] = set.stageId ? [{ entity: 'stage', id: set.stageId }] : [];
  return [...boats, ...stages];
}

/** An amendment's fields with boat and stage as the one field that they are: a stage brings her boat, a boat alone no stage. */
export function movedFields<Set extends Moved>(set: Set, look: RowLookup): Record<string, unknown> {
  const { boatId, stageId, ...others } = set;
  if (boatId === undefined && !stageId) return others;
  const stage = stageId ? (look({ entity: 'stage', id: stageId }) as StageRow) : undefined;
  return { ...others, [STAGE_FIELD]: { boatId: boatId ?? stage?.boatId, stageId: stageId ?? null } };
}
