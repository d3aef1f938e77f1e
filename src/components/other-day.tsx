import { useState } from 'react';
import { Key } from '#src/components/key.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { TextField } from '#src/components/text-field.tsx';

interface OtherDayProps {
  /** `YYYY-MM-DD`: the day that is shown. */
  day: string;
  onShow: (day: string) => void;
  onClose: () => void;
}

/** Asks for any day, by the device's own calendar. */
export function OtherDay({ day: shown, onShow, onClose }: OtherDayProps) {
  const [day, setDay] = useState(shown);
  // a date input answers an empty string while it is being typed into
  const isDay = /^\d{4}-\d{2}-\d{2}$/.test(day);
  const show = () => {
    if (!isDay) return;
    onClose();
    onShow(day);
  };
  return (
    <Sheet
      isOpen
      onClose={onClose}
      title="Another day"
      foot={
        <Key kind="main" onClick={show} disabled={!isDay}>
          Show this day
        </Key>
      }
    >
      <form
        onSubmit={(event) => {
          event.preventDefault();
          show();
        }}
      >
        <TextField label="Which day" type="date" value={day} onChange={setDay} />
      </form>
    </Sheet>
  );
}
