import type { Day } from '#shared/sync/day.ts';
import type { TaskRow } from '#shared/task/task.ts';
import type { View } from '#src/replica/view.ts';
import { readPlanned, waitsFor, type PlannedLine } from './read-planned.ts';

export interface StageToPick {
  stageId: string;
  name: string;
  /** 'comes after Frames, not finished', 'is finished'; null where it may start or is under way */
  notNow: string | null;
  tasks: PlannedLine[];
}

/** The boats that have open tasks; those where the person worked last come first. */
export function readBoatsToPick(
  view: View,
  personId: string,
): { id: string; name: string; openCount: number }[] {
  const last = lastWorkedAt(view, personId);
  return view
    .all('boat')
    .filter((boat) => !boat.struck)
    .map(({ id, name }) => ({ id, name, openCount: openTasks(view, id).length }))
    .filter(({ openCount }) => openCount > 0)
    .sort(
      (a, b) => (last.get(b.id) ?? '').localeCompare(last.get(a.id) ?? '') || a.name.localeCompare(b.name),
    );
}

/**
 * A boat's open tasks that the person does not have on that day, by stage: what may start first, in each
 * what the person began or was named for first.
 */
export function readPick(view: View, boatId: string, personId: string, day: Day): StageToPick[] {
  const open = openTasks(view, boatId).filter(
    ({ plannedFor, assigneeIds }) => plannedFor !== day || !assigneeIds?.includes(personId),
  );
  return view
    .all('stage')
    .filter((stage) => stage.boatId === boatId && !stage.struck)
    .sort((a, b) => a.order - b.order)
    .map(({ id, name, done }) => ({
      stageId: id,
      name,
      notNow: notNow(view, id, done),
      tasks: open
        .filter(({ stageId }) => stageId === id)
        .sort((a, b) => nearness(b, personId) - nearness(a, personId) || (a.id < b.id ? -1 : 1))
        .map((task) => readPlanned(view, task, null)),
    }))
    .filter(({ tasks }) => tasks.length > 0)
    .sort((a, b) => Number(a.notNow !== null) - Number(b.notNow !== null));
}

function notNow(view: View, stageId: string, isFinished: boolean): string | null {
  if (isFinished) return 'is finished';
  const before = waitsFor(view, stageId);
  return before && `comes ${before}, not finished`;
}

function openTasks(view: View, boatId: string): TaskRow[] {
  return view.all('task').filter((task) => task.boatId === boatId && !task.struck && !task.done);
}

function nearness({ starts, assigneeIds }: TaskRow, personId: string): number {
  if (starts.some((start) => start.personId === personId && !start.takenBack)) return 2;
  return assigneeIds?.includes(personId) ? 1 : 0;
}

/** The last day on which a person logged on each boat. */
function lastWorkedAt(view: View, personId: string): Map<string, Day> {
  const days = new Map<string, Day>();
  for (const { authorId, hours, boatId, workDate, struck } of view.all('entry')) {
    const isTheirs = authorId === personId || hours.some((figure) => figure.personId === personId);
    if (isTheirs && !struck && workDate > (days.get(boatId) ?? '')) days.set(boatId, workDate);
  }
  return days;
}
