import type { PersonRow } from '#shared/identity/person.ts';
import { dayAt } from '#shared/sync/day.ts';
import type { View } from '#src/replica/view.ts';
import { dayWords } from '#src/words/day-words.ts';
import { listWords } from '#src/words/name-words.ts';
import { rolesWords } from '#src/words/role-words.ts';
import { boatWords } from '#src/words/where.ts';

export interface PersonLine {
  row: PersonRow;
  /** 'crew and owner of Widdershins' */
  words: string;
  /** 'left Tue 8 Sep' */
  left: string | null;
  isMe: boolean;
}

/** Everybody of the shop by name; who has left stands apart. */
export function readPeople(view: View): { here: PersonLine[]; left: PersonLine[] } {
  const lines = view
    .all('person')
    .map((row) => ({
      row,
      words: personWords(view, row),
      left: row.leftAt && `left ${dayWords(dayAt(Date.parse(row.leftAt), view.timeZone), view.today)}`,
      isMe: row.id === view.me.personId,
    }))
    .sort((a, b) => a.row.name.localeCompare(b.row.name));
  return { here: lines.filter((line) => !line.left), left: lines.filter((line) => line.left) };
}

function personWords(view: View, { roles, boatIds = [] }: PersonRow): string {
  const boats = boatIds.length > 0 ? ` of ${listWords(boatIds.map((id) => boatWords(view, id)))}` : '';
  return rolesWords(roles) + boats;
}
