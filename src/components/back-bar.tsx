import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { Icon } from '#src/components/icons.tsx';

interface BackBarProps {
  title: string;
  /** Where the back key leads. */
  to: string;
  /** The word of the back key for a screen reader, for example 'Back to Juniper Tide'. */
  backWord: string;
  subTitle?: ReactNode;
  right?: ReactNode;
  /** On the ground of the NameBar, for a page that belongs to what is named there. */
  isCoaming?: boolean;
}

/** The bar of a page that was opened from another: the way back, and the page's heading. */
export function BackBar({ title, to, backWord, subTitle, right, isCoaming = false }: BackBarProps) {
  return (
    <div
      className={`focus-deep flex min-h-[64px] items-center gap-1 pt-[env(safe-area-inset-top)] pr-4 md:pr-[var(--bar-inset,24px)] md:pl-[calc(var(--bar-inset,60px)-60px)] print:bg-transparent print:text-black ${isCoaming ? 'bg-coaming text-on-coaming' : 'bg-deep text-on-deep'}`}
    >
      <Link
        data-bar
        to={to}
        aria-label={backWord}
        className="flex size-key shrink-0 items-center justify-center focus-visible:outline-offset-[-6px]"
      >
        <Icon name="back" />
      </Link>
      <div className="min-w-0 flex-1 py-2">
        <h1 className="text-[24px] leading-tight font-bold break-words">{title}</h1>
        {subTitle !== undefined && <p className="text-[18px] leading-snug">{subTitle}</p>}
      </div>
      {right !== undefined && <div className="shrink-0 text-right text-[18px]">{right}</div>}
    </div>
  );
}
