import type { ReactNode } from 'react';

interface PageProps {
  /** NameBar or TopBar, and StateBar. */
  bars?: ReactNode;
  /** KeyRack: the keys at the foot of a crew screen. */
  foot?: ReactNode;
  /** 'wide' fills a desk; 'line' keeps to the width of a readable column. 'line' unless told. */
  width?: 'wide' | 'line';
  children: ReactNode;
}

/** A whole screen: bars above, the page's main part, keys at the foot within the thumb's reach. */
export function Page({ bars, foot, width = 'line', children }: PageProps) {
  return (
    <div className="flex min-h-dvh flex-col bg-primer text-bilge">
      {bars !== undefined && (
        // what a bar says begins where the page's column does
        <header className={width === 'line' ? '[--bar-inset:max(24px,calc(50vw-386px))]' : ''}>{bars}</header>
      )}
      <main className={`mx-auto w-full flex-1 ${width === 'wide' ? 'max-w-[1440px]' : 'max-w-[820px]'}`}>
        {children}
      </main>
      {foot}
    </div>
  );
}

interface SectionProps {
  title: ReactNode;
  /** Beside the title: a count, a key. */
  aside?: ReactNode;
  /** 2 unless told; 1 where no NameBar names the page. */
  level?: 1 | 2 | 3;
  children: ReactNode;
}

const TITLE_SIZES = { 1: 'text-[30px]', 2: 'text-[24px]', 3: 'text-[20px]' };

/** A titled part of a page. */
export function Section({ title, aside, level = 2, children }: SectionProps) {
  const Heading = `h${level}` as const;
  return (
    <section className="pb-2">
      <div className="flex flex-wrap items-center justify-between gap-x-4 gap-y-3 px-4 pt-6 pb-3 md:px-6">
        <Heading className={`leading-tight font-bold ${TITLE_SIZES[level]}`}>{title}</Heading>
        {aside}
      </div>
      {children}
    </section>
  );
}

interface KeyRackProps {
  children: ReactNode;
}

/** The keys of a crew screen, always at the foot: rows of keys, 12 px apart. */
export function KeyRack({ children }: KeyRackProps) {
  return (
    <footer data-keys className="sticky bottom-0 z-30 border-t-[3px] border-bilge bg-primer">
      <div className="mx-auto grid max-w-[820px] gap-3 p-3 pb-[calc(12px+env(safe-area-inset-bottom))]">
        {children}
      </div>
    </footer>
  );
}

/** Keys side by side in one row, all of one width. */
export function KeyRow({ children }: KeyRackProps) {
  return <div className="grid auto-cols-fr grid-flow-col gap-3">{children}</div>;
}
