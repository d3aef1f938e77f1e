import { idFromSha256, isUuid } from '../sync/ids.ts';
import type { Judgement } from '../sync/judge.ts';
import type { Reason } from '../sync/op.ts';
import type { Ref } from '../sync/row.ts';
import type { LoggedOp } from '../sync/store.ts';
import { isAdmitted, withState, type SetAsideRow } from './set-aside.ts';

/** The row of an op that is kept but does not count; `awaits` is the row whose coming has it judged again. */
export function setAsideRow(logged: LoggedOp, reason: Reason, awaits: Ref | null): SetAsideRow {
  const opId = isUuid(logged.key) ? logged.key : null;
  const id = opId ?? idFromSha256(logged.key);
  return {
    id,
    opId,
    opKey: logged.key,
    op: logged.op,
    authorId: logged.personId,
    reason,
    state: 'waiting',
    by: null,
    at: null,
    why: null,
    decisions: [],
    sinceKept: false,
    awaits,
    madeBy: id,
    makerId: logged.personId,
    heads: {},
    stamps: { [id]: logged.orderedAt },
    struck: null,
    statements: [],
  };
}

/** The row after its op was judged again. What was admitted and waits for a row keeps the reason it was admitted from. */
export function reconsidered(row: SetAsideRow, judgement: Judgement): SetAsideRow {
  if (judgement.reason === null) return withState({ ...row, sinceKept: true, awaits: null });
  const awaits = judgement.awaits ?? null;
  const reason = awaits && isAdmitted(row) ? row.reason : judgement.reason;
  return withState({ ...row, reason, awaits });
}
