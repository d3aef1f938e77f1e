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
      {bars}
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
  level?: 2 | 3;
  children: ReactNode;
}

/** A titled part of a page. */
export function Section({ title, aside, level = 2, children }: SectionProps) {
  const Heading = level === 2 ? 'h2' : 'h3';
  return (
    <section className="pb-6">
      <div className="flex items-center justify-between gap-4 px-4 pt-6 pb-3 md:px-6">
        <Heading className={`leading-tight font-bold ${level === 2 ? 'text-[24px]' : 'text-[20px]'}`}>
          {title}
        </Heading>
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
    <div data-keys className="sticky bottom-0 z-30 border-t-[3px] border-bilge bg-primer">
      <div className="mx-auto grid max-w-[820px] gap-3 p-3 pb-[calc(12px+env(safe-area-inset-bottom))]">
        {children}
      </div>
    </div>
  );
}

/** Keys side by side in one row, all of one width. */
export function KeyRow({ children }: KeyRackProps) {
  return <div className="grid auto-cols-fr grid-flow-col gap-3">{children}</div>;
}
