import type { Holding } from '#src/replica/replica.ts';
import type { SaidEntity } from '#src/routes/alongside/read-ends.ts';

/** What was just held, and the ops that take it back. It survives a change of screen in the history's state. */
export interface Done {
  /** tells one doing from the next */
  done: string;
  words: string;
  undo: Holding[];
  /** what is on a form again once it is taken back, unless something else was begun there */
  draftBack?: { key: string; value: object };
}

export const UNDONE_WHY = 'undone at once';

/** Whether the screen before this one left something just done. */
export function isDone(state: unknown): state is Done {
  return typeof state === 'object' && state !== null && typeof (state as Partial<Done>).done === 'string';
}

/** The ops that strike what was just made. */
export function undoneAtOnce(made: { entity: SaidEntity; id: string }[]): Holding[] {
  return made.map(({ entity, id }) => ({
    kind: `${entity}.strike`,
    data: { [`${entity}Id`]: id, why: UNDONE_WHY },
  }));
}
