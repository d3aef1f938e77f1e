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
}

/** The bar of a page that was opened from another: the way back, and the page's heading. */
export function BackBar({ title, to, backWord, subTitle, right }: BackBarProps) {
  return (
    <div className="focus-deep flex min-h-[64px] items-center gap-1 bg-deep pt-[env(safe-area-inset-top)] pr-4 text-on-deep print:bg-transparent print:text-black">
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
