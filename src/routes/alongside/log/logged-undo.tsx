import { useState } from 'react';
import { Undo } from '#src/components/undo.tsx';
import { useReplica } from '#src/replica/hooks.tsx';
import type { Replica } from '#src/replica/replica.ts';
import {
  DRAFT_KEY,
  isWorthKeeping,
  readDraft,
  type EntryDraft,
} from '#src/routes/alongside/log/entry-draft.ts';

/** What the form leaves to the screen after it. */
export interface Logged {
  logged: 'entry';
  entryId: string;
  words: string;
  draft: EntryDraft;
}

const UNDONE_WHY = 'undone at once';

/** Whether the screen before this one left a logged entry. */
export function isLogged(state: unknown): state is Logged {
  return typeof state === 'object' && state !== null && (state as Partial<Logged>).logged === 'entry';
}

/** What was just logged, and for eight seconds the way back: the entry is struck, its ticks taken back, its words are on the form again. */
export function LoggedUndo({ logged, onGone }: { logged: Logged; onGone: () => void }) {
  const replica = useReplica();
  const [problem, setProblem] = useState<string | null>(null);
  async function undo() {
    try {
      await undoLogged(replica, logged);
      onGone();
    } catch (error) {
      setProblem(error instanceof Error ? error.message : String(error));
    }
  }
  return (
    <div className="-mx-3 -mt-3">
      <Undo words={problem ?? logged.words} onUndo={() => void undo()} onGone={onGone} />
    </div>
  );
}

async function undoLogged(replica: Replica, { entryId, draft }: Logged): Promise<void> {
  await bringBackDraft(replica, draft);
  for (const { taskId, markId } of draft.ticked) {
    await replica.hold('task.unmark', { taskId, markIds: [markId] });
  }
  await replica.hold('entry.strike', { entryId, why: UNDONE_WHY });
}

/** The words are on the form again, under new ids; words begun since then are not pushed aside. */
async function bringBackDraft(replica: Replica, draft: EntryDraft): Promise<void> {
  const begun = readDraft(replica.draft.read(DRAFT_KEY));
  if (begun && isWorthKeeping(begun)) return;
  const ticked = draft.ticked.map(({ taskId }) => ({ taskId, markId: replica.newId() }));
  await replica.draft.write(DRAFT_KEY, { ...draft, ticked, entryId: replica.newId() });
}
