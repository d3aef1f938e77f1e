import { useState } from 'react';
import { hoursText, parseHours } from '#shared/measure/hours.ts';
import type { TaskRow } from '#shared/task/task.ts';
import { CheckKey } from '#src/components/check-key.tsx';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { Why } from '#src/components/why.tsx';
import { useHold, useRead, useReplica } from '#src/replica/hooks.tsx';
import type { BoatPage } from './read-boat.ts';

interface TaskSheetProps {
  boat: BoatPage;
  stageId: string;
  /** null: a new task */
  task: TaskRow | null;
  onClose: () => void;
}

/** Adds a task, or changes what it is, its stage, its estimate and who it is for. */
export function TaskSheet({ boat, stageId, task, onClose }: TaskSheetProps) {
  const replica = useReplica();
  const { mutateAsync: hold, error, isPending } = useHold();
  const crew = useRead(['crew'], (view) =>
    view.all('person').filter((person) => person.roles.includes('crew') && !person.leftAt),
  );
  const [title, setTitle] = useState(task?.title ?? '');
  const [estimate, setEstimate] = useState(task?.estimateMinutes ? hoursText(task.estimateMinutes) : '');
  const [assigneeIds, setAssignees] = useState(task?.assigneeIds ?? []);
  const [stage, setStage] = useState(stageId);
  const [isAsked, setAsked] = useState(false);
  const [isStriking, setStriking] = useState(false);
  const estimateMinutes = estimate.trim() === '' ? null : parseEstimate(estimate);
  const isUnread = estimate.trim() !== '' && estimateMinutes === null;

  async function save() {
    setAsked(true);
    if (title.trim() === '' || isUnread) return;
    if (task) await amend(task);
    else {
      const optional = {
        ...(estimateMinutes ? { estimateMinutes } : {}),
        ...(assigneeIds.length > 0 ? { assigneeIds } : {}),
      };
      const data = {
        taskId: replica.newId(),
        boatId: boat.row.id,
        stageId: stage,
        title: title.trim(),
        ...optional,
      };
      await hold({ kind: 'task.add', data });
    }
    onClose();
  }

  async function amend(row: TaskRow) {
    const set = {
      ...(title.trim() !== row.title ? { title: title.trim() } : {}),
      ...(estimateMinutes !== (row.estimateMinutes ?? null) ? { estimateMinutes } : {}),
      ...([...assigneeIds].sort().join() !== [...(row.assigneeIds ?? [])].sort().join()
        ? { assigneeIds }
        : {}),
      ...(stage !== row.stageId ? { boatId: boat.row.id, stageId: stage } : {}),
    };
    if (Object.keys(set).length > 0) await hold({ kind: 'task.amend', data: { taskId: row.id, set } });
  }

  return (
    <Sheet
      isOpen
      onClose={onClose}
      title={task ? 'Task' : 'A new task'}
      foot={
        <Key kind="main" disabled={isPending} onClick={() => void save()}>
          {task ? 'Change' : 'Add it'}
        </Key>
      }
    >
      {error && <Notice tone="error">{error.message}</Notice>}
      <TextField
        label="What is to be done"
        value={title}
        onChange={setTitle}
        problem={isAsked && title.trim() === '' ? 'Write what is to be done.' : undefined}
      />
      <TextField
        label="Estimate, in hours"
        hint="Like 3 or 2 1/2. Empty where there is none."
        value={estimate}
        onChange={setEstimate}
        problem={
          isAsked && isUnread ? 'That is no figure of hours. Write it like 3, 2.5 or 2 1/2.' : undefined
        }
      />
      <SelectField
        label="Stage"
        value={stage}
        onChange={setStage}
        options={boat.stages.map(({ row }) => ({ value: row.id, label: row.name }))}
      />
      <fieldset className="grid gap-3">
        <legend className="pb-1 text-[18px] font-semibold">Who it is for</legend>
        {crew.map(({ id, name }) => (
          <CheckKey
            key={id}
            label={name}
            isChecked={assigneeIds.includes(id)}
            onChange={(isOn) =>
              setAssignees(isOn ? [...assigneeIds, id] : assigneeIds.filter((one) => one !== id))
            }
          />
        ))}
      </fieldset>
      {task && (
        <Key kind="danger" onClick={() => setStriking(true)}>
          Strike this task
        </Key>
      )}
      <Why
        isOpen={isStriking}
        onClose={() => setStriking(false)}
        title="Strike this task"
        question="Why is it struck?"
        confirm="Strike it"
        isDanger
        onConfirm={(why) =>
          void hold({ kind: 'task.strike', data: { taskId: task!.id, why, saw: [] } }).then(onClose)
        }
      />
    </Sheet>
  );
}

// a day's entry has at most 24 hours; an estimate may have more
function parseEstimate(text: string): number | null {
  const whole = /^\d{1,4}(?:[.,]\d+)?$/.exec(text.trim());
  return whole ? Math.round(Number(text.trim().replace(',', '.')) * 60) : parseHours(text);
}
