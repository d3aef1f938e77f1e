import type { ReactNode } from 'react';
import { Icon } from '#src/components/icons.tsx';

interface CheckKeyProps {
  label: ReactNode;
  /** A second line. */
  note?: ReactNode;
  isChecked: boolean;
  onChange: (isChecked: boolean) => void;
}

/** A checkbox as wide as its row; checked is told by the tick in its box and by its ground. */
export function CheckKey({ label, note, isChecked, onChange }: CheckKeyProps) {
  return (
    <label className="flex min-h-key items-center gap-3 rounded-key border-2 border-bilge bg-plank px-3 py-2 leading-tight has-checked:bg-bilge has-checked:text-primer has-focus-visible:outline-3 has-focus-visible:outline-offset-3 has-focus-visible:outline-bilge">
      <input
        type="checkbox"
        className="sr-only"
        checked={isChecked}
        onChange={(event) => onChange(event.target.checked)}
      />
      <span
        aria-hidden="true"
        className="flex size-8 shrink-0 items-center justify-center rounded-key border-2 border-current"
      >
        {isChecked && <Icon name="tick" size={24} />}
      </span>
      <span className="min-w-0 break-words">
        <span className="block font-semibold">{label}</span>
        {note !== undefined && <span className="block">{note}</span>}
      </span>
    </label>
  );
}
