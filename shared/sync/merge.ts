import type { SetAsideRow } from '../set-aside/set-aside.ts';
import { isUuid } from './ids.ts';
import { Merging, understandLogged } from './merging.ts';
import type { Reason } from './op.ts';
import { Reception } from './receive.ts';
import type { Stamp } from './stamp.ts';
import type { BatchFrom, LoggedOp, OutcomeName, RecordStore } from './store.ts';

export interface Outcome {
  /** the op's id as it came, if it reads as a UUID */
  id: string | null;
  outcome: OutcomeName;
  reason?: Reason;
  orderedAt: Stamp;
}

/**
 * Merges a batch into the record: judges each op, changes the rows, sets aside what may not count, and writes it all
 * as one. Answers ops[i] by outcomes[i]; an op that came before gets its first outcome and changes nothing.
 * `faulty` names, by index, ops whose merging has failed: they are set aside as the server's fault.
 */
export async function mergeBatch(
  store: RecordStore,
  from: BatchFrom,
  ops: unknown[],
  faulty: ReadonlySet<number> = new Set(),
): Promise<Outcome[]> {
  const reception = new Reception(store, from);
  const received = await reception.receiveAll(ops, faulty);
  const fresh = [...new Set(received)].filter((one) => !one.isRepeat);
  const merging = new Merging(store, from.shop.id);
  await merging.takeIn(fresh);
  await merging.write(fresh, reception.lastOrderedAt);
  return received.map(({ logged }, index) => outcomeOf(ops[index], logged));
}

/** Judges set-aside ops again, as a newer server does with what an older one did not understand or failed at. */
export async function judgeSetAside(store: RecordStore, shopId: string, rows: SetAsideRow[]): Promise<void> {
  const merging = new Merging(store, shopId);
  await merging.judgeAgain(rows);
  await merging.write([], null);
}

/**
 * Makes the rows of ops that were received before, in whatever order they are given, with the facts and verdicts held
 * that they were given then (`reason`, as their set-aside rows now say it; whether a row is there is found out anew).
 */
export async function applyLogged(store: RecordStore, shopId: string, ops: LoggedOp[]): Promise<void> {
  const received = ops.map((logged) => {
    const understood = understandLogged(logged);
    const reason = logged.reason === 'no-such-row' ? null : logged.reason;
    return {
      logged: { ...logged, reason },
      isRepeat: false,
      understood: typeof understood === 'string' ? null : understood,
    };
  });
  const merging = new Merging(store, shopId, { verdictsHeld: true });
  await merging.takeIn(received);
  await merging.write(received, null);
}

function outcomeOf(raw: unknown, { outcome, reason, orderedAt }: LoggedOp): Outcome {
  const id = (raw as { id?: unknown } | null)?.id;
  const echoed = typeof id === 'string' && isUuid(id.toLowerCase()) ? id : null;
  return { id: echoed, outcome, ...(reason ? { reason } : {}), orderedAt };
}
