import { useState } from 'react';
import { Hours } from '#src/components/hours.tsx';
import { Icon } from '#src/components/icons.tsx';
import { Key } from '#src/components/key.tsx';
import { useHold, useRead, useReplica } from '#src/replica/hooks.tsx';
import { standingItems } from '#shared/sync/items.ts';
import type { BoatPage, StageOfBoat, TaskOfBoat } from './read-boat.ts';
import { StageSheet } from './stage-sheet.tsx';
import { TaskSheet } from './task-sheet.tsx';

interface StageBlockProps {
  boat: BoatPage;
  stage: StageOfBoat;
}

type Open = { sheet: 'stage' } | { sheet: 'task'; task: TaskOfBoat | null } | null;

/** A stage with its hours, whether it is finished, and its tasks. */
export function StageBlock({ boat, stage }: StageBlockProps) {
  const [open, setOpen] = useState<Open>(null);
  const { row, minutes, finished, after, tasks, doneTasks } = stage;
  const close = () => setOpen(null);
  return (
    <li className="bg-plank px-4 py-3 md:px-6">
      <div className="flex items-baseline justify-between gap-4">
        <h3 className="min-w-0 text-[20px] leading-snug font-bold break-words">{row.name}</h3>
        <p className="text-[20px] font-bold">
          <Hours minutes={minutes} />
        </p>
      </div>
      <p className="leading-snug text-slate">
        {[finished, tasks.length > 0 && `${doneTasks} of ${tasks.length} tasks done`, after]
          .filter(Boolean)
          .join(' · ')}
      </p>
      <ul className="mt-1">
        {tasks.map((task) => (
          <Task
            key={task.row.id}
            task={task}
            onOpen={boat.mayChange ? () => setOpen({ sheet: 'task', task }) : null}
          />
        ))}
      </ul>
      {boat.mayChange && (
        <div data-keys className="flex flex-wrap gap-3 pt-2 pb-1">
          <FinishKey stage={stage} />
          <Key icon="plus" onClick={() => setOpen({ sheet: 'task', task: null })}>
            Add a task<span className="sr-only"> to {row.name}</span>
          </Key>
          <Key onClick={() => setOpen({ sheet: 'stage' })}>
            Change<span className="sr-only"> {row.name}</span>
          </Key>
        </div>
      )}
      {open?.sheet === 'stage' && <StageSheet boat={boat} stage={stage} onClose={close} />}
      {open?.sheet === 'task' && (
        <TaskSheet boat={boat} stageId={row.id} task={open.task?.row ?? null} onClose={close} />
      )}
    </li>
  );
}

/** Marks the stage finished, or takes up again what was marked. */
function FinishKey({ stage: { row, finished } }: { stage: StageOfBoat }) {
  const replica = useReplica();
  const { mutate: hold } = useHold();
  const today = useRead(['today'], (view) => view.today);
  const markIds = standingItems(row.marks).map((mark) => mark.id);
  if (finished) {
    return (
      <Key icon="undo" onClick={() => hold({ kind: 'stage.unmark', data: { stageId: row.id, markIds } })}>
        Take up again<span className="sr-only"> {row.name}</span>
      </Key>
    );
  }
  return (
    <Key
      icon="tick"
      onClick={() =>
        hold({ kind: 'stage.mark', data: { stageId: row.id, markId: replica.newId(), workDate: today } })
      }
    >
      Finished<span className="sr-only">: {row.name}</span>
    </Key>
  );
}

function Task({ task: { row, words, assigned }, onOpen }: { task: TaskOfBoat; onOpen: (() => void) | null }) {
  const notes = [words, assigned].filter((note) => note !== null);
  const body = (
    <>
      <span
        aria-hidden="true"
        className="mt-[1px] flex size-[26px] shrink-0 items-center justify-center rounded-key border-2 border-bilge"
      >
        {row.done && <Icon name="tick" size={18} />}
      </span>
      <span className="min-w-0 break-words">
        <span className="sr-only">{row.done ? 'Done: ' : 'To do: '}</span>
        {row.title}
        {row.estimateMinutes ? (
          <span className="text-slate">
            {' · est. '}
            <Hours minutes={row.estimateMinutes} />
          </span>
        ) : null}
        {notes.length > 0 && (
          <span className="block text-[16px] leading-snug text-slate">{notes.join(' · ')}</span>
        )}
      </span>
    </>
  );
  const look = 'flex w-full items-start gap-3 py-2 text-left leading-snug';
  return (
    <li className="border-t-2 border-line first:border-t-0">
      {onOpen ? (
        <button
          type="button"
          className={`${look} min-h-key hover:underline`}
          onClick={onOpen}
          aria-haspopup="dialog"
        >
          {body}
        </button>
      ) : (
        <div className={look}>{body}</div>
      )}
    </li>
  );
}
