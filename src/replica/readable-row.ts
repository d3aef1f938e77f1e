import type { z } from 'zod';
import { deviceRowSchema } from '#shared/identity/device.ts';
import { personRowSchema } from '#shared/identity/person.ts';
import { newShopSchema, shopRowSchema } from '#shared/identity/shop.ts';

type Check = (value: unknown) => boolean;

const isText: Check = (value) => typeof value === 'string';
const isNumber: Check = (value) => typeof value === 'number';
const isObject = (value: unknown): value is Record<string, unknown> =>
  typeof value === 'object' && value !== null && !Array.isArray(value);
const listOf =
  (check: Check): Check =>
  (value) =>
    Array.isArray(value) && value.every(check);
const recordOf =
  (check: Check): Check =>
  (value) =>
    isObject(value) && Object.values(value).every(check);
const orNull =
  (check: Check): Check =>
  (value) =>
    value === null || check(value);
const orNone =
  (check: Check): Check =>
  (value) =>
    value === undefined || check(value);
const shape = (fields: Record<string, Check>): Check => {
  const checks = Object.entries(fields);
  return (value) => isObject(value) && checks.every(([field, check]) => check(value[field]));
};
const schema =
  (read: z.ZodType): Check =>
  (value) =>
    read.safeParse(value).success;

// what reducers and screens count on; fields that a newer server adds are let through
const made = {
  id: isText,
  madeBy: isText,
  heads: recordOf(listOf(isText)),
  stamps: recordOf(isText),
  struck: orNull(isObject),
  // owners get rows without them
  statements: orNone(listOf(shape({ field: isText, opId: isText, over: listOf(isText) }))),
};
const items = listOf(shape({ id: isText, personId: isText, opId: isText }));
const hours = listOf(shape({ personId: isText, minutes: isNumber }));

// Plain checks where there are thousands of rows: a phone that opens looks at every one before it shows anything, and
// schemas took a third of a second for 10,000 of them.
const CHECKS: Record<string, Check> = {
  shop: schema(shopRowSchema.extend({ timeZone: newShopSchema.shape.timeZone })),
  person: schema(personRowSchema.partial({ boatIds: true })),
  device: schema(deviceRowSchema),
  boat: shape({ ...made, name: isText }),
  stage: shape({ ...made, boatId: isText, name: isText, marks: orNone(items) }),
  task: shape({ ...made, boatId: isText, title: isText, marks: items, starts: items }),
  entry: shape({ ...made, boatId: isText, workDate: isText, text: isText, hours, additions: items }),
  finding: shape({ ...made, boatId: isText, kind: isText, text: isText }),
  sound: shape({ ...made, boatId: isText }),
  photo: shape({ ...made, boatId: isText, sha256: isText, width: isNumber, height: isNumber }),
  setAside: shape({ ...made, opKey: isText, decisions: listOf(shape({ opId: isText })) }),
};

/** Whether this version of the app can show a row. The others are kept for a version that can. */
export function isReadableRow(entity: string, row: unknown): row is object {
  return CHECKS[entity]?.(row) ?? false;
}

/** A row as it is kept on the device. */
export interface StoredRow {
  entity: string;
  row: { id: string } & object;
}

/** A stored row that this or another version of the app has kept, or null where it is none. */
export function readStoredRow(value: unknown): StoredRow | null {
  if (!isObject(value) || !isText(value.entity)) return null;
  return isObject(value.row) && isText(value.row.id) ? (value as unknown as StoredRow) : null;
}
