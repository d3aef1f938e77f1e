import { useState } from 'react';
import { Hours } from '#src/components/hours.tsx';
import { Key } from '#src/components/key.tsx';
import { FinishKey } from './finish-key.tsx';
import type { BoatPage, StageOfBoat, TaskOfBoat } from './read-boat.ts';
import { StageSheet } from './stage-sheet.tsx';
import { TaskLine } from './task-line.tsx';
import { TaskSheet } from './task-sheet.tsx';

interface StageBlockProps {
  boat: BoatPage;
  stage: StageOfBoat;
}

type Open = { sheet: 'stage' } | { sheet: 'task'; task: TaskOfBoat | null } | null;

/** A stage with its hours and its tasks; what is finished stands back. */
export function StageBlock({ boat, stage }: StageBlockProps) {
  const [open, setOpen] = useState<Open>(null);
  const { row, tasks, doneTasks, finished } = stage;
  const close = () => setOpen(null);
  const openTask = boat.mayChange ? (task: TaskOfBoat) => setOpen({ sheet: 'task', task }) : null;
  const list = <TaskList tasks={tasks} onOpen={openTask} />;
  return (
    <li className="bg-plank px-4 py-3 md:px-6">
      <StageHead stage={stage} onChange={boat.mayChange ? () => setOpen({ sheet: 'stage' }) : null} />
      {finished && tasks.length > 0 ? (
        <details>
          <summary className="flex min-h-key w-fit cursor-pointer items-center gap-2 text-verdigris underline underline-offset-4">
            {doneTasks} of {tasks.length} tasks done
          </summary>
          {list}
        </details>
      ) : (
        list
      )}
      {boat.mayChange && !finished && (
        <div data-keys className="flex flex-wrap gap-3 pt-2 pb-1">
          <Key icon="plus" onClick={() => setOpen({ sheet: 'task', task: null })}>
            Add a task<span className="sr-only"> to {row.name}</span>
          </Key>
          <FinishKey stage={stage} />
        </div>
      )}
      {open?.sheet === 'stage' && <StageSheet boat={boat} stage={stage} onClose={close} />}
      {open?.sheet === 'task' && (
        <TaskSheet boat={boat} stageId={row.id} task={open.task?.row ?? null} onClose={close} />
      )}
    </li>
  );
}

function StageHead({ stage, onChange }: { stage: StageOfBoat; onChange: (() => void) | null }) {
  const { row, minutes, finished, after, tasks, doneTasks } = stage;
  const progress = !finished && tasks.length > 0 && `${doneTasks} of ${tasks.length} tasks done`;
  return (
    <div className="flex items-center gap-4">
      <div className="min-w-0 flex-1 break-words">
        <h3 className="text-[20px] leading-snug font-bold">{row.name}</h3>
        <p className="leading-snug text-slate">
          {[finished, progress, !finished && after].filter(Boolean).join(' · ')}
        </p>
      </div>
      <p className="text-[20px] font-bold">{minutes > 0 && <Hours minutes={minutes} />}</p>
      {onChange && (
        <Key onClick={onChange}>
          Change<span className="sr-only"> {row.name}</span>
        </Key>
      )}
    </div>
  );
}

function TaskList({ tasks, onOpen }: { tasks: TaskOfBoat[]; onOpen: ((task: TaskOfBoat) => void) | null }) {
  return (
    <ul className="mt-1">
      {tasks.map((task) => (
        <TaskLine key={task.row.id} task={task} onOpen={onOpen ? () => onOpen(task) : null} />
      ))}
    </ul>
  );
}
