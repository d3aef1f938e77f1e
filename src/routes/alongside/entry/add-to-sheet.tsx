import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { TextBox } from '#src/components/text-box.tsx';
import { useHold, useReplica } from '#src/replica/hooks.tsx';
import type { ChangeProps } from '#src/routes/alongside/entry/change-sheets.tsx';
import { tooLongWords } from '#src/words/too-long.ts';
import { useDraft } from '#src/routes/alongside/use-draft.ts';

/** Words added to anybody's entry, which stand beside its own. */
export function AddToSheet({ page, onClose, onDone }: ChangeProps) {
  const entryId = page.row.id;
  const { draft, change, clear } = useDraft(`addTo/${entryId}`, (kept) =>
    typeof kept === 'string' ? kept : '',
  );
  const replica = useReplica();
  const hold = useHold();

  function confirm() {
    const text = draft.trim();
    if (text === '' || tooLongWords(text)) return;
    const data = { entryId, additionId: replica.newId(), text };
    hold.mutate(
      { kind: 'entry.addTo', data },
      {
        onSuccess: (op) => {
          const back = { kind: 'entry.takeBack', data: { entryId, additionIds: [data.additionId] } };
          onDone({ done: op.id, words: 'Added to the entry', undo: [back] });
          void clear().then(onClose);
        },
      },
    );
  }

  return (
    <Sheet
      isOpen
      onClose={onClose}
      title="Add to it"
      foot={
        <>
          {hold.error && <Notice tone="error">{hold.error.message}</Notice>}
          <Key kind="main" onClick={confirm}>
            Add it
          </Key>
        </>
      }
    >
      <TextBox
        label="What else?"
        hint="It stands under your name beside the entry."
        rows={4}
        value={draft}
        onChange={change}
        problem={tooLongWords(draft)}
      />
    </Sheet>
  );
}
