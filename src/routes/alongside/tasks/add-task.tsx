import { useState } from 'react';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextBox } from '#src/components/text-box.tsx';
import { useHold, useReplica } from '#src/replica/hooks.tsx';
import { useDraft } from '#src/routes/alongside/use-draft.ts';

const TITLE_LENGTH_MAX = 500;

/** A new task for the stage that is being worked on. */
export function AddTask({ boatId, stageId }: { boatId: string; stageId: string }) {
  const replica = useReplica();
  const hold = useHold();
  const { draft, change, clear } = useDraft('task', (kept) => (typeof kept === 'string' ? kept : ''));
  const [isAsked, setAsked] = useState(false);

  function add() {
    const title = draft.trim();
    setAsked(title === '');
    if (title === '' || title.length > TITLE_LENGTH_MAX) return;
    const data = { taskId: replica.newId(), boatId, stageId, title };
    hold.mutate({ kind: 'task.add', data }, { onSuccess: () => void clear() });
  }

  return (
    <form className="grid gap-3 px-4 py-5 md:px-6" onSubmit={(event) => event.preventDefault()}>
      <TextBox
        label="Something else to be done here"
        rows={1}
        value={draft}
        onChange={(text) => {
          setAsked(false);
          change(text);
        }}
        problem={problemOf(draft, isAsked)}
      />
      {hold.error && <Notice tone="error">{hold.error.message}</Notice>}
      <Key icon="plus" onClick={add}>
        Add the task
      </Key>
    </form>
  );
}

function problemOf(title: string, isAsked: boolean): string | undefined {
  if (isAsked) return 'Write what is to be done.';
  const over = title.trim().length - TITLE_LENGTH_MAX;
  return over > 0 ? `That is ${over} characters too many for a task. Say it shorter.` : undefined;
}
