import { addDays, type Day } from '#shared/sync/day.ts';
import { nextWorkDay, readLeftOver, readPlanFor } from '#shared/task/plan.ts';
import type { View } from '#src/replica/view.ts';
import { readPlanned, type PlannedLine } from './read-planned.ts';

export interface PersonOnBoard {
  personId: string;
  name: string;
  minutes: number;
  withoutEstimate: number;
  tasks: PlannedLine[];
  /** planned for today or before, for a day before this one, and not done */
  leftOver: PlannedLine[];
}

export interface Board {
  day: Day;
  today: Day;
  people: PersonOnBoard[];
  /** tasks on the board that are done or not, each once */
  taskCount: number;
  mayPlan: boolean;
}

/** What each person has for a day: all the crew, and whoever else has something. */
export function readBoard(view: View, day: Day): Board {
  const people = view
    .all('person')
    .filter(({ leftAt }) => !leftAt)
    .map((person) => ({ isCrew: person.roles.includes('crew'), ...onBoard(view, person, day) }))
    .filter(({ isCrew, tasks, leftOver }) => isCrew || tasks.length + leftOver.length > 0)
    .sort((a, b) => a.name.localeCompare(b.name));
  return {
    day,
    today: view.today,
    people: people.map(({ isCrew: _isCrew, ...person }) => person),
    taskCount: new Set(people.flatMap(({ tasks }) => tasks.map(({ row }) => row.id))).size,
    mayPlan: view.me.roles.includes('foreman'),
  };
}

function onBoard(view: View, { id, name }: { id: string; name: string }, day: Day): PersonOnBoard {
  const { tasks, minutes, withoutEstimate } = readPlanFor(view, id, day);
  // what is planned for a day that has not come is not left over from it
  const isToCome = day > view.today;
  return {
    personId: id,
    name,
    minutes,
    withoutEstimate,
    tasks: tasks.map((task) => readPlanned(view, task, id)),
    leftOver: readLeftOver(view, id, isToCome ? addDays(view.today, 1) : day).map((task) =>
      readPlanned(view, task, id),
    ),
  };
}

/** The day that is planned unless another is asked for: the next on which the shop works. */
export function dayToPlan(view: View): Day {
  return nextWorkDay(view.today);
}
