import { standingItems } from '#shared/sync/items.ts';
import type { TaskRow } from '#shared/task/task.ts';
import type { View } from '#src/replica/view.ts';
import { dayWords, momentWords, nearDayWords } from '#src/words/day-words.ts';
import { listWords } from '#src/words/name-words.ts';
import { placeWords } from '#src/words/place-words.ts';
import { whoWords } from '#src/words/who.ts';

export type TaskState = 'open' | 'started' | 'done';

export interface TaskOfOrder {
  row: TaskRow;
  state: TaskState;
  /** 'done by Rosa Mon 4 May', 'started by Wes 13:05' */
  words: string | null;
  /** 'for Rosa' */
  assigned: string | null;
  /** 'planned for tomorrow'; null where it is done */
  planned: string | null;
  /** 'deck beam 4 port'; empty where nothing of it is said */
  where: string;
  isHeld: boolean;
  /** the starts and marks of one's own that stand */
  myStartIds: string[];
  myMarkIds: string[];
}

/** A task as the order of work shows it: how far it is, by whom, for whom and when. */
export function readTask(view: View, row: TaskRow): TaskOfOrder {
  const starts = standingItems(row.starts);
  const marks = standingItems(row.marks);
  const isMine = ({ personId }: { personId: string }) => personId === view.me.personId;
  return {
    row,
    state: row.done ? 'done' : starts.length > 0 ? 'started' : 'open',
    words: saidWords(view, row),
    assigned: row.assigneeIds?.length
      ? `for ${listWords(row.assigneeIds.map((id) => whoWords(view, id)))}`
      : null,
    planned: row.plannedFor && !row.done ? plannedWords(row.plannedFor, view.today) : null,
    where: placeWords(row.place),
    isHeld: view.isHeld('task', row.id),
    myStartIds: starts.filter(isMine).map(({ id }) => id),
    myMarkIds: marks.filter(isMine).map(({ id }) => id),
  };
}

/** 'planned for tomorrow', 'was planned for Mon 4 May'. */
export function plannedWords(day: string, today: string): string {
  return `${day < today ? 'was planned for' : 'planned for'} ${nearDayWords(day, today)}`;
}

function saidWords(view: View, { marks, starts, twice }: TaskRow): string | null {
  const done = standingItems(marks).map(
    (mark) => `${whoWords(view, mark.personId)} ${dayWords(mark.workDate, view.today)}`,
  );
  if (done.length > 0) return `${twice ? 'done twice, by' : 'done by'} ${listWords(done)}`;
  const begun = standingItems(starts).map(
    (start) => `${whoWords(view, start.personId)} ${momentWords(start.at, view.timeZone, view.today)}`,
  );
  return begun.length > 0 ? `started by ${listWords(begun)}` : null;
}
