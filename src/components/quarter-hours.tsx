import { useId, useState } from 'react';
import { MINUTES_PER_ENTRY_MAX, hoursText, parseHours } from '#shared/measure/hours.ts';
import { FIELD_LOOK, FieldProblem } from '#src/components/field.tsx';
import { Hours } from '#src/components/hours.tsx';
import { IconKey } from '#src/components/key.tsx';
import { keyLook } from '#src/components/key-look.ts';

interface QuarterHoursProps {
  /** Whose or what hours, for example 'Your hours'. */
  label: string;
  /** Null where nothing is said yet. */
  minutes: number | null;
  onChange: (minutes: number | null) => void;
  /** Without the keys of the common figures, for one of several people. */
  isShort?: boolean;
}

const QUARTER_MINUTES = 15;
const COMMON_MINUTES = [60, 120, 240, 480];

/** Hours by quarter-hour keys, by the common figures, or typed: `2.5`, `2 1/2`, `2:30`. */
export function QuarterHours({ label, minutes, onChange, isShort = false }: QuarterHoursProps) {
  const id = useId();
  // what is being typed stands until it can be read; then the figure speaks
  const [typed, setTyped] = useState<string | null>(null);
  const isUnread = typed !== null && typed.trim() !== '' && parseHours(typed) === null;

  function take(next: number | null) {
    setTyped(null);
    onChange(next);
  }

  function type(text: string) {
    setTyped(text);
    const read = parseHours(text);
    if (read !== null || text.trim() === '') onChange(read);
  }

  return (
    <div role="group" aria-labelledby={`${id}-label`} className="grid gap-3">
      <label id={`${id}-label`} htmlFor={id} className="-mb-2 text-[18px] font-semibold">
        {label}
      </label>
      <div className="flex gap-3">
        <IconKey
          icon="minus"
          word="A quarter hour less"
          isBare
          disabled={!minutes}
          onClick={() => take(stepped(minutes, -1))}
        />
        <input
          id={id}
          // no numeric keyboard has a slash or a colon, and words such as '2 h' are read too
          inputMode="text"
          autoComplete="off"
          placeholder="none"
          className={`${FIELD_LOOK} min-w-0 text-center font-bold`}
          value={typed ?? (minutes === null ? '' : hoursText(minutes))}
          onChange={(event) => type(event.target.value)}
          onBlur={() => {
            if (!isUnread) setTyped(null);
          }}
          aria-invalid={isUnread}
          aria-describedby={`${id}-problem`}
        />
        <IconKey icon="plus" word="A quarter hour more" isBare onClick={() => take(stepped(minutes, 1))} />
      </div>
      {!isShort && (
        <div className="grid grid-cols-4 gap-3">
          {COMMON_MINUTES.map((common) => (
            <button
              key={common}
              type="button"
              className={`${keyLook('plain')} aria-pressed:bg-bilge aria-pressed:text-primer`}
              aria-pressed={minutes === common}
              onClick={() => take(common)}
            >
              <Hours minutes={common} />
            </button>
          ))}
        </div>
      )}
      <FieldProblem
        id={`${id}-problem`}
        problem={
          isUnread ? 'That is no figure of hours. Write it like 2.5, 2 1/2 or 2:30, up to 24.' : undefined
        }
      />
    </div>
  );
}

/** The next quarter hour up or down; a figure between quarters goes to the nearest one in that direction. */
function stepped(minutes: number | null, direction: 1 | -1): number {
  const quarters = (minutes ?? 0) / QUARTER_MINUTES;
  const next = direction === 1 ? Math.floor(quarters) + 1 : Math.ceil(quarters) - 1;
  return Math.min(Math.max(next * QUARTER_MINUTES, 0), MINUTES_PER_ENTRY_MAX);
}
