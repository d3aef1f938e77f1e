import type { ReactNode } from 'react';
import { Fold, FoldMark } from '#src/components/fold.tsx';
import { Key } from '#src/components/key.tsx';
import { counted } from '#src/words/day-words.ts';
import { HoursAgainst } from './hours-against.tsx';
import type { StageOfOrder, StageState } from './read-stages.ts';
import type { TaskOfOrder } from './read-task.ts';
import { TaskLine } from './task-line.tsx';

export interface StageKeys {
  /** Null where this person may not. */
  onAdd: (() => void) | null;
  onChange: (() => void) | null;
  onFinish: (() => void) | null;
  onReopen: (() => void) | null;
}

interface StageBlockProps {
  stage: StageOfOrder;
  keys: StageKeys;
  onOpen: (task: TaskOfOrder) => void;
}

const STATE_WORDS: Record<StageState, string> = {
  finished: 'finished',
  'under-way': 'under way',
  free: 'may start now',
  waits: 'waits',
};

/** A stage with its state, its hours against the estimate, and its tasks; what is finished or waits is folded. */
export function StageBlock({ stage, keys, onOpen }: StageBlockProps) {
  const { row, open, done, state } = stage;
  const isFolded = state === 'finished' || state === 'waits';
  const tasks = (
    <>
      <Tasks tasks={open} onOpen={onOpen} />
      {state === 'finished' && <Tasks tasks={done} onOpen={onOpen} />}
      {state !== 'finished' && done.length > 0 && (
        <div className="pt-3">
          <Fold title={`${done.length} done`}>
            <Tasks tasks={done} onOpen={onOpen} />
          </Fold>
        </div>
      )}
      <Keys name={row.name} keys={keys} />
    </>
  );
  return (
    <li className="bg-plank px-4 py-3 md:px-6">
      {isFolded && hasInside(stage, keys) ? (
        <Folded head={<StageHead stage={stage} />}>{tasks}</Folded>
      ) : (
        <>
          <StageHead stage={stage} />
          {tasks}
        </>
      )}
    </li>
  );
}

/** A stage under its head: a long list of work keeps to a screen or two. */
function Folded({ head, children }: { head: ReactNode; children: ReactNode }) {
  return (
    <details className="group">
      <summary className="-my-3 grid min-h-[68px] cursor-pointer grid-cols-[20px_minmax(0,1fr)] items-center gap-3 py-3 hover:underline">
        <FoldMark />
        {head}
      </summary>
      <div className="pt-5">{children}</div>
    </details>
  );
}

function hasInside({ open, done }: StageOfOrder, keys: StageKeys): boolean {
  return open.length + done.length > 0 || Object.values(keys).some((key) => key !== null);
}

function taskCount({ open, done }: StageOfOrder): string {
  const count = open.length + done.length;
  if (count === 0) return 'No tasks in it';
  return `${done.length} of ${counted(count, 'task')} done`;
}

function StageHead({ stage }: { stage: StageOfOrder }) {
  const { row, state, finished, waitsFor, minutes, estimateMinutes } = stage;
  const words = [finished, state === 'finished' ? null : waitsFor, taskCount(stage)].filter(Boolean);
  return (
    <div className="flex flex-wrap items-baseline justify-between gap-x-4 sm:flex-nowrap">
      <div className="min-w-0 break-words">
        <h2 className="text-[20px] leading-snug font-bold">
          {row.name} {state !== 'finished' && <StateWord state={state} />}
        </h2>
        <p className="leading-snug text-slate">{words.join(' · ')}</p>
      </div>
      <p className="font-semibold sm:shrink-0">
        <HoursAgainst minutes={minutes} estimateMinutes={estimateMinutes} />
      </p>
    </div>
  );
}

function StateWord({ state }: { state: StageState }) {
  const look = state === 'waits' ? 'border-line text-slate' : 'border-bilge';
  return (
    <span
      className={`ml-1 inline-block border-2 px-2 align-[1px] text-[18px] leading-snug font-semibold ${look}`}
    >
      {STATE_WORDS[state]}
    </span>
  );
}

function Tasks({ tasks, onOpen }: { tasks: TaskOfOrder[]; onOpen: (task: TaskOfOrder) => void }) {
  return (
    <ul className="-mx-2 mt-1 *:px-2 empty:hidden">
      {tasks.map((task) => (
        <TaskLine key={task.row.id} task={task} onOpen={() => onOpen(task)} />
      ))}
    </ul>
  );
}

function Keys({ name, keys: { onAdd, onChange, onFinish, onReopen } }: { name: string; keys: StageKeys }) {
  const of = <span className="sr-only"> {name}</span>;
  const shown: ReactNode[] = [
    onAdd && (
      <Key key="add" icon="plus" onClick={onAdd}>
        Add a task<span className="sr-only"> to {name}</span>
      </Key>
    ),
    onFinish && (
      <Key key="finish" icon="tick" onClick={onFinish}>
        Stage finished{of}
      </Key>
    ),
    onReopen && (
      <Key key="reopen" icon="undo" onClick={onReopen}>
        Take it up again{of}
      </Key>
    ),
    onChange && (
      <Key key="change" onClick={onChange}>
        Change stage{of}
      </Key>
    ),
  ].filter(Boolean);
  return (
    shown.length > 0 && (
      <div data-keys className="flex flex-wrap gap-3 pt-3 pb-1">
        {shown}
      </div>
    )
  );
}
