import { KeyRack } from '#src/components/page.tsx';
import { Undo } from '#src/components/undo.tsx';
import type { Deeds } from '#src/shell/use-deeds.ts';

/** What was just done, at the foot of the screen, with the way back for eight seconds. */
export function DeedBar({ deeds: { last, undo, forget } }: { deeds: Deeds }) {
  if (!last || last.back.length === 0) return null;
  return (
    <KeyRack>
      <div className="-m-3">
        <Undo key={last.count} words={last.words} onUndo={undo} onGone={forget} />
      </div>
    </KeyRack>
  );
}
