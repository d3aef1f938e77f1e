import { type ReactNode, useId } from 'react';
import { Icon } from '#src/components/icons.tsx';

export interface Option<Value extends string> {
  value: Value;
  label: ReactNode;
  /** A second line, smaller in weight. */
  note?: ReactNode;
}

interface ChoiceProps<Value extends string> {
  label: string;
  options: readonly Option<Value>[];
  /** Null where nothing is chosen yet. */
  value: Value | null;
  onChange: (value: Value) => void;
  /** Side by side, for two to four short words; stacked unless told. */
  isRow?: boolean;
}

/** One of a few: a radio group whose options are keys. The chosen one is told by a tick and its ground. */
export function Choice<Value extends string>({
  label,
  options,
  value,
  onChange,
  isRow = false,
}: ChoiceProps<Value>) {
  const name = useId();
  return (
    <fieldset className="min-w-0">
      <legend className="pb-1 text-[18px] font-semibold">{label}</legend>
      <div className={`grid gap-3 ${isRow ? 'auto-cols-fr grid-flow-col' : ''}`}>
        {options.map((option) => (
          <label
            key={option.value}
            className={`flex min-h-key items-center gap-2 rounded-key border-2 border-bilge bg-plank py-2 leading-tight has-checked:bg-bilge has-checked:text-primer has-focus-visible:outline-3 has-focus-visible:outline-offset-3 has-focus-visible:outline-bilge ${isRow ? 'justify-center px-2 text-center' : 'px-4'}`}
          >
            <input
              type="radio"
              className="sr-only"
              name={name}
              checked={option.value === value}
              onChange={() => onChange(option.value)}
            />
            <span>
              <span className={`flex items-center gap-2 font-semibold ${isRow ? 'justify-center' : ''}`}>
                {option.value === value && <Icon name="tick" size={20} />}
                {option.label}
              </span>
              {option.note !== undefined && <span className="block">{option.note}</span>}
            </span>
          </label>
        ))}
      </div>
    </fieldset>
  );
}
