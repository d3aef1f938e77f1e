import { useState } from 'react';
import { Why } from '#src/components/why.tsx';
import { useHold } from '#src/replica/hooks.tsx';
import { BoatSheet } from '#src/routes/alongside/boat-sheet.tsx';
import { AddToSheet } from '#src/routes/alongside/entry/add-to-sheet.tsx';
import { DaySheet } from '#src/routes/alongside/entry/day-sheet.tsx';
import { HoursSheet } from '#src/routes/alongside/entry/hours-sheet.tsx';
import type { EntryPage } from '#src/routes/alongside/entry/read-entry-page.ts';
import { WordsSheet } from '#src/routes/alongside/entry/words-sheet.tsx';
import type { Where } from '#src/routes/alongside/read-boats.ts';

export type Change = 'words' | 'move' | 'day' | 'hours' | 'addTo' | 'strike' | 'restore';

export interface ChangeProps {
  page: EntryPage;
  onClose: () => void;
}

/** The sheet for one change of an entry. */
export function ChangeSheets({ page, change, onClose }: ChangeProps & { change: Change }) {
  switch (change) {
    case 'words':
      return <WordsSheet page={page} onClose={onClose} />;
    case 'move':
      return <MoveSheets page={page} onClose={onClose} />;
    case 'day':
      return <DaySheet page={page} onClose={onClose} />;
    case 'hours':
      return <HoursSheet page={page} onClose={onClose} />;
    case 'addTo':
      return <AddToSheet page={page} onClose={onClose} />;
    case 'strike':
    case 'restore':
      return <StrikeSheet page={page} change={change} onClose={onClose} />;
  }
}

function StrikeSheet({ page, change, onClose }: ChangeProps & { change: 'strike' | 'restore' }) {
  const hold = useHold();
  const isStrike = change === 'strike';
  return (
    <Why
      isOpen
      onClose={onClose}
      title={isStrike ? 'Strike this entry' : 'Bring this entry back'}
      question={isStrike ? 'Why is it struck? It stays to be read.' : 'Why is it brought back?'}
      confirm={isStrike ? 'Strike it' : 'Bring it back'}
      isDanger={isStrike}
      problem={hold.error?.message}
      onConfirm={(why) =>
        hold.mutate({ kind: `entry.${change}`, data: { entryId: page.row.id, why } }, { onSuccess: onClose })
      }
    />
  );
}

function MoveSheets({ page, onClose }: ChangeProps) {
  const hold = useHold();
  const [to, setTo] = useState<Where | null>(null);
  const { boatId, stageId } = page.row;
  if (!to) return <BoatSheet isOpen where={{ boatId, stageId }} onClose={onClose} onChoose={setTo} />;
  return (
    <Why
      isOpen
      onClose={onClose}
      title="Move this entry"
      question="Why is it moved?"
      confirm="Move it"
      problem={hold.error?.message}
      onConfirm={(why) =>
        hold.mutate(
          { kind: 'entry.amend', data: { entryId: page.row.id, set: { ...to }, why } },
          { onSuccess: onClose },
        )
      }
    />
  );
}
