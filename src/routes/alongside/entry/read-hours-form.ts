import type { EntryRow } from '#shared/entry/entry.ts';
import type { HoursGiven, HoursKind } from '#shared/entry/hours.ts';
import type { View } from '#src/replica/view.ts';
import type { EntryActions } from '#src/routes/alongside/entry/read-entry-page.ts';
import { capital, whoWords } from '#src/words/who.ts';

export interface Figure {
  personId: string;
  label: string;
  minutes: number | null;
  kind: HoursKind | null;
}

/** The figures that this person may change, oneself first, then by name. */
export function readFigures(view: View, row: EntryRow, { hoursOf }: EntryActions): Figure[] {
  return hoursOf.map((personId) => readFigure(view, row, personId)).sort((a, b) => rank(view, a, b));
}

/** Those who could be named in the hours and are not yet. */
export function readUnnamed(view: View, named: Figure[]): { id: string; name: string }[] {
  return view
    .all('person')
    .filter(({ id, leftAt }) => !leftAt && !named.some(({ personId }) => personId === id))
    .filter(({ roles }) => roles.includes('crew') || roles.includes('foreman'))
    .map(({ id, name }) => ({ id, name }))
    .sort((a, b) => a.name.localeCompare(b.name));
}

export function readFigure(view: View, row: EntryRow, personId: string): Figure {
  const figure = row.hours.find((each) => each.personId === personId);
  const label = personId === view.me.personId ? 'Your hours' : `${capital(whoWords(view, personId))}'s hours`;
  return { personId, label, minutes: figure?.minutes ?? null, kind: figure?.kind ?? null };
}

/** Only the figures that are no longer what stands, both parts of each. */
export function changedHours(row: EntryRow, figures: Figure[]): HoursGiven {
  return figures
    .map(({ personId, minutes, kind }) => ({ personId, minutes: minutes ?? 0, kind }))
    .filter(({ personId, minutes, kind }) => {
      const standing = row.hours.find((each) => each.personId === personId);
      return minutes !== (standing?.minutes ?? 0) || kind !== (standing?.kind ?? null);
    });
}

/** The figures of the same people as they stand, for the way back. */
export function standingHours(row: EntryRow, changed: HoursGiven): HoursGiven {
  return changed.map(({ personId }) => {
    const standing = row.hours.find((each) => each.personId === personId);
    return { personId, minutes: standing?.minutes ?? 0, kind: standing?.kind ?? null };
  });
}

function rank(view: View, a: Figure, b: Figure): number {
  const isMe = (figure: Figure) => Number(figure.personId === view.me.personId);
  return isMe(b) - isMe(a) || a.label.localeCompare(b.label);
}
