import { z } from 'zod';
import { placeSchema } from '../place/place.ts';
import { idSchema, newIdSchema } from '../sync/ids.ts';
import type { Row } from '../sync/row.ts';

/** How a thing is known, from hearsay to sound wood all round. */
export const knownSchema = z.enum([
  'heard',
  'seen',
  'sounded',
  'probed',
  'metered',
  'opened',
  'cut-to-sound',
]);
export type Known = z.infer<typeof knownSchema>;

export const certaintySchema = z.enum(['suspected', 'proved']);
export type Certainty = z.infer<typeof certaintySchema>;

const lengthSchema = z.int().min(0).max(1_000_000);

/** How far it goes, in whole millimetres. */
export const extentSchema = z.strictObject({
  lengthMm: lengthSchema.optional(),
  widthMm: lengthSchema.optional(),
  depthMm: lengthSchema.optional(),
});
export type Extent = z.infer<typeof extentSchema>;

const countSchema = z.strictObject({ of: z.int().min(0).optional(), failed: z.int().min(0).optional() });
const findingKindSchema = z.string().min(1).max(100);
const textSchema = z.string().max(20_000);

export const findingNoteSchema = z.strictObject({
  findingId: newIdSchema,
  boatId: idSchema,
  stageId: idSchema.nullish(),
  entryId: idSchema.optional(),
  taskId: idSchema.optional(),
  /** a kind of the trade's vocabulary, or the shop's own */
  kind: findingKindSchema,
  place: placeSchema,
  known: knownSchema,
  certainty: certaintySchema,
  seenExtent: extentSchema.optional(),
  fearedExtent: extentSchema.optional(),
  /** only opening will tell how far it goes */
  openToKnow: z.boolean().optional(),
  /** of how many looked at, how many failed */
  count: countSchema.optional(),
  text: textSchema,
});
export type FindingNote = z.infer<typeof findingNoteSchema>;

export const findingSetSchema = z
  .strictObject({
    boatId: idSchema.optional(),
    stageId: idSchema.nullish(),
    kind: findingKindSchema.optional(),
    place: placeSchema.optional(),
    known: knownSchema.optional(),
    certainty: certaintySchema.optional(),
    seenExtent: extentSchema.nullish(),
    fearedExtent: extentSchema.nullish(),
    openToKnow: z.boolean().nullish(),
    count: countSchema.nullish(),
    text: textSchema.optional(),
  })
  .refine((set) => Object.keys(set).length > 0, 'sets at least one field')
  .refine(
    (set) => set.stageId !== null || set.boatId !== undefined,
    'a finding without a stage says its boat',
  );
export type FindingSet = z.infer<typeof findingSetSchema>;

export interface FindingRow
  extends Row, Omit<FindingNote, 'findingId' | 'seenExtent' | 'fearedExtent' | 'openToKnow' | 'count'> {
  boatId: string;
  stageId: string | null;
  seenExtent?: Extent | null;
  fearedExtent?: Extent | null;
  openToKnow?: boolean | null;
  count?: FindingNote['count'] | null;
  authorId: string;
  notedAt: string;
  notedOn: string;
}
