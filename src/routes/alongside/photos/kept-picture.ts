import { z } from 'zod';
import { sha256Schema } from '#shared/photo/photo.ts';
import { newIdSchema } from '#shared/sync/ids.ts';
import type { KeptPicture } from '#src/replica/photos/picture.ts';

/** A picture that this device keeps for a form, as the form's draft holds it. */
export const keptPictureSchema = z.object({
  photoId: newIdSchema,
  name: z.string(),
  sha256: sha256Schema,
  width: z.int(),
  height: z.int(),
  bytes: z.int(),
  takenAt: z.string().optional(),
}) as unknown as z.ZodType<KeptPicture>;
