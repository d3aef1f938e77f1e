import { z } from 'zod';
import { photoSetSchema } from '#shared/photo/photo.ts';
import { placeSchema, type Place } from '#shared/place/place.ts';
import type { Replica } from '#src/replica/replica.ts';

const KEY = 'carried';

/** Where the last finding or photograph was, carried on to the next until it is changed. */
const carriedSchema = z.object({
  boatId: z.string(),
  place: placeSchema.catch({}),
  set: photoSetSchema.nullable().catch(null),
});
export type Carried = z.infer<typeof carriedSchema>;

/** What is carried on a boat; nothing of another boat. */
export function readCarried(replica: Pick<Replica, 'draft'>, boatId: string): Omit<Carried, 'boatId'> {
  const carried = carriedSchema.safeParse(replica.draft.read(KEY)).data;
  return carried?.boatId === boatId ? { place: carried.place, set: carried.set } : { place: {}, set: null };
}

export function carryOn(replica: Pick<Replica, 'draft'>, carried: Carried): Promise<void> {
  return replica.draft.write(KEY, carried);
}

/** A place without the fields that say nothing. */
export function plainPlace(place: Place): Place {
  const words = place.words?.trim();
  return Object.fromEntries(
    Object.entries({ ...place, words: words === '' ? undefined : words }).filter(
      ([, value]) => value !== undefined,
    ),
  );
}
