import type { z } from 'zod';
import { opSchema } from '#shared/sync/op.ts';
import { opKinds } from '#shared/sync/registry.ts';

/** What ops are, for the API's document: `Op` is what all have, `entry.write` and so on the `data` of each kind. */
export const opSchemas: Record<string, z.ZodType> = {
  Op: opSchema,
  ...Object.fromEntries([...opKinds.values()].map(({ kind, data }) => [kind, data])),
};
