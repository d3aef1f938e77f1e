import { useState } from 'react';
import type { BoatRow } from '#shared/boat/boat.ts';
import { boatLengthText, parseBoatLength, type Units } from '#shared/measure/length.ts';
import { daySchema } from '#shared/sync/day.ts';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { TextBox } from '#src/components/text-box.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { useHold, useRead, useReplica } from '#src/replica/hooks.tsx';

type Way = 'unknown' | 'upright' | 'upside-down';

interface Draft {
  name: string;
  type: string;
  arrivedOn: string;
  length: string;
  beam: string;
  hullNumber: string;
  builder: string;
  builtYear: string;
  numbering: string;
  lies: Way;
}

interface BoatSheetProps {
  /** null: a new boat */
  boat: BoatRow | null;
  onClose: () => void;
  onDone?: (boatId: string) => void;
}

/** Adds a boat, or amends what is known of one: only what was changed is said. */
export function BoatSheet({ boat, onClose, onDone }: BoatSheetProps) {
  const replica = useReplica();
  const { units, today } = useRead(['units'], (view) => ({
    units: (view.all('shop')[0]?.units ?? 'imperial') as Units,
    today: view.today,
  }));
  const { mutateAsync: hold, error, isPending } = useHold();
  const [before] = useState(() => draftOf(boat, units));
  const [draft, setDraft] = useState(boat ? before : { ...before, arrivedOn: today });
  const [isAsked, setAsked] = useState(false);
  const change = (part: Partial<Draft>) => setDraft({ ...draft, ...part });
  const problems = problemsOf(draft, units);

  async function save() {
    setAsked(true);
    if (Object.keys(problems).length > 0) return;
    const set = changesOf(boat ? before : draftOf(null, units), draft, units, today);
    if (boat && Object.keys(set).length === 0) return onClose();
    const boatId = boat?.id ?? replica.newId();
    if (boat) await hold({ kind: 'boat.amend', data: { boatId, set } });
    else await hold({ kind: 'boat.add', data: { boatId, ...set } });
    onClose();
    onDone?.(boatId);
  }

  const field = (key: keyof Draft, label: string, more: { hint?: string; type?: string } = {}) => (
    <TextField
      label={label}
      value={draft[key]}
      onChange={(text) => change({ [key]: text })}
      problem={isAsked ? problems[key] : undefined}
      autoComplete="off"
      {...more}
    />
  );
  const measure = units === 'metric' ? 'Like 7.9 m.' : 'Like 26 ft 6 in.';
  return (
    <Sheet
      isOpen
      onClose={onClose}
      title={boat ? `${boat.name}: particulars` : 'Add a boat'}
      foot={
        <Key kind="main" disabled={isPending} onClick={() => void save()}>
          {boat ? 'Change' : 'Add her'}
        </Key>
      }
    >
      <form
        className="grid gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          void save();
        }}
      >
        {error && <Notice tone="error">{error.message}</Notice>}
        {field('name', 'Name')}
        {field('type', 'What she is', { hint: 'Launch, utility, skiff; carvel, lapstrake.' })}
        {field('arrivedOn', 'The day she came', { type: 'date', hint: 'Her stay is counted from it.' })}
        {field('length', 'Length', { hint: measure })}
        {field('beam', 'Beam', { hint: measure })}
        {field('hullNumber', 'Hull number')}
        {field('builder', 'Builder')}
        {field('builtYear', 'Year built')}
        <SelectField
          label="Which way she lies"
          value={draft.lies}
          onChange={(lies) => change({ lies })}
          options={[
            { value: 'unknown', label: 'not said' },
            { value: 'upright', label: 'upright' },
            { value: 'upside-down', label: 'upside down' },
          ]}
        />
        <TextBox
          label="How planks and frames are counted"
          value={draft.numbering}
          onChange={(numbering) => change({ numbering })}
          rows={2}
        />
        <button type="submit" hidden />
      </form>
    </Sheet>
  );
}

function draftOf(boat: BoatRow | null, units: Units): Draft {
  const length = (mm: number | null | undefined) => (mm ? boatLengthText(mm, units) : '');
  return {
    name: boat?.name ?? '',
    type: boat?.type ?? '',
    arrivedOn: boat?.arrivedOn ?? '',
    length: length(boat?.lengthMm),
    beam: length(boat?.beamMm),
    hullNumber: boat?.hullNumber ?? '',
    builder: boat?.builder ?? '',
    builtYear: boat?.builtYear?.toString() ?? '',
    numbering: boat?.numbering ?? '',
    lies: boat?.lies?.way ?? 'unknown',
  };
}

function problemsOf(draft: Draft, units: Units): Partial<Record<keyof Draft, string>> {
  const isYear = draft.builtYear === '' || /^(1[5-9]|2[0-4])\d\d$/.test(draft.builtYear.trim());
  const isLength = (text: string) => text.trim() === '' || parseBoatLength(text, units) !== null;
  const lengthWords = units === 'metric' ? 'Write it like 7.9 m.' : 'Write it like 26 ft 6 in.';
  return {
    ...(draft.name.trim() === '' ? { name: 'Write her name.' } : {}),
    ...(draft.arrivedOn !== '' && !daySchema.safeParse(draft.arrivedOn).success
      ? { arrivedOn: 'Pick a day.' }
      : {}),
    ...(isLength(draft.length) ? {} : { length: lengthWords }),
    ...(isLength(draft.beam) ? {} : { beam: lengthWords }),
    ...(isYear ? {} : { builtYear: 'Write a year in four figures.' }),
  };
}

/** What differs, as the record keeps it; what was emptied is null. */
function changesOf(before: Draft, draft: Draft, units: Units, today: string): Record<string, unknown> {
  const text = (words: string) => words.trim() || null;
  const length = (words: string) => (words.trim() ? parseBoatLength(words, units) : null);
  const values: Record<keyof Draft, [field: string, value: unknown]> = {
    name: ['name', draft.name.trim()],
    type: ['type', text(draft.type)],
    arrivedOn: ['arrivedOn', text(draft.arrivedOn)],
    length: ['lengthMm', length(draft.length)],
    beam: ['beamMm', length(draft.beam)],
    hullNumber: ['hullNumber', text(draft.hullNumber)],
    builder: ['builder', text(draft.builder)],
    builtYear: ['builtYear', draft.builtYear.trim() ? Number(draft.builtYear) : null],
    numbering: ['numbering', text(draft.numbering)],
    lies: ['lies', draft.lies === 'unknown' ? null : { way: draft.lies, since: today }],
  };
  const changed = (Object.keys(values) as (keyof Draft)[]).filter(
    (key) => draft[key].trim() !== before[key].trim(),
  );
  return Object.fromEntries(changed.map((key) => values[key]));
}
