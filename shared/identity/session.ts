import { z } from 'zod';
import { idSchema } from '../sync/ids.ts';
import { roleSchema } from './role.ts';
import { emailSchema, nameSchema } from './words.ts';

export const sessionRequestSchema = z.strictObject({
  email: emailSchema,
  password: z.string().min(1).max(200),
  device: z.strictObject({
    id: idSchema,
    label: nameSchema,
    /** the device in whose place this one comes */
    replaces: idSchema.nullish(),
  }),
  /** which shop, where the e-mail is in several */
  shopId: idSchema.optional(),
});
export type SessionRequest = z.infer<typeof sessionRequestSchema>;

export const refreshRequestSchema = z.strictObject({
  /** another person enrolled on this device, to go on as */
  personId: idSchema.optional(),
});

export const sessionAnswerSchema = z.object({
  accessToken: z.string(),
  expiresInSeconds: z.int(),
  person: z.object({ id: idSchema, name: z.string(), roles: z.array(roleSchema), shopId: idSchema }),
  device: z.object({ id: idSchema }),
});
export type SessionAnswer = z.infer<typeof sessionAnswerSchema>;

/** What a 409 at sign-in carries beside the members of a problem. */
export const shopChoiceSchema = z.object({ shops: z.array(z.object({ id: idSchema, name: z.string() })) });
export type ShopChoice = z.infer<typeof shopChoiceSchema>['shops'];
