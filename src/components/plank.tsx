import type { ReactNode } from 'react';
import { type Bung, BungMark } from '#src/components/bung-mark.tsx';

interface PlankProps {
  mark: Bung;
  /** The mark's word where the usual one does not say enough. */
  markWord?: string;
  /** What stands left of the line: a time of day, or a weekday in short. Five characters fit. */
  time?: ReactNode;
  children: ReactNode;
  id?: string;
}

/** A row on the ribband line: its mark on the line, its time to the left, its body to the right. */
export function Plank({ mark, markWord, time, children, id }: PlankProps) {
  return (
    <li
      id={id}
      className="relative min-h-key bg-plank py-[15px] pr-4 pl-[calc(var(--rib)+28px)] md:pr-6 md:pl-[calc(var(--rib)+36px)]"
    >
      {time !== undefined && (
        <span className="absolute top-[15px] left-0 w-[calc(var(--rib)-18px)] text-right tracking-[-0.01em] whitespace-nowrap text-slate">
          {time}
        </span>
      )}
      <span className="absolute top-[15px] left-[calc(var(--rib)-13px)] z-20">
        <BungMark mark={mark} word={markWord} />
      </span>
      <div className="min-w-0 break-words">{children}</div>
    </li>
  );
}

interface PlainPlankProps {
  children: ReactNode;
  id?: string;
}

/** A row off the line, for lists that are not dated. */
export function PlainPlank({ children, id }: PlainPlankProps) {
  return (
    <li id={id} className="min-h-key bg-plank px-4 py-[15px] break-words md:px-6">
      {children}
    </li>
  );
}
