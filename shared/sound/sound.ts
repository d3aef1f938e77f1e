import { z } from 'zod';
import { knownSchema } from '../finding/finding.ts';
import { placeSchema } from '../place/place.ts';
import { idSchema, newIdSchema } from '../sync/ids.ts';
import type { Row } from '../sync/row.ts';

const aboutSchema = z.string().min(1).max(100);
const textSchema = z.string().max(20_000);

/** Looked at, and nothing wrong: as much a record as a finding. */
export const soundNoteSchema = z.strictObject({
  soundId: newIdSchema,
  boatId: idSchema,
  stageId: idSchema.nullish(),
  entryId: idSchema.optional(),
  place: placeSchema,
  known: knownSchema,
  /** what was looked for and not found: a kind of finding */
  about: aboutSchema.optional(),
  text: textSchema.optional(),
});
export type SoundNote = z.infer<typeof soundNoteSchema>;

export const soundSetSchema = z
  .strictObject({
    boatId: idSchema.optional(),
    stageId: idSchema.nullish(),
    place: placeSchema.optional(),
    known: knownSchema.optional(),
    about: aboutSchema.nullish(),
    text: textSchema.nullish(),
  })
  .refine((set) => Object.keys(set).length > 0, 'sets at least one field')
  .refine((set) => set.stageId !== null || set.boatId !== undefined, 'a note without a stage says its boat');
export type SoundSet = z.infer<typeof soundSetSchema>;

export interface SoundRow extends Row, Omit<SoundNote, 'soundId' | 'about' | 'text'> {
  boatId: string;
  stageId: string | null;
  about?: string | null;
  text?: string | null;
  authorId: string;
  notedAt: string;
  notedOn: string;
}
