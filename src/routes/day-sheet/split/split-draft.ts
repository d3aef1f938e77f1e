import type { EntryRow, EntrySet } from '#shared/entry/entry.ts';
import type { HoursGiven, HoursKind } from '#shared/entry/hours.ts';
import type { Holding } from '#src/replica/replica.ts';

/** How an entry is divided: what stays in it, and what becomes a second one. */
export interface SplitDraft {
  firstText: string;
  secondText: string;
  boatId: string;
  stageId: string | null;
  /** minutes that go into the second one, by person */
  moved: Readonly<Record<string, number>>;
  /** the kind of the hours in the second one; null: each as it was */
  kind: HoursKind | null;
  why: string;
}

export function newSplit({ text, boatId, stageId }: EntryRow): SplitDraft {
  return { firstText: text, secondText: '', boatId, stageId, moved: {}, kind: null, why: '' };
}

/** Sentences of an entry, so that whole ones can be moved by a tap. */
export function sentencesOf(text: string): string[] {
  return text.split(/(?<=[.!?])\s+|\n+/).filter((sentence) => sentence.trim() !== '');
}

export interface SplitFigure {
  personId: string;
  beforeMinutes: number;
  firstMinutes: number;
  secondMinutes: number;
}

/** Every person's hours before and after; the two parts always come to what was there. */
export function figuresOf({ hours }: EntryRow, { moved }: SplitDraft): SplitFigure[] {
  return hours.map(({ personId, minutes }) => {
    const secondMinutes = Math.min(Math.max(moved[personId] ?? 0, 0), minutes);
    return { personId, beforeMinutes: minutes, firstMinutes: minutes - secondMinutes, secondMinutes };
  });
}

/** What keeps it from being divided, in one sentence; null where nothing does. */
export function splitProblem(entry: EntryRow, draft: SplitDraft): string | null {
  const figures = figuresOf(entry, draft);
  const isMoved = figures.some(({ secondMinutes }) => secondMinutes > 0);
  if (draft.secondText.trim() === '' && !isMoved) return 'Put words or hours into the second part.';
  if (draft.firstText.trim() === '' && figures.every(({ firstMinutes }) => firstMinutes === 0))
    return 'Leave something in the first part, or move the whole entry.';
  if (!isTextChanged(entry, draft) && !isMoved) return 'Take words or hours out of the first part.';
  return draft.why.trim() === '' ? 'Write why it is divided.' : null;
}

interface SplitIds {
  secondId: string;
  additionId: string;
}

/** The ops that divide an entry, and those that make it whole again. `said` is what the second one says of where it comes from. */
export function splitChange(
  entry: EntryRow,
  draft: SplitDraft,
  { secondId, additionId }: SplitIds,
  said: string,
) {
  const entryId = entry.id;
  const second = {
    entryId: secondId,
    boatId: draft.boatId,
    stageId: draft.stageId,
    workDate: entry.workDate,
    text: draft.secondText.trim(),
    spoken: false,
    hours: movedHours(entry, draft, ({ secondMinutes }) => secondMinutes, draft.kind),
  };
  const why = draft.why.trim();
  const holdings: Holding[] = [
    { kind: 'entry.amend', data: { entryId, set: firstSet(entry, draft), why } },
    { kind: 'entry.write', data: second },
    { kind: 'entry.addTo', data: { entryId: secondId, additionId, text: said } },
  ];
  const back: Holding[] = [
    { kind: 'entry.strike', data: { entryId: secondId, why: UNDONE_WHY } },
    { kind: 'entry.amend', data: { entryId, set: wholeSet(entry, draft), why: UNDONE_WHY } },
  ];
  return { holdings, back };
}

const UNDONE_WHY = 'undone at once';

/** What the first part sets: words and figures, each only where it changes. */
function firstSet(entry: EntryRow, draft: SplitDraft): EntrySet {
  const hours = movedHours(entry, draft, ({ firstMinutes }) => firstMinutes, null);
  return {
    ...(isTextChanged(entry, draft) ? { text: draft.firstText.trim() } : {}),
    ...(hours.length > 0 ? { hours } : {}),
  };
}

/** What makes the entry whole again. */
function wholeSet(entry: EntryRow, draft: SplitDraft): EntrySet {
  const hours = movedHours(entry, draft, ({ beforeMinutes }) => beforeMinutes, null);
  return {
    ...(isTextChanged(entry, draft) ? { text: entry.text } : {}),
    ...(hours.length > 0 ? { hours } : {}),
  };
}

function isTextChanged({ text }: EntryRow, { firstText }: SplitDraft): boolean {
  return firstText.trim() !== text.trim();
}

/** A figure for everybody of whom hours go over; of the kind that it was, unless one is given. */
function movedHours(
  entry: EntryRow,
  draft: SplitDraft,
  minutesOf: (figure: SplitFigure) => number,
  kind: HoursKind | null,
): HoursGiven {
  return figuresOf(entry, draft)
    .filter(({ secondMinutes }) => secondMinutes > 0)
    .map((figure) => ({
      personId: figure.personId,
      minutes: minutesOf(figure),
      kind: kind ?? entry.hours.find(({ personId }) => personId === figure.personId)!.kind,
    }));
}
