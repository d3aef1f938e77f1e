import type { PhotoRow } from '#shared/photo/photo.ts';
import type { View } from '#src/replica/view.ts';
import { PHOTO_SET_WORDS } from '#src/words/photo-words.ts';
import { placeWords } from '#src/words/place-words.ts';
import { capital } from '#src/words/who.ts';

/** A photograph as a strip shows it. */
export interface PhotoLine {
  id: string;
  sha256: string;
  width: number;
  height: number;
  /** what it is called for somebody who does not see it, and under it: 'deck beam 4 port, before: the scarf' */
  words: string;
  /** how much of it the server has; null until it has any */
  arrived: PhotoRow['arrived'];
  isHeld: boolean;
}

/** Photographs by what they belong to, the oldest first; struck ones are left out. */
export interface PhotosByOwner {
  ofEntry: ReadonlyMap<string, PhotoRow[]>;
  ofFinding: ReadonlyMap<string, PhotoRow[]>;
  /** those that belong to neither */
  alone: PhotoRow[];
}

/** A boat's photographs by what they belong to: one of a finding is the finding's, also where it came with an entry. */
export function photosByOwner(view: View, boatId: string): PhotosByOwner {
  const ofEntry = new Map<string, PhotoRow[]>();
  const ofFinding = new Map<string, PhotoRow[]>();
  const alone: PhotoRow[] = [];
  for (const photo of standingPhotos(view, boatId)) {
    const { findingId, entryId } = photo;
    if (findingId && view.find('finding', findingId)?.boatId === boatId) push(ofFinding, findingId, photo);
    else if (entryId && view.find('entry', entryId)?.boatId === boatId) push(ofEntry, entryId, photo);
    else alone.push(photo);
  }
  return { ofEntry, ofFinding, alone };
}

function standingPhotos(view: View, boatId: string): PhotoRow[] {
  return view
    .all('photo')
    .filter((photo) => photo.boatId === boatId && !photo.struck)
    .sort((a, b) =>
      a.attachedAt < b.attachedAt ? -1 : a.attachedAt > b.attachedAt ? 1 : a.id < b.id ? -1 : 1,
    );
}

function push(map: Map<string, PhotoRow[]>, key: string, photo: PhotoRow): void {
  const known = map.get(key);
  if (known) known.push(photo);
  else map.set(key, [photo]);
}

/** A photograph for a strip or the viewer. */
export function readPhoto(view: View, row: PhotoRow): PhotoLine {
  const { id, sha256, width, height, arrived } = row;
  return {
    id,
    sha256,
    width,
    height,
    arrived,
    words: capital(photoTitle(row)),
    isHeld: view.isHeld('photo', id),
  };
}

/** 'Deck beam 4 port, before closing: the scarf'; 'Photograph' where nothing of it is said. */
export function photoTitle({ place, set, caption }: Pick<PhotoRow, 'place' | 'set' | 'caption'>): string {
  const named = [placeWords(place), set && PHOTO_SET_WORDS[set]].filter(Boolean).join(', ');
  return [named, caption?.trim()].filter(Boolean).join(': ') || 'Photograph';
}
