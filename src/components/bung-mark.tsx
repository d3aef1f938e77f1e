import type { ReactNode } from 'react';

/** What an item has come through, told by a mark taken from bunging a fastening. */
export type Bung = 'held' | 'sent' | 'released' | 'loose' | 'struck';

/** The word for each mark, for wherever a mark stands. */
export const BUNG_WORDS: Record<Bung, string> = {
  held: 'held on this device',
  sent: 'sent',
  released: 'released to the owner',
  loose: 'loose end',
  struck: 'struck',
};

const RING = { stroke: 'var(--bilge)', strokeWidth: 2.6 };
const CUT = { fill: 'none', stroke: 'var(--bilge)', strokeWidth: 2.4 };
const GRAIN = { fill: 'none', stroke: 'var(--on-coaming)', strokeWidth: 1.5 };

const DRAWINGS: Record<Bung, ReactNode> = {
  // an empty hole, the screw's cross still to be seen
  held: (
    <>
      <circle cx="14" cy="14" r="11" fill="var(--plank)" {...RING} />
      <path d="M14 8.500v11M8.500 14h11" {...CUT} />
    </>
  ),
  // set proud: a filled bung, its grain running across
  sent: (
    <>
      <circle cx="14" cy="14" r="11" fill="var(--coaming)" />
      <path
        d="M3 12.500c6 0 12-4 20-4.500M2.500 18c8 0 14-5 23-5.500M6 22.500c6 0 11-3.500 18-5"
        {...GRAIN}
      />
      <circle cx="14" cy="14" r="11" fill="none" {...RING} />
    </>
  ),
  // pared flush: the plank's surface, and the bung's fine edge in it, grain in line
  released: (
    <>
      <path d="M1 4h26v20H1z" fill="var(--coaming)" />
      <path d="M1 8.500h26M1 19.500h26M1 14h5.500M21.500 14H27" {...GRAIN} />
      <circle cx="14" cy="14" r="7.500" {...GRAIN} fill="var(--coaming)" strokeWidth={2.2} />
      <path d="M8 14h12" {...GRAIN} />
    </>
  ),
  // split along a crack, one half slipped down
  loose: (
    <>
      <circle cx="14" cy="14" r="13.500" fill="var(--plank)" />
      <path
        d="M15.500 1.500A11 11 0 009.500 22.500l4-5.500-4.500-3.500 5-5z"
        fill="none"
        {...RING}
        strokeLinejoin="round"
      />
      <path
        d="M19.500 4.800A11 11 0 0114 26l4-6.500-4.500-4 5-5.200z"
        fill="none"
        {...RING}
        strokeLinejoin="round"
      />
    </>
  ),
  // a stroke through
  struck: (
    <>
      <circle cx="14" cy="14" r="9" fill="var(--plank)" stroke="var(--slate)" strokeWidth="2" />
      <path d="M1.500 21.500L26.500 6.500" {...CUT} strokeWidth={3.4} />
    </>
  ),
};

interface BungMarkProps {
  mark: Bung;
  /** The accessible name where `BUNG_WORDS` does not say enough; an empty string where the same words stand beside it. */
  word?: string;
  /** Edge in px; 26 unless told. */
  size?: number;
}

/** One mark of the ribband line, told by shape first, with its word as accessible name. */
export function BungMark({ mark, word = BUNG_WORDS[mark], size = 26 }: BungMarkProps) {
  return (
    <svg
      className="shrink-0"
      width={size}
      height={size}
      viewBox="0 0 28 28"
      data-mark={mark}
      {...(word ? { role: 'img', 'aria-label': word } : { 'aria-hidden': true })}
    >
      {DRAWINGS[mark]}
    </svg>
  );
}
