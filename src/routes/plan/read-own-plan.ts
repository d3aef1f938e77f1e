import type { Day } from '#shared/sync/day.ts';
import { nextWorkDay, readLeftOver, readPlanFor } from '#shared/task/plan.ts';
import type { View } from '#src/replica/view.ts';
import { readPlanned, type PlannedLine } from './read-planned.ts';

export interface DayOfPlan {
  day: Day;
  minutes: number;
  withoutEstimate: number;
  tasks: PlannedLine[];
}

export interface OwnPlan {
  today: Day;
  /** today, the next working day, and every later one that has something */
  days: DayOfPlan[];
  leftOver: PlannedLine[];
}

/** What oneself has, from today on. */
export function readOwnPlan(view: View): OwnPlan {
  const { me, today } = view;
  const later = view
    .all('task')
    .flatMap(({ plannedFor, assigneeIds }) =>
      plannedFor && plannedFor > today && assigneeIds?.includes(me.personId) ? [plannedFor] : [],
    );
  const days = [...new Set([today, nextWorkDay(today), ...later])].sort();
  return {
    today,
    days: days.map((day) => dayOfPlan(view, day)),
    leftOver: readLeftOver(view, me.personId, today).map((task) => readPlanned(view, task, me.personId)),
  };
}

function dayOfPlan(view: View, day: Day): DayOfPlan {
  const { personId } = view.me;
  const { tasks, minutes, withoutEstimate } = readPlanFor(view, personId, day);
  return { day, minutes, withoutEstimate, tasks: tasks.map((task) => readPlanned(view, task, personId)) };
}
