import type { Day } from '#shared/sync/day.ts';
import type { TaskRow } from '#shared/task/task.ts';
import type { Holding } from '#src/replica/replica.ts';

/** Ops that change the plan, and those that put it back. */
export interface PlanChange {
  holdings: Holding[];
  back: Holding[];
}

interface Planned {
  assigneeIds?: string[] | null;
  plannedFor?: Day | null;
}

/** Gives a person tasks for a day; whom they are for besides stays. */
export function give(tasks: TaskRow[], personId: string, day: Day): PlanChange {
  return changeAll(tasks, ({ assigneeIds }) => ({
    ...(assigneeIds?.includes(personId) ? {} : { assigneeIds: [...(assigneeIds ?? []), personId] }),
    plannedFor: day,
  }));
}

/** Moves tasks to another day, for all they are for. */
export function moveToDay(tasks: TaskRow[], day: Day): PlanChange {
  return changeAll(tasks, () => ({ plannedFor: day }));
}

/** Moves a task from one person to another, on the same day. */
export function moveToPerson(task: TaskRow, fromId: string, toId: string): PlanChange {
  return changeAll([task], ({ assigneeIds }) => ({
    assigneeIds: [...(assigneeIds ?? []).filter((id) => id !== fromId && id !== toId), toId],
  }));
}

/** Takes a task out of a person's day: who has it alone keeps it, without a day. */
export function takeOff(task: TaskRow, personId: string): PlanChange {
  const others = (task.assigneeIds ?? []).filter((id) => id !== personId);
  return changeAll([task], () => (others.length > 0 ? { assigneeIds: others } : { plannedFor: null }));
}

function changeAll(tasks: TaskRow[], setOf: (task: TaskRow) => Planned): PlanChange {
  const sets = tasks.map((task) => ({ task, set: setOf(task) }));
  return {
    holdings: sets.map(({ task, set }) => amend(task, set)),
    back: sets.map(({ task, set }) => amend(task, asBefore(task, set))),
  };
}

function asBefore(task: TaskRow, set: Planned): Planned {
  return {
    ...('assigneeIds' in set ? { assigneeIds: task.assigneeIds ?? null } : {}),
    ...('plannedFor' in set ? { plannedFor: task.plannedFor ?? null } : {}),
  };
}

function amend({ id }: TaskRow, set: Planned): Holding {
  return { kind: 'task.amend', data: { taskId: id, set } };
}
