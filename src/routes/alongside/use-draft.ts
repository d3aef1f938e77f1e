import { useMemo, useRef, useState } from 'react';
import { useReplica } from '#src/replica/hooks.tsx';
import { DraftWriter } from '#src/routes/alongside/draft-writer.ts';

export interface DraftHandle<T> {
  draft: T;
  /** Shows it at once and keeps it on the device. */
  change: (next: T) => void;
  /** As `change`, of whatever stands by then: for what comes later, as a picture that takes time to prepare. */
  changeBy: (make: (draft: T) => T) => void;
  /** Ends it: an empty one on the screen, none on the device. Resolves when that is so. */
  clear: () => Promise<void>;
  /** The device could not keep it, so that it lives on this screen alone. */
  isUnkept: boolean;
}

/** A draft of this person's, as they left it, or a new one. `read` makes a draft of whatever an older version kept. */
export function useDraft<T>(key: string, read: (kept: unknown) => T): DraftHandle<T> {
  const replica = useReplica();
  const [draft, setDraft] = useState(() => read(replica.draft.read(key)));
  const latest = useRef(draft);
  const [isUnkept, setUnkept] = useState(false);
  const writer = useMemo(() => new DraftWriter(replica.draft, key, () => setUnkept(true)), [replica, key]);
  function change(next: T) {
    latest.current = next;
    setDraft(next);
    void writer.keep(next);
  }
  return {
    draft,
    change,
    changeBy: (make) => change(make(latest.current)),
    clear() {
      latest.current = read(undefined);
      setDraft(latest.current);
      return writer.clear();
    },
    isUnkept,
  };
}
