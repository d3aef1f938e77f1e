import { useState } from 'react';
import { Why } from '#src/components/why.tsx';
import { useHold } from '#src/replica/hooks.tsx';
import { BoatSheet } from '#src/routes/alongside/boat-sheet.tsx';
import { UNDONE_WHY, type Done } from '#src/routes/alongside/done.ts';
import { AddToSheet } from '#src/routes/alongside/entry/add-to-sheet.tsx';
import { DaySheet } from '#src/routes/alongside/entry/day-sheet.tsx';
import { HoursSheet } from '#src/routes/alongside/entry/hours-sheet.tsx';
import type { EntryPage } from '#src/routes/alongside/entry/read-entry-page.ts';
import { useAmend } from '#src/routes/alongside/entry/use-amend.ts';
import { WordsSheet } from '#src/routes/alongside/entry/words-sheet.tsx';
import type { Where } from '#src/routes/alongside/read-boats.ts';

export type Change = 'words' | 'move' | 'day' | 'hours' | 'addTo' | 'strike' | 'restore';

export interface ChangeProps {
  page: EntryPage;
  onClose: () => void;
  /** called once a change is held, with the way back */
  onDone: (done: Done) => void;
}

/** The sheet for one change of an entry. */
export function ChangeSheets({ change, ...props }: ChangeProps & { change: Change }) {
  switch (change) {
    case 'words':
      return <WordsSheet {...props} />;
    case 'move':
      return <MoveSheets {...props} />;
    case 'day':
      return <DaySheet {...props} />;
    case 'hours':
      return <HoursSheet {...props} />;
    case 'addTo':
      return <AddToSheet {...props} />;
    case 'strike':
    case 'restore':
      return <StrikeSheet {...props} change={change} />;
  }
}

function StrikeSheet({ page, change, onClose, onDone }: ChangeProps & { change: 'strike' | 'restore' }) {
  const hold = useHold();
  const isStrike = change === 'strike';
  const entryId = page.row.id;
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
        hold.mutate(
          { kind: `entry.${change}`, data: { entryId, why } },
          {
            onSuccess: (op) => {
              const kind = isStrike ? 'entry.restore' : 'entry.strike';
              const words = isStrike ? 'The entry is struck' : 'The entry is back';
              onDone({ done: op.id, words, undo: [{ kind, data: { entryId, why: UNDONE_WHY } }] });
              onClose();
            },
          },
        )
      }
    />
  );
}

function MoveSheets({ page, onClose, onDone }: ChangeProps) {
  const amend = useAmend(page, onDone, onClose);
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
      problem={amend.failure}
      onConfirm={(why) => amend.hold({ ...to }, { boatId, stageId }, why)}
    />
  );
}
