import type { Place } from '../place/place.ts';
import type { TaskTemplate } from './template.ts';

const MM_PER_TEN_FEET = 3048;
// a longer one stays in the place alone: a title is read at a glance
const PLACE_WORDS_IN_TITLE_MAX = 100;

/** One of several ribs or planks: its number and side, as far as they are known. */
export type Numbered = Pick<Place, 'number' | 'side'>;

/** What the tasks of a boat are counted by. What is not given makes no task; it can be added later. */
export interface Counts {
  ribs?: Numbered[];
  planks?: Numbered[];
  /** by task id, for tasks made at each place or finding */
  places?: Readonly<Record<string, Place[]>>;
  lengthMm?: number;
}

/** One task to be made: how it is called and where it is. */
export interface Making {
  title: string;
  place?: Place;
}

/** The tasks that a template's task makes of what was counted. */
export function makingsOf(task: TaskTemplate, counts: Counts): Making[] {
  const own = ownPlace(task);
  const named = eachOf(task, counts);
  if (!named || task.each === undefined) return [{ title: task.title, ...(own ? { place: own } : {}) }];
  const { each } = task;
  return named.map((place, index) => ({
    title: each.replace('{which}', () => whichWords(place, index, named.length)),
    ...placeOr({ ...own, ...place }),
  }));
}

/** Minutes; undefined where it goes by a length that is not known. */
export function estimateOf(task: TaskTemplate, counts: Counts): number | undefined {
  if (task.per !== 'tenFeet') return task.estimateMinutes;
  return counts.lengthMm === undefined
    ? undefined
    : Math.round((task.estimateMinutes * counts.lengthMm) / MM_PER_TEN_FEET);
}

function eachOf(task: TaskTemplate, counts: Counts): Place[] | undefined {
  switch (task.per) {
    case 'side':
      return [{ side: 'port' }, { side: 'starboard' }];
    case 'rib':
      return counts.ribs ?? [];
    case 'plank':
      return counts.planks ?? [];
    case 'place':
    case 'finding':
      return counts.places?.[task.id] ?? [];
    default:
      return undefined;
  }
}

function ownPlace(task: TaskTemplate): Place | undefined {
  const place = { ...(task.part ? { partId: task.part } : {}), ...(task.side ? { side: task.side } : {}) };
  return placeOr(place).place;
}

function placeOr(place: Place): { place?: Place } {
  return Object.keys(place).length > 0 ? { place } : {};
}

function whichWords(place: Place, index: number, count: number): string {
  const numbers = place.toNumber === undefined ? place.number : `${place.number ?? ''} to ${place.toNumber}`;
  const said = [titleWords(place), numbers, place.side].filter((word) => word !== undefined);
  return said.length > 0 ? said.join(' ').trim() : `${index + 1} of ${count}`;
}

function titleWords(place: Place): string | undefined {
  const words = place.words?.trim() ?? '';
  return words.length > 0 && words.length <= PLACE_WORDS_IN_TITLE_MAX ? words : undefined;
}
