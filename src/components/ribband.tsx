import type { ReactNode } from 'react';

interface RibbandProps {
  children: ReactNode;
  /** The accessible name of the list of days, for example 'Juniper Tide, day by day'. */
  label: string;
}

/** The batten that a dated list hangs on: holds DayHead, Planks and DayTicks, and draws the one vertical line through them. */
export function Ribband({ children, label }: RibbandProps) {
  return (
    <section
      aria-label={label}
      className="relative isolate [--rib:68px] before:absolute before:inset-y-0 before:left-[calc(var(--rib)-1.5px)] before:z-10 before:w-[3px] before:bg-bilge md:[--rib:88px]"
    >
      {children}
    </section>
  );
}

interface PlanksProps {
  children: ReactNode;
}

/** Rows laid edge to edge with a seam between them; holds Plank, or PlainPlank off the line. */
export function Planks({ children }: PlanksProps) {
  return <ul className="grid grid-cols-[minmax(0,1fr)] gap-seam bg-line py-seam">{children}</ul>;
}
