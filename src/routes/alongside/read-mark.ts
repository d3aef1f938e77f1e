import type { Row } from '#shared/sync/row.ts';
import type { Bung } from '#src/components/bung-mark.tsx';
import type { View } from '#src/replica/view.ts';
import type { EndLine } from '#src/routes/alongside/read-ends.ts';
import { momentWords } from '#src/words/day-words.ts';
import { whoWords } from '#src/words/who.ts';

/** What a row has come through, as its mark on the line. */
export function markOf(row: Row, ends: readonly EndLine[], isHeld: boolean): Bung {
  if (ends.length > 0) return 'loose';
  if (row.struck) return 'struck';
  return isHeld ? 'held' : 'sent';
}

/** 'Struck by Rosa 14:05: wrong boat'; null where it stands. */
export function struckWords(view: View, { struck }: Row): string | null {
  if (!struck) return null;
  return `Struck by ${whoWords(view, struck.by)} ${momentWords(struck.at, view.timeZone, view.today)}: ${struck.why}`;
}
