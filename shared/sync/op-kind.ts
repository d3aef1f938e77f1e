import type { z } from 'zod';
import type { Role } from '../identity/role.ts';
import type { Op } from './op.ts';
import type { Facts, RecordEntity, Ref, Row } from './row.ts';

/** Who made an op, with the roles in force when it was received. */
export interface Author {
  personId: string;
  roles: Role[];
}

/** Looks a row up; undefined where it is not there. */
export type RowLookup = (ref: Ref) => object | undefined;

/** One kind of op: its schema, what it changes and names, who may make it, and what it means for its row. */
export interface OpKind<Data, R extends Row = Row> {
  kind: string;
  v: number;
  data: z.ZodType<Data>;
  entity: RecordEntity;
  /** the id of the row it makes or changes */
  rowId(data: Data): string;
  makes: boolean;
  /** the other rows that it names, which must be there */
  names?(data: Data): Ref[];
  /** whether the rows that it changes and names are such as it can be about; where not, it has no such row */
  fits?(data: Data, look: RowLookup): boolean;
  /** the id of an item it adds to the row */
  itemId?(data: Data): string;
  mayMake(author: Author, data: Data, row: R | undefined): boolean;
  reduce(row: R, op: Op<Data>, facts: Facts, look: RowLookup): R;
}

/** Any kind, as the registry keeps it: data and row are what its own schema and reducer made. */
// eslint-disable-next-line @typescript-eslint/no-explicit-any
export type AnyOpKind = OpKind<any, any>;

export function isOneOf(author: Author, ...roles: Role[]): boolean {
  return roles.some((role) => author.roles.includes(role));
}

export function isForeman(author: Author): boolean {
  return isOneOf(author, 'foreman');
}

export function isCrewOrForeman(author: Author): boolean {
  return isOneOf(author, 'crew', 'foreman');
}
