import type { EntryRow } from '../entry/entry.ts';
import { isFollowerEntity, onEntry, type Follower, type FollowerRow } from '../entry/follow.ts';
import { judge, reduceOp, understand } from './judge.ts';
import type { RowLookup } from './op-kind.ts';
import type { Op } from './op.ts';
import { refKey, type Facts, type Ref, type Row } from './row.ts';

/** An op that waits on its device, with the facts that serve until the server has fixed them. */
export interface HeldOp {
  op: Op;
  facts: Facts;
}

/** The rows that belong to an entry, as they were before. */
export type FollowersOf = (entryId: string) => Follower[];

/**
 * The rows that held ops change, as they will stand: what a screen shows is the server's rows with these over them.
 * An op that this version does not understand, or whose row is not here, shows in the list of held ops alone.
 */
export function replay(held: HeldOp[], look: RowLookup, followersOf: FollowersOf): Map<string, { ref: Ref; row: Row }> {
  const changed = new Map<string, { ref: Ref; row: Row }>();
  const lookOver: RowLookup = (ref) => changed.get(refKey(ref))?.row ?? look(ref);
  for (const { op, facts } of held) {
    const understood = understand(op);
    if (typeof understood === 'string') continue;
    const { reason } = judge(understood, { personId: op.personId, roles: facts.roles }, lookOver);
    if (reason !== null) continue;
    const ref = understood.changes;
    const row = reduceOp(understood, facts, lookOver);
    changed.set(refKey(ref), { ref, row });
    if (op.kind === 'entry.amend') moveFollowers(row as EntryRow, changed, followersOf);
  }
  return changed;
}

function moveFollowers(entry: EntryRow, changed: Map<string, { ref: Ref; row: Row }>, followersOf: FollowersOf): void {
  const known = followersOf(entry.id).map(({ entity, row }) => ({ ref: { entity, id: row.id }, row }));
  const held = [...changed.values()].filter(({ ref }) => isFollowerEntity(ref.entity));
  for (const { ref, row } of [...known, ...held]) {
    const current = (changed.get(refKey(ref))?.row ?? row) as FollowerRow;
    if (current.entryId === entry.id) changed.set(refKey(ref), { ref, row: onEntry(current, entry) });
  }
}
