import { z } from 'zod';
import { idSchema } from '../sync/ids.ts';
import { newShopSchema } from './shop.ts';
import { emailSchema, nameSchema, newPasswordSchema } from './words.ts';

export const firstRunRequestSchema = z.strictObject({
  /** the one-time code that an empty server prints */
  code: z.string().min(1).max(100),
  shop: newShopSchema,
  /** the shop's first foreman */
  person: z.strictObject({ name: nameSchema, email: emailSchema, password: newPasswordSchema }),
});
export type FirstRunRequest = z.infer<typeof firstRunRequestSchema>;

export const firstRunAnswerSchema = z.object({ shopId: idSchema, personId: idSchema });
