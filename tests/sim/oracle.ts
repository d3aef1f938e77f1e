import type { SetAsideRow } from '#shared/set-aside/set-aside.ts';
import { isAdmitted } from '#shared/set-aside/set-aside.ts';
import { reduceOp, understand } from '#shared/sync/judge.ts';
import type { MemoryStore } from '#shared/sync/memory-store.ts';
import type { Op } from '#shared/sync/op.ts';
import { refKey, type Ref, type Row } from '#shared/sync/row.ts';
import { STAMP_AHEAD_MAX_MS, stampMs } from '#shared/sync/stamp.ts';
import type { LoggedOp } from '#shared/sync/store.ts';

/**
 * The rows as they must be whatever the order of arrival: what counts of the log, with its receipt facts, reduced the
 * other way round (what makes a row first, since nothing can come before it).
 */
export function rowsReversed(store: MemoryStore): Map<string, Row> {
  const rows = new Map<string, Row>();
  const look = (ref: Ref) => rows.get(refKey(ref)) ?? store.row(ref.entity, ref.id);
  const counting = [...store.ops.values()].flatMap((logged) => countingOp(store, logged));
  const makers = counting.filter(({ understood }) => understood.kind.makes);
  const changes = counting.filter(({ understood }) => !understood.kind.makes).reverse();
  for (const { understood, facts } of [...makers, ...changes]) {
    const { kind, op, changes: ref } = understood;
    if (kind.makes) rows.set(refKey(ref), kind.reduce(undefined, op, facts, look) as Row);
    else rows.set(refKey(ref), reduceOp(understood, facts, look));
  }
  return rows;
}

function countingOp(store: MemoryStore, logged: LoggedOp) {
  const understood = understand(logged.op as Op);
  if (typeof understood === 'string' || understood.changes.entity === 'setAside') return [];
  if (logged.outcome !== 'set-aside') return [{ understood, facts: logged }];
  const row = store.row('setAside', logged.key) as SetAsideRow;
  if (!row.sinceKept) return [];
  return [{ understood, facts: isAdmitted(row) ? { ...logged, isAdmitted: true } : logged }];
}

/** What the law says of when each op counts as made, told again in its plainest words; the ops where the log differs. */
export function wronglyOrdered(store: MemoryStore): string[] {
  const latest = new Map<string, string>();
  const wrong: string[] = [];
  for (const { key, op, deviceId, orderedAt, receivedAt } of store.ops.values()) {
    const { at } = op as Op;
    const last = latest.get(deviceId) ?? '';
    const isBelieved = stampMs(at) <= Date.parse(receivedAt) + STAMP_AHEAD_MAX_MS;
    const own = isBelieved ? stampMs(at) : Date.parse(receivedAt);
    // its own time, or as soon after the op before it as a stamp can be
    const isAsSaid =
      isBelieved && orderedAt === at
        ? true
        : stampMs(orderedAt) === Math.max(own, last === '' ? 0 : stampMs(last));
    if (orderedAt <= last || !isAsSaid) wrong.push(key);
    latest.set(deviceId, orderedAt);
  }
  return wrong;
}
