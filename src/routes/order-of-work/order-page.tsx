import { useState } from 'react';
import { useParams } from 'react-router-dom';
import { Empty } from '#src/components/empty.tsx';
import { Key, KeyLink } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Planks } from '#src/components/ribband.tsx';
import { useRead } from '#src/replica/hooks.tsx';
import { DeedBar } from '#src/shell/deed-bar.tsx';
import { PlacePage } from '#src/shell/place-page.tsx';
import { counted } from '#src/words/day-words.ts';
import { FinishSheet } from './finish-sheet.tsx';
import { HoursAgainst } from './hours-against.tsx';
import { readOrder, type OrderOfWork } from './read-order.ts';
import type { StageOfOrder } from './read-stages.ts';
import { StageBlock, type StageKeys } from './stage-block.tsx';
import { StageSheet } from './stage-sheet.tsx';
import { Struck } from './struck.tsx';
import { TaskForm } from './task-form.tsx';
import { TaskSheet } from './task-sheet.tsx';
import { useWorkDeeds, type WorkDeeds } from './use-work-deeds.ts';
import { WorkSheet } from './work-sheet.tsx';

/** By ids, so that what is open shows what the record has become meanwhile. */
type Open =
  | { sheet: 'task'; stageId: string; taskId: string }
  | { sheet: 'new-task'; stageId: string }
  | { sheet: 'stage'; stageId: string }
  | { sheet: 'finish'; stageId: string }
  | { sheet: 'new-stage' }
  | { sheet: 'template' };

/** One boat's order of work: her stages and their tasks. */
export default function OrderPage() {
  const { id = '' } = useParams();
  const order = useRead(['order', id], (view) => readOrder(view, id));
  const deeds = useWorkDeeds();
  const [open, setOpen] = useState<Open | null>(null);
  if (!order) {
    return (
      <PlacePage title="No such boat">
        <Empty action={<KeyLink to="/order">All boats</KeyLink>}>This boat is not known here.</Empty>
      </PlacePage>
    );
  }
  return (
    <PlacePage title={`${order.boat.name}: order of work`} foot={<DeedBar deeds={deeds.deeds} />}>
      <Head order={order} />
      {deeds.deeds.failure && <Notice tone="error">{deeds.deeds.failure}</Notice>}
      <Stages order={order} deeds={deeds} onOpen={setOpen} />
      <Struck order={order} />
      {open && <OpenSheet order={order} open={open} deeds={deeds} onClose={() => setOpen(null)} />}
    </PlacePage>
  );
}

function Head({ order }: { order: OrderOfWork }) {
  const { boat, openTasks, doneTasks, minutes, estimateMinutes, mayChange } = order;
  const count = openTasks + doneTasks;
  return (
    <div className="flex flex-wrap items-end justify-between gap-3 px-4 pt-6 pb-3 md:px-6">
      <div className="min-w-0">
        <h1 className="text-[34px] leading-tight font-bold tracking-[-0.01em] break-words text-mahogany">
          {boat.name}
        </h1>
        <p>
          {count === 0 ? 'no tasks yet' : `${doneTasks} of ${counted(count, 'task')} done`}
          {(minutes > 0 || estimateMinutes !== null) && ' · '}
          <HoursAgainst minutes={minutes} estimateMinutes={estimateMinutes} />
        </p>
        {boat.struck && <Notice tone="warn">Struck: {boat.struck.why}</Notice>}
      </div>
      <div data-keys className="flex flex-wrap gap-3">
        <KeyLink to="/order">All boats</KeyLink>
        {mayChange && <KeyLink to={`/boats/${boat.id}`}>Her particulars</KeyLink>}
      </div>
    </div>
  );
}

interface StagesProps {
  order: OrderOfWork;
  deeds: WorkDeeds;
  onOpen: (open: Open) => void;
}

function Stages({ order, deeds, onOpen }: StagesProps) {
  const addStage = order.mayChange && (
    <Key icon="plus" onClick={() => onOpen({ sheet: 'new-stage' })}>
      Add a stage
    </Key>
  );
  if (order.stages.length === 0) {
    const keys = order.mayChange && (
      <div className="flex flex-wrap gap-3">
        <Key kind="main" onClick={() => onOpen({ sheet: 'template' })}>
          Make her list from a template
        </Key>
        {addStage}
      </div>
    );
    return <Empty action={keys}>She has no stages yet. Work can be logged on her without one.</Empty>;
  }
  return (
    <>
      <Planks>
        {order.stages.map((stage) => (
          <StageBlock
            key={stage.row.id}
            stage={stage}
            keys={keysOf(order, stage, deeds, onOpen)}
            onOpen={({ row }) => onOpen({ sheet: 'task', stageId: stage.row.id, taskId: row.id })}
          />
        ))}
      </Planks>
      {addStage && (
        <div data-keys className="px-4 py-5 md:px-6">
          {addStage}
        </div>
      )}
    </>
  );
}

function keysOf(
  { mayChange, mayWork }: OrderOfWork,
  stage: StageOfOrder,
  deeds: WorkDeeds,
  onOpen: (open: Open) => void,
): StageKeys {
  const stageId = stage.row.id;
  const isFinished = stage.state === 'finished';
  const opens = (sheet: 'new-task' | 'stage' | 'finish') => () => onOpen({ sheet, stageId });
  return {
    onAdd: mayWork && !isFinished ? opens('new-task') : null,
    onFinish: mayChange && !isFinished ? opens('finish') : null,
    onReopen: mayChange && isFinished ? () => deeds.reopen(stage) : null,
    onChange: mayChange ? opens('stage') : null,
  };
}

interface OpenSheetProps {
  order: OrderOfWork;
  open: Open;
  deeds: WorkDeeds;
  onClose: () => void;
}

function OpenSheet({ order, open, deeds, onClose }: OpenSheetProps) {
  if (open.sheet === 'template') return <WorkSheet boat={order.boat} onClose={onClose} />;
  if (open.sheet === 'new-stage') return <StageSheet order={order} stage={null} onClose={onClose} />;
  const stage = order.stages.find(({ row }) => row.id === open.stageId);
  if (!stage) return null;
  if (open.sheet === 'stage') return <StageSheet order={order} stage={stage} onClose={onClose} />;
  if (open.sheet === 'new-task')
    return (
      <TaskForm order={order} stageId={open.stageId} task={null} deeds={deeds.deeds} onClose={onClose} />
    );
  if (open.sheet === 'finish') {
    const finish = () => {
      deeds.finish(stage);
      onClose();
    };
    return <FinishSheet stage={stage} onFinish={finish} onClose={onClose} />;
  }
  const task = [...stage.open, ...stage.done].find(({ row }) => row.id === open.taskId);
  return task ? <TaskSheet order={order} stage={stage} task={task} deeds={deeds} onClose={onClose} /> : null;
}
