import type { HoursValue } from '#shared/entry/hours-field.ts';
import { hoursText } from '#shared/measure/hours.ts';
import type { Place } from '#shared/place/place.ts';
import { STAGE_FIELD, STRUCK_FIELD } from '#shared/sync/fields.ts';
import type { Struck } from '#shared/sync/row.ts';
import type { View } from '#src/replica/view.ts';
import { dayWords } from '#src/words/day-words.ts';
import { HOURS_KIND_WORDS } from '#src/words/hours-words.ts';
import { listWords } from '#src/words/name-words.ts';
import { boatWords, stageWords, whereWords } from '#src/words/where.ts';
import { capital, whoWords } from '#src/words/who.ts';

const HOURS_PREFIX = 'hours/';

const FIELD_WORDS: Record<string, string> = {
  [STAGE_FIELD]: 'Which boat and stage',
  [STRUCK_FIELD]: 'Struck or not',
  text: 'The words',
  workDate: 'The day',
  place: 'The place',
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

/** What a field is called: "Wes's hours", 'The words'. */
export function fieldWords(view: View, field: string): string {
  if (!field.startsWith(HOURS_PREFIX)) return FIELD_WORDS[field] ?? field;
  const personId = field.slice(HOURS_PREFIX.length);
  return personId === view.me.personId ? 'Your hours' : `${capital(whoWords(view, personId))}'s hours`;
}

/** A value of a field in words. */
export function valueWords(view: View, field: string, value: unknown): string {
  if (field.startsWith(HOURS_PREFIX)) return hoursWords(value as HoursValue);
  if (field === STRUCK_FIELD) return value === null ? 'keep it' : `struck: ${(value as Struck).why}`;
  if (value === null || value === '') return 'none';
  if (field === STAGE_FIELD) return whereOf(view, value as { boatId: string; stageId: string | null });
  if (field === 'workDate' || field === 'plannedFor' || field === 'arrivedOn')
    return dayWords(value as string, view.today);
  if (field === 'place') return placeWords(value as Place);
  if (field === 'assigneeIds')
    return listWords((value as string[]).map((id) => whoWords(view, id))) || 'nobody';
  if (field === 'after') return listWords((value as string[]).map((id) => stageWords(view, id))) || 'nothing';
  if (field === 'estimateMinutes') return `${hoursText(value as number)} h`;
  if (field === 'lies') return liesWords(view, value as { way: string; since: string });
  if (field === 'names') return listWords((value as { name: string }[]).map(({ name }) => name));
  if (field.endsWith('Mm')) return `${(value as number) / 1000} m`;
  return String(value);
}

/** '2 1/2 h, extra work'. */
export function hoursWords({ minutes, kind }: HoursValue): string {
  if (minutes === 0) return 'no hours';
  return kind === null ? `${hoursText(minutes)} h` : `${hoursText(minutes)} h, ${HOURS_KIND_WORDS[kind]}`;
}

function whereOf(view: View, { boatId, stageId }: { boatId: string; stageId: string | null }): string {
  return stageId ? whereWords(view, boatId, stageId) : boatWords(view, boatId);
}

function liesWords(view: View, { way, since }: { way: string; since: string }): string {
  return `${way === 'upright' ? 'upright' : 'upside down'} since ${dayWords(since, view.today)}`;
}

function placeWords({ side, number, toNumber, words }: Place): string {
  const numbers = toNumber === undefined ? number : `${number} to ${toNumber}`;
  return [side, numbers, words].filter((part) => part !== undefined).join(', ');
}
