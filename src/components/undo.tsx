import { useEffect, useEffectEvent, useState } from 'react';
import { Key } from '#src/components/key.tsx';

interface UndoProps {
  /** What was done, for example 'Logged: 2 1/2 h on Juniper Tide'. Another `key` makes a new bar. */
  words: string;
  onUndo: () => void;
  /** Called once the bar has stood its time. */
  onGone: () => void;
}

const STANDS_MS = 8000;

/** What was just done, and the way back, for eight seconds; a finger, pointer or focus on it stops the time. */
export function Undo({ words, onUndo, onGone }: UndoProps) {
  const [isHeld, setHeld] = useState(false);
  // the parent draws again while the bar stands, which must not start its time anew
  const gone = useEffectEvent(onGone);
  useEffect(() => {
    if (isHeld) return;
    const timer = setTimeout(() => gone(), STANDS_MS);
    return () => clearTimeout(timer);
  }, [isHeld]);
  return (
    <div
      data-bar
      role="status"
      className="focus-deep flex min-h-[72px] items-center justify-between gap-3 bg-deep py-2 pr-2 pl-4 text-on-deep"
      onPointerEnter={() => setHeld(true)}
      onPointerLeave={() => setHeld(false)}
      onFocus={() => setHeld(true)}
      onBlur={() => setHeld(false)}
    >
      <span className="leading-tight">{words}</span>
      <Key icon="undo" onClick={onUndo}>
        Undo
      </Key>
    </div>
  );
}
