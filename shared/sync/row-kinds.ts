import { z } from 'zod';
import { stateFields } from './fields.ts';
import { idSchema } from './ids.ts';
import type { AnyOpKind, Author, OpKind, RowLookup } from './op-kind.ts';
import { TEXT_UNITS_MAX } from './op.ts';
import type { RecordEntity, Ref, Row } from './row.ts';
import { restoreRow, strikeRow } from './strike.ts';

const whySchema = z.string().trim().min(1).max(TEXT_UNITS_MAX);

interface RowKindsOf<R extends Row, Set extends object> {
  entity: Exclude<RecordEntity, 'setAside'>;
  set: z.ZodType<Set>;
  /** what an amendment names */
  names?(set: Set): Ref[];
  /** fields as the law keeps them, from what an amendment sets */
  fields?(set: Set, look: RowLookup): Record<string, unknown>;
  mayAmend(author: Author, row: R, set: Set): boolean;
  mayStrike(author: Author, row: R): boolean;
}

/** The kinds `amend`, `strike` and `restore`, which are alike for every entity. */
export function rowKinds<R extends Row, Set extends object>(of: RowKindsOf<R, Set>): AnyOpKind[] {
  const idField = `${of.entity}Id` as const;
  const rowId = (data: { [idField: string]: unknown }) => data[idField] as string;
  const shape = { [idField]: idSchema };

  type Amend = { set: Set; why?: string };
  const amend = {
    kind: `${of.entity}.amend`,
    v: 1,
    entity: of.entity,
    data: z.strictObject({ ...shape, set: of.set, why: whySchema.optional() }) as unknown as z.ZodType<Amend>,
    makes: false,
    rowId,
    names: (data) => of.names?.(data.set) ?? [],
    mayMake: (author, data, row) => row !== undefined && of.mayAmend(author, row, data.set),
    reduce: (row, op, facts, look) => {
      const fields = of.fields?.(op.data.set, look) ?? (op.data.set as Record<string, unknown>);
      return stateFields(row, fields, op, facts, { why: op.data.why });
    },
  } as OpKind<Amend, R>;

  type Strike = { why: string; saw: string[] };
  const strike = {
    kind: `${of.entity}.strike`,
    v: 1,
    entity: of.entity,
    data: z.strictObject({ ...shape, why: whySchema, saw: z.array(idSchema).max(10_000) }) as unknown as z.ZodType<Strike>,
    makes: false,
    rowId,
    mayMake: (author, _data, row) => row !== undefined && of.mayStrike(author, row),
    reduce: (row, op, facts) => strikeRow(row, op.data.why, op.data.saw, op, facts),
  } as OpKind<Strike, R>;

  type Restore = { why: string };
  const restore = {
    kind: `${of.entity}.restore`,
    v: 1,
    entity: of.entity,
    data: z.strictObject({ ...shape, why: whySchema }) as unknown as z.ZodType<Restore>,
    makes: false,
    rowId,
    mayMake: (author, _data, row) => row !== undefined && of.mayStrike(author, row),
    reduce: (row, op, facts) => restoreRow(row, op.data.why, op, facts),
  } as OpKind<Restore, R>;

  return [amend, strike, restore];
}
