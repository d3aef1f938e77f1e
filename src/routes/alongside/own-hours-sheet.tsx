import { useState } from 'react';
import { useMutation } from '@tanstack/react-query';
import type { HoursKind } from '#shared/entry/hours.ts';
import { Choice } from '#src/components/choice.tsx';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { QuarterHours } from '#src/components/quarter-hours.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { TextBox } from '#src/components/text-box.tsx';
import { useRead, useReplica } from '#src/replica/hooks.tsx';
import type { Done } from '#src/routes/alongside/done.ts';
import { logOwnHours } from '#src/routes/alongside/log-own-hours.ts';
import type { Where } from '#src/routes/alongside/read-boats.ts';
import { readOwnEntries, type OwnEntry } from '#src/routes/alongside/read-own-hours.ts';
import { HOURS_KIND_WORDS, HOURS_KINDS } from '#src/words/hours-words.ts';
import { boatWords } from '#src/words/where.ts';

interface OwnHoursSheetProps {
  where: Where;
  onClose: () => void;
  onDone: (done: Done) => void;
}

const ALONE = 'alone';
const KIND_OPTIONS: { value: HoursKind | ''; label: string }[] = [
  { value: '', label: 'as the foreman sets it' },
  ...HOURS_KINDS.map((kind) => ({ value: kind, label: HOURS_KIND_WORDS[kind] })),
];

/** One's own hours of today: in an entry that is there already, or by themselves. */
export default function OwnHoursSheet({ where, onClose, onDone }: OwnHoursSheetProps) {
  const replica = useReplica();
  const entries = useRead(['own entries', where], (view) => readOwnEntries(view, where));
  const boat = useRead(['boat', where.boatId], (view) => boatWords(view, where.boatId));
  const [chosen, setChosen] = useState(entries[0]?.entryId ?? ALONE);
  const entry = entries.find(({ entryId }) => entryId === chosen) ?? null;
  const [said, setSaid] = useState<Said>(saidOf(entry));
  const [isAsked, setAsked] = useState(false);
  const holding = useMutation({
    mutationFn: () => logOwnHours(replica, { where, entry, ...said, minutes: said.minutes ?? 0 }),
    networkMode: 'always',
    retry: false,
    onSuccess: onDone,
  });
  const problem = problemOf(said, entry);

  function choose(next: string) {
    setChosen(next);
    setSaid(saidOf(entries.find(({ entryId }) => entryId === next) ?? null));
    setAsked(false);
  }

  function confirm() {
    setAsked(true);
    if (!problem) holding.mutate();
  }

  return (
    <Sheet
      isOpen
      onClose={onClose}
      title={`Your hours today on ${boat}`}
      foot={
        <>
          {holding.error && <Notice tone="error">{holding.error.message}</Notice>}
          {isAsked && problem?.minutes && <Notice tone="error">{problem.minutes}</Notice>}
          <Key kind="main" disabled={holding.isPending} onClick={confirm}>
            {entry ? 'Put them into the entry' : 'Log the hours'}
          </Key>
        </>
      }
    >
      {entries.length > 0 && (
        <Choice
          label="Which work?"
          options={[
            ...entries.map(({ entryId, words }) => ({ value: entryId, label: words })),
            { value: ALONE, label: 'Hours by themselves' },
          ]}
          value={chosen}
          onChange={choose}
        />
      )}
      <QuarterHours
        key={chosen}
        label="Your hours"
        minutes={said.minutes}
        onChange={(minutes) => setSaid({ ...said, minutes })}
      />
      <SelectField
        label="Kind of hours"
        options={KIND_OPTIONS}
        value={said.kind ?? ''}
        onChange={(kind) => setSaid({ ...said, kind: kind || null })}
      />
      {isCorrection(said, entry) && (
        <TextBox
          label="Why do they change?"
          rows={1}
          value={said.why}
          onChange={(why) => setSaid({ ...said, why })}
          problem={isAsked ? problem?.why : undefined}
        />
      )}
    </Sheet>
  );
}

interface Said {
  minutes: number | null;
  kind: HoursKind | null;
  why: string;
}

function saidOf(entry: OwnEntry | null): Said {
  return { minutes: entry?.minutes ?? null, kind: entry?.kind ?? null, why: '' };
}

// a figure that stood already keeps its reason beside it; a first one needs none
function isCorrection({ minutes, kind }: Said, entry: OwnEntry | null): boolean {
  return Boolean(entry?.minutes) && (minutes !== entry!.minutes || kind !== entry!.kind);
}

function problemOf(said: Said, entry: OwnEntry | null): { minutes?: string; why?: string } | null {
  if (!said.minutes && !entry?.minutes) return { minutes: 'Say how many hours.' };
  if (entry?.minutes && !isCorrection(said, entry)) return { minutes: 'That is what stands already.' };
  if (isCorrection(said, entry) && said.why.trim() === '') return { why: 'Write the reason in a few words.' };
  return null;
}
