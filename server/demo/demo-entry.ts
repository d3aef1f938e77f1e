import type { HoursKind } from '#shared/entry/hours.ts';
import type { BoatKey } from './demo-boats.ts';
import type { PersonKey } from './demo-people.ts';

/** Hours, and the kind where the author proposed one. */
export type Figure = number | [number, HoursKind];

export interface DemoEntry {
  /** the working day it was written on and is about, counted back from today */
  day: number;
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
  day: number,
  time: string,
  author: PersonKey,
  text: string,
  hours: DemoEntry['hours'],
  key?: string,
];

/** Entries about one stage, a line each. */
export function linesAbout(boat: BoatKey, stage: string, lines: Line[]): DemoEntry[] {
  return lines.map(([day, time, author, text, hours, key]) => ({
    day,
    time,
    author,
    boat,
    stage,
    text,
    hours,
    ...(key ? { key } : {}),
  }));
}
