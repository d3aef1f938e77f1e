import type { HoursKind } from '#shared/entry/hours.ts';
import type { View } from '#src/replica/view.ts';
import type { Where } from '#src/routes/alongside/read-boats.ts';
import { openingWords } from '#src/words/name-words.ts';

/** An entry of today that oneself may give hours in. */
export interface OwnEntry {
  entryId: string;
  words: string;
  /** null where it has no figure of one's own yet */
  minutes: number | null;
  kind: HoursKind | null;
}

/** Today's entries of this person on a boat, the newest first. */
export function readOwnEntries(view: View, where: Where): OwnEntry[] {
  const me = view.me.personId;
  return view
    .all('entry')
    .filter((entry) => entry.boatId === where.boatId && entry.workDate === view.today && !entry.struck)
    .filter((entry) => entry.authorId === me || entry.hours.some(({ personId }) => personId === me))
    .sort((a, b) => (a.writtenAt < b.writtenAt ? 1 : -1))
    .map((entry) => {
      const figure = entry.hours.find(({ personId }) => personId === me);
      return {
        entryId: entry.id,
        words: openingWords(entry.text, 60) || 'Hours alone',
        minutes: figure?.minutes ?? null,
        kind: figure?.kind ?? null,
      };
    });
}
