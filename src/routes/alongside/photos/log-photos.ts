import type { Replica } from '#src/replica/replica.ts';
import { undoneAtOnce, type Done } from '#src/routes/alongside/done.ts';
import { PHOTOS_DRAFT_KEY, type PhotosDraft } from '#src/routes/alongside/photos/photos-draft.ts';
import { carryOn, plainPlace } from '#src/routes/alongside/place/carried.ts';
import { counted } from '#src/words/day-words.ts';
import { placeWords } from '#src/words/place-words.ts';

/** Makes kept pictures photographs of the record, where and of what the form says. Throws a HoldError, with words. */
export async function logPhotos(replica: Replica, draft: PhotosDraft): Promise<Done> {
  const { boatId, stageId, entryId, findingId, set, pictures } = draft;
  const place = plainPlace(draft.place);
  const caption = draft.caption.trim();
  await replica.attachKept(pictures, {
    boatId,
    stageId,
    ...(entryId ? { entryId } : {}),
    ...(findingId ? { findingId } : {}),
    place,
    ...(set ? { set } : {}),
    ...(caption ? { caption } : {}),
  });
  await carryOn(replica, { boatId, place, set });
  const where = placeWords(place);
  return {
    done: pictures[0]!.photoId,
    words: [counted(pictures.length, 'photo') + ' logged', where].filter(Boolean).join(': '),
    undo: undoneAtOnce(pictures.map(({ photoId }) => ({ entity: 'photo', id: photoId }))),
    draftBack: {
      key: PHOTOS_DRAFT_KEY,
      value: { ...draft, pictures: pictures.map((picture) => ({ ...picture, photoId: replica.newId() })) },
    },
  };
}
