import { z } from 'zod';
import { daySchema } from '../sync/day.ts';
import { idSchema, newIdSchema } from '../sync/ids.ts';
import type { Item, Row } from '../sync/row.ts';

const nameSchema = z.string().trim().min(1).max(200);
const orderSchema = z.number().min(-1e9).max(1e9);
const afterSchema = z.array(idSchema).max(100);

export const stageAddSchema = z.strictObject({
  stageId: newIdSchema,
  boatId: idSchema,
  name: nameSchema,
  order: orderSchema,
  /** the stages that come before this one */
  after: afterSchema,
  templateId: z.string().max(100).optional(),
});
export type StageAdd = z.infer<typeof stageAddSchema>;

export const stageSetSchema = z
  .strictObject({ name: nameSchema.optional(), order: orderSchema.optional(), after: afterSchema.optional() })
  .refine((set) => Object.keys(set).length > 0, 'sets at least one field');
export type StageSet = z.infer<typeof stageSetSchema>;

export const stageMarkSchema = z.strictObject({ stageId: idSchema, markId: newIdSchema, workDate: daySchema });
export const stageUnmarkSchema = z.strictObject({ stageId: idSchema, markIds: z.array(idSchema).min(1).max(100) });

/** A person's statement that something is finished, about a day. */
export interface Mark extends Item {
  workDate: string;
  entryId?: string;
}

export type StageRow = Row &
  Omit<StageAdd, 'stageId'> & { marks: Mark[]; done: boolean; twice: boolean };
