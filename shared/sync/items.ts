import type { Op } from './op.ts';
import { madeAt, type Facts, type Item, type Row, type TakeBack } from './row.ts';

/** The lists of a row whose items are added and taken back, never changed. */
export type ItemList = 'marks' | 'starts' | 'additions';
const ITEM_LISTS: ItemList[] = ['marks', 'starts', 'additions'];

type Lists = Partial<Record<ItemList, Item[]>>;

function byTime(a: { at: string; opId: string }, b: { at: string; opId: string }): number {
  if (a.at !== b.at) return a.at < b.at ? -1 : 1;
  return a.opId < b.opId ? -1 : a.opId > b.opId ? 1 : 0;
}

function takenBack(item: Item, takeBacks: TakeBack[]): Item['takenBack'] {
  const first = takeBacks.find(
    (takeBack) => takeBack.itemId === item.id && (takeBack.anybodys || takeBack.personId === item.personId),
  );
  return first ? { by: first.personId, at: first.at } : null;
}

function withTakenBack<R extends Row>(row: R): R {
  const next: R & Lists = { ...row };
  for (const list of ITEM_LISTS) {
    const items = next[list];
    if (items) Object.assign(next, { [list]: items.map((item) => ({ ...item, takenBack: takenBack(item, row.takeBacks ?? []) })) });
  }
  return next;
}

export function itemsOf(row: Row | undefined): Item[] {
  return ITEM_LISTS.flatMap((list) => (row as (Row & Lists) | undefined)?.[list] ?? []);
}

/** The row with an item added; unchanged where it is there already. What was taken back before it came stays taken back. */
export function addItem<R extends Row>(row: R, list: ItemList, item: { id: string }, op: Op<unknown>, facts: Facts): R {
  if (itemsOf(row).some((known) => known.id === item.id)) return row;
  const added: Item = { ...item, personId: op.personId, at: madeAt(facts), opId: op.id, takenBack: null };
  const items = [...((row as R & Lists)[list] ?? []), added].sort(byTime);
  return withTakenBack({ ...row, [list]: items });
}

/** The row with items taken back, by their maker or, where the author's role allows, by anybody. */
export function takeBackItems<R extends Row>(row: R, itemIds: string[], op: Op<unknown>, facts: Facts): R {
  const known = row.takeBacks ?? [];
  if (known.some((takeBack) => takeBack.opId === op.id)) return row;
  const anybodys = facts.roles.includes('foreman') || facts.isAdmitted === true;
  const said = itemIds.map((itemId) => ({ itemId, personId: op.personId, at: madeAt(facts), opId: op.id, anybodys }));
  const takeBacks = [...known, ...said].sort((a, b) => byTime(a, b) || (a.itemId < b.itemId ? -1 : 1));
  return withTakenBack({ ...row, takeBacks });
}

export function standingItems<I extends Item>(items: I[] | undefined): I[] {
  return (items ?? []).filter((item) => item.takenBack === null);
}
