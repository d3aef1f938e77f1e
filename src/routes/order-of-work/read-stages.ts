import { hoursLines, sumHours } from '#shared/entry/sums.ts';
import type { StageRow } from '#shared/stage/stage.ts';
import { standingItems } from '#shared/sync/items.ts';
import type { TaskRow } from '#shared/task/task.ts';
import type { View } from '#src/replica/view.ts';
import { dayWords } from '#src/words/day-words.ts';
import { listWords } from '#src/words/name-words.ts';
import { whoWords } from '#src/words/who.ts';
import { readTask, type TaskOfOrder } from './read-task.ts';

/** `free` may start now; `waits` comes after a stage that is not finished. */
export type StageState = 'finished' | 'under-way' | 'free' | 'waits';

export interface StageOfOrder {
  row: StageRow;
  state: StageState;
  /** 'finished Mon 4 May by Orrin'; null where it is not */
  finished: string | null;
  /** 'after Strip out and Survey': what must be finished first and is not */
  waitsFor: string | null;
  /** hours logged so far, in minutes */
  minutes: number;
  /** the estimates of its tasks, in minutes; null where no task has one */
  estimateMinutes: number | null;
  /** started ones first */
  open: TaskOfOrder[];
  done: TaskOfOrder[];
}

/** A boat's stages in their order, with how far each is and what it waits for. */
export function readStages(view: View, boatId: string): StageOfOrder[] {
  const stages = stagesOf(view, boatId).filter((stage) => !stage.struck);
  const tasks = view.all('task').filter((task) => task.boatId === boatId && !task.struck);
  const own = view.all('entry').filter((entry) => entry.boatId === boatId);
  const minutes = sumHours(hoursLines(own), 'stage');
  return stages.map((row) => {
    const lines = tasks.filter((task) => task.stageId === row.id);
    const read = lines.map((task) => readTask(view, task)).sort(startedFirst);
    const logged = minutes.get(row.id) ?? 0;
    const before = stages.filter(({ id, done }) => row.after.includes(id) && !done);
    return {
      row,
      state: stateOf(row, before, logged > 0 || read.some(({ state }) => state !== 'open')),
      finished: finishedWords(view, row),
      waitsFor: before.length > 0 ? `after ${before.map(({ name }) => name).join('; ')}` : null,
      minutes: logged,
      estimateMinutes: estimateOf(lines),
      open: read.filter(({ state }) => state !== 'done'),
      done: read.filter(({ state }) => state === 'done'),
    };
  });
}

/** A boat's stages in their order, struck ones too. */
export function stagesOf(view: View, boatId: string): StageRow[] {
  return view
    .all('stage')
    .filter((stage) => stage.boatId === boatId)
    .sort((a, b) => a.order - b.order || (a.id < b.id ? -1 : 1));
}

/** Null where no task has an estimate. */
export function estimateOf(tasks: TaskRow[]): number | null {
  const estimates = tasks.flatMap(({ estimateMinutes }) => estimateMinutes ?? []);
  return estimates.length > 0 ? estimates.reduce((sum, minutes) => sum + minutes, 0) : null;
}

// a stage that was begun out of its order is under way all the same
function stateOf(row: StageRow, before: StageRow[], isBegun: boolean): StageState {
  if (row.done) return 'finished';
  if (isBegun) return 'under-way';
  return before.length > 0 ? 'waits' : 'free';
}

function startedFirst(a: TaskOfOrder, b: TaskOfOrder): number {
  return Number(b.state === 'started') - Number(a.state === 'started') || (a.row.id < b.row.id ? -1 : 1);
}

function finishedWords(view: View, stage: StageRow): string | null {
  const marks = standingItems(stage.marks);
  if (marks.length === 0) return null;
  const names = listWords([...new Set(marks.map((mark) => whoWords(view, mark.personId)))]);
  return `finished ${dayWords(marks[0]!.workDate, view.today)} by ${names}`;
}
