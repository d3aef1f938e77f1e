import type { EntryRow } from '#shared/entry/entry.ts';
import type { View } from '#src/replica/view.ts';
import { dayWords } from '#src/words/day-words.ts';
import { listWords } from '#src/words/name-words.ts';
import { whereWords } from '#src/words/where.ts';
import { capital, whoWords } from '#src/words/who.ts';

export interface EntryToSplit {
  row: EntryRow;
  /** 'Wes, Mon 4 May' */
  title: string;
  where: string;
  names: Readonly<Record<string, string>>;
  /** something in it is a loose end, which is settled first */
  isLoose: boolean;
  /** boats with their stages, by name */
  boats: { id: string; name: string; stages: { id: string; name: string }[] }[];
  /** what came with it, which stays with the first part: '2 photos or notes' */
  followerCount: number;
}

/** An entry to be divided; null where it is not here or is struck. */
export function readSplit(view: View, entryId: string): EntryToSplit | null {
  const row = view.find('entry', entryId);
  if (!row || row.struck) return null;
  const people = row.hours.length > 0 ? row.hours.map(({ personId }) => personId) : [row.authorId];
  const followers = [...view.all('finding'), ...view.all('sound'), ...view.all('photo')];
  return {
    row,
    title: `${capital(listWords(people.map((id) => whoWords(view, id))))}, ${dayWords(row.workDate, view.today)}`,
    where: whereWords(view, row.boatId, row.stageId),
    names: Object.fromEntries(people.map((id) => [id, capital(whoWords(view, id))])),
    isLoose: view.all('looseEnd').some((end) => end.rowId === entryId),
    boats: readBoats(view),
    followerCount: followers.filter((one) => one.entryId === entryId && !one.struck).length,
  };
}

/** What the second part says of where it comes from, shown before it is held. */
export function originWords(view: View, row: EntryRow, why: string): string {
  const author = row.authorId === view.me.personId ? 'my' : `${whoWords(view, row.authorId)}'s`;
  const where = whereWords(view, row.boatId, row.stageId);
  return `Divided from ${author} entry of ${dayWords(row.workDate, view.today)} on ${where}: ${why.trim()}`;
}

function readBoats(view: View): EntryToSplit['boats'] {
  return view
    .all('boat')
    .filter((boat) => !boat.struck)
    .sort((a, b) => a.name.localeCompare(b.name))
    .map(({ id, name }) => ({
      id,
      name,
      stages: view
        .all('stage')
        .filter((stage) => stage.boatId === id && !stage.struck)
        .sort((a, b) => a.order - b.order)
        .map((stage) => ({ id: stage.id, name: stage.name })),
    }));
}
