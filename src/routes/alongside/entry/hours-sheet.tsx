import { useState } from 'react';
import type { HoursKind } from '#shared/entry/hours.ts';
import { QuarterHours } from '#src/components/quarter-hours.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import { useRead, useReplica } from '#src/replica/hooks.tsx';
import { AmendSheet } from '#src/routes/alongside/entry/amend-sheet.tsx';
import type { ChangeProps } from '#src/routes/alongside/entry/change-sheets.tsx';
import { useAmend } from '#src/routes/alongside/entry/use-amend.ts';
import {
  changedHours,
  readFigure,
  readFigures,
  readUnnamed,
  standingHours,
  type Figure,
} from '#src/routes/alongside/entry/read-hours-form.ts';
import { HOURS_KIND_WORDS, HOURS_KINDS } from '#src/words/hours-words.ts';

const KIND_OPTIONS: { value: HoursKind | ''; label: string }[] = [
  { value: '', label: 'not set' },
  ...HOURS_KINDS.map((kind) => ({ value: kind, label: HOURS_KIND_WORDS[kind] })),
];

/** Other hours in an entry, for those whose figures this person may change, with the reason. */
export function HoursSheet({ page, onClose, onDone }: ChangeProps) {
  const { row, actions } = page;
  const replica = useReplica();
  const [figures, setFigures] = useState<Figure[]>(() => readFigures(replica.view(), row, actions));
  const unnamed = useRead(['unnamed', figures], (view) =>
    actions.hoursOfAnybody ? readUnnamed(view, figures) : [],
  );
  const [why, setWhy] = useState('');
  const [isAsked, setAsked] = useState(false);
  const amend = useAmend(page, onDone, onClose);

  function setFigure(personId: string, next: Partial<Figure>) {
    setFigures(figures.map((figure) => (figure.personId === personId ? { ...figure, ...next } : figure)));
  }

  function confirm() {
    const hours = changedHours(row, figures);
    if (hours.length === 0) return onClose();
    if (why.trim() === '') return setAsked(true);
    amend.hold({ hours }, { hours: standingHours(row, hours) }, why);
  }

  return (
    <AmendSheet
      title="Change the hours"
      onClose={onClose}
      why={why}
      onWhy={setWhy}
      whyLabel="Why do they change?"
      whyProblem={isAsked && why.trim() === '' ? 'Write the reason in a few words.' : undefined}
      onConfirm={confirm}
      failure={amend.failure}
    >
      {figures.map(({ personId, label, minutes, kind }) => (
        <div key={personId} className="grid gap-3">
          <QuarterHours
            label={label}
            minutes={minutes}
            onChange={(next) => setFigure(personId, { minutes: next })}
            isShort
          />
          <SelectField
            label={`Kind of ${label.replace(/^Your/, 'your')}`}
            options={KIND_OPTIONS}
            value={kind ?? ''}
            onChange={(next) => setFigure(personId, { kind: next || null })}
          />
        </div>
      ))}
      {unnamed.length > 0 && (
        <SelectField
          label="Somebody else who worked on it"
          options={[
            { value: '', label: 'nobody' },
            ...unnamed.map(({ id, name }) => ({ value: id, label: name })),
          ]}
          value=""
          onChange={(id) => {
            if (id) setFigures([...figures, readFigure(replica.view(), row, id)]);
          }}
        />
      )}
    </AmendSheet>
  );
}
