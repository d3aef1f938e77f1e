import type { BoatRow } from '#shared/boat/boat.ts';
import { hoursLines, totalMinutes } from '#shared/entry/sums.ts';
import type { StageRow } from '#shared/stage/stage.ts';
import type { TaskRow } from '#shared/task/task.ts';
import type { View } from '#src/replica/view.ts';
import { readStages, stagesOf, type StageOfOrder } from './read-stages.ts';

export interface OrderOfWork {
  boat: BoatRow;
  stages: StageOfOrder[];
  /** hours logged on the boat so far, in minutes, those without a stage too */
  minutes: number;
  /** null where no task has an estimate */
  estimateMinutes: number | null;
  openTasks: number;
  doneTasks: number;
  struckStages: StageRow[];
  struckTasks: TaskRow[];
  /** stages, and everything of a task */
  mayChange: boolean;
  /** adds, starts and ticks off tasks */
  mayWork: boolean;
}

/** A boat's whole list of work; null where she is not known here. */
export function readOrder(view: View, boatId: string): OrderOfWork | null {
  const boat = view.find('boat', boatId);
  if (!boat) return null;
  const stages = readStages(view, boatId);
  const { roles } = view.me;
  return {
    boat,
    stages,
    ...readSums(view, boatId, stages),
    struckStages: stagesOf(view, boatId).filter((stage) => stage.struck),
    struckTasks: view.all('task').filter((task) => task.boatId === boatId && task.struck),
    mayChange: roles.includes('foreman'),
    mayWork: roles.includes('foreman') || roles.includes('crew'),
  };
}

function readSums(view: View, boatId: string, stages: StageOfOrder[]) {
  const estimates = stages.flatMap(({ estimateMinutes }) => estimateMinutes ?? []);
  const logged = view.all('entry').filter((entry) => entry.boatId === boatId);
  return {
    minutes: totalMinutes(hoursLines(logged)),
    estimateMinutes: estimates.length > 0 ? estimates.reduce((sum, own) => sum + own, 0) : null,
    openTasks: stages.reduce((count, { open }) => count + open.length, 0),
    doneTasks: stages.reduce((count, { done }) => count + done.length, 0),
  };
}
