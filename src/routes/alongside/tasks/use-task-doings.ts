import { useState } from 'react';
import { useHold, useReplica } from '#src/replica/hooks.tsx';
import type { Holding } from '#src/replica/replica.ts';
import type { Done } from '#src/routes/alongside/done.ts';
import type { TaskLine } from '#src/routes/alongside/tasks/read-tasks.ts';
import { openingWords } from '#src/words/name-words.ts';

const TITLE_LENGTH_MAX = 40;

/** What can be done with a task, and the way back from the last doing while it stands. */
export interface TaskDoings {
  tick: (task: TaskLine) => void;
  untick: (task: TaskLine) => void;
  start: (task: TaskLine) => void;
  stop: (task: TaskLine) => void;
  done: Done | null;
  onGone: () => void;
  failure: string | null;
}

export function useTaskDoings(): TaskDoings {
  const replica = useReplica();
  const hold = useHold();
  const [done, setDone] = useState<Done | null>(null);

  function take(what: string, { title }: TaskLine, deed: Holding, back: Holding) {
    // the way back from what was done before is none from this
    setDone(null);
    hold.mutate(deed, {
      onSuccess: (op) =>
        setDone({ done: op.id, words: `${what}: ${openingWords(title, TITLE_LENGTH_MAX)}`, undo: [back] }),
    });
  }

  const mark = (taskId: string, markId: string): Holding => ({
    kind: 'task.mark',
    data: { taskId, markId, workDate: replica.view().today },
  });
  const unmark = (taskId: string, markIds: string[]): Holding => ({
    kind: 'task.unmark',
    data: { taskId, markIds },
  });
  const start = (taskId: string, startId: string): Holding => ({
    kind: 'task.start',
    data: { taskId, startId },
  });
  const stop = (taskId: string, startIds: string[]): Holding => ({
    kind: 'task.stop',
    data: { taskId, startIds },
  });

  return {
    tick(task) {
      const markId = replica.newId();
      take('Ticked off', task, mark(task.id, markId), unmark(task.id, [markId]));
    },
    // what was taken back holds for ever, so that the way back is a tick of its own
    untick: (task) =>
      take('Tick taken back', task, unmark(task.id, task.myMarkIds), mark(task.id, replica.newId())),
    start(task) {
      const startId = replica.newId();
      take('Started', task, start(task.id, startId), stop(task.id, [startId]));
    },
    stop: (task) => take('Stopped', task, stop(task.id, task.myStartIds), start(task.id, replica.newId())),
    done,
    onGone: () => setDone(null),
    failure: hold.error?.message ?? null,
  };
}
