import type { View } from '#src/replica/view.ts';
import { readOrder, type OrderOfWork } from './read-order.ts';
import type { TaskOfOrder } from './read-task.ts';

export interface BoatAtWork {
  id: string;
  name: string;
  minutes: number;
  estimateMinutes: number | null;
  openTasks: number;
  doneTasks: number;
  /** stages that were begun and are not finished */
  underWay: string[];
  /** stages that may start now */
  free: string[];
  /** tasks that somebody has started */
  started: TaskOfOrder[];
}

/** Every boat that is here: what is under way, what may start, who is on what. The most under way first. */
export function readWork(view: View): BoatAtWork[] {
  return view
    .all('boat')
    .filter((boat) => !boat.struck)
    .map((boat) => atWork(readOrder(view, boat.id)!))
    .sort((a, b) => b.underWay.length - a.underWay.length || a.name.localeCompare(b.name));
}

function atWork({ boat, stages, minutes, estimateMinutes, openTasks, doneTasks }: OrderOfWork): BoatAtWork {
  const namesOf = (state: string) =>
    stages.filter((stage) => stage.state === state).map(({ row }) => row.name);
  return {
    id: boat.id,
    name: boat.name,
    minutes,
    estimateMinutes,
    openTasks,
    doneTasks,
    underWay: namesOf('under-way'),
    free: namesOf('free'),
    started: stages.flatMap(({ open }) => open).filter(({ state }) => state === 'started'),
  };
}
