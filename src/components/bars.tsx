import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { BungMark } from '#src/components/bung-mark.tsx';
import { Icon } from '#src/components/icons.tsx';

interface NameBarProps {
  title: string;
  subTitle?: ReactNode;
  /** The right end: who is here, another boat, a key. */
  right?: ReactNode;
  /** Makes the title and what stands under it one key, described by `pressWords`, for example 'other boat'. */
  onPress?: () => void;
  pressWords?: string;
}

/** The boat's name bar, a varnished coaming; its title is the page's heading. */
export function NameBar({ title, subTitle, right, onPress, pressWords }: NameBarProps) {
  return (
    <div className="focus-deep flex min-h-[76px] items-center gap-3 bg-coaming px-4 pt-[calc(8px+env(safe-area-inset-top))] pb-3 text-on-coaming md:px-[var(--bar-inset,24px)] print:bg-transparent print:px-0 print:text-black">
      <div className="relative min-w-0 flex-1">
        <h1 className="text-[27px] leading-[1.1] font-bold tracking-[-0.01em] break-words md:text-[32px]">
          {onPress ? (
            <button
              type="button"
              aria-haspopup="dialog"
              className="text-left after:absolute after:-inset-y-2 after:inset-x-0"
              onClick={onPress}
            >
              {title}
              {pressWords !== undefined && <span className="sr-only">, {pressWords}</span>}
            </button>
          ) : (
            title
          )}
        </h1>
        {subTitle !== undefined && (
          <p className="text-[18px] leading-snug">
            {subTitle}
            {pressWords !== undefined && (
              <span aria-hidden="true">
                {' · '}
                <span className="whitespace-nowrap underline decoration-2 underline-offset-4">
                  {pressWords}
                </span>
              </span>
            )}
          </p>
        )}
      </div>
      {right !== undefined && (
        <div className="shrink-0 text-right text-[18px] leading-snug print:hidden">{right}</div>
      )}
    </div>
  );
}

export type BarTone = 'held' | 'quiet' | 'warning';

interface StateBarProps {
  tone: BarTone;
  left: ReactNode;
  right?: ReactNode;
  /** Where a tap leads: the list of what is held. */
  to?: string;
}

const TONES: Record<BarTone, string> = {
  held: 'bg-seam text-on-seam border-on-seam [--bilge:var(--on-seam)] [--plank:var(--seam)]',
  quiet: 'bg-plank text-slate border-line',
  warning: 'bg-redlead text-on-redlead border-redlead [--focus:var(--on-redlead)]',
};

/** The state of the record in words, always in sight. */
export function StateBar({ tone, left, right, to }: StateBarProps) {
  const look = `flex min-h-key items-center justify-between gap-4 border-b-[3px] px-4 py-1 text-[18px] leading-tight md:px-[var(--bar-inset,24px)] ${TONES[tone]}`;
  const words = (
    <>
      <span className="flex items-center gap-2 font-bold">
        {tone === 'held' && <BungMark mark="held" word="" />}
        {tone === 'warning' && <Icon name="warning" />}
        {left}
      </span>
      {right !== undefined && <span className="text-right">{right}</span>}
    </>
  );
  if (to === undefined)
    return (
      <div data-bar className={look}>
        {words}
      </div>
    );
  return (
    <Link
      data-bar
      to={to}
      className={`${look} underline decoration-2 underline-offset-4 focus-visible:outline-offset-[-6px]`}
    >
      {words}
    </Link>
  );
}
