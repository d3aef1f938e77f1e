import { z } from 'zod';
import { placeSchema } from '../place/place.ts';
import type { Mark } from '../stage/stage.ts';
import { daySchema } from '../sync/day.ts';
import { idSchema, newIdSchema } from '../sync/ids.ts';
import { TEXT_UNITS_MAX } from '../sync/op.ts';
import type { Item, Row } from '../sync/row.ts';

const titleSchema = z.string().trim().min(1).max(500);
const estimateSchema = z.int().min(0).max(100_000);
const assigneesSchema = z.array(idSchema).max(50);

export const taskAddSchema = z.strictObject({
  taskId: newIdSchema,
  boatId: idSchema,
  stageId: idSchema,
  title: titleSchema,
  estimateMinutes: estimateSchema.optional(),
  assigneeIds: assigneesSchema.optional(),
  place: placeSchema.optional(),
  findingId: idSchema.optional(),
  plannedFor: daySchema.optional(),
  templateId: z.string().max(100).optional(),
});
export type TaskAdd = z.infer<typeof taskAddSchema>;

export const taskSetSchema = z
  .strictObject({
    title: titleSchema.optional(),
    boatId: idSchema.optional(),
    stageId: idSchema.optional(),
    estimateMinutes: estimateSchema.nullish(),
    assigneeIds: assigneesSchema.nullish(),
    place: placeSchema.nullish(),
    plannedFor: daySchema.nullish(),
  })
  .refine((set) => Object.keys(set).length > 0, 'sets at least one field')
  .refine((set) => set.boatId === undefined || set.stageId !== undefined, 'a task moves to a stage of the boat');
export type TaskSet = z.infer<typeof taskSetSchema>;

export const taskStartSchema = z.strictObject({ taskId: idSchema, startId: newIdSchema });
export const taskStopSchema = z.strictObject({
  taskId: idSchema,
  startIds: z.array(idSchema).min(1).max(100),
  why: z.string().trim().max(TEXT_UNITS_MAX).optional(),
});
export const taskMarkSchema = z.strictObject({
  taskId: idSchema,
  markId: newIdSchema,
  workDate: daySchema,
  entryId: idSchema.optional(),
});
export const taskUnmarkSchema = z.strictObject({ taskId: idSchema, markIds: z.array(idSchema).min(1).max(100) });

export type TaskRow = Row &
  Omit<TaskAdd, 'taskId'> & { marks: Mark[]; starts: Item[]; done: boolean; twice: boolean };
