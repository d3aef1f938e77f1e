import type { HoursValue } from '#shared/entry/hours-field.ts';
import type { Place } from '#shared/place/place.ts';
import { STAGE_FIELD, STRUCK_FIELD } from '#shared/sync/fields.ts';
import type { Struck } from '#shared/sync/row.ts';
import type { View } from '#src/replica/view.ts';
import { dayWords } from '#src/words/day-words.ts';
import { HOURS_KIND_WORDS } from '#src/words/hours-words.ts';
import { whereWords } from '#src/words/where.ts';
import { capital, whoWords } from '#src/words/who.ts';

/** A value that somebody said about a field, for the eye: hours are drawn, everything else is words. */
export interface SaidValue {
  minutes?: number;
  words: string;
}

const HOURS_PREFIX = 'hours/';

/** The person whose hours a field is, or null where it is another field. */
export function personOfHours(field: string): string | null {
  return field.startsWith(HOURS_PREFIX) ? field.slice(HOURS_PREFIX.length) : null;
}

/** What a field of an entry is called: 'The words', "Rosa's hours". */
export function fieldWords(view: View, field: string): string {
  const personId = personOfHours(field);
  if (personId !== null) {
    return personId === view.me.personId ? 'Your hours' : `${capital(whoWords(view, personId))}'s hours`;
  }
  if (field === STAGE_FIELD) return 'Boat and stage';
  if (field === 'text') return 'The words';
  if (field === 'workDate') return 'The day';
  if (field === 'place') return 'The place';
  return field === STRUCK_FIELD ? 'Struck or not' : field;
}

/** A field's value as people read it. */
export function readValue(view: View, field: string, value: unknown): SaidValue {
  if (personOfHours(field) !== null) {
    const { minutes, kind } = value as HoursValue;
    return { minutes, words: kind === null ? '' : HOURS_KIND_WORDS[kind] };
  }
  if (field === STAGE_FIELD) {
    const { boatId, stageId } = value as { boatId: string; stageId: string | null };
    return { words: whereWords(view, boatId, stageId) };
  }
  if (field === 'workDate') return { words: dayWords(value as string, view.today) };
  if (field === STRUCK_FIELD) return { words: struckWords(value as Struck | null) };
  if (field === 'place') return { words: placeWords(value as Place | null) };
  return { words: String(value) };
}

function struckWords(struck: Struck | null): string {
  return struck ? `struck: ${struck.why}` : 'restored';
}

function placeWords(place: Place | null): string {
  if (!place) return 'no place';
  const { side, number, toNumber, words } = place;
  const numbers = toNumber === undefined ? number : `${number} to ${toNumber}`;
  return [side, numbers, words].filter((part) => part !== undefined).join(', ');
}
