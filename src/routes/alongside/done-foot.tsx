import { KeyRack } from '#src/components/page.tsx';
import { DoneUndo } from '#src/routes/alongside/done-undo.tsx';
import type { Done } from '#src/routes/alongside/done.ts';

/** The foot of a page without keys of its own: what was just held there, and the way back. */
export function DoneFoot({ done, onGone }: { done: Done; onGone: () => void }) {
  return (
    <KeyRack>
      <div className="-mb-3">
        <DoneUndo key={done.done} done={done} onGone={onGone} />
      </div>
    </KeyRack>
  );
}
