import { useState } from 'react';
import { useMutation } from '@tanstack/react-query';
import { useReplica } from '#src/replica/hooks.tsx';
import type { KeptPicture } from '#src/replica/photos/picture.ts';
import type { Replica } from '#src/replica/replica.ts';
import type { Done } from '#src/routes/alongside/done.ts';
import {
  emptyFound,
  FOUND_DRAFT_KEY,
  foundProblems,
  isFoundWorthKeeping,
  readFoundDraft,
  type FoundDraft,
} from '#src/routes/alongside/found/found-draft.ts';
import { logFound } from '#src/routes/alongside/found/log-found.ts';
import { readCarried } from '#src/routes/alongside/place/carried.ts';
import type { Where } from '#src/routes/alongside/read-boats.ts';
import { useDraft } from '#src/routes/alongside/use-draft.ts';

/** The form's draft and what can be done with it. */
export function useFoundForm(where: Where, entryId: string | null, onLogged: (done: Done) => void) {
  const replica = useReplica();
  const { draft, changeBy, clear, isUnkept } = useDraft(FOUND_DRAFT_KEY, (kept) =>
    openFound(replica, where, entryId, kept),
  );
  const [isAsked, setAsked] = useState(false);
  const logging = useMutation({
    mutationFn: async () => {
      const done = await logFound(replica, draft);
      await clear();
      return done;
    },
    networkMode: 'always',
    retry: false,
    onSuccess: onLogged,
  });
  return {
    draft,
    isUnkept,
    /** it was asked to be logged, so that what is missing is told */
    isAsked,
    isLogging: logging.isPending,
    failure: logging.error?.message ?? null,
    change: (next: Partial<FoundDraft>) => changeBy((kept) => ({ ...kept, ...next })),
    addPictures: (pictures: KeptPicture[]) =>
      changeBy((kept) => ({ ...kept, pictures: [...kept.pictures, ...pictures] })),
    log() {
      setAsked(true);
      if (Object.keys(foundProblems(draft)).length === 0) logging.mutate();
    },
    empty() {
      setAsked(false);
      void replica.dropKept(draft.pictures).catch(() => undefined);
      void clear();
    },
  };
}

/** The form as it was left; a new one where nothing is on it, or where what it was about is already in the record. */
function openFound(replica: Replica, where: Where, entryId: string | null, kept: unknown): FoundDraft {
  const view = replica.view();
  const draft = readFoundDraft(kept);
  const isMade = draft && view.find(draft.isSound ? 'sound' : 'finding', draft.rowId) !== undefined;
  if (draft && !isMade && isFoundWorthKeeping(draft) && view.find('boat', draft.boatId)) {
    return { ...draft, entryId: entryId ?? draft.entryId };
  }
  const { place } = readCarried(replica, where.boatId);
  return emptyFound({ ...where, entryId, place }, replica.newId());
}
