import { useState } from 'react';
import type { EntryRow } from '#shared/entry/entry.ts';
import { CheckKey } from '#src/components/check-key.tsx';
import { TextBox } from '#src/components/text-box.tsx';
import { sentencesOf, type SplitDraft } from './split-draft.ts';

interface SplitWordsProps {
  row: EntryRow;
  draft: SplitDraft;
  change: (part: Partial<SplitDraft>) => void;
}

/** Which words go over: by whole sentences, and as they are then written. */
export function SplitWords({ row, draft, change }: SplitWordsProps) {
  const sentences = sentencesOf(row.text);
  const [over, setOver] = useState<ReadonlySet<number>>(new Set());

  function take(index: number, isOver: boolean) {
    const next = new Set(over);
    if (isOver) next.add(index);
    else next.delete(index);
    setOver(next);
    const part = (isSecond: boolean) => sentences.filter((_, each) => next.has(each) === isSecond).join(' ');
    change({ firstText: part(false), secondText: part(true) });
  }

  return (
    <>
      {sentences.length > 1 && (
        <fieldset className="grid gap-3">
          <legend className="pb-2 font-semibold">Tap the sentences that go into the second part</legend>
          {sentences.map((sentence, index) => (
            <CheckKey
              key={index}
              label={<span className="font-normal">{sentence}</span>}
              isChecked={over.has(index)}
              onChange={(isOver) => take(index, isOver)}
            />
          ))}
        </fieldset>
      )}
      <TextBox
        label="First part, as it stays"
        rows={2}
        value={draft.firstText}
        onChange={(firstText) => change({ firstText })}
      />
      <TextBox
        label="Second part"
        rows={2}
        value={draft.secondText}
        onChange={(secondText) => change({ secondText })}
      />
    </>
  );
}
