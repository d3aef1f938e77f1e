import { useState } from 'react';
import { addDays } from '#shared/sync/day.ts';
import { DayChoice } from '#src/components/day-choice.tsx';
import { useHold, useRead } from '#src/replica/hooks.tsx';
import { AmendSheet } from '#src/routes/alongside/entry/amend-sheet.tsx';
import type { ChangeProps } from '#src/routes/alongside/entry/change-sheets.tsx';
import { whyOf } from '#src/routes/alongside/entry/why-of.ts';
import { dayWords } from '#src/words/day-words.ts';

/** Another day that an entry is about. */
export function DaySheet({ page, onClose }: ChangeProps) {
  const { id, workDate: standing } = page.row;
  const today = useRead(['today'], (view) => view.today);
  const [workDate, setWorkDate] = useState(standing);
  const [why, setWhy] = useState('');
  const hold = useHold();

  function confirm() {
    if (workDate === standing) return onClose();
    hold.mutate(
      { kind: 'entry.amend', data: { entryId: id, set: { workDate }, ...whyOf(why) } },
      { onSuccess: onClose },
    );
  }

  return (
    <AmendSheet
      title="Change the day"
      onClose={onClose}
      why={why}
      onWhy={setWhy}
      onConfirm={confirm}
      failure={hold.error?.message}
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
