import { useState } from 'react';
import { useMutation } from '@tanstack/react-query';
import { useReplica } from '#src/replica/hooks.tsx';
import type { KeptPicture } from '#src/replica/photos/picture.ts';
import type { Replica } from '#src/replica/replica.ts';
import type { Done } from '#src/routes/alongside/done.ts';
import { logPhotos } from '#src/routes/alongside/photos/log-photos.ts';
import {
  PHOTOS_DRAFT_KEY,
  photosProblem,
  readPhotosDraft,
  type PhotosDraft,
} from '#src/routes/alongside/photos/photos-draft.ts';
import { readCarried } from '#src/routes/alongside/place/carried.ts';
import type { Where } from '#src/routes/alongside/read-boats.ts';
import { useDraft } from '#src/routes/alongside/use-draft.ts';

/** What photographs are to belong to, beside the boat. */
export interface PhotosOf {
  entryId: string | null;
  findingId: string | null;
}

/** The photographs that are taken and not logged yet, and what can be done with them. */
export function usePhotosForm(where: Where, of: PhotosOf, onLogged: (done: Done) => void) {
  const replica = useReplica();
  const { draft, changeBy, clear, isUnkept } = useDraft(PHOTOS_DRAFT_KEY, (kept) =>
    openPhotos(replica, where, of, kept),
  );
  const [isAsked, setAsked] = useState(false);
  const logging = useMutation({
    mutationFn: async () => {
      const done = await logPhotos(replica, draft);
      await clear();
      return done;
    },
    networkMode: 'always',
    retry: false,
    onSuccess: onLogged,
  });
  const problem = photosProblem(draft);
  return {
    draft,
    isUnkept,
    problem: isAsked ? problem : undefined,
    isLogging: logging.isPending,
    failure: logging.error?.message ?? null,
    change: (next: Partial<PhotosDraft>) => changeBy((kept) => ({ ...kept, ...next })),
    add: (pictures: KeptPicture[]) =>
      changeBy((kept) => ({ ...kept, pictures: [...kept.pictures, ...pictures] })),
    remove(picture: KeptPicture) {
      changeBy((kept) => ({
        ...kept,
        pictures: kept.pictures.filter(({ photoId }) => photoId !== picture.photoId),
      }));
      void replica.dropKept([picture]).catch(() => undefined);
    },
    log() {
      setAsked(true);
      if (problem === undefined) logging.mutate();
    },
  };
}

/** The pictures as they were left, for what they are asked for now; those already in the record are left out. */
function openPhotos(replica: Replica, where: Where, of: PhotosOf, kept: unknown): PhotosDraft {
  const view = replica.view();
  const draft = readPhotosDraft(kept);
  const pictures = (draft?.pictures ?? []).filter(({ photoId }) => !view.find('photo', photoId));
  const isFor = of.entryId !== null || of.findingId !== null;
  if (draft && pictures.length > 0 && !isFor) return { ...draft, pictures };
  const finding = of.findingId === null ? undefined : view.find('finding', of.findingId);
  const carried = readCarried(replica, where.boatId);
  return {
    ...where,
    ...of,
    place: finding?.place ?? carried.place,
    set: carried.set,
    caption: '',
    pictures,
  };
}
