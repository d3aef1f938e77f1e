import type { z } from 'zod';
import { UNMARKED, addMark, takeBackMarks } from '../stage/marks.ts';
import { movedFields, movedRefs } from '../stage/moved.ts';
import { addItem, itemsOf, takeBackItems } from '../sync/items.ts';
import { isCrewOrForeman, isForeman, type AnyOpKind, type Author, type OpKind } from '../sync/op-kind.ts';
import { rowKinds } from '../sync/row-kinds.ts';
import { madeRow, type Ref } from '../sync/row.ts';
import {
  taskAddSchema,
  taskMarkSchema,
  taskSetSchema,
  taskStartSchema,
  taskStopSchema,
  taskUnmarkSchema,
  type TaskAdd,
  type TaskRow,
  type TaskSet,
} from './task.ts';

interface Naming {
  boatId?: string;
  stageId?: string;
  assigneeIds?: string[] | null;
  findingId?: string;
}

function namedRefs(data: Naming): Ref[] {
  const people = (data.assigneeIds ?? []).map((id): Ref => ({ entity: 'person', id }));
  const finding: Ref[] = data.findingId ? [{ entity: 'finding', id: data.findingId }] : [];
  return [...movedRefs(data), ...people, ...finding];
}

/** Crew take back their own, and what is not here yet on trust that it is; the foreman anybody's. */
function mayTakeBack(author: Author, itemIds: string[], row: TaskRow | undefined): boolean {
  if (isForeman(author)) return true;
  const others = itemsOf(row).filter((item) => item.personId !== author.personId);
  return isCrewOrForeman(author) && !others.some((item) => itemIds.includes(item.id));
}

const rowId = (data: { taskId: string }) => data.taskId;

const add: OpKind<TaskAdd, TaskRow> = {
  kind: 'task.add',
  v: 1,
  data: taskAddSchema,
  entity: 'task',
  rowId,
  makes: true,
  names: namedRefs,
  mayMake: isCrewOrForeman,
  reduce: (_row, op, facts) => {
    const { taskId, ...fields } = op.data;
    return madeRow(taskId, op, facts, { ...fields, ...UNMARKED, starts: [] });
  },
};

const start: OpKind<z.infer<typeof taskStartSchema>, TaskRow> = {
  kind: 'task.start',
  v: 1,
  data: taskStartSchema,
  entity: 'task',
  rowId,
  makes: false,
  itemId: (data) => data.startId,
  mayMake: isCrewOrForeman,
  reduce: (row, op, facts) => addItem(row, 'starts', { id: op.data.startId }, op, facts),
};

const stop: OpKind<z.infer<typeof taskStopSchema>, TaskRow> = {
  kind: 'task.stop',
  v: 1,
  data: taskStopSchema,
  entity: 'task',
  rowId,
  makes: false,
  mayMake: (author, data, row) => mayTakeBack(author, data.startIds, row),
  reduce: (row, op, facts) => takeBackItems(row, op.data.startIds, op, facts),
};

const mark: OpKind<z.infer<typeof taskMarkSchema>, TaskRow> = {
  kind: 'task.mark',
  v: 1,
  data: taskMarkSchema,
  entity: 'task',
  rowId,
  makes: false,
  names: (data) => (data.entryId ? [{ entity: 'entry', id: data.entryId }] : []),
  itemId: (data) => data.markId,
  mayMake: isCrewOrForeman,
  reduce: (row, op, facts) => {
    const { markId, workDate, entryId } = op.data;
    return addMark(row, { id: markId, workDate, ...(entryId ? { entryId } : {}) }, op, facts);
  },
};

const unmark: OpKind<z.infer<typeof taskUnmarkSchema>, TaskRow> = {
  kind: 'task.unmark',
  v: 1,
  data: taskUnmarkSchema,
  entity: 'task',
  rowId,
  makes: false,
  mayMake: (author, data, row) => mayTakeBack(author, data.markIds, row),
  reduce: (row, op, facts) => takeBackMarks(row, op.data.markIds, op, facts),
};

export const taskKinds: AnyOpKind[] = [
  add,
  start,
  stop,
  mark,
  unmark,
  ...rowKinds<TaskRow, TaskSet>({
    entity: 'task',
    set: taskSetSchema,
    names: namedRefs,
      fields: movedFields,
    mayAmend: isForeman,
    mayStrike: isForeman,
  }),
];
