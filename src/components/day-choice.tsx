import { useState } from 'react';
import { Choice } from '#src/components/choice.tsx';
import { TextField } from '#src/components/text-field.tsx';

interface DayChoiceProps {
  label: string;
  /** `YYYY-MM-DD`, as are all days here. */
  today: string;
  yesterday: string;
  value: string;
  onChange: (day: string) => void;
  /** A day written out, for example 'Tue 8 Sep'. */
  words: (day: string) => string;
}

/** A day by today, yesterday or another; another one by the phone's own calendar, and never a day to come. */
export function DayChoice({ label, today, yesterday, value, onChange, words }: DayChoiceProps) {
  const [isOther, setOther] = useState(value !== today && value !== yesterday);
  const options = [
    { value: 'today', label: 'Today', note: words(today) },
    { value: 'yesterday', label: 'Yesterday', note: words(yesterday) },
    { value: 'other', label: 'Other', note: isOther ? words(value) : 'pick a day' },
  ] as const;

  function choose(choice: (typeof options)[number]['value']) {
    setOther(choice === 'other');
    if (choice === 'today') onChange(today);
    if (choice === 'yesterday') onChange(yesterday);
  }

  return (
    <div className="grid gap-3">
      <Choice label={label} options={options} value={chosen(isOther, value, today)} onChange={choose} isRow />
      {isOther && (
        <TextField
          label="Which day"
          type="date"
          max={today}
          value={value}
          onChange={(day) => {
            if (isDay(day) && day <= today) onChange(day);
          }}
        />
      )}
    </div>
  );
}

function chosen(isOther: boolean, value: string, today: string) {
  if (isOther) return 'other';
  return value === today ? 'today' : 'yesterday';
}

// a date input answers an empty string while it is being typed into
function isDay(text: string): boolean {
  return /^\d{4}-\d{2}-\d{2}$/.test(text);
}
