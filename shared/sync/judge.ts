import type { z } from 'zod';
import { itemsOf } from './items.ts';
import type { AnyOpKind, Author, RowLookup } from './op-kind.ts';
import { hasUnknownField, type Op, type Reason } from './op.ts';
import { opKinds } from './registry.ts';
import type { Facts, Ref, Row } from './row.ts';

/** An op whose kind is known here and whose data fits it, with the rows that it needs. */
export interface Understood {
  kind: AnyOpKind;
  op: Op<unknown>;
  changes: Ref;
  names: Ref[];
}

function hasUnknownKey(issues: z.core.$ZodIssue[]): boolean {
  return issues.some((issue) => issue.code === 'unrecognized_keys');
}

/** Reads an op's data by its kind; the reason where that cannot be done. */
export function understand(op: Op): Understood | Reason {
  const kind = opKinds.get(op.kind);
  if (!kind || op.v !== kind.v || hasUnknownField(op)) return 'not-understood';
  const parsed = kind.data.safeParse(op.data);
  if (!parsed.success) return hasUnknownKey(parsed.error.issues) ? 'not-understood' : 'malformed';
  const data: unknown = parsed.data;
  const changes: Ref = { entity: kind.entity, id: kind.rowId(data) };
  return { kind, op: { ...op, data }, changes, names: kind.names?.(data) ?? [] };
}

export type Judgement = { reason: null } | { reason: Reason; awaits?: Ref };

/** Whether an op may count on the rows as they stand. `isAdmitted` passes over who made it. */
export function judge(
  { kind, op, changes, names }: Understood,
  author: Author,
  look: RowLookup,
  isAdmitted = false,
): Judgement {
  const row = look(changes) as Row | undefined;
  const missing = [...(kind.makes ? [] : [changes]), ...names].find((ref) => !look(ref));
  if (missing) {
    // who could never make it is told so at once; what hangs on the row waits for it
    const isBarred = !isAdmitted && author.roles.every((role) => role === 'owner');
    return isBarred ? { reason: 'not-entitled' } : { reason: 'no-such-row', awaits: missing };
  }
  if (kind.fits && !kind.fits(op.data, look)) return { reason: 'no-such-row', awaits: changes };
  if (kind.makes && row) return { reason: row.madeBy === op.id ? null : 'id-reused' };
  const itemId = kind.itemId?.(op.data);
  const known = itemId && itemsOf(row).find((item) => item.id === itemId);
  if (known && known.opId !== op.id) return { reason: 'id-reused' };
  if (!isAdmitted && !kind.mayMake(author, op.data, row)) return { reason: 'not-entitled' };
  return { reason: null };
}

/** The row that an op changes, once it has; `look` must find that row and those the op names. */
export function reduceOp({ kind, op, changes }: Understood, facts: Facts, look: RowLookup): Row {
  const row = look(changes);
  if (kind.makes && row) return row as Row;
  return kind.reduce(row, op, facts, look) as Row;
}
