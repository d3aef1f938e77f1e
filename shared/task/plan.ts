import type { Day } from '../sync/day.ts';
import type { TaskRow } from './task.ts';

/** A shop's day of work; common practice, no source. */
export const SHOP_DAY_MINUTES = 8 * 60;

/** Whatever holds tasks: a view of the replica does. */
interface HasTasks {
  all(entity: 'task'): TaskRow[];
}

/** What somebody has on one day. */
export interface PersonPlan {
  /** by boat, the started ones of a boat first */
  tasks: TaskRow[];
  /** of those that have an estimate */
  minutes: number;
  withoutEstimate: number;
}

/** What a person has on a day: the tasks that are for them and planned for it. Done ones stay, struck ones do not. */
export function readPlanFor(view: HasTasks, personId: string, day: Day): PersonPlan {
  const tasks = view
    .all('task')
    .filter((task) => isFor(task, personId) && task.plannedFor === day && !task.struck)
    .sort(byBoat);
  const shares = tasks.map(dayShare);
  return {
    tasks,
    minutes: shares.reduce<number>((sum, share) => sum + (share ?? 0), 0),
    withoutEstimate: shares.filter((share) => share === null).length,
  };
}

/** What a person had on a day before `day` and nobody has ticked off, the latest first. */
export function readLeftOver(view: HasTasks, personId: string, day: Day): TaskRow[] {
  return view
    .all('task')
    .filter((task) => isFor(task, personId) && !task.struck && !task.done)
    .filter(({ plannedFor }) => plannedFor != null && plannedFor < day)
    .sort((a, b) => b.plannedFor!.localeCompare(a.plannedFor!) || byBoat(a, b));
}

/**
 * Minutes that a task takes of one person's day: the estimate shared among those it is for, and no more than a day,
 * since what is longer goes on the day after. Null without an estimate.
 */
export function dayShare({ estimateMinutes, assigneeIds }: TaskRow): number | null {
  if (estimateMinutes == null) return null;
  const people = Math.max(assigneeIds?.length ?? 0, 1);
  return Math.min(Math.round(estimateMinutes / people), SHOP_DAY_MINUTES);
}

/** The day after on which the shop works, Monday to Friday; common practice, no source. */
export function nextWorkDay(day: Day): Day {
  const date = new Date(day);
  do date.setUTCDate(date.getUTCDate() + 1);
  while (!isWorkDay(date.toISOString().slice(0, 10)));
  return date.toISOString().slice(0, 10);
}

/** Monday to Friday. */
export function isWorkDay(day: Day): boolean {
  return ![0, 6].includes(new Date(day).getUTCDay());
}

function isFor({ assigneeIds }: TaskRow, personId: string): boolean {
  return assigneeIds?.includes(personId) ?? false;
}

function byBoat(a: TaskRow, b: TaskRow): number {
  return (
    a.boatId.localeCompare(b.boatId) || Number(isStarted(b)) - Number(isStarted(a)) || (a.id < b.id ? -1 : 1)
  );
}

function isStarted({ starts }: TaskRow): boolean {
  return starts.some((start) => start.takenBack === null);
}
