import { z } from 'zod';
import { idSchema } from '../sync/ids.ts';
import { nameSchema } from './words.ts';

function isTimeZone(name: string): boolean {
  try {
    new Intl.DateTimeFormat('en', { timeZone: name });
    return true;
  } catch {
    return false;
  }
}

/** How lengths are shown; they are kept in millimetres whatever is chosen. */
export const unitsSchema = z.enum(['imperial', 'metric']);

export const newShopSchema = z.strictObject({
  name: nameSchema,
  timeZone: z.string().max(100).refine(isTimeZone, 'no time zone of the IANA list'),
  currency: z.string().regex(/^[A-Z]{3}$/, 'three capitals (ISO 4217)'),
  units: unitsSchema,
});
export type NewShop = z.infer<typeof newShopSchema>;

/** The shop as it stands in the feed. */
export const shopRowSchema = z.object({
  id: idSchema,
  name: z.string(),
  timeZone: z.string(),
  currency: z.string(),
  units: unitsSchema,
});
export type ShopRow = z.infer<typeof shopRowSchema>;
