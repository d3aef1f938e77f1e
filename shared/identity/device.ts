import { z } from 'zod';
import { idSchema } from '../sync/ids.ts';

/** What a device had not sent when it was last heard; `oldest` is when the oldest of it was made. */
export const heldSchema = z.strictObject({
  ops: z.int().min(0),
  photos: z.int().min(0),
  oldest: z.iso.datetime().nullish(),
});
export type Held = z.infer<typeof heldSchema>;

/** A device as it stands in the feed; `personIds` are those who have signed in on it. */
export const deviceRowSchema = z.object({
  id: idSchema,
  label: z.string(),
  personIds: z.array(idSchema),
  /** the device in whose place this one came */
  replaces: idSchema.nullable(),
  lastHeardAt: z.iso.datetime().nullable(),
  appVersion: z.string().nullable(),
  held: heldSchema.nullable(),
  revokedAt: z.iso.datetime().nullable(),
});
export type DeviceRow = z.infer<typeof deviceRowSchema>;

export const deviceAnswerSchema = z.object({ device: deviceRowSchema });
export const devicesAnswerSchema = z.object({ devices: z.array(deviceRowSchema) });
