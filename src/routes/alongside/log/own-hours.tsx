import type { HoursKind } from '#shared/entry/hours.ts';
import { QuarterHours } from '#src/components/quarter-hours.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import type { DraftFields } from '#src/routes/alongside/log/entry-draft.ts';
import { HOURS_KIND_WORDS, HOURS_KINDS } from '#src/words/hours-words.ts';

const KIND_OPTIONS: { value: HoursKind | ''; label: string }[] = [
  { value: '', label: 'as the foreman sets it' },
  ...HOURS_KINDS.map((kind) => ({ value: kind, label: HOURS_KIND_WORDS[kind] })),
];

/** One's own hours, and the kind that one proposes for them. */
export function OwnHours({ draft, change }: DraftFields) {
  return (
    <>
      <QuarterHours label="Your hours" minutes={draft.minutes} onChange={(minutes) => change({ minutes })} />
      {draft.minutes !== null && (
        <SelectField
          label="Kind of hours"
          options={KIND_OPTIONS}
          value={draft.kind ?? ''}
          onChange={(kind) => change({ kind: kind || null })}
        />
      )}
    </>
  );
}
