import { z } from 'zod';
import type { Role } from '../identity/role.ts';
import type { Day } from './day.ts';
import type { Op } from './op.ts';
import { stampTime, type Stamp } from './stamp.ts';

/** The entities whose rows ops make and change, in the order in which their rows refer to one another. */
export const recordEntitySchema = z.enum(['boat', 'stage', 'task', 'entry', 'finding', 'sound', 'photo', 'setAside']);
export type RecordEntity = z.infer<typeof recordEntitySchema>;

/** Every entity a replica may hold. */
export const entitySchema = z.enum(['shop', 'person', 'device', ...recordEntitySchema.options, 'looseEnd']);
export type Entity = z.infer<typeof entitySchema>;

export interface Ref {
  entity: Entity;
  id: string;
}

export function refKey(ref: Ref): string {
  return `${ref.entity}/${ref.id}`;
}

/** What was fixed about an op when it was first received; `received…` is null while it is held on its device. */
export interface Facts {
  orderedAt: Stamp;
  orderedOn: Day;
  receivedAt: string | null;
  receivedOn: Day | null;
  /** the roles its author held then */
  roles: Role[];
  /** it counts because somebody entitled to let it has admitted it */
  isAdmitted?: boolean;
}

/** One value that somebody said about one field of a row, since it was made. */
export interface Statement {
  field: string;
  value: unknown;
  opId: string;
  personId: string;
  at: Stamp;
  over: string[];
  why?: string;
  /** said by one who sets kinds of hours: foreman or office */
  settles?: true;
  /** a strike's: what its author had before them */
  saw?: string[];
}

export interface Struck {
  by: string;
  at: string;
  why: string;
}

/** Something added to a row (a mark, a start, an addition), which stands until it is taken back. */
export interface Item {
  id: string;
  personId: string;
  at: string;
  opId: string;
  takenBack: null | { by: string; at: string };
}

/** A person's word that items no longer stand; it holds even where the item comes later. */
export interface TakeBack {
  itemId: string;
  personId: string;
  at: string;
  opId: string;
  /** said by one who may take back anybody's */
  anybodys: boolean;
}

/** What every row made by ops carries. */
export interface Row {
  id: string;
  boatId?: string;
  madeBy: string;
  makerId: string;
  heads: Record<string, string[]>;
  stamps: Record<string, Stamp>;
  struck: Struck | null;
  statements: Statement[];
  takeBacks?: TakeBack[];
}

/** A new row as `op` makes it, with `fields` as it gave them. */
export function madeRow<Fields extends object>(id: string, op: Op<unknown>, facts: Facts, fields: Fields): Row & Fields {
  return {
    id,
    madeBy: op.id,
    makerId: op.personId,
    ...fields,
    heads: {},
    stamps: { [op.id]: facts.orderedAt },
    struck: null,
    statements: [],
  };
}

/** The ISO time that counts as when an op was made. */
export function madeAt(facts: Facts): string {
  return stampTime(facts.orderedAt);
}
