import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import { useReplica } from '#src/replica/hooks.tsx';
import type { Holding } from '#src/replica/replica.ts';

/** Something done in one tap, all of it held in one write, and what takes it back. */
export interface Deed {
  /** 'Rosa: 2 tasks for Wed 9 Dec' */
  words: string;
  holdings: Holding[];
  /** the ops that undo it; empty where this person may not */
  back: Holding[];
}

export interface Deeds {
  doIt: (deed: Deed, onHeld?: () => void) => void;
  /** the last deed, while the way back stands; `count` tells one from the next */
  last: (Deed & { count: number }) | null;
  undo: () => void;
  forget: () => void;
  failure: string | null;
  isPending: boolean;
}

/** Holds deeds one by one and keeps the way back from the last of them. */
export function useDeeds(): Deeds {
  const replica = useReplica();
  const [last, setLast] = useState<Deeds['last']>(null);
  const { mutate, error, isPending } = useMutation({
    mutationFn: (holdings: Holding[]) => replica.holdAll(holdings),
    networkMode: 'always',
    retry: false,
  });
  return {
    doIt: (deed, onHeld) =>
      mutate(deed.holdings, {
        onSuccess() {
          setLast((before) => ({ ...deed, count: (before?.count ?? 0) + 1 }));
          onHeld?.();
        },
      }),
    last,
    undo: () => last && mutate(last.back, { onSuccess: () => setLast(null) }),
    forget: () => setLast(null),
    failure: error?.message ?? null,
    isPending,
  };
}
