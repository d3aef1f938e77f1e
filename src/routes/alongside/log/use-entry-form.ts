import { useState } from 'react';
import { useMutation } from '@tanstack/react-query';
import type { Day } from '#shared/sync/day.ts';
import { useReplica } from '#src/replica/hooks.tsx';
import type { KeptPicture } from '#src/replica/photos/picture.ts';
import type { Replica } from '#src/replica/replica.ts';
import {
  draftProblems,
  emptyDraft,
  isWorthKeeping,
  readDraft,
  type EntryDraft,
} from '#src/routes/alongside/log/entry-draft.ts';
import { DRAFT_KEY } from '#src/routes/alongside/log/waiting-draft.ts';
import { logEntry, untickedYet } from '#src/routes/alongside/log/log-entry.ts';
import type { Done } from '#src/routes/alongside/done.ts';
import { readCarried } from '#src/routes/alongside/place/carried.ts';
import type { Where } from '#src/routes/alongside/read-boats.ts';
import { useDraft } from '#src/routes/alongside/use-draft.ts';

/** Somebody else's day that an entry is to be about. */
export interface LogFor {
  personId: string;
  day: Day;
}

/** The form's draft and what can be done with it. */
export function useEntryForm(where: Where, logFor: LogFor | null, onLogged: (done: Done) => void) {
  const replica = useReplica();
  const { draft, change, changeBy, clear, isUnkept } = useDraft(draftKey(logFor), (kept) =>
    openDraft(replica, where, logFor, kept),
  );
  const [restoredAt, setRestoredAt] = useState(draft.keptAt);
  const [emptied, setEmptied] = useState<EntryDraft | null>(null);
  const [isAsked, setAsked] = useState(false);
  const logging = useMutation({
    mutationFn: async () => {
      const logged = await logEntry(replica, draft);
      await clear();
      return logged;
    },
    networkMode: 'always',
    retry: false,
    onSuccess: onLogged,
  });

  function log() {
    setAsked(true);
    if (Object.keys(draftProblems(draft, replica.view().me.personId)).length === 0) logging.mutate();
  }

  /** Changes the draft; an empty one says that nothing waits on it. */
  const changeTo = (make: (kept: EntryDraft) => EntryDraft) =>
    changeBy((kept) => {
      const next = make(kept);
      return { ...next, keptAt: isWorthKeeping(next) ? new Date(replica.view().nowMs).toISOString() : null };
    });

  return {
    draft,
    isUnkept,
    /** when the draft that was found here was last changed; null for a new one */
    restoredAt,
    /** 'Log it' was pressed, so that what is missing is told */
    isAsked,
    isLogging: logging.isPending,
    failure: logging.error?.message ?? null,
    emptied,
    newId: () => replica.newId(),
    change: (next: Partial<EntryDraft>) => changeTo((kept) => ({ ...kept, ...next })),
    addPictures: (pictures: KeptPicture[]) =>
      changeTo((kept) => ({ ...kept, pictures: [...kept.pictures, ...pictures] })),
    removePicture(picture: KeptPicture) {
      changeTo((kept) => ({
        ...kept,
        pictures: kept.pictures.filter(({ photoId }) => photoId !== picture.photoId),
      }));
      void replica.dropKept([picture]).catch(() => undefined);
    },
    log,
    empty() {
      setEmptied(draft);
      setRestoredAt(null);
      setAsked(false);
      void clear();
    },
    bringBack() {
      if (emptied) change(emptied);
      setEmptied(null);
    },
    forgetEmptied() {
      if (emptied) void replica.dropKept(emptied.pictures).catch(() => undefined);
      setEmptied(null);
    },
  };
}

// a draft of one's own is not taken for somebody else's day, nor theirs for one's own
function draftKey(logFor: LogFor | null): string {
  return logFor ? `${DRAFT_KEY}/${logFor.personId}/${logFor.day}` : DRAFT_KEY;
}

function freshDraft(replica: Replica, where: Where, logFor: LogFor | null): EntryDraft {
  const { place } = readCarried(replica, where.boatId);
  const draft = emptyDraft(where, logFor?.day ?? replica.view().today, replica.newId(), place);
  return logFor ? { ...draft, along: [{ personId: logFor.personId, minutes: null }] } : draft;
}

/** The draft as it was left; a new one where nothing is on it, or where its entry is already in the record. */
function openDraft(replica: Replica, where: Where, logFor: LogFor | null, kept: unknown): EntryDraft {
  const view = replica.view();
  const fresh = freshDraft(replica, where, logFor);
  const draft = readDraft(kept);
  if (!draft || !isWorthKeeping(draft) || !view.find('boat', draft.boatId)) return fresh;
  // cut off between the entry and its ticks: the ticks are still to be made
  if (view.find('entry', draft.entryId)) return { ...fresh, ticked: untickedYet(view, draft) };
  return draft;
}
