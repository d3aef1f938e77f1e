import { type ReactNode, useState } from 'react';
import { NavLink } from 'react-router-dom';
import { Badge } from '#src/components/badge.tsx';
import { Icon } from '#src/components/icons.tsx';
import { Sheet } from '#src/components/sheet.tsx';

export interface Place {
  to: string;
  label: string;
  /** How many things wait there; nothing is shown for 0. */
  count?: number;
}

interface TopBarProps {
  places: readonly Place[];
  /** The right end: the person and the state of the record. */
  right?: ReactNode;
}

/** The bar of the places: a row of links on a desk, one key that opens the same list on a narrow screen. */
export function TopBar({ places, right }: TopBarProps) {
  return (
    <div
      data-bar
      className="focus-deep flex min-h-[60px] items-stretch gap-4 bg-deep px-4 pt-[env(safe-area-inset-top)] text-on-deep md:px-6"
    >
      <NarrowNav places={places} />
      <span className="hidden items-center text-[20px] font-bold xl:flex">Ribband</span>
      <nav aria-label="Places" className="hidden items-stretch gap-3 xl:flex">
        {places.map((place) => (
          <NavLink key={place.to} to={place.to} className={deskLink}>
            {place.label}
            <Badge count={place.count ?? 0} />
          </NavLink>
        ))}
      </nav>
      {right !== undefined && (
        <div className="ml-auto flex items-center text-right leading-tight">{right}</div>
      )}
    </div>
  );
}

function deskLink({ isActive }: { isActive: boolean }): string {
  const state = isActive ? 'border-seam font-bold' : 'border-transparent hover:border-on-deep';
  return `flex items-center gap-2 border-y-4 border-t-transparent px-3 focus-visible:outline-offset-[-5px] ${state}`;
}

function NarrowNav({ places }: { places: readonly Place[] }) {
  const [isOpen, setOpen] = useState(false);
  const close = () => setOpen(false);
  return (
    <div className="flex items-center xl:hidden">
      <button
        type="button"
        className="-ml-3 flex min-h-key items-center gap-2 px-3 font-bold focus-visible:outline-offset-[-5px]"
        aria-haspopup="dialog"
        onClick={() => setOpen(true)}
      >
        <Icon name="list" /> Places
      </button>
      <Sheet isOpen={isOpen} onClose={close} title="Places">
        <nav aria-label="Places" className="grid gap-3">
          {places.map((place) => (
            <NavLink key={place.to} to={place.to} className={sheetLink} onClick={close}>
              {place.label}
              <Badge count={place.count ?? 0} />
            </NavLink>
          ))}
        </nav>
      </Sheet>
    </div>
  );
}

function sheetLink({ isActive }: { isActive: boolean }): string {
  const state = isActive ? 'bg-deep text-on-deep font-bold' : 'bg-plank text-bilge';
  return `flex min-h-key items-center justify-between rounded-key border-2 border-bilge px-4 text-[20px] ${state}`;
}
