import type { HoursKind } from '#shared/entry/hours.ts';
import { SelectField } from '#src/components/select-field.tsx';
import type { DraftFields } from '#src/routes/alongside/log/entry-draft.ts';
import { HOURS_KIND_WORDS, HOURS_KINDS } from '#src/words/hours-words.ts';

const KIND_OPTIONS: { value: HoursKind | ''; label: string }[] = [
  { value: '', label: 'as the foreman sets it' },
  ...HOURS_KINDS.map((kind) => ({ value: kind, label: HOURS_KIND_WORDS[kind] })),
];

/** The kind that is proposed for everybody's hours in the entry. */
export function KindField({ draft, change }: DraftFields) {
  return (
    <SelectField
      label="Kind of hours"
      options={KIND_OPTIONS}
      value={draft.kind ?? ''}
      onChange={(kind) => change({ kind: kind || null })}
    />
  );
}
