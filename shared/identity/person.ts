import { z } from 'zod';
import { idSchema } from '../sync/ids.ts';
import { roleSchema } from './role.ts';
import { emailSchema, nameSchema, newPasswordSchema } from './words.ts';

const rolesSchema = z
  .array(roleSchema)
  .min(1)
  .refine((roles) => new Set(roles).size === roles.length, 'a role is named once');

/** A person as they stand in the feed; `boatIds` are the boats that they own. */
export const personRowSchema = z.object({
  id: idSchema,
  name: z.string(),
  /** foreman and office see it */
  email: z.string().optional(),
  roles: z.array(roleSchema),
  leftAt: z.iso.datetime().nullable(),
  boatIds: z.array(idSchema),
});
export type PersonRow = z.infer<typeof personRowSchema>;

export const newPersonSchema = z.strictObject({
  id: idSchema,
  name: nameSchema,
  email: emailSchema,
  password: newPasswordSchema,
  roles: rolesSchema,
});
export type NewPerson = z.infer<typeof newPersonSchema>;

export const personChangeSchema = z
  .strictObject({
    name: nameSchema.optional(),
    email: emailSchema.optional(),
    password: newPasswordSchema.optional(),
    roles: rolesSchema.optional(),
    /** true: the person has left the shop and cannot sign in; false: has come back */
    hasLeft: z.boolean().optional(),
  })
  .refine((change) => Object.keys(change).length > 0, 'changes at least one field');
export type PersonChange = z.infer<typeof personChangeSchema>;

export const personAnswerSchema = z.object({ person: personRowSchema });
export const peopleAnswerSchema = z.object({ people: z.array(personRowSchema) });

const OWNERS_MAX = 50;

/** Who owns a boat: all of them, in place of those before. */
export const boatOwnersSchema = z.strictObject({ personIds: z.array(idSchema).max(OWNERS_MAX) });
export const boatOwnersAnswerSchema = z.object({ boatId: idSchema, personIds: z.array(idSchema) });
