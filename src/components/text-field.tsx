import { type InputHTMLAttributes, useId } from 'react';
import { FIELD_LOOK, FieldProblem } from '#src/components/field.tsx';

interface TextFieldProps extends Omit<InputHTMLAttributes<HTMLInputElement>, 'value' | 'onChange'> {
  label: string;
  value: string;
  onChange: (text: string) => void;
  /** A line under the label that says what belongs here. */
  hint?: string;
  /** What is wrong and what to do, in one sentence. */
  problem?: string;
}

/** One line of text, a password, an e-mail: any `type` that an input has. */
export function TextField({ label, value, onChange, hint, problem, ...rest }: TextFieldProps) {
  const id = useId();
  const describedBy = [hint !== undefined && `${id}-hint`, problem !== undefined && `${id}-problem`].filter(
    Boolean,
  );
  return (
    <div className="grid gap-1">
      <label htmlFor={id} className="text-[18px] font-semibold">
        {label}
      </label>
      {hint !== undefined && (
        <p id={`${id}-hint`} className="text-slate">
          {hint}
        </p>
      )}
      <input
        id={id}
        value={value}
        onChange={(event) => onChange(event.target.value)}
        aria-invalid={problem !== undefined}
        aria-describedby={describedBy.join(' ') || undefined}
        className={FIELD_LOOK}
        {...rest}
      />
      <FieldProblem id={`${id}-problem`} problem={problem} />
    </div>
  );
}
