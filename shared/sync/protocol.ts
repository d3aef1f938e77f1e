import { z } from 'zod';
import { heldSchema } from '../identity/device.ts';
import { idSchema } from './ids.ts';
import { isKeepableText, reasonSchema } from './op.ts';
import { entitySchema } from './row.ts';
import { stampSchema } from './stamp.ts';

export const OPS_PER_REQUEST_MAX = 500;
export const ROWS_PER_ANSWER_MAX = 1000;
/** After unzipping. */
export const SYNC_BODY_BYTES_MAX = 1024 * 1024;

export const syncRequestSchema = z.strictObject({
  deviceId: idSchema,
  cursor: z.string().max(1000).nullable(),
  ops: z.array(z.unknown().describe('an Op; what is none is set aside')).max(OPS_PER_REQUEST_MAX),
  limit: z.int().min(1).max(ROWS_PER_ANSWER_MAX).optional(),
  held: heldSchema.optional(),
  appVersion: z.string().max(100).refine(isKeepableText, 'holds a character that cannot be kept').optional(),
  sentAt: z.iso.datetime().optional(),
});
export type SyncRequest = z.infer<typeof syncRequestSchema>;

export const outcomeSchema = z.object({
  id: z.string().nullable(),
  outcome: z.enum(['kept', 'loose-end', 'set-aside']),
  reason: reasonSchema.optional(),
  orderedAt: stampSchema,
});

export const feedRowSchema = z.object({
  // a newer server may name entities that this version does not know; it keeps them for the version that does
  entity: z.string(),
  id: z.string(),
  seq: z.int(),
  row: z.record(z.string(), z.unknown()).nullable(),
  gone: z.boolean(),
});

export const syncAnswerSchema = z.object({
  outcomes: z.array(outcomeSchema),
  rows: z.array(feedRowSchema),
  cursor: z.string(),
  more: z.boolean(),
  reset: z.boolean(),
  replayFrom: z.string().nullable(),
  backedUpTo: z.string().nullable(),
  serverTime: z.string(),
});
export type SyncAnswer = z.infer<typeof syncAnswerSchema>;
export type FeedRow = z.infer<typeof feedRowSchema>;

export function isKnownEntity(entity: string): boolean {
  return entitySchema.safeParse(entity).success;
}
