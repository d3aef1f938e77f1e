import { z } from 'zod';
import {
  certaintySchema,
  extentSchema,
  knownSchema,
  type Certainty,
  type Extent,
  type Known,
} from '#shared/finding/finding.ts';
import { placeSchema, type Place } from '#shared/place/place.ts';
import { newIdSchema } from '#shared/sync/ids.ts';
import { keptPictureSchema } from '#src/routes/alongside/photos/kept-picture.ts';
import type { Where } from '#src/routes/alongside/read-boats.ts';
import { tooLongWords } from '#src/words/too-long.ts';

export const FOUND_DRAFT_KEY = 'found';
const KIND_LENGTH_MAX = 100;

/** What is on the form for a finding, or for what was found sound. Its id is made with it, so that it is not made twice. */
const foundDraftSchema = z.object({
  rowId: newIdSchema,
  isSound: z.boolean().catch(false),
  boatId: z.string(),
  stageId: z.string().nullable().catch(null),
  /** the entry that it comes with */
  entryId: z.string().nullable().catch(null),
  /** a kind of finding, or what was looked for; empty where none is chosen */
  kind: z.string().catch(''),
  place: placeSchema.catch({}),
  known: knownSchema.catch('seen'),
  /** null: as the way it is known proposes */
  certainty: certaintySchema.nullable().catch(null),
  seenExtent: extentSchema.catch({}),
  fearedExtent: extentSchema.catch({}),
  openToKnow: z.boolean().catch(false),
  text: z.string(),
  pictures: z.array(keptPictureSchema).catch([]),
});
export type FoundDraft = z.infer<typeof foundDraftSchema>;

export function readFoundDraft(kept: unknown): FoundDraft | undefined {
  return foundDraftSchema.safeParse(kept).data;
}

interface FoundAt extends Where {
  entryId: string | null;
  place: Place;
}

/** An empty form, with the place that is carried on. */
export function emptyFound(at: FoundAt, rowId: string): FoundDraft {
  return {
    ...at,
    rowId,
    isSound: false,
    kind: '',
    known: 'seen',
    certainty: null,
    seenExtent: {},
    fearedExtent: {},
    openToKnow: false,
    text: '',
    pictures: [],
  };
}

/** Whether there is anything on it that somebody would miss. */
export function isFoundWorthKeeping({ kind, text, pictures, seenExtent, fearedExtent }: FoundDraft): boolean {
  return (
    kind !== '' || text.trim() !== '' || pictures.length > 0 || isSized(seenExtent) || isSized(fearedExtent)
  );
}

/** Hearsay, the eye, the ear, an awl and a meter leave it suspected; wood laid open proves it. */
export function certaintyBy(known: Known): Certainty {
  return known === 'opened' || known === 'cut-to-sound' ? 'proved' : 'suspected';
}

export function certaintyOf({ certainty, known }: FoundDraft): Certainty {
  return certainty ?? certaintyBy(known);
}

export function isSized(extent: Extent): boolean {
  return Object.values(extent).some((mm) => mm !== undefined && mm > 0);
}

/** What keeps the form from being logged, in one sentence each. */
export function foundProblems(draft: FoundDraft): { kind?: string; text?: string; place?: string } {
  const problems: ReturnType<typeof foundProblems> = {};
  const tooLong = tooLongWords(draft.text);
  if (tooLong) problems.text = tooLong;
  if (draft.kind.trim().length > KIND_LENGTH_MAX)
    problems.kind = 'Say what it is in fewer words, and the rest below.';
  if (!draft.isSound && draft.kind.trim() === '')
    problems.kind = 'Say what it is: take the nearest, or your own words.';
  if (draft.isSound && Object.keys(draft.place).length === 0 && draft.text.trim() === '') {
    problems.place = 'Say what was looked at: a part, or your own words.';
  }
  return problems;
}
