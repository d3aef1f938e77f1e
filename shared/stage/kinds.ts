import type { z } from 'zod';
import { isForeman, type AnyOpKind, type OpKind } from '../sync/op-kind.ts';
import { rowKinds } from '../sync/row-kinds.ts';
import { madeRow } from '../sync/row.ts';
import { UNMARKED, addMark, takeBackMarks } from './marks.ts';
import {
  stageAddSchema,
  stageMarkSchema,
  stageSetSchema,
  stageUnmarkSchema,
  type StageAdd,
  type StageRow,
  type StageSet,
} from './stage.ts';

const stageRef = (id: string) => ({ entity: 'stage' as const, id });

const add: OpKind<StageAdd, StageRow> = {
  kind: 'stage.add',
  v: 1,
  data: stageAddSchema,
  entity: 'stage',
  rowId: (data) => data.stageId,
  makes: true,
  names: (data) => [{ entity: 'boat', id: data.boatId }, ...data.after.map(stageRef)],
  mayMake: isForeman,
  reduce: (_row, op, facts) => {
    const { stageId, ...fields } = op.data;
    return madeRow(stageId, op, facts, { ...fields, ...UNMARKED });
  },
};

const mark: OpKind<z.infer<typeof stageMarkSchema>, StageRow> = {
  kind: 'stage.mark',
  v: 1,
  data: stageMarkSchema,
  entity: 'stage',
  rowId: (data) => data.stageId,
  makes: false,
  itemId: (data) => data.markId,
  mayMake: isForeman,
  reduce: (row, op, facts) => addMark(row, { id: op.data.markId, workDate: op.data.workDate }, op, facts),
};

const unmark: OpKind<z.infer<typeof stageUnmarkSchema>, StageRow> = {
  kind: 'stage.unmark',
  v: 1,
  data: stageUnmarkSchema,
  entity: 'stage',
  rowId: (data) => data.stageId,
  makes: false,
  mayMake: isForeman,
  reduce: (row, op, facts) => takeBackMarks(row, op.data.markIds, op, facts),
};

export const stageKinds: AnyOpKind[] = [
  add,
  mark,
  unmark,
  ...rowKinds<StageRow, StageSet>({
    entity: 'stage',
    set: stageSetSchema,
    names: (set) => (set.after ?? []).map(stageRef),
    mayAmend: isForeman,
    mayStrike: isForeman,
  }),
];
