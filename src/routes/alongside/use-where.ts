import { useState } from 'react';
import { useRead, useReplica } from '#src/replica/hooks.tsx';
import { readWhere, type Where } from '#src/routes/alongside/read-boats.ts';

/** The boat and stage that this person works at, and the way to another, which is remembered. Null without a boat. */
export function useWhere(): [Where | null, (where: Where) => void] {
  const replica = useReplica();
  const [chosen, setChosen] = useState<Partial<Where>>(() => {
    const { boatId, stageId } = replica.remember.read();
    return boatId === null ? {} : { boatId, stageId };
  });
  const where = useRead(['where', chosen.boatId, chosen.stageId], (view) => readWhere(view, chosen));
  function choose(next: Where) {
    setChosen(next);
    void replica.remember.write(next);
  }
  return [where, choose];
}
