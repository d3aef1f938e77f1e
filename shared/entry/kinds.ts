import type { z } from 'zod';
import { movedFields, movedRefs } from '../stage/moved.ts';
import { saidFields, statementsOf } from '../sync/fields.ts';
import { addItem, itemsOf, takeBackItems } from '../sync/items.ts';
import {
  isCrewOrForeman,
  isForeman,
  isOneOf,
  type AnyOpKind,
  type Author,
  type OpKind,
  type RowLookup,
} from '../sync/op-kind.ts';
import type { Op } from '../sync/op.ts';
import { rowKinds } from '../sync/row-kinds.ts';
import { madeAt, madeRow, type Facts, type Ref } from '../sync/row.ts';
import {
  entryAddToSchema,
  entrySetSchema,
  entryTakeBackSchema,
  entryWriteSchema,
  type EntryRow,
  type EntrySet,
  type EntryWrite,
} from './entry.ts';
import type { Hours, HoursGiven } from './hours.ts';

const hoursField = (personId: string) => `hours/${personId}`;

function personRefs(hours: HoursGiven | undefined): Ref[] {
  return (hours ?? []).map((figure) => ({ entity: 'person', id: figure.personId }));
}

function givenHours(hours: HoursGiven, facts: Facts): Hours[] {
  const settles = isOneOf({ personId: '', roles: facts.roles }, 'foreman', 'office');
  return hours
    .filter((figure) => figure.minutes > 0)
    .map(({ personId, minutes, kind = null }) => ({
      personId,
      minutes,
      kind,
      proposed: kind === null || !settles,
    }))
    .sort((a, b) => (a.personId < b.personId ? -1 : 1));
}

function writtenEntry(op: Op<EntryWrite>, facts: Facts): EntryRow {
  // each by its name: copying a rest of what was parsed takes five times as long, and this is done for every entry
  const { entryId, boatId, stageId, workDate, text, spoken, hours, place } = op.data;
  const { orderedOn, receivedAt, receivedOn } = facts;
  return madeRow(entryId, op, facts, {
    boatId,
    stageId: stageId ?? null,
    workDate,
    text,
    spoken,
    hours: givenHours(hours, facts),
    additions: [],
    authorId: op.personId,
    writtenAt: madeAt(facts),
    writtenOn: orderedOn,
    receivedAt,
    receivedOn,
    writtenLater: orderedOn > workDate,
    heardLater: receivedOn !== null && receivedOn > orderedOn,
    ...(place ? { place } : {}),
  });
}

function withLateness(row: EntryRow): EntryRow {
  return { ...row, writtenLater: row.writtenOn > row.workDate };
}

function setFields(set: EntrySet, look: RowLookup): Record<string, unknown> {
  const { hours, ...others } = movedFields(set, look) as Omit<EntrySet, 'boatId' | 'stageId'>;
  const figures = (hours ?? []).map(
    ({ personId, minutes, kind = null }) => [hoursField(personId), { minutes, kind }] as const,
  );
  return { ...others, ...Object.fromEntries(figures) };
}

function isOwnFigureOnly(author: Author, row: EntryRow, set: EntrySet): boolean {
  const setsHoursAlone = Object.keys(set).every((field) => field === 'hours');
  const isOwn = (set.hours ?? []).every((figure) => figure.personId === author.personId);
  const isNamed = statementsOf(row, hoursField(author.personId)).length > 0;
  return setsHoursAlone && isOwn && isNamed && isCrewOrForeman(author);
}

/** Authors their own whole; who is named in its hours their own figure; office any hours; the foreman all. */
function mayAmend(author: Author, row: EntryRow, set: EntrySet): boolean {
  if (isForeman(author)) return true;
  if (isOneOf(author, 'office') && Object.keys(set).every((field) => field === 'hours')) return true;
  if (isOneOf(author, 'crew') && row.authorId === author.personId) return true;
  return isOwnFigureOnly(author, row, set);
}

const write: OpKind<EntryWrite, EntryRow> = {
  kind: 'entry.write',
  v: 1,
  data: entryWriteSchema,
  entity: 'entry',
  rowId: (data) => data.entryId,
  makes: true,
  names: (data) => [...movedRefs(data), ...personRefs(data.hours)],
  mayMake: isCrewOrForeman,
  reduce: (_row, op, facts) => writtenEntry(op, facts),
};

const addTo: OpKind<z.infer<typeof entryAddToSchema>, EntryRow> = {
  kind: 'entry.addTo',
  v: 1,
  data: entryAddToSchema,
  entity: 'entry',
  rowId: (data) => data.entryId,
  makes: false,
  itemId: (data) => data.additionId,
  mayMake: isCrewOrForeman,
  reduce: (row, op, facts) => {
    const addition = { id: op.data.additionId, text: op.data.text };
    return addItem(row, 'additions', addition, op, facts);
  },
};

const takeBack: OpKind<z.infer<typeof entryTakeBackSchema>, EntryRow> = {
  kind: 'entry.takeBack',
  v: 1,
  data: entryTakeBackSchema,
  entity: 'entry',
  rowId: (data) => data.entryId,
  makes: false,
  mayMake: (author, data, row) => {
    const others = itemsOf(row).filter((item) => item.personId !== author.personId);
    return (
      isForeman(author) ||
      (isCrewOrForeman(author) && !others.some((item) => data.additionIds.includes(item.id)))
    );
  },
  reduce: (row, op, facts) => takeBackItems(row, op.data.additionIds, op, facts),
};

const changes = rowKinds<EntryRow, EntrySet>({
  entity: 'entry',
  set: entrySetSchema,
  names: (set) => [...movedRefs(set), ...personRefs(set.hours)],
  fields: setFields,
  mayAmend,
  mayStrike: (author, row) =>
    isForeman(author) || (isOneOf(author, 'crew') && row.authorId === author.personId),
}).map((kind) => ({
  ...kind,
  reduce: (...args: Parameters<typeof kind.reduce>) => withLateness(kind.reduce(...args)),
}));

export const entryKinds: AnyOpKind[] = [write, addTo, takeBack, ...changes];

/** The people who have, or ever had, a figure in an entry's hours. */
export function peopleInHours(row: EntryRow): string[] {
  const said = saidFields(row)
    .filter((field) => field.startsWith('hours/'))
    .map((field) => field.slice('hours/'.length));
  return [...new Set([...row.hours.map((figure) => figure.personId), ...said])];
}
