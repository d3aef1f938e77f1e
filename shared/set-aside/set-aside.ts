import { z } from 'zod';
import { idSchema } from '../sync/ids.ts';
import { TEXT_UNITS_MAX, type Reason } from '../sync/op.ts';
import type { Ref, Row } from '../sync/row.ts';

export const decideSchema = z.strictObject({
  setAsideId: idSchema,
  why: z.string().trim().max(TEXT_UNITS_MAX).optional(),
});

export interface Decision {
  choice: 'admit' | 'dismiss';
  by: string;
  at: string;
  opId: string;
  why: string | null;
}

export type SetAsideState = 'waiting' | 'admitted' | 'dismissed' | 'since-kept';

/** An op that was kept but does not count, until somebody admits it or what it needs is there. */
export interface SetAsideRow extends Row {
  opId: string | null;
  /** where the op log keeps it: its id, or the SHA-256 of its canonical JSON */
  opKey: string;
  op: unknown;
  authorId: string;
  reason: Reason;
  state: SetAsideState;
  by: string | null;
  at: string | null;
  why: string | null;
  decisions: Decision[];
  sinceKept: boolean;
  /** the row whose coming has it judged again */
  awaits: Ref | null;
}

const ADMISSIBLE: Reason[] = ['not-entitled', 'device-revoked'];

export function isAdmissible(row: SetAsideRow): boolean {
  return ADMISSIBLE.includes(row.reason);
}

export function isAdmitted(row: SetAsideRow): boolean {
  return row.decisions.some((decision) => decision.choice === 'admit');
}

/** The row with its state as its decisions say: an admission holds whatever dismissal there is, the first of a choice names who. */
export function withState(row: SetAsideRow): SetAsideRow {
  const standing = row.decisions.find((decision) => decision.choice === 'admit') ?? row.decisions[0];
  const { by = null, at = null, why = null } = standing ?? {};
  return { ...row, state: stateOf(row, standing), by, at, why };
}

function stateOf(row: SetAsideRow, standing: Decision | undefined): SetAsideState {
  if (standing?.choice === 'admit') return 'admitted';
  if (row.sinceKept) return 'since-kept';
  return standing ? 'dismissed' : 'waiting';
}
