import { useState } from 'react';
import { Undo } from '#src/components/undo.tsx';
import { useReplica } from '#src/replica/hooks.tsx';
import type { Replica } from '#src/replica/replica.ts';
import type { Done } from '#src/routes/alongside/done.ts';

interface DoneUndoProps {
  done: Done;
  onGone: () => void;
  /** done once what was held is taken back */
  onUndone?: () => void;
}

/** What was just held, and for eight seconds the way back. */
export function DoneUndo({ done, onGone, onUndone }: DoneUndoProps) {
  const replica = useReplica();
  const [problem, setProblem] = useState<string | null>(null);
  async function undo() {
    try {
      await bringBackDraft(replica, done);
      await replica.holdAll(done.undo);
      onUndone?.();
      onGone();
    } catch (error) {
      setProblem(error instanceof Error ? error.message : String(error));
    }
  }
  return (
    <div className="-mx-3 -mt-3">
      <Undo key={done.done} words={problem ?? done.words} onUndo={() => void undo()} onGone={onGone} />
    </div>
  );
}

async function bringBackDraft(replica: Replica, { draftBack }: Done): Promise<void> {
  if (!draftBack || replica.draft.read(draftBack.key) !== undefined) return;
  await replica.draft.write(draftBack.key, draftBack.value);
}
