import type { HoursKind } from '#shared/entry/hours.ts';
import type { BoatKey } from './demo-work.ts';
import type { When } from './demo-days.ts';
import type { PersonKey } from './demo-people.ts';

/** Hours, and the kind where the author proposed one. */
export type Figure = number | [number, HoursKind];

export interface DemoEntry {
  /** the day it was written on */
  day: When;
  /** the day it is about, where that is another */
  about?: When;
  time: string;
  author: PersonKey;
  boat: BoatKey;
  stage: string;
  text: string;
  hours: Partial<Record<PersonKey, Figure>>;
  /** named where something is said about it later */
  key?: string;
}

type Line = [
  day: When,
  time: string,
  author: PersonKey,
  text: string,
  hours: DemoEntry['hours'],
  more?: string | { key?: string; about?: When },
];

/** Entries about one stage, a line each. */
export function linesAbout(boat: BoatKey, stage: string, lines: Line[]): DemoEntry[] {
  return lines.map(([day, time, author, text, hours, more]) => ({
    day,
    time,
    author,
    boat,
    stage,
    text,
    hours,
    ...(typeof more === 'string' ? { key: more } : more),
  }));
}

/** By what an entry is found again: its key, or who wrote it, when: `rosa/-20/11:50`. */
export function nameOf({ key, author, day, time }: DemoEntry): string {
  return key ?? `${author}/${day}/${time}`;
}
