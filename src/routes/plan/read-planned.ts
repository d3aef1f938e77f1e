import type { Day } from '#shared/sync/day.ts';
import { standingItems } from '#shared/sync/items.ts';
import { dayShare } from '#shared/task/plan.ts';
import type { TaskRow } from '#shared/task/task.ts';
import type { View } from '#src/replica/view.ts';
import { nearDayWords } from '#src/words/day-words.ts';
import { listWords } from '#src/words/name-words.ts';
import { boatWords, stageWords } from '#src/words/where.ts';
import { whoWords } from '#src/words/who.ts';

/** A task as it stands in somebody's plan. */
export interface PlannedLine {
  row: TaskRow;
  boatName: string;
  stageName: string;
  /** minutes of this person's day; null without an estimate */
  share: number | null;
  /** the whole estimate, where it is longer than what the people's day can take; else null */
  longerMinutes: number | null;
  /** 'with Wes'; null where it is theirs alone */
  along: string | null;
  /** 'done by Rosa', 'started by Wes'; null where neither */
  state: string | null;
  /** 'after Frames': what is to be finished first, and is not */
  waitsFor: string | null;
  /** 'today', 'Mon 4 May': the day it is planned for */
  plannedFor: string | null;
  isHeld: boolean;
}

export function readPlanned(view: View, row: TaskRow, personId: string | null): PlannedLine {
  const share = dayShare(row);
  const others = (row.assigneeIds ?? []).filter((id) => id !== personId);
  return {
    row,
    boatName: boatWords(view, row.boatId),
    stageName: stageWords(view, row.stageId),
    share,
    longerMinutes: isLonger(row, share) ? row.estimateMinutes! : null,
    along: others.length > 0 ? `with ${listWords(others.map((id) => whoWords(view, id)))}` : null,
    state: stateWords(view, row),
    waitsFor: row.done ? null : waitsFor(view, row.stageId),
    plannedFor: row.plannedFor ? nearDayOf(view, row.plannedFor) : null,
    isHeld: view.isHeld('task', row.id),
  };
}

function isLonger({ estimateMinutes, assigneeIds }: TaskRow, share: number | null): boolean {
  const people = Math.max(assigneeIds?.length ?? 0, 1);
  return share !== null && Math.round(estimateMinutes! / people) > share;
}

function nearDayOf(view: View, day: Day): string {
  return nearDayWords(day, view.today);
}

function stateWords(view: View, { marks, starts }: TaskRow): string | null {
  const names = (items: { personId: string }[]) =>
    listWords([...new Set(items.map(({ personId }) => whoWords(view, personId)))]);
  const [done, begun] = [standingItems(marks), standingItems(starts)];
  if (done.length > 0) return `done by ${names(done)}`;
  return begun.length > 0 ? `started by ${names(begun)}` : null;
}

/** What comes before a stage and is not finished. */
export function waitsFor(view: View, stageId: string): string | null {
  const before = (view.find('stage', stageId)?.after ?? [])
    .flatMap((id) => view.find('stage', id) ?? [])
    .filter(({ done, struck }) => !done && !struck);
  return before.length > 0 ? `after ${before.map(({ name }) => name).join('; ')}` : null;
}
