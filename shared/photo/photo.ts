import { z } from 'zod';
import { placeSchema } from '../place/place.ts';
import { idSchema, newIdSchema } from '../sync/ids.ts';
import { TEXT_UNITS_MAX } from '../sync/op.ts';
import type { Row } from '../sync/row.ts';

/** The name of a picture's or recording's bytes: the SHA-256 of what the phone sent. */
export const sha256Schema = z.string().regex(/^[0-9a-f]{64}$/, 'a SHA-256 in lower-case hex');

export const photoSetSchema = z.enum(['arrival', 'before', 'after', 'before-closing', 'mark']);
export type PhotoSet = z.infer<typeof photoSetSchema>;

const captionSchema = z.string().max(TEXT_UNITS_MAX);
const SIDE_PX_MAX = 100_000;

export const photoAttachSchema = z.strictObject({
  photoId: newIdSchema,
  sha256: sha256Schema,
  boatId: idSchema,
  stageId: idSchema.nullish(),
  entryId: idSchema.optional(),
  findingId: idSchema.optional(),
  waitId: idSchema.optional(),
  place: placeSchema.optional(),
  set: photoSetSchema.optional(),
  caption: captionSchema.optional(),
  takenAt: z.iso.datetime({ offset: true }).optional(),
  width: z.int().min(1).max(SIDE_PX_MAX),
  height: z.int().min(1).max(SIDE_PX_MAX),
  bytes: z.int().min(1),
});
export type PhotoAttach = z.infer<typeof photoAttachSchema>;

export const photoSetFieldsSchema = z
  .strictObject({
    boatId: idSchema.optional(),
    stageId: idSchema.nullish(),
    findingId: idSchema.nullish(),
    place: placeSchema.nullish(),
    set: photoSetSchema.nullish(),
    caption: captionSchema.nullish(),
  })
  .refine((set) => Object.keys(set).length > 0, 'sets at least one field')
  .refine((set) => set.stageId !== null || set.boatId !== undefined, 'a photo without a stage says its boat');
export type PhotoSetFields = z.infer<typeof photoSetFieldsSchema>;

/** How much of a picture the server has: a receipt fact, which everyone hears. */
export type Arrived = null | 'thumb' | 'full';

export interface PhotoRow extends Row {
  boatId: string;
  stageId: string | null;
  sha256: string;
  entryId?: string;
  findingId?: string | null;
  waitId?: string;
  place?: PhotoAttach['place'] | null;
  set?: PhotoSet | null;
  caption?: string | null;
  takenAt?: string;
  width: number;
  height: number;
  bytes: number;
  authorId: string;
  attachedAt: string;
  attachedOn: string;
  arrived: Arrived;
}
