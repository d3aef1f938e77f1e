import type { Day } from '#shared/sync/day.ts';
import type { View } from '#src/replica/view.ts';
import { readBoatRows } from '#src/routes/alongside/read-boat-rows.ts';
import { monthWords } from '#src/words/day-words.ts';

export interface MonthOnLine {
  /** 'YYYY-MM' */
  month: string;
  words: string;
  /** days with something on them */
  days: number;
  /** the newest of them */
  lastDay: Day;
}

/** The months of a boat in which something was logged, the newest first. */
export function readMonths(view: View, boatId: string): MonthOnLine[] {
  const days = [...readBoatRows(view, boatId).days.keys()].sort().reverse();
  const months = new Map<string, MonthOnLine>();
  for (const day of days) {
    const month = day.slice(0, 7);
    const known = months.get(month) ?? { month, words: monthWords(day), days: 0, lastDay: day };
    months.set(month, { ...known, days: known.days + 1 });
  }
  return [...months.values()];
}
