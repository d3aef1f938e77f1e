import type { BoatRow } from '#shared/boat/boat.ts';
import type { HoursValue } from '#shared/entry/hours-field.ts';
import type { Certainty, Extent, Known } from '#shared/finding/finding.ts';
import { hoursText } from '#shared/measure/hours.ts';
import { boatLengthText } from '#shared/measure/length.ts';
import type { PhotoSet } from '#shared/photo/photo.ts';
import type { Place } from '#shared/place/place.ts';
import { STAGE_FIELD, STRUCK_FIELD } from '#shared/sync/fields.ts';
import type { Struck } from '#shared/sync/row.ts';
import { findingWords } from '#shared/trade/finding-words.ts';
import type { View } from '#src/replica/view.ts';
import { dayWords } from '#src/words/day-words.ts';
import { CERTAINTY_WORDS, extentWords, findingTitle, KNOWN_WORDS } from '#src/words/finding-words.ts';
import { HOURS_KIND_WORDS } from '#src/words/hours-words.ts';
import { listWords } from '#src/words/name-words.ts';
import { PHOTO_SET_WORDS } from '#src/words/photo-words.ts';
import { placeWords } from '#src/words/place-words.ts';
import { unitsOf } from '#src/words/units.ts';
import { stageWords, whereWords } from '#src/words/where.ts';
import { capital, whoWords } from '#src/words/who.ts';

/** A value that somebody said about a field, for the eye: hours are drawn, everything else is words. */
export interface SaidValue {
  minutes?: number;
  words: string;
}

const HOURS_PREFIX = 'hours/';

const FIELD_WORDS: Readonly<Record<string, string>> = {
  [STAGE_FIELD]: 'Boat and stage',
  [STRUCK_FIELD]: 'Struck or not',
  text: 'The words',
  workDate: 'The day',
  place: 'The place',
  kind: 'The kind',
  known: 'The way it is known',
  certainty: 'Suspected or proved',
  seenExtent: 'The size seen',
  fearedExtent: 'The size feared',
  openToKnow: 'That only opening will tell',
  count: 'The count',
  about: 'The thing looked for',
  caption: 'The words under it',
  set: 'The set',
  findingId: 'The finding it shows',
  title: 'What the task is',
  estimateMinutes: 'The estimate',
  assigneeIds: 'Who it is for',
  plannedFor: 'The day it is planned for',
  name: 'The name',
  order: 'The place in the order',
  after: 'What comes before it',
  arrivedOn: 'The day she came',
  type: 'What she is',
  hullNumber: 'Her number',
  lengthMm: 'Her length',
  beamMm: 'Her beam',
  lies: 'Which way she lies',
  numbering: 'How she is counted',
  builder: 'Her builder',
  builtYear: 'The year she was built',
  names: 'Her names',
};

/** The person whose hours a field is, or null where it is another field. */
export function personOfHours(field: string): string | null {
  return field.startsWith(HOURS_PREFIX) ? field.slice(HOURS_PREFIX.length) : null;
}

/** What a field is called: 'The words', "Rosa's hours". */
export function fieldWords(view: View, field: string): string {
  const personId = personOfHours(field);
  if (personId === null) return FIELD_WORDS[field] ?? field;
  return personId === view.me.personId ? 'Your hours' : `${capital(whoWords(view, personId))}'s hours`;
}

/** A field's value as people read it. */
export function readValue(view: View, field: string, value: unknown): SaidValue {
  if (personOfHours(field) !== null) {
    const { minutes, kind } = value as HoursValue;
    return { minutes, words: kind === null ? '' : HOURS_KIND_WORDS[kind] };
  }
  if ((value === null || value === '') && field !== STRUCK_FIELD && field !== 'place')
    return { words: 'nothing' };
  const read = READ[field];
  return { words: read ? read(view, value) : String(value) };
}

/** A value in words alone, its hours too: '2 1/2 h, extra work'. */
export function saidWords({ minutes, words }: SaidValue): string {
  if (minutes === undefined) return words;
  if (minutes === 0) return 'no hours';
  return [`${hoursText(minutes)} h`, words].filter(Boolean).join(', ');
}

function dayRead(view: View, value: unknown): string {
  return dayWords(value as string, view.today);
}

const READ: Readonly<Record<string, (view: View, value: unknown) => string>> = {
  [STAGE_FIELD](view, value) {
    const { boatId, stageId } = value as { boatId: string; stageId: string | null };
    return whereWords(view, boatId, stageId);
  },
  [STRUCK_FIELD]: (_view, value) => (value ? `struck: ${(value as Struck).why}` : 'restored'),
  workDate: dayRead,
  plannedFor: dayRead,
  arrivedOn: dayRead,
  estimateMinutes: (_view, value) => `${hoursText(value as number)} h`,
  assigneeIds: (view, value) => listWords((value as string[]).map((id) => whoWords(view, id))) || 'nobody',
  after: (view, value) => listWords((value as string[]).map((id) => stageWords(view, id))) || 'nothing',
  lengthMm: (view, value) => boatLengthText(value as number, unitsOf(view)),
  beamMm: (view, value) => boatLengthText(value as number, unitsOf(view)),
  names: (_view, value) => listWords((value as { name: string }[]).map(({ name }) => name)),
  lies(view, value) {
    const { way, since } = value as NonNullable<BoatRow['lies']>;
    return `${way === 'upright' ? 'upright' : 'upside down'} since ${dayWords(since, view.today)}`;
  },
  place: (_view, value) => placeWords(value as Place | null) || 'no place',
  kind: (_view, value) => findingWords(value as string),
  about: (_view, value) => findingWords(value as string),
  known: (_view, value) => KNOWN_WORDS[value as Known],
  certainty: (_view, value) => CERTAINTY_WORDS[value as Certainty],
  seenExtent: (view, value) => extentWords(value as Extent, unitsOf(view)) || 'nothing',
  fearedExtent: (view, value) => extentWords(value as Extent, unitsOf(view)) || 'nothing',
  openToKnow: (_view, value) => (value ? 'only opening will tell' : 'can be told without opening'),
  set: (_view, value) => PHOTO_SET_WORDS[value as PhotoSet],
  findingId(view, value) {
    const finding = view.find('finding', value as string);
    return finding ? findingTitle(finding) : 'a finding not known here';
  },
  count(_view, value) {
    const { of, failed } = value as { of?: number; failed?: number };
    return `${failed ?? 'some'} of ${of ?? 'several'}`;
  },
};
