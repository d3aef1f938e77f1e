import type { z } from 'zod';
import { STRUCK_FIELD } from '#shared/sync/fields.ts';
import { understand, type Understood } from '#shared/sync/judge.ts';
import { TEXT_UNITS_MAX, isKeepableText, type Op } from '#shared/sync/op.ts';
import { fieldsOfSet, overFor } from '#shared/sync/over.ts';
import { opKinds } from '#shared/sync/registry.ts';
import type { Row } from '#shared/sync/row.ts';
import type { Stamp } from '#shared/sync/stamp.ts';
import { standingOps } from '#shared/sync/strike.ts';
import { HoldError } from './hold-error.ts';
import type { View } from './view.ts';

/** What to compose an op with beyond its kind and data: `rowId` and `fields` where they cannot be told from the data. */
export interface HoldOptions {
  rowId?: string;
  fields?: string[];
}

/** The longest an op may be as JSON, in UTF-16 units: a request must hold it. */
const OP_UNITS_MAX = 256 * 1024;

type Data = Record<string, unknown>;
type Verb = 'amend' | 'strike' | 'restore' | null;

function verbOf(kind: string): Verb {
  const verb = kind.split('.')[1];
  return verb === 'amend' || verb === 'strike' || verb === 'restore' ? verb : null;
}

function whatIsWrong(kind: string, data: Data): string {
  const known = opKinds.get(kind);
  if (!known) return `This version of the app does not know how to write ‘${kind}’.`;
  const [issue] = (known.data.safeParse(data).error?.issues ?? []) as z.core.$ZodIssue[];
  const where = issue?.path.join('.');
  return `This cannot be kept as it stands${where ? ` (${where})` : ''}: ${issue?.message ?? 'it is not understood'}.`;
}

function refuseUnkeepable(data: Data): void {
  if (isKeepableText(data)) return;
  const isTooLong = Object.values(data).some(
    (value) => typeof value === 'string' && value.length > TEXT_UNITS_MAX,
  );
  throw new HoldError(
    isTooLong
      ? `This is longer than ${TEXT_UNITS_MAX.toLocaleString('en')} characters. Divide it in two.`
      : 'This holds a character that cannot be kept, or is too long.',
  );
}

/** An op's data as it will travel. Throws a HoldError where no op can be made of it. */
export function readHoldData(data: object): Data {
  const plain = JSON.parse(JSON.stringify(data)) as Data;
  refuseUnkeepable(plain);
  if (JSON.stringify(plain).length > OP_UNITS_MAX)
    throw new HoldError('This is too long to be sent. Divide it in two.');
  return plain;
}

interface Making {
  id: string;
  at: Stamp;
  personId: string;
  view: View;
}

/**
 * The op that a person's deed is: what it replaces is what `view` shows of the fields and what unsent ops named there;
 * a strike sees all that stands. Throws a HoldError where this version could not read it, or has no such row.
 */
export function composeOp(
  kind: string,
  data: Data,
  options: HoldOptions,
  { id, at, personId, view }: Making,
): Op {
  const verb = verbOf(kind);
  const draft: Op = { id, v: opKinds.get(kind)?.v ?? 1, kind, at, personId, over: {}, data };
  const understood = understand(verb === 'strike' ? { ...draft, data: { saw: [], ...data } } : draft);
  if (typeof understood === 'string') throw new HoldError(whatIsWrong(kind, data));
  if (verb === null) return draft;
  const row = changedRow(understood, options, view);
  const saw = verb === 'strike' && !data.saw ? { saw: standingOps(row) } : {};
  const fields = options.fields ?? (verb === 'amend' ? fieldsOfSet(data.set as Data) : [STRUCK_FIELD]);
  const unsent = view.held.map((item) => item.op);
  return { ...draft, over: overFor(row, fields, unsent), data: { ...data, ...saw } };
}

function changedRow({ changes }: Understood, { rowId }: HoldOptions, view: View): Row {
  const row = view.find(changes.entity, rowId ?? changes.id) as Row | undefined;
  if (!row)
    throw new HoldError('What this changes is not on this device yet. Try again once it has been heard.');
  return row;
}

/** Something to be made an op of, its data as `readHoldData` answered it. */
export interface OpDraft {
  id: string;
  kind: string;
  data: Data;
  options: HoldOptions;
}

interface MakingSeveral {
  personId: string;
  nextStamp: () => Stamp;
  view: View;
  /** the view with further held ops in it */
  viewWith: (ops: Op[]) => View;
}

/** As `composeOp`, several held together. One that changes a row sees what those before it made of it. */
export function composeOps(drafts: OpDraft[], { personId, nextStamp, view, viewWith }: MakingSeveral): Op[] {
  const ops: Op[] = [];
  for (const { id, kind, data, options } of drafts) {
    // a view is dear, and only what changes a row looks at it
    const seen = verbOf(kind) !== null && ops.length > 0 ? viewWith(ops) : view;
    ops.push(composeOp(kind, data, options, { id, at: nextStamp(), personId, view: seen }));
  }
  return ops;
}
