import type { BoatAdd } from '#shared/boat/boat.ts';
import type { Place } from '#shared/place/place.ts';
import type { TemplateId } from '#shared/trade/load.ts';
import type { Counts } from '#shared/trade/task-places.ts';
import type { Choice } from '#shared/trade/template.ts';
import type { PersonKey } from './demo-people.ts';

export type BoatKey = 'penny' | 'widder' | 'hickory';

/** Who ticked it, on which working day, when. */
export type Tick = readonly [by: PersonKey, day: number, time: string];

/** What has been done of a task, and who is to do it when. */
export interface Doing {
  assignees?: PersonKey[];
  /** planned for this working day; 1 is the one after today */
  planned?: number;
  started?: Tick;
  ticked?: Tick[];
  /** why the foreman struck it from her list */
  struck?: string;
}

/** A task that is in no template. */
export interface OwnTask extends Doing {
  title: string;
  estimateHours?: number;
  place?: Place;
  /** the finding that it is for */
  finding?: string;
  /** the working day on which the foreman added it; with the list where left out */
  added?: number;
}

/** A stage that is over: between which days its tasks were ticked, and by whom in turn. */
export interface StageDone {
  from: number;
  to: number;
  by: PersonKey[];
  /** tasks that nobody ticked, by their name in the template */
  left?: string[];
}

export interface DemoBoat {
  particulars: Omit<BoatAdd, 'boatId' | 'arrivedOn' | 'templateId' | 'lies'>;
  /** calendar days before today; with the list where left out */
  arrivedDaysAgo?: number;
  /** the working day, and when, that the foreman made her list of work */
  listed: readonly [day: number, time: string];
  template: TemplateId;
  counts: Omit<Counts, 'lengthMm'>;
  chosen: Choice[];
  /** by stage: how many times the template's estimate the foreman reckons for her */
  reckoned: Record<string, number>;
  owner: PersonKey;
  /** stages that were over before the shop kept this log, ticked from its paper book */
  before: string[];
  done: Record<string, StageDone>;
  /** by task: its id in the template, and `/9` or `/port` where there are several */
  doing: Record<string, Doing>;
  /** by stage */
  own: Record<string, OwnTask[]>;
  lies?: { way: 'upside-down'; since: number };
}
