import { z } from 'zod';
import { roleSchema } from '#shared/identity/role.ts';
import { idSchema } from '#shared/sync/ids.ts';
import { reasonSchema, type Op } from '#shared/sync/op.ts';
import { stampSchema } from '#shared/sync/stamp.ts';

// an op stays exactly as it was made, whatever version made it: the server knows a repeat by its content
const keptOpSchema = z.looseObject({
  id: z.string(),
  kind: z.string(),
  at: stampSchema,
  personId: z.string(),
  data: z.record(z.string(), z.unknown()),
}) as unknown as z.ZodType<Op>;

export const outboxRecordSchema = z.object({ op: keptOpSchema, heldSince: z.iso.datetime() });
export type OutboxRecord = z.infer<typeof outboxRecordSchema>;

export const sentRecordSchema = outboxRecordSchema.extend({
  outcome: z.enum(['kept', 'loose-end', 'set-aside']),
  reason: reasonSchema.optional(),
  orderedAt: stampSchema,
  /** the server's time of the answer, which is never before it received the op */
  answeredAt: z.iso.datetime(),
  /** the people of this device whose rows have it */
  inRowsOf: z.array(z.string()),
});
export type SentRecord = z.infer<typeof sentRecordSchema>;

/** What every writer of the device's database reads and writes again, so that tabs notice each other. */
export const deviceStateSchema = z.object({
  clock: z.object({ ms: z.int(), counter: z.int() }).nullable(),
  /** the server's time less the device's own */
  offsetMs: z.int(),
  /** counts the changes of outbox and sent list */
  outboxVersion: z.int(),
  /** counts the changes of anybody's rows */
  rowsVersion: z.int(),
});
export type DeviceState = z.infer<typeof deviceStateSchema>;

export const NEW_DEVICE_STATE: DeviceState = { clock: null, offsetMs: 0, outboxVersion: 0, rowsVersion: 0 };

/** Who is signed in on this device, and the roles of all who ever did. */
export const sessionRecordSchema = z.object({
  me: z
    .object({ personId: idSchema, name: z.string(), roles: z.array(roleSchema), shopId: idSchema })
    .nullable(),
  needsSignIn: z.boolean(),
  rolesOnDevice: z.record(z.string(), z.array(roleSchema)),
});
export type SessionRecord = z.infer<typeof sessionRecordSchema>;

export const NOBODY: SessionRecord = { me: null, needsSignIn: false, rolesOnDevice: {} };
