import type { Replica } from '#src/replica/replica.ts';
import { holdTogether } from '#src/routes/alongside/photos/hold-together.ts';
import { undoneAtOnce, type Done } from '#src/routes/alongside/done.ts';
import { certaintyOf, isSized, type FoundDraft } from '#src/routes/alongside/found/found-draft.ts';
import { carryOn, plainPlace } from '#src/routes/alongside/place/carried.ts';
import { findingTitle, soundTitle } from '#src/words/finding-words.ts';

/** Makes a form's ops durable as one: the finding, or what was found sound, and its photographs. Throws a HoldError, with words. */
export async function logFound(replica: Replica, draft: FoundDraft): Promise<Done> {
  const { rowId, isSound, boatId, stageId, entryId } = draft;
  const entity = isSound ? 'sound' : 'finding';
  const place = plainPlace(draft.place);
  const about = { boatId, stageId, ...(entryId ? { entryId } : {}), place };
  const note = {
    kind: `${entity}.note`,
    data: isSound ? soundData(draft, about) : findingData(draft, about),
  };
  const isMade = replica.view().find(entity, rowId) !== undefined;
  await holdTogether(replica, isMade ? [] : [note], draft.pictures, {
    ...about,
    ...(isSound ? {} : { findingId: rowId }),
  });
  await carryOn(replica, { boatId, place, set: null });
  const words = isSound
    ? soundTitle({ place, about: draft.kind || null })
    : findingTitle({ kind: draft.kind, place });
  return {
    done: rowId,
    words: isSound ? words : `Found: ${words}`,
    undo: undoneAtOnce([
      { entity, id: rowId },
      ...draft.pictures.map(({ photoId }) => ({ entity: 'photo' as const, id: photoId })),
    ]),
  };
}

function findingData(draft: FoundDraft, about: object): object {
  const { rowId, known, seenExtent, fearedExtent, openToKnow } = draft;
  return {
    findingId: rowId,
    ...about,
    kind: draft.kind.trim(),
    known,
    certainty: certaintyOf(draft),
    ...(isSized(seenExtent) ? { seenExtent } : {}),
    ...(isSized(fearedExtent) ? { fearedExtent } : {}),
    ...(openToKnow ? { openToKnow } : {}),
    text: draft.text.trim(),
  };
}

function soundData({ rowId, kind, known, text }: FoundDraft, about: object): object {
  const lookedFor = kind.trim();
  return {
    soundId: rowId,
    ...about,
    known,
    ...(lookedFor ? { about: lookedFor } : {}),
    ...(text.trim() ? { text: text.trim() } : {}),
  };
}
