import type { Place } from '#shared/place/place.ts';
import { PARTS, type Part } from '#shared/trade/parts.ts';
import type { View } from '#src/replica/view.ts';

const RECENT_MAX = 6;

/** The parts of a boat that were named last, newest first. */
export function readRecentParts(view: View, boatId: string): Part[] {
  const named = [
    ...view.all('finding').map(({ boatId, place, notedAt }) => ({ boatId, place, at: notedAt })),
    ...view.all('sound').map(({ boatId, place, notedAt }) => ({ boatId, place, at: notedAt })),
    ...view.all('photo').map(({ boatId, place, attachedAt }) => ({ boatId, place, at: attachedAt })),
  ]
    .filter((row) => row.boatId === boatId && row.place?.partId !== undefined)
    .sort((a, b) => (a.at < b.at ? 1 : -1));
  const ids = [...new Set(named.map(({ place }) => place!.partId!))].slice(0, RECENT_MAX);
  return ids.flatMap((id) => PARTS.find((part) => part.id === id) ?? []);
}

/** Parts whose name, or a word that people look for them by, has a word that begins so; the nearest first. */
export function searchParts(asked: string): Part[] {
  const words = asked.trim().toLowerCase().split(/\s+/).filter(Boolean);
  if (words.length === 0) return [...PARTS];
  const ranked = PARTS.map((part) => ({ part, rank: rankOf(part, words) })).filter(
    ({ rank }) => rank !== null,
  );
  return ranked.sort((a, b) => a.rank! - b.rank!).map(({ part }) => part);
}

function rankOf(part: Part, words: string[]): number | null {
  const isIn = (text: string) =>
    words.every((word) => text.split(/[\s-]+/).some((known) => known.startsWith(word)));
  if (part.word === words.join(' ')) return 0;
  if (part.word.startsWith(words[0]!) && isIn(part.word)) return 1;
  if (isIn(part.word)) return 2;
  if (part.also.some((also) => also === words.join(' '))) return 1;
  return part.also.some(isIn) ? 3 : null;
}

/** A place at another part: its side follows where the part has only one, and its number where it is counted. */
export function withPart(place: Place, part: Part | null): Place {
  const { partId: before, side, number, toNumber, ...rest } = place;
  if (!part) return { ...rest, ...(side ? { side } : {}) };
  const wasCentre = PARTS.find(({ id }) => id === before)?.sides === 'centre';
  const nextSide = part.sides === 'centre' ? ('centre' as const) : wasCentre ? undefined : side;
  const isSame = before === part.id;
  return {
    ...rest,
    partId: part.id,
    ...(nextSide ? { side: nextSide } : {}),
    ...(isSame && number !== undefined ? { number } : {}),
    ...(isSame && toNumber !== undefined ? { toNumber } : {}),
  };
}
