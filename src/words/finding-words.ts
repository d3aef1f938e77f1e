import type { Certainty, Extent, FindingRow, Known } from '#shared/finding/finding.ts';
import { lengthText, type Units } from '#shared/measure/length.ts';
import type { SoundRow } from '#shared/sound/sound.ts';
import { findingWords } from '#shared/trade/finding-words.ts';
import { placeWords } from '#src/words/place-words.ts';
import { capital } from '#src/words/who.ts';

/** How a thing is known, each stronger than the one before. */
export const KNOWN_WORDS: Record<Known, string> = {
  heard: 'heard of',
  seen: 'seen',
  sounded: 'sounded',
  probed: 'probed',
  metered: 'metered',
  opened: 'opened up',
  'cut-to-sound': 'cut to sound',
};

export const CERTAINTY_WORDS: Record<Certainty, string> = { suspected: 'suspected', proved: 'proved' };

const EXTENT_WORDS = { lengthMm: 'long', widthMm: 'wide', depthMm: 'deep' } as const;

/** '11 in long, 3/4 in deep'; empty where nothing was measured. */
export function extentWords(extent: Extent | null | undefined, units: Units): string {
  if (!extent) return '';
  return (Object.keys(EXTENT_WORDS) as (keyof typeof EXTENT_WORDS)[])
    .flatMap((field) => {
      const mm = extent[field];
      return mm === undefined ? [] : [`${lengthText(mm, units)} ${EXTENT_WORDS[field]}`];
    })
    .join(', ');
}

/** 'Rot, deck beam 4 port'. */
export function findingTitle({ kind, place }: Pick<FindingRow, 'kind' | 'place'>): string {
  return capital([findingWords(kind), placeWords(place)].filter(Boolean).join(', '));
}

/** 'Sound: deck beam 4 port, no rot'. */
export function soundTitle({ place, about }: Pick<SoundRow, 'place' | 'about'>): string {
  const where = placeWords(place) || 'what was looked at';
  return `Sound: ${where}${about ? `, no ${findingWords(about)}` : ''}`;
}
