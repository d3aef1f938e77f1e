import { z } from 'zod';
import { daySchema } from '../sync/day.ts';
import { newIdSchema } from '../sync/ids.ts';
import type { Row } from '../sync/row.ts';

const wordsSchema = z.string().trim().max(200);
const lengthSchema = z.int().min(0).max(1_000_000);

/** What is known of a boat beside her name; lengths in millimetres. Null clears a value. */
const particularsShape = {
  arrivedOn: daySchema.nullish(),
  templateId: z.string().max(100).nullish(),
  /** names she has borne, each with the days it held where they are known */
  names: z.array(z.strictObject({ name: wordsSchema, from: daySchema.nullish(), to: daySchema.nullish() })).max(50).nullish(),
  hullNumber: wordsSchema.nullish(),
  /** '26 ft launch' without the figure: launch, utility, skiff */
  type: wordsSchema.nullish(),
  lengthMm: lengthSchema.nullish(),
  beamMm: lengthSchema.nullish(),
  lies: z.strictObject({ way: z.enum(['upright', 'upside-down']), since: daySchema }).nullish(),
  /** from where planks and frames are counted, in the shop's words */
  numbering: wordsSchema.nullish(),
  builder: wordsSchema.nullish(),
  builtYear: z.int().min(1500).max(2500).nullish(),
};

const nameSchema = wordsSchema.min(1);

export const boatAddSchema = z.strictObject({ boatId: newIdSchema, name: nameSchema, ...particularsShape });
export type BoatAdd = z.infer<typeof boatAddSchema>;

export const boatSetSchema = z
  .strictObject({ name: nameSchema.optional(), ...particularsShape })
  .refine((set) => Object.keys(set).length > 0, 'sets at least one field');
export type BoatSet = z.infer<typeof boatSetSchema>;

export type BoatRow = Row & Omit<BoatAdd, 'boatId'> & { boatId: string };
