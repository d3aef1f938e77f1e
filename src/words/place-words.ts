import type { Place } from '#shared/place/place.ts';
import { partWords } from '#shared/trade/part-words.ts';

export const SIDE_WORDS: Record<NonNullable<Place['side']>, string> = {
  port: 'port',
  starboard: 'starboard',
  centre: 'centre',
  both: 'both sides',
};

/** 'deck beam 4 port', 'frame 6 to 9, by the bulkhead'; empty where nothing of it is said. */
export function placeWords(place: Place | null | undefined): string {
  if (!place) return '';
  const { partId, side, number, toNumber, words } = place;
  const numbers = toNumber === undefined ? number : `${number ?? ''} to ${toNumber}`.trim();
  const named = [partId && partWords(partId), numbers, side && SIDE_WORDS[side]].filter(
    (word) => word !== undefined && word !== '',
  );
  return [named.join(' '), words?.trim()].filter(Boolean).join(', ');
}
