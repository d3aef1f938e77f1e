import type { PersonRow } from '#shared/identity/person.ts';
import { hoursLines, type HoursLine } from '#shared/entry/sums.ts';
import { dayAt, type Day } from '#shared/sync/day.ts';
import { SHOP_DAY_MINUTES, isWorkDay } from '#shared/task/plan.ts';
import type { View } from '#src/replica/view.ts';
import { peopleOf } from './read-entry.ts';
import { readNothing } from './read-heard.ts';

/** A day on which somebody has logged less than the shop's day. */
export interface MissingDay {
  day: Day;
  minutes: number;
  missingMinutes: number;
  /** all that they could have logged that day has been heard */
  isSure: boolean;
}

export interface MissingOfPerson {
  personId: string;
  name: string;
  days: MissingDay[];
  /** of the days that are over */
  missingMinutes: number;
}

/** What is expected of a person on a day, in minutes: the shop's day from the crew, Monday to Friday, up to today; else 0. */
export function usualMinutes(view: View, { roles, leftAt }: PersonRow, day: Day): number {
  const isHere = leftAt === null || day <= dayAt(Date.parse(leftAt), view.timeZone);
  return roles.includes('crew') && isHere && isWorkDay(day) && day <= view.today ? SHOP_DAY_MINUTES : 0;
}

/**
 * Who has hours missing on which of the days, the most first. A day on which nobody logged anything is nobody's
 * gap (the shop was shut), today excepted; nor is a day before a person's first entry.
 */
export function readMissing(view: View, days: readonly Day[]): MissingOfPerson[] {
  const lines = hoursLines(view.all('entry'));
  const worked = days.filter((day) => day === view.today || lines.some((line) => line.day === day));
  return view
    .all('person')
    .map((person) =>
      missingOf(
        view,
        person,
        worked,
        lines.filter(({ personId }) => personId === person.id),
      ),
    )
    .filter(({ days: short }) => short.length > 0)
    .sort((a, b) => b.missingMinutes - a.missingMinutes || a.name.localeCompare(b.name));
}

function missingOf(view: View, person: PersonRow, days: readonly Day[], own: HoursLine[]): MissingOfPerson {
  const first = firstDayOf(view, person.id);
  const missing = days
    .filter((day) => day >= first)
    .map((day): MissingDay => {
      const minutes = own.filter((line) => line.day === day).reduce((sum, line) => sum + line.minutes, 0);
      const missingMinutes = Math.max(usualMinutes(view, person, day) - minutes, 0);
      return { day, minutes, missingMinutes, isSure: readNothing(view, person.id, day).isSure };
    })
    .filter(({ missingMinutes }) => missingMinutes > 0);
  return {
    personId: person.id,
    name: person.name,
    days: missing,
    missingMinutes: missing
      .filter(({ day }) => day < view.today)
      .reduce((sum, day) => sum + day.missingMinutes, 0),
  };
}

/** The day of a person's first entry, a struck one too: nothing was expected of them before; today where they have none. */
function firstDayOf(view: View, personId: string): Day {
  return view
    .all('entry')
    .filter((entry) => peopleOf(entry).includes(personId))
    .reduce((first, { workDate }) => (workDate < first ? workDate : first), view.today);
}
