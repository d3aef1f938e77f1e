import { Key } from '#src/components/key.tsx';
import { useHold, useMe } from '#src/replica/hooks.tsx';
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
        Kinds of hours:{' '}
        {[proposedCount > 0 && `${proposedCount} proposed`, unsetCount > 0 && `${unsetCount} not said`]
          .filter(Boolean)
          .join(', ')}
        .
      </p>
      {proposedCount > 0 && (
        <Key disabled={isPending} onClick={() => void setAll(proposed)}>
          Take the {proposedCount} as proposed
        </Key>
      )}
      {unsetCount > 0 && (
        <Key disabled={isPending} onClick={() => void setAll(unset('agreed'))}>
          Set the {unsetCount} not said to agreed work
        </Key>
      )}
    </div>
  );
}
