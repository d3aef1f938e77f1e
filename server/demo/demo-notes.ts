import type { Extent, FindingNote, FindingSet } from '#shared/finding/finding.ts';
import type { SoundNote } from '#shared/sound/sound.ts';
import type { PersonKey } from './demo-people.ts';

type Note<Given> = Omit<Given, 'findingId' | 'soundId' | 'boatId' | 'stageId' | 'entryId'> & {
  /** the entry that it was said with, by its name */
  with: string;
};
export type DemoFinding = Note<FindingNote> & { key: string };
export type DemoSound = Note<SoundNote>;

/** What was said of a finding later. */
export interface FindingLater {
  key: string;
  day: number;
  time: string;
  by: PersonKey;
  does: { set: FindingSet; why?: string } | { strikes: string };
}

const INCH_MM = 25.4;
/** An extent as it is said in the shop. */
export const inches = (length?: number, width?: number, depth?: number): Extent => ({
  ...(length === undefined ? {} : { lengthMm: Math.round(length * INCH_MM) }),
  ...(width === undefined ? {} : { widthMm: Math.round(width * INCH_MM) }),
  ...(depth === undefined ? {} : { depthMm: Math.round(depth * INCH_MM) }),
});
