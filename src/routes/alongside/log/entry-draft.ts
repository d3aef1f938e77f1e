import { z } from 'zod';
import { hoursKindSchema, type HoursGiven } from '#shared/entry/hours.ts';
import { daySchema, type Day } from '#shared/sync/day.ts';
import { newIdSchema } from '#shared/sync/ids.ts';
import { TEXT_UNITS_MAX } from '#shared/sync/op.ts';
import type { Where } from '#src/routes/alongside/read-boats.ts';

export const DRAFT_KEY = 'log';

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
  /** ISO time of the last change; null while nothing is on it */
  keptAt: z.string().nullable().catch(null),
});
export type EntryDraft = z.infer<typeof draftSchema>;

/** A draft as it was kept; undefined where there is none that can be read. */
export function readDraft(kept: unknown): EntryDraft | undefined {
  return draftSchema.safeParse(kept).data;
}

/** An empty form at a place and day. */
export function emptyDraft(where: Where, today: Day, entryId: string): EntryDraft {
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
    keptAt: null,
  };
}

/** Whether there is anything on it that somebody would miss. */
export function isWorthKeeping(draft: EntryDraft): boolean {
  return (
    draft.text.trim() !== '' || draft.minutes !== null || draft.along.length > 0 || draft.ticked.length > 0
  );
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
  const tooLong = tooLongWords(draft.text);
  if (tooLong) problems.text = tooLong;
  else if (draft.text.trim() === '' && hoursOf(draft, me).length === 0) {
    problems.text = 'Say what you did, or give the hours.';
  }
  if (draft.along.some(({ minutes }) => (minutes ?? draft.minutes) === null)) {
    problems.along = 'Give your hours, or theirs.';
  }
  return problems;
}

/** That a text is longer than the record takes, by how much, and what to do; undefined where it fits. */
export function tooLongWords(text: string): string | undefined {
  const over = text.trim().length - TEXT_UNITS_MAX;
  if (over <= 0) return undefined;
  return `That is ${over} characters too many for one entry. Nothing is lost: cut the end out, log this, and put the rest into a second entry.`;
}

/** What a part of the form is given: the draft, and the way to change some of it. */
export interface DraftFields {
  draft: EntryDraft;
  change: (next: Partial<EntryDraft>) => void;
}
