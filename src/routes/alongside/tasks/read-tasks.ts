import type { TaskRow } from '#shared/task/task.ts';
import { standingItems } from '#shared/sync/items.ts';
import type { View } from '#src/replica/view.ts';
import { stagesOf, type Where } from '#src/routes/alongside/read-boats.ts';
import { mayDo } from '#src/replica/may-do.ts';
import { momentWords, nearDayWords } from '#src/words/day-words.ts';
import { listWords } from '#src/words/name-words.ts';
import { whoWords } from '#src/words/who.ts';

export interface TaskLine {
  id: string;
  title: string;
  isHeld: boolean;
  isDone: boolean;
  /** 'Done by Rosa today'; null where nobody has ticked it */
  done: string | null;
  /** set where two people or more ticked it */
  isTwice: boolean;
  /** 'Started by Rosa 07:40' */
  started: string | null;
  /** 'For Rosa and Orrin' */
  assigned: string | null;
  /** the starts and marks that this person may take back */
  myStartIds: string[];
  myMarkIds: string[];
}

export interface TaskGroup {
  stageId: string;
  stageName: string;
  open: TaskLine[];
  done: TaskLine[];
}

/** A boat's tasks by stage, the stage that is being worked on first. Stages without a task are left out, but not that one. */
export function readTasks(view: View, where: Where): TaskGroup[] {
  const tasks = view.all('task').filter((task) => task.boatId === where.boatId && !task.struck);
  const stages = stagesOf(view, where.boatId);
  const ordered = [
    ...stages.filter(({ id }) => id === where.stageId),
    ...stages.filter(({ id }) => id !== where.stageId),
  ];
  return ordered
    .map((stage) => ({
      stageId: stage.id,
      stageName: stage.name,
      ...split(tasks.filter((task) => task.stageId === stage.id).map((task) => readTask(view, task))),
    }))
    .filter((group) => group.stageId === where.stageId || group.open.length + group.done.length > 0);
}

function split(tasks: TaskLine[]) {
  const sorted = tasks.sort((a, b) => a.id.localeCompare(b.id));
  return { open: sorted.filter((task) => !task.isDone), done: sorted.filter((task) => task.isDone) };
}

/** A task as this person may act on it. */
export function readTask(view: View, task: TaskRow): TaskLine {
  const starts = standingItems(task.starts);
  const marks = standingItems(task.marks);
  const moment = (at: string) => momentWords(at, view.timeZone, view.today);
  return {
    id: task.id,
    title: task.title,
    isHeld: view.isHeld('task', task.id),
    isDone: task.done,
    done: said(
      'Done by',
      marks.map((mark) => `${whoWords(view, mark.personId)} ${nearDayWords(mark.workDate, view.today)}`),
    ),
    isTwice: task.twice,
    started: said(
      'Started by',
      starts.map((start) => `${whoWords(view, start.personId)} ${moment(start.at)}`),
    ),
    assigned: said(
      'For',
      (task.assigneeIds ?? []).map((id) => whoWords(view, id)),
    ),
    myStartIds: mine(
      view,
      task,
      'task.stop',
      'startIds',
      starts.map(({ id }) => id),
    ),
    myMarkIds: mine(
      view,
      task,
      'task.unmark',
      'markIds',
      marks.map(({ id }) => id),
    ),
  };
}

function said(opening: string, words: string[]): string | null {
  return words.length > 0 ? `${opening} ${listWords(words)}` : null;
}

function mine(
  view: View,
  task: TaskRow,
  kind: string,
  list: 'startIds' | 'markIds',
  ids: string[],
): string[] {
  return ids.filter((id) => mayDo(view, kind, { taskId: task.id, [list]: [id] }, task));
}
