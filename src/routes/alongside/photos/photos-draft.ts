import { z } from 'zod';
import { photoSetSchema } from '#shared/photo/photo.ts';
import { placeSchema } from '#shared/place/place.ts';
import { keptPictureSchema } from '#src/routes/alongside/photos/kept-picture.ts';

export const PHOTOS_DRAFT_KEY = 'photos';
const CAPTION_LENGTH_MAX = 2000;

/** Photographs that are taken and not logged yet, with what they are of. */
const photosDraftSchema = z.object({
  boatId: z.string(),
  stageId: z.string().nullable().catch(null),
  entryId: z.string().nullable().catch(null),
  findingId: z.string().nullable().catch(null),
  place: placeSchema.catch({}),
  set: photoSetSchema.nullable().catch(null),
  caption: z.string().catch(''),
  pictures: z.array(keptPictureSchema).catch([]),
});
export type PhotosDraft = z.infer<typeof photosDraftSchema>;

export function readPhotosDraft(kept: unknown): PhotosDraft | undefined {
  return photosDraftSchema.safeParse(kept).data;
}

/** What keeps the photographs from being logged, in one sentence; undefined where nothing does. */
export function photosProblem({ pictures, caption }: PhotosDraft): string | undefined {
  if (pictures.length === 0) return 'Take a photo first, or choose one.';
  const over = caption.trim().length - CAPTION_LENGTH_MAX;
  return over > 0 ? `The words are ${over} characters too many for a photo. Say it shorter.` : undefined;
}
