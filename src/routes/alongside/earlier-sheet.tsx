import { useState } from 'react';
import type { Day } from '#shared/sync/day.ts';
import { Key } from '#src/components/key.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { useRead } from '#src/replica/hooks.tsx';
import { readMonths } from '#src/routes/alongside/read-earlier.ts';
import { counted } from '#src/words/day-words.ts';

interface EarlierSheetProps {
  boatId: string;
  boatName: string;
  onChoose: (day: Day) => void;
  onClose: () => void;
}

/** The way to a boat's earlier days: by its date, or by the month. */
export default function EarlierSheet({ boatId, boatName, onChoose, onClose }: EarlierSheetProps) {
  const months = useRead(['months', boatId], (view) => readMonths(view, boatId));
  const today = useRead(['today'], (view) => view.today);
  const [day, setDay] = useState('');
  const isDay = /^\d{4}-\d{2}-\d{2}$/.test(day) && day <= today;
  return (
    <Sheet isOpen onClose={onClose} title={`Earlier days of ${boatName}`}>
      <form
        className="grid grid-cols-[1fr_auto] items-end gap-3"
        onSubmit={(event) => {
          event.preventDefault();
          if (isDay) onChoose(day);
        }}
      >
        <TextField label="Go to a day" type="date" max={today} value={day} onChange={setDay} />
        <Key type="submit" disabled={!isDay}>
          Go
        </Key>
      </form>
      <div role="group" aria-label="Months" className="grid gap-3">
        <h3 className="font-semibold">Or to a month</h3>
        {months.map((month) => (
          <Key key={month.month} className="!justify-between" onClick={() => onChoose(month.lastDay)}>
            <span>{month.words}</span>
            <span className="font-normal">{counted(month.days, 'day')}</span>
          </Key>
        ))}
        {months.length === 0 && <p className="text-slate">Nothing is logged on her yet.</p>}
      </div>
    </Sheet>
  );
}
