import { useState } from 'react';
import { useHold, useReplica } from '#src/replica/hooks.tsx';
import type { TaskLine } from '#src/routes/alongside/tasks/read-tasks.ts';
import { openingWords } from '#src/words/name-words.ts';

const TITLE_LENGTH_MAX = 40;

interface UndoTick {
  markId: string;
  words: string;
  onUndo: () => void;
  onGone: () => void;
}

/** What can be done with a task, and the way back from the last tick while it stands. */
export interface TaskDoings {
  tick: (task: TaskLine) => void;
  untick: (task: TaskLine) => void;
  start: (task: TaskLine) => void;
  stop: (task: TaskLine) => void;
  undo: UndoTick | null;
  failure: string | null;
}

export function useTaskDoings(): TaskDoings {
  const replica = useReplica();
  const hold = useHold();
  const [ticked, setTicked] = useState<{ taskId: string; markId: string; title: string } | null>(null);
  const take = (kind: string, data: object) => hold.mutate({ kind, data });

  function undoOf({ taskId, markId, title }: NonNullable<typeof ticked>): UndoTick {
    return {
      markId,
      words: `Ticked off: ${openingWords(title, TITLE_LENGTH_MAX)}`,
      onUndo() {
        setTicked(null);
        take('task.unmark', { taskId, markIds: [markId] });
      },
      onGone: () => setTicked(null),
    };
  }

  return {
    tick({ id, title }) {
      const markId = replica.newId();
      take('task.mark', { taskId: id, markId, workDate: replica.view().today });
      setTicked({ taskId: id, markId, title });
    },
    untick: ({ id, myMarkIds }) => take('task.unmark', { taskId: id, markIds: myMarkIds }),
    start: ({ id }) => take('task.start', { taskId: id, startId: replica.newId() }),
    stop: ({ id, myStartIds }) => take('task.stop', { taskId: id, startIds: myStartIds }),
    undo: ticked && undoOf(ticked),
    failure: hold.error?.message ?? null,
  };
}
