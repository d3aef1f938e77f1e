import { isForeman, type AnyOpKind, type OpKind } from '../sync/op-kind.ts';
import { rowKinds } from '../sync/row-kinds.ts';
import { madeRow } from '../sync/row.ts';
import { boatAddSchema, boatSetSchema, type BoatAdd, type BoatRow, type BoatSet } from './boat.ts';

const add: OpKind<BoatAdd, BoatRow> = {
  kind: 'boat.add',
  v: 1,
  data: boatAddSchema,
  entity: 'boat',
  rowId: (data) => data.boatId,
  makes: true,
  mayMake: isForeman,
  reduce: (_row, op, facts) => madeRow(op.data.boatId, op, facts, op.data),
};

export const boatKinds: AnyOpKind[] = [
  add,
  ...rowKinds<BoatRow, BoatSet>({ entity: 'boat', set: boatSetSchema, mayAmend: isForeman, mayStrike: isForeman }),
];
