import type { z } from 'zod';
import { movedFields, type Moved } from '../stage/moved.ts';
import { isCrewOrForeman, type AnyOpKind, type OpKind, type RowLookup } from '../sync/op-kind.ts';
import type { Op } from '../sync/op.ts';
import { rowKinds } from '../sync/row-kinds.ts';
import { madeAt, madeRow, type Facts, type Ref } from '../sync/row.ts';
import { placedRefs, withEntry, type Follower, type FollowerRow } from './follow.ts';

interface NoteKindsOf<Data extends object, Set extends Moved & { findingId?: string | null }> {
  entity: Follower['entity'];
  verb: 'note' | 'attach';
  data: z.ZodType<Data>;
  set: z.ZodType<Set>;
  /** what the server alone knows of a new row */
  atFirst?: object;
}

type Placed = Moved & { entryId?: string; findingId?: string; taskId?: string; boatId: string };

/** The kinds of what is noted on a boat, by itself or with an entry: anybody of the crew makes and amends it. */
export function noteKinds<Data extends Placed, Set extends Moved & { findingId?: string | null }>(
  of: NoteKindsOf<Data, Set>,
): AnyOpKind[] {
  const idField = `${of.entity}Id`;
  const rowId = (data: Data) => (data as unknown as Record<string, string>)[idField]!;
  const made = of.verb === 'note' ? 'noted' : 'attached';

  const make: OpKind<Data, FollowerRow> = {
    kind: `${of.entity}.${of.verb}`,
    v: 1,
    data: of.data,
    entity: of.entity,
    rowId,
    makes: true,
    // a photo's own id is no row that it names, nor is a finding's
    names: (data) => placedRefs({ ...data, ...(of.entity === 'finding' ? { findingId: undefined } : {}) }),
    mayMake: isCrewOrForeman,
    reduce: (_row, op, facts, look) => {
      const { [idField]: id, stageId, ...fields } = op.data as unknown as Record<string, unknown> & Placed;
      const said = {
        authorId: op.personId,
        [`${made}At`]: madeAt(facts),
        [`${made}On`]: facts.orderedOn,
        ...of.atFirst,
      };
      const row = madeRow(id as string, op, facts, { ...fields, stageId: stageId ?? null, ...said });
      return withEntry(row as FollowerRow, look);
    },
  };

  const changes = rowKinds<FollowerRow, Set>({
    entity: of.entity,
    set: of.set,
    names: (set): Ref[] => placedRefs(set),
    fields: movedFields,
    mayAmend: isCrewOrForeman,
    mayStrike: isCrewOrForeman,
  }).map((kind) => ({
    ...kind,
    reduce: (row: FollowerRow, op: Op<Amended>, ...rest: [Facts, RowLookup]) =>
      kind.reduce(row, row.entryId ? withoutMove(op) : op, ...rest),
  }));

  return [make, ...changes];
}

interface Amended {
  set?: Moved;
}

// what belongs to an entry lies where the entry lies: that it be elsewhere is no value that could stand or ask to
function withoutMove(op: Op<Amended>): Op<Amended> {
  if (!op.data.set) return op;
  const { boatId: _boatId, stageId: _stageId, ...set } = op.data.set;
  return { ...op, data: { ...op.data, set } };
}
