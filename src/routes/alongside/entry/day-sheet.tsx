import { useState } from 'react';
import { addDays } from '#shared/sync/day.ts';
import { DayChoice } from '#src/components/day-choice.tsx';
import { useRead } from '#src/replica/hooks.tsx';
import { AmendSheet } from '#src/routes/alongside/entry/amend-sheet.tsx';
import type { ChangeProps } from '#src/routes/alongside/entry/change-sheets.tsx';
import { useAmend } from '#src/routes/alongside/entry/use-amend.ts';
import { dayWords } from '#src/words/day-words.ts';

/** Another day that an entry is about. */
export function DaySheet({ page, onClose, onDone }: ChangeProps) {
  const { workDate: standing } = page.row;
  const today = useRead(['today'], (view) => view.today);
  const [workDate, setWorkDate] = useState(standing);
  const [why, setWhy] = useState('');
  const amend = useAmend(page, onDone, onClose);

  function confirm() {
    if (workDate === standing) return onClose();
    amend.hold({ workDate }, { workDate: standing }, why);
  }

  return (
    <AmendSheet
      title="Change the day"
      onClose={onClose}
      why={why}
      onWhy={setWhy}
      onConfirm={confirm}
      failure={amend.failure}
    >
      <DayChoice
        label="Which day was it?"
        today={today}
        yesterday={addDays(today, -1)}
        value={workDate}
        onChange={setWorkDate}
        words={(day) => dayWords(day, today)}
      />
    </AmendSheet>
  );
}
