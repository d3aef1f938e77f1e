import { addItem, standingItems, takeBackItems } from '../sync/items.ts';
import type { Op } from '../sync/op.ts';
import type { Facts, Row } from '../sync/row.ts';
import type { Mark } from './stage.ts';

type Marked = Row & { marks: Mark[]; done: boolean; twice: boolean };

export const UNMARKED = { marks: [] as Mark[], done: false, twice: false };

/** Done once one mark stands; twice where the marks that stand are by two people or more. */
function withDone<R extends Marked>(row: R): R {
  const standing = standingItems(row.marks);
  const people = new Set(standing.map((mark) => mark.personId));
  return { ...row, done: standing.length > 0, twice: people.size > 1 };
}

export function addMark<R extends Marked>(
  row: R,
  mark: { id: string; workDate: string; entryId?: string },
  op: Op<unknown>,
  facts: Facts,
): R {
  return withDone(addItem(row, 'marks', mark, op, facts));
}

export function takeBackMarks<R extends Marked>(row: R, markIds: string[], op: Op<unknown>, facts: Facts): R {
  return withDone(takeBackItems(row, markIds, op, facts));
}
