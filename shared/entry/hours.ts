import { z } from 'zod';
import { idSchema } from '../sync/ids.ts';

export const hoursKindSchema = z.enum(['agreed', 'extra', 'waiting', 'own-fault', 'teaching', 'yard']);
export type HoursKind = z.infer<typeof hoursKindSchema>;

const MINUTES_A_DAY = 24 * 60;

const figureSchema = z.strictObject({
  personId: idSchema,
  minutes: z.int().min(0).max(MINUTES_A_DAY),
  kind: hoursKindSchema.nullish(),
});

/** Hours as an op gives them: one figure a person, in whole minutes. */
export const hoursGivenSchema = z
  .array(figureSchema)
  .max(100)
  .refine((figures) => new Set(figures.map((figure) => figure.personId)).size === figures.length, 'one figure a person');
export type HoursGiven = z.infer<typeof hoursGivenSchema>;

/** A person's hours as they stand; `proposed` while no foreman or office has set their kind. */
export interface Hours {
  personId: string;
  minutes: number;
  kind: HoursKind | null;
  proposed: boolean;
}
