import { z } from 'zod';
import { hoursKindSchema, type HoursGiven } from '#shared/entry/hours.ts';
import { daySchema, type Day } from '#shared/sync/day.ts';
import { newIdSchema } from '#shared/sync/ids.ts';
import { photoSetSchema } from '#shared/photo/photo.ts';
import { placeSchema, type Place } from '#shared/place/place.ts';
import { keptPictureSchema } from '#src/routes/alongside/photos/kept-picture.ts';
import type { Where } from '#src/routes/alongside/read-boats.ts';
import { tooLongWords } from '#src/words/too-long.ts';

/**
 * What is on the form before 'Log it'. Its ids are made with it, so that a log cut off halfway is not made twice.
 * A part that an older version kept differently is left out, never the words.
 */
const draftSchema = z.object({
  entryId: newIdSchema,
  boatId: z.string(),
  stageId: z.string().nullable().catch(null),
  text: z.string(),
  workDate: daySchema,
  minutes: z.int().nullable().catch(null),
  kind: hoursKindSchema.nullable().catch(null),
  /** who worked along; no minutes of their own means: as long as I did */
  along: z.array(z.object({ personId: z.string(), minutes: z.int().nullable() })).catch([]),
  ticked: z.array(z.object({ taskId: z.string(), markId: newIdSchema })).catch([]),
  /** work that was not done, in place of the words; null for work that was */
  notDone: z.object({ what: z.string(), why: z.string() }).nullable().catch(null),
  pictures: z.array(keptPictureSchema).catch([]),
  /** where the pictures were taken, and for which set */
  place: placeSchema.catch({}),
  set: photoSetSchema.nullable().catch(null),
  /** ISO time of the last change; null while nothing is on it */
  keptAt: z.string().nullable().catch(null),
});
export type EntryDraft = z.infer<typeof draftSchema>;

/** A draft as it was kept; undefined where there is none that can be read. */
export function readDraft(kept: unknown): EntryDraft | undefined {
  return draftSchema.safeParse(kept).data;
}

/** An empty form for a boat, stage and day; its pictures at the place that is carried on. */
export function emptyDraft(where: Where, today: Day, entryId: string, place: Place = {}): EntryDraft {
  const { boatId, stageId } = where;
  return {
    boatId,
    stageId,
    entryId,
    text: '',
    workDate: today,
    minutes: null,
    kind: null,
    along: [],
    ticked: [],
    notDone: null,
    pictures: [],
    place,
    set: null,
    keptAt: null,
  };
}

/** Whether there is anything on it that somebody would miss. */
export function isWorthKeeping(draft: EntryDraft): boolean {
  return (
    entryText(draft) !== '' ||
    draft.minutes !== null ||
    [draft.along, draft.ticked, draft.pictures].some((list) => list.length > 0)
  );
}

/** The entry's words as they will stand: what was typed, or of work not done what and why. */
export function entryText({ text, notDone }: Pick<EntryDraft, 'text' | 'notDone'>): string {
  if (!notDone) return text.trim();
  const [what, why] = [notDone.what.trim(), notDone.why.trim()];
  if (what === '' && why === '') return '';
  return [what && `Not done: ${ended(what)}`, why && `Why: ${ended(why)}`].filter(Boolean).join(' ');
}

function ended(words: string): string {
  return /[.!?]$/.test(words) ? words : `${words}.`;
}

/** Everybody's figures, mine first; nobody without minutes. */
export function hoursOf(draft: EntryDraft, me: string): HoursGiven {
  const figures = [
    { personId: me, minutes: draft.minutes ?? 0 },
    ...draft.along.map(({ personId, minutes }) => ({ personId, minutes: minutes ?? draft.minutes ?? 0 })),
  ];
  const kind = draft.kind ? { kind: draft.kind } : {};
  return figures.filter(({ minutes }) => minutes > 0).map((figure) => ({ ...figure, ...kind }));
}

/** What keeps the draft from being logged, in one sentence each, by field; empty where nothing does. */
export function draftProblems(draft: EntryDraft, me: string): { text?: string; along?: string } {
  const problems: { text?: string; along?: string } = {};
  const tooLong = tooLongWords(entryText(draft));
  if (tooLong) problems.text = tooLong;
  else if (draft.notDone && (draft.notDone.what.trim() === '' || draft.notDone.why.trim() === '')) {
    problems.text = 'Say what was not done, and why.';
  } else if (entryText(draft) === '' && hoursOf(draft, me).length === 0) {
    problems.text = 'Say what you did, or give the hours.';
  }
  if (draft.along.some(({ minutes }) => (minutes ?? draft.minutes) === null)) {
    problems.along = 'Give your hours, or theirs.';
  }
  return problems;
}

/** What a part of the form is given: the draft, and the way to change some of it. */
export interface DraftFields {
  draft: EntryDraft;
  change: (next: Partial<EntryDraft>) => void;
}
