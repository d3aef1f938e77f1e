import { counted } from '#src/words/day-words.ts';

/** Where the form for an entry keeps its draft. */
export const DRAFT_KEY = 'log';

/** What a screen without the form needs of the draft: whose entry it is to be, and since when it waits. */
export interface WaitingDraft {
  entryId: string;
  /** ISO time of the last change */
  keptAt: string;
}

/** The draft that waits on the form; null where nothing is on it. */
export function readWaiting(kept: unknown): WaitingDraft | null {
  const { entryId, keptAt } = (kept ?? {}) as Partial<Record<keyof WaitingDraft, unknown>>;
  return typeof entryId === 'string' && typeof keptAt === 'string' ? { entryId, keptAt } : null;
}

interface FormsWaiting {
  /** the draft of the form for photographs */
  photos: unknown;
  /** the draft of the form for a finding */
  found: unknown;
}

/** What else was begun and is not logged, in words: '2 photos', 'a finding'. */
export function waitingWords({ photos, found }: FormsWaiting): string[] {
  const pictures = ((photos ?? {}) as { pictures?: unknown[] }).pictures ?? [];
  const {
    kind,
    text,
    pictures: shots,
  } = (found ?? {}) as { kind?: string; text?: string; pictures?: unknown[] };
  return [
    ...(pictures.length > 0 ? [counted(pictures.length, 'photo')] : []),
    ...(kind || text?.trim() || shots?.length ? ['a finding'] : []),
  ];
}
