import { type TextareaHTMLAttributes, useId } from 'react';
import { FIELD_LOOK, FieldProblem } from '#src/components/field.tsx';

interface TextBoxProps extends Omit<TextareaHTMLAttributes<HTMLTextAreaElement>, 'value' | 'onChange'> {
  label: string;
  value: string;
  onChange: (text: string) => void;
  /** A line under the label that says what belongs here. */
  hint?: string;
  /** What is wrong and what to do, in one sentence. */
  problem?: string;
}

/** Words of any length: a text area that grows with them. */
export function TextBox({ label, value, onChange, hint, problem, rows = 3, ...rest }: TextBoxProps) {
  const id = useId();
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
      {/* the hidden copy gives the box its height, in browsers without field-sizing too */}
      <div className="grid *:col-start-1 *:row-start-1">
        <div
          aria-hidden="true"
          className={`invisible max-h-[60dvh] overflow-hidden py-3 break-words whitespace-pre-wrap ${FIELD_LOOK}`}
        >
          {value}{' '}
        </div>
        <textarea
          id={id}
          rows={rows}
          value={value}
          onChange={(event) => onChange(event.target.value)}
          aria-invalid={problem !== undefined}
          aria-describedby={
            [hint !== undefined && `${id}-hint`, problem !== undefined && `${id}-problem`]
              .filter(Boolean)
              .join(' ') || undefined
          }
          className={`resize-none py-3 ${FIELD_LOOK}`}
          {...rest}
        />
      </div>
      <FieldProblem id={`${id}-problem`} problem={problem} />
    </div>
  );
}
