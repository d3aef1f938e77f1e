import { useState } from 'react';
import { Hours } from '#src/components/hours.tsx';
import { Key } from '#src/components/key.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { Cautions } from './cautions.tsx';
import type { OrderOfWork } from './read-order.ts';
import type { StageOfOrder } from './read-stages.ts';
import type { TaskOfOrder } from './read-task.ts';
import { TaskForm } from './task-form.tsx';
import type { WorkDeeds } from './use-work-deeds.ts';

interface TaskSheetProps {
  order: OrderOfWork;
  stage: StageOfOrder;
  task: TaskOfOrder;
  deeds: WorkDeeds;
  onClose: () => void;
}

/** A task opened: its cautions first, what is known of it, and the keys; the foreman changes it from here. */
export function TaskSheet({ order, stage, task, deeds, onClose }: TaskSheetProps) {
  const [isChanging, setChanging] = useState(false);
  if (isChanging)
    return (
      <TaskForm order={order} stageId={stage.row.id} task={task.row} deeds={deeds.deeds} onClose={onClose} />
    );
  const { row, words, assigned, planned, where } = task;
  const facts = [words, assigned, planned, where].filter(Boolean);
  return (
    <Sheet
      isOpen
      onClose={onClose}
      title={row.title}
      foot={order.mayWork && <TaskKeys task={task} deeds={deeds} onClose={onClose} />}
    >
      <Cautions templateId={row.templateId} />
      {stage.state === 'waits' && (
        <p className="border-l-[9px] border-bilge pl-3 font-semibold">
          {stage.row.name} comes {stage.waitsFor}, not finished yet.
        </p>
      )}
      <div className="leading-snug">
        <p className="text-slate">
          {order.boat.name} · {stage.row.name}
          {row.estimateMinutes ? (
            <>
              {' · estimated '}
              <Hours minutes={row.estimateMinutes} />
            </>
          ) : null}
        </p>
        {facts.map((fact) => (
          <p key={fact}>{fact}</p>
        ))}
      </div>
      {order.mayChange && <Key onClick={() => setChanging(true)}>Change, plan or strike it</Key>}
    </Sheet>
  );
}

interface TaskKeysProps {
  task: TaskOfOrder;
  deeds: WorkDeeds;
  onClose: () => void;
}

function TaskKeys({ task, deeds, onClose }: TaskKeysProps) {
  const press = (act: (task: TaskOfOrder) => void) => () => {
    act(task);
    onClose();
  };
  if (task.state === 'done')
    return task.myMarkIds.length > 0 ? (
      <Key icon="undo" onClick={press(deeds.untick)}>
        Take my tick back
      </Key>
    ) : null;
  return (
    <div className="grid grid-cols-2 gap-3">
      {task.myStartIds.length > 0 ? (
        <Key onClick={press(deeds.stop)}>Stop</Key>
      ) : (
        <Key onClick={press(deeds.start)}>Start</Key>
      )}
      <Key kind="main" icon="tick" onClick={press(deeds.tick)}>
        Tick off
      </Key>
    </div>
  );
}
