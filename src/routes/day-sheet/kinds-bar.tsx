import { Key } from '#src/components/key.tsx';
import { useHold, useMe } from '#src/replica/hooks.tsx';
import { counted } from '#src/words/day-words.ts';
import type { DaySheet } from './read-day-sheet.ts';
import { readKindsToSet, type KindsOfEntry } from './read-kinds-to-set.ts';

/** The kinds of a day's hours that nobody has set yet, and the two short ways to set them all. */
export function KindsBar({ sheet }: { sheet: DaySheet }) {
  const me = useMe();
  const { mutateAsync: hold, isPending } = useHold();
  const { proposedCount, unsetCount, proposed, unset } = readKindsToSet(sheet);
  const maySet = me?.roles.some((role) => role === 'foreman' || role === 'office') ?? false;
  if (!maySet || proposedCount + unsetCount === 0) return null;

  async function setAll(kinds: KindsOfEntry[]) {
    for (const { entryId, hours } of kinds)
      await hold({ kind: 'entry.amend', data: { entryId, set: { hours } } });
  }

  return (
    <div data-keys className="flex flex-wrap items-center gap-3 px-4 pt-4 md:px-0">
      <p className="mr-auto text-slate">
        Kinds of hours: {counted(proposedCount, 'figure')} proposed, {unsetCount} not said.
      </p>
      {proposedCount > 0 && (
        <Key disabled={isPending} onClick={() => void setAll(proposed)}>
          {proposedCount === 1 ? 'Take the proposed one' : `Take the ${proposedCount} as proposed`}
        </Key>
      )}
      {unsetCount > 0 && (
        <Key disabled={isPending} onClick={() => void setAll(unset('agreed'))}>
          {unsetCount === 1 ? 'Set the other to agreed work' : `Set the other ${unsetCount} to agreed work`}
        </Key>
      )}
    </div>
  );
}
