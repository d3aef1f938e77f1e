import { judge, reduceOp, understand } from './judge.ts';
import type { RowLookup } from './op-kind.ts';
import type { Op } from './op.ts';
import { refKey, type Facts, type Ref, type Row } from './row.ts';

/** An op that waits on its device, with the facts that serve until the server has fixed them. */
export interface HeldOp {
  op: Op;
  facts: Facts;
}

/**
 * The rows that held ops change, as they will stand: what a screen shows is the server's rows with these over them.
 * An op that this version does not understand, or whose row is not here, shows in the list of held ops alone.
 */
export function replay(held: HeldOp[], look: RowLookup): Map<string, { ref: Ref; row: Row }> {
  const changed = new Map<string, { ref: Ref; row: Row }>();
  const lookOver: RowLookup = (ref) => changed.get(refKey(ref))?.row ?? look(ref);
  for (const { op, facts } of held) {
    const understood = understand(op);
    if (typeof understood === 'string') continue;
    const { reason } = judge(understood, { personId: op.personId, roles: facts.roles }, lookOver);
    if (reason !== null) continue;
    const ref = understood.changes;
    changed.set(refKey(ref), { ref, row: reduceOp(understood, facts, lookOver) });
  }
  return changed;
}
