import { parseHours, hoursText } from '#shared/measure/hours.ts';
import type { Place } from '#shared/place/place.ts';
import type { Day } from '#shared/sync/day.ts';
import type { TaskRow } from '#shared/task/task.ts';

export type Side = NonNullable<Place['side']> | '';

/** What is on the form of a task. */
export interface TaskDraft {
  title: string;
  /** as typed */
  estimate: string;
  stageId: string;
  assigneeIds: string[];
  plannedFor: Day | null;
  side: Side;
  /** '4', '6-9', as typed */
  numbers: string;
  placeWords: string;
}

export function draftOf(task: TaskRow | null, stageId: string): TaskDraft {
  const { side = '', number, toNumber, words = '' } = task?.place ?? {};
  return {
    title: task?.title ?? '',
    estimate: task?.estimateMinutes ? hoursText(task.estimateMinutes) : '',
    stageId,
    assigneeIds: task?.assigneeIds ?? [],
    plannedFor: task?.plannedFor ?? null,
    side,
    numbers: [number, toNumber].filter((one) => one !== undefined).join('-'),
    placeWords: words,
  };
}

/** What keeps the draft from being held, by field; empty where nothing does. */
export function problemsOf(draft: TaskDraft): Partial<Record<'title' | 'estimate' | 'numbers', string>> {
  const isUnread = draft.estimate.trim() !== '' && readEstimate(draft.estimate) === null;
  return {
    ...(draft.title.trim() === '' ? { title: 'Write what is to be done.' } : {}),
    ...(isUnread ? { estimate: 'That is no figure of hours. Write it like 3, 2.5 or 2 1/2.' } : {}),
    ...(readNumbers(draft.numbers) ? {} : { numbers: 'Write it like 4 or 6-9.' }),
  };
}

/** A new task's fields, those that were given. */
export function fieldsOf(draft: TaskDraft): Record<string, unknown> {
  const { estimateMinutes, assigneeIds, plannedFor, place } = valuesOf(draft, undefined);
  return {
    title: draft.title.trim(),
    stageId: draft.stageId,
    ...(estimateMinutes === null ? {} : { estimateMinutes }),
    ...(assigneeIds.length > 0 ? { assigneeIds } : {}),
    ...(plannedFor === null ? {} : { plannedFor }),
    ...(place === null ? {} : { place }),
  };
}

/** What differs from the task as it stands, for task.amend; empty where nothing does. */
export function changesOf(task: TaskRow, draft: TaskDraft): Record<string, unknown> {
  const before = valuesOf(draftOf(task, task.stageId), task.place);
  const after = valuesOf(draft, task.place);
  const changed = Object.entries(after).filter(
    ([field, value]) => JSON.stringify(value) !== JSON.stringify(before[field as keyof typeof before]),
  );
  const move = draft.stageId === task.stageId ? {} : { boatId: task.boatId, stageId: draft.stageId };
  const title = draft.title.trim() === task.title ? {} : { title: draft.title.trim() };
  return { ...title, ...Object.fromEntries(changed), ...move };
}

/** What puts back what a change of a task sets. */
export function backTo(task: TaskRow, set: Record<string, unknown>): Record<string, unknown> {
  const standing = task as unknown as Record<string, unknown>;
  return Object.fromEntries(Object.keys(set).map((field) => [field, standing[field] ?? null]));
}

function valuesOf(draft: TaskDraft, known: Place | null | undefined) {
  return {
    estimateMinutes: readEstimate(draft.estimate),
    assigneeIds: [...draft.assigneeIds].sort(),
    plannedFor: draft.plannedFor,
    place: placeOf(draft, known),
  };
}

// what the form does not ask (the part, the distance) stays as it was
function placeOf({ side, numbers, placeWords }: TaskDraft, known: Place | null | undefined): Place | null {
  const { side: _side, number: _number, toNumber: _toNumber, words: _words, ...rest } = known ?? {};
  const place: Place = {
    ...rest,
    ...(side ? { side } : {}),
    ...readNumbers(numbers),
    ...(placeWords.trim() ? { words: placeWords.trim() } : {}),
  };
  return Object.keys(place).length > 0 ? place : null;
}

/** Null where the figures cannot be read. */
function readNumbers(text: string): Pick<Place, 'number' | 'toNumber'> | null {
  if (text.trim() === '') return {};
  const read = /^(\d{1,4})(?:\s*(?:-|–|to)\s*(\d{1,4}))?$/.exec(text.trim());
  if (!read) return null;
  return { number: Number(read[1]), ...(read[2] === undefined ? {} : { toNumber: Number(read[2]) }) };
}

/** Minutes; null where nothing was given or it cannot be read. An estimate may be longer than a day. */
function readEstimate(text: string): number | null {
  const plain = text.trim();
  if (plain === '') return null;
  if (/^\d{1,4}(?:[.,]\d+)?$/.test(plain)) return Math.round(Number(plain.replace(',', '.')) * 60);
  return parseHours(plain);
}
