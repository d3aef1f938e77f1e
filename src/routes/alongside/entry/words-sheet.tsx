import { useState } from 'react';
import { TextBox } from '#src/components/text-box.tsx';
import { AmendSheet } from '#src/routes/alongside/entry/amend-sheet.tsx';
import { useAmend } from '#src/routes/alongside/entry/use-amend.ts';
import type { ChangeProps } from '#src/routes/alongside/entry/change-sheets.tsx';
import { tooLongWords } from '#src/words/too-long.ts';
import { useDraft } from '#src/routes/alongside/use-draft.ts';

/** Other words for an entry; what is typed is kept until it is done, and the earlier words stay in its history. */
export function WordsSheet({ page, onClose, onDone }: ChangeProps) {
  const { id, text: standing } = page.row;
  const { draft, change, clear } = useDraft(`words/${id}`, (kept) => readWords(kept) ?? standing);
  const [why, setWhy] = useState('');
  const amend = useAmend(page, onDone, () => void clear().then(onClose));

  function confirm() {
    if (tooLongWords(draft)) return;
    if (draft.trim() === standing.trim()) return void clear().then(onClose);
    amend.hold({ text: draft.trim() }, { text: standing }, why);
  }

  return (
    <AmendSheet
      title="Change the words"
      onClose={onClose}
      why={why}
      onWhy={setWhy}
      onConfirm={confirm}
      failure={amend.failure}
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
