import { useState } from 'react';
import type { HoursKind } from '#shared/entry/hours.ts';
import { Key, KeyLink } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { TextBox } from '#src/components/text-box.tsx';
import { useRead, useReplica } from '#src/replica/hooks.tsx';
import type { Deeds } from '#src/shell/use-deeds.ts';
import { HOURS_KINDS, HOURS_KIND_WORDS } from '#src/words/hours-words.ts';
import { originWords, readSplit, type EntryToSplit } from './read-split.ts';
import { newSplit, splitChange, splitProblem, type SplitDraft } from './split-draft.ts';
import { SplitHours } from './split-hours.tsx';
import { SplitWords } from './split-words.tsx';

interface SplitSheetProps {
  entryId: string;
  deeds: Deeds;
  onClose: () => void;
}

/** Divides an entry in two: which words and hours become a second one, on which boat and stage, and why. */
export function SplitSheet({ entryId, ...rest }: SplitSheetProps) {
  const entry = useRead(['split', entryId], (view) => readSplit(view, entryId));
  return entry && <Split key={entryId} entry={entry} {...rest} />;
}

function Split({ entry, deeds, onClose }: Omit<SplitSheetProps, 'entryId'> & { entry: EntryToSplit }) {
  const replica = useReplica();
  const { row } = entry;
  const [draft, setDraft] = useState(() => newSplit(row));
  const [isAsked, setAsked] = useState(false);
  const change = (part: Partial<SplitDraft>) => setDraft({ ...draft, ...part });
  const problem = splitProblem(row, draft);
  const origin = originWords(replica.view(), row, draft.why);

  function divide() {
    setAsked(true);
    if (problem) return;
    const ids = { secondId: replica.newId(), additionId: replica.newId() };
    deeds.doIt({ words: `Divided in two: ${entry.title}`, ...splitChange(row, draft, ids, origin) }, onClose);
  }

  return (
    <Sheet
      isOpen
      onClose={onClose}
      title={`Split in two: ${entry.title}`}
      foot={
        !entry.isLoose && (
          <>
            {isAsked && problem && <Notice tone="error">{problem}</Notice>}
            {deeds.failure && <Notice tone="error">{deeds.failure}</Notice>}
            <Key kind="main" disabled={deeds.isPending} onClick={divide}>
              Split it in two
            </Key>
          </>
        )
      }
    >
      <KeyLink to={`/entry/${row.id}`}>Only move it: on its own page</KeyLink>
      {entry.isLoose ? (
        <Notice tone="warn">
          Something in it was said in two ways. Settle that loose end first, then split it.
        </Notice>
      ) : (
        <>
          <SplitWords row={row} draft={draft} change={change} />
          <SecondPlace entry={entry} draft={draft} change={change} />
          <SplitHours entry={entry} draft={draft} change={change} />
          <SelectField
            label="Kind of hours in the second part"
            value={draft.kind ?? ''}
            onChange={(kind) => change({ kind: kind || null })}
            options={[
              { value: '' as HoursKind | '', label: 'as it was' },
              ...HOURS_KINDS.map((kind) => ({ value: kind, label: HOURS_KIND_WORDS[kind] })),
            ]}
          />
          <TextBox
            label="Why is it divided?"
            rows={1}
            value={draft.why}
            onChange={(why) => change({ why })}
          />
          <p className="border-l-[3px] border-bilge pl-3">
            <span className="font-semibold">The second part will carry this:</span> {origin}
          </p>
          {entry.followerCount > 0 && (
            <p className="text-slate">What was found with it, and its photos, stay with the first part.</p>
          )}
        </>
      )}
    </Sheet>
  );
}

interface PartProps {
  entry: EntryToSplit;
  draft: SplitDraft;
  change: (part: Partial<SplitDraft>) => void;
}

function SecondPlace({ entry: { boats }, draft, change }: PartProps) {
  const stages = boats.find(({ id }) => id === draft.boatId)?.stages ?? [];
  return (
    <>
      <SelectField
        label="Boat of the second part"
        value={draft.boatId}
        onChange={(boatId) =>
          change({ boatId, stageId: boats.find(({ id }) => id === boatId)?.stages[0]?.id ?? null })
        }
        options={boats.map(({ id, name }) => ({ value: id, label: name }))}
      />
      <SelectField
        label="Stage of the second part"
        value={draft.stageId ?? ''}
        onChange={(stageId) => change({ stageId: stageId || null })}
        options={[
          { value: '', label: 'no stage' },
          ...stages.map(({ id, name }) => ({ value: id, label: name })),
        ]}
      />
    </>
  );
}
