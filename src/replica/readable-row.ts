import { deviceRowSchema } from '#shared/identity/device.ts';
import { personRowSchema } from '#shared/identity/person.ts';
import { newShopSchema, shopRowSchema } from '#shared/identity/shop.ts';
import { z } from 'zod';

// what reducers and screens count on; fields that a newer server adds are let through
const madeShape = {
  id: z.string(),
  madeBy: z.string(),
  heads: z.record(z.string(), z.array(z.string())),
  stamps: z.record(z.string(), z.string()),
  struck: z.looseObject({}).nullable(),
  // owners get rows without them
  statements: z
    .array(z.looseObject({ field: z.string(), opId: z.string(), over: z.array(z.string()) }))
    .optional(),
};
const itemsSchema = z.array(z.looseObject({ id: z.string(), personId: z.string(), opId: z.string() }));

const schemas: Record<string, z.ZodType> = {
  shop: shopRowSchema.extend({ timeZone: newShopSchema.shape.timeZone }),
  person: personRowSchema.partial({ boatIds: true }),
  device: deviceRowSchema,
  boat: z.looseObject({ ...madeShape, name: z.string() }),
  stage: z.looseObject({ ...madeShape, boatId: z.string(), name: z.string(), marks: itemsSchema.optional() }),
  task: z.looseObject({
    ...madeShape,
    boatId: z.string(),
    title: z.string(),
    marks: itemsSchema,
    starts: itemsSchema,
  }),
  entry: z.looseObject({
    ...madeShape,
    boatId: z.string(),
    workDate: z.string(),
    text: z.string(),
    hours: z.array(z.looseObject({ personId: z.string(), minutes: z.number() })),
    additions: itemsSchema,
  }),
  finding: z.looseObject({ ...madeShape, boatId: z.string(), kind: z.string(), text: z.string() }),
  sound: z.looseObject({ ...madeShape, boatId: z.string() }),
  photo: z.looseObject({
    ...madeShape,
    boatId: z.string(),
    sha256: z.string(),
    width: z.number(),
    height: z.number(),
  }),
  setAside: z.looseObject({
    ...madeShape,
    opKey: z.string(),
    decisions: z.array(z.looseObject({ opId: z.string() })),
  }),
};

/** Whether this version of the app can show a row. The others are kept for a version that can. */
export function isReadableRow(entity: string, row: unknown): row is object {
  return schemas[entity]?.safeParse(row).success ?? false;
}
