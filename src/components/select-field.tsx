import { useId } from 'react';
import { FIELD_LOOK } from '#src/components/field.tsx';

interface SelectFieldProps<Value extends string> {
  label: string;
  options: readonly { value: Value; label: string }[];
  value: Value;
  onChange: (value: Value) => void;
}

/** One of many short words, by the device's own list. */
export function SelectField<Value extends string>({
  label,
  options,
  value,
  onChange,
}: SelectFieldProps<Value>) {
  const id = useId();
  return (
    <div className="grid gap-1">
      <label htmlFor={id} className="text-[18px] font-semibold">
        {label}
      </label>
      <select
        id={id}
        className={FIELD_LOOK}
        value={value}
        onChange={(event) => onChange(event.target.value as Value)}
      >
        {options.map((option) => (
          <option key={option.value} value={option.value}>
            {option.label}
          </option>
        ))}
      </select>
    </div>
  );
}
