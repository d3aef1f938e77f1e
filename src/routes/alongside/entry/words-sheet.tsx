import { useState } from 'react';
import { TextBox } from '#src/components/text-box.tsx';
import { useHold } from '#src/replica/hooks.tsx';
import { AmendSheet } from '#src/routes/alongside/entry/amend-sheet.tsx';
import { whyOf } from '#src/routes/alongside/entry/why-of.ts';
import type { ChangeProps } from '#src/routes/alongside/entry/change-sheets.tsx';
import { tooLongWords } from '#src/routes/alongside/log/entry-draft.ts';
import { useDraft } from '#src/routes/alongside/use-draft.ts';

/** Other words for an entry; what is typed is kept until it is done, and the earlier words stay in its history. */
export function WordsSheet({ page, onClose }: ChangeProps) {
  const { id, text: standing } = page.row;
  const { draft, change, clear } = useDraft(`words/${id}`, (kept) => readWords(kept) ?? standing);
  const [why, setWhy] = useState('');
  const hold = useHold();

  function confirm() {
    if (tooLongWords(draft)) return;
    if (draft.trim() === standing.trim()) return void clear().then(onClose);
    const set = { text: draft.trim() };
    hold.mutate(
      { kind: 'entry.amend', data: { entryId: id, set, ...whyOf(why) } },
      { onSuccess: () => void clear().then(onClose) },
    );
  }

  return (
    <AmendSheet
      title="Change the words"
      onClose={onClose}
      why={why}
      onWhy={setWhy}
      onConfirm={confirm}
      failure={hold.error?.message}
    >
      <TextBox
        label="The words"
        hint="The earlier words stay in the history."
        rows={5}
        value={draft}
        onChange={change}
        problem={tooLongWords(draft)}
      />
    </AmendSheet>
  );
}

function readWords(kept: unknown): string | undefined {
  return typeof kept === 'string' ? kept : undefined;
}
