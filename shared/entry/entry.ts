import { z } from 'zod';
import { placeSchema } from '../place/place.ts';
import { daySchema } from '../sync/day.ts';
import { idSchema, newIdSchema } from '../sync/ids.ts';
import { TEXT_UNITS_MAX } from '../sync/op.ts';
import type { Item, Row } from '../sync/row.ts';
import { hoursGivenSchema, type Hours } from './hours.ts';

const textSchema = z.string().max(TEXT_UNITS_MAX);

export const entryWriteSchema = z.strictObject({
  entryId: newIdSchema,
  boatId: idSchema,
  stageId: idSchema.nullish(),
  /** the day that it is about, as the person said */
  workDate: daySchema,
  text: textSchema,
  spoken: z.boolean(),
  hours: hoursGivenSchema,
  place: placeSchema.optional(),
});
export type EntryWrite = z.infer<typeof entryWriteSchema>;

export const entrySetSchema = z
  .strictObject({
    text: textSchema.optional(),
    boatId: idSchema.optional(),
    stageId: idSchema.nullish(),
    workDate: daySchema.optional(),
    place: placeSchema.nullish(),
    hours: hoursGivenSchema.optional(),
  })
  .refine((set) => Object.keys(set).length > 0, 'sets at least one field')
  .refine((set) => set.stageId !== null || set.boatId !== undefined, 'an entry without a stage says its boat');
export type EntrySet = z.infer<typeof entrySetSchema>;

export const entryAddToSchema = z.strictObject({ entryId: idSchema, additionId: newIdSchema, text: textSchema.min(1) });
export const entryTakeBackSchema = z.strictObject({ entryId: idSchema, additionIds: z.array(idSchema).min(1).max(100) });

export interface Addition extends Item {
  text: string;
}

export interface EntryRow extends Row {
  boatId: string;
  stageId: string | null;
  authorId: string;
  workDate: string;
  text: string;
  spoken: boolean;
  place?: EntryWrite['place'] | null;
  hours: Hours[];
  additions: Addition[];
  writtenAt: string;
  /** the days of `writtenAt` and `receivedAt` in the shop's time zone */
  writtenOn: string;
  receivedAt: string | null;
  receivedOn: string | null;
  /** written after the day that it is about */
  writtenLater: boolean;
  /** heard by the server after the day that it was written on */
  heardLater: boolean;
}
