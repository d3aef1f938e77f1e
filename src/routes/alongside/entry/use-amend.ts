import type { EntrySet } from '#shared/entry/entry.ts';
import { useHold } from '#src/replica/hooks.tsx';
import { UNDONE_WHY, type Done } from '#src/routes/alongside/done.ts';
import type { EntryPage } from '#src/routes/alongside/entry/read-entry-page.ts';
import { whyOf } from '#src/routes/alongside/entry/why-of.ts';

/** Amends an entry, and tells how it was, for the way back. */
export function useAmend({ row }: EntryPage, onDone: (done: Done) => void, onHeld: () => void) {
  const hold = useHold();
  return {
    failure: hold.error?.message,
    /** `before`: the same fields as they stand now */
    hold(set: EntrySet, before: EntrySet, why: string) {
      const amendment = (fields: EntrySet, reason: { why?: string }) => ({
        kind: 'entry.amend',
        data: { entryId: row.id, set: fields, ...reason },
      });
      hold.mutate(amendment(set, whyOf(why)), {
        onSuccess: (op) => {
          onDone({
            done: op.id,
            words: 'The entry is changed',
            undo: [amendment(before, { why: UNDONE_WHY })],
          });
          onHeld();
        },
      });
    },
  };
}
