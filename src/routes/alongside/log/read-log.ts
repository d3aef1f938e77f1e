import { addDays, type Day } from '#shared/sync/day.ts';
import type { View } from '#src/replica/view.ts';
import type { Where } from '#src/routes/alongside/read-boats.ts';
import { readTask, type TaskLine } from '#src/routes/alongside/tasks/read-tasks.ts';
import { boatWords, stageWords } from '#src/words/where.ts';

export interface LogForm {
  today: Day;
  yesterday: Day;
  boatName: string;
  stageName: string;
  /** who may have worked along, by name */
  people: { id: string; name: string }[];
  /** open tasks of this boat and stage */
  tasks: TaskLine[];
  /** open tasks of her other stages */
  otherTasks: (TaskLine & { stageName: string })[];
}

/** What the form for a new entry offers. */
export function readLog(view: View, where: Where): LogForm {
  const open = view.all('task').filter((task) => task.boatId === where.boatId && !task.struck && !task.done);
  const here = open.filter((task) => task.stageId === where.stageId);
  const elsewhere = open.filter((task) => task.stageId !== where.stageId);
  return {
    today: view.today,
    yesterday: addDays(view.today, -1),
    boatName: boatWords(view, where.boatId),
    stageName: stageWords(view, where.stageId),
    people: readMates(view),
    tasks: here.map((task) => readTask(view, task)),
    otherTasks: elsewhere.map((task) => ({
      ...readTask(view, task),
      stageName: stageWords(view, task.stageId),
    })),
  };
}

function readMates(view: View): LogForm['people'] {
  return view
    .all('person')
    .filter(({ id, leftAt, roles }) => id !== view.me.personId && !leftAt && roles.some(isBench))
    .map(({ id, name }) => ({ id, name }))
    .sort((a, b) => a.name.localeCompare(b.name));
}

function isBench(role: string): boolean {
  return role === 'crew' || role === 'foreman';
}
