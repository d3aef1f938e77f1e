import { useState } from 'react';
import { nextWorkDay } from '#shared/task/plan.ts';
import type { TaskRow } from '#shared/task/task.ts';
import { CheckKey } from '#src/components/check-key.tsx';
import { Fold } from '#src/components/fold.tsx';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { Why } from '#src/components/why.tsx';
import { useHold, useRead, useReplica } from '#src/replica/hooks.tsx';
import type { Deed, Deeds } from '#src/shell/use-deeds.ts';
import { dayWords } from '#src/words/day-words.ts';
import { openingWords } from '#src/words/name-words.ts';
import { SIDE_WORDS } from '#src/words/place-words.ts';
import type { OrderOfWork } from './read-order.ts';
import { backTo, changesOf, draftOf, fieldsOf, problemsOf, type Side, type TaskDraft } from './task-draft.ts';

interface TaskFormProps {
  order: OrderOfWork;
  stageId: string;
  /** null: a new task */
  task: TaskRow | null;
  deeds: Deeds;
  onClose: () => void;
}

interface FieldsProps {
  draft: TaskDraft;
  change: (part: Partial<TaskDraft>) => void;
  problems: ReturnType<typeof problemsOf>;
}

/** Adds a task, or changes all that is known of one. */
export function TaskForm({ order, stageId, task, deeds, onClose }: TaskFormProps) {
  const replica = useReplica();
  const { mutateAsync: hold, error } = useHold();
  const failure = deeds.failure ?? error?.message;
  const [draft, setDraft] = useState(() => draftOf(task, stageId));
  const [isAsked, setAsked] = useState(false);
  const [isStriking, setStriking] = useState(false);
  const change = (part: Partial<TaskDraft>) => setDraft({ ...draft, ...part });

  function save() {
    setAsked(true);
    if (Object.keys(problemsOf(draft)).length > 0) return;
    const deed = task ? amending(task, draft) : adding(order, draft, replica.newId());
    if (deed) deeds.doIt(deed, onClose);
    else onClose();
  }

  const fields: FieldsProps = { draft, change, problems: isAsked ? problemsOf(draft) : {} };
  return (
    <Sheet
      isOpen
      onClose={onClose}
      title={task ? 'Task' : 'A new task'}
      foot={
        <Key kind="main" disabled={deeds.isPending} onClick={save}>
          {task ? 'Change' : 'Add it'}
        </Key>
      }
    >
      {failure && <Notice tone="error">{failure}</Notice>}
      <TextField
        label="What is to be done"
        value={draft.title}
        onChange={(title) => change({ title })}
        problem={fields.problems.title}
      />
      <SelectField
        label="Stage"
        value={draft.stageId}
        onChange={(to) => change({ stageId: to })}
        options={order.stages.map(({ row }) => ({ value: row.id, label: row.name }))}
      />
      <PlaceFields {...fields} />
      {order.mayChange && <PlanFields {...fields} />}
      {task && order.mayChange && (
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

/** Null where nothing was changed. */
function amending(task: TaskRow, draft: TaskDraft): Deed | null {
  const set = changesOf(task, draft);
  if (Object.keys(set).length === 0) return null;
  const amend = (fields: object) => [{ kind: 'task.amend', data: { taskId: task.id, set: fields } }];
  return {
    words: `Changed: ${openingWords(task.title, 44)}`,
    holdings: amend(set),
    back: amend(backTo(task, set)),
  };
}

function adding({ boat, mayChange }: OrderOfWork, draft: TaskDraft, taskId: string): Deed {
  const data = { taskId, boatId: boat.id, ...fieldsOf(draft) };
  const strike = { kind: 'task.strike', data: { taskId, why: 'undone at once' } };
  return {
    words: `Added: ${openingWords(draft.title, 44)}`,
    holdings: [{ kind: 'task.add', data }],
    // the crew strike no tasks
    back: mayChange ? [strike] : [],
  };
}

function PlaceFields({ draft, change, problems }: FieldsProps) {
  const isGiven = draft.side !== '' || draft.numbers !== '' || draft.placeWords !== '';
  return (
    <Fold title="Where on the boat" isOpenAtFirst={isGiven}>
      <div className="grid gap-4 pb-2">
        <SelectField
          label="Side"
          value={draft.side}
          onChange={(side) => change({ side })}
          options={[
            { value: '' as Side, label: 'not said' },
            ...Object.entries(SIDE_WORDS).map(([side, label]) => ({ value: side as Side, label })),
          ]}
        />
        <TextField
          label="Number, or from and to"
          hint="Like 4 or 6-9."
          value={draft.numbers}
          onChange={(numbers) => change({ numbers })}
          problem={problems.numbers}
          autoComplete="off"
        />
        <TextField
          label="In words"
          value={draft.placeWords}
          onChange={(placeWords) => change({ placeWords })}
          maxLength={500}
        />
      </div>
    </Fold>
  );
}

function PlanFields({ draft, change, problems }: FieldsProps) {
  const { today, crew } = useRead(['task-form'], (view) => ({
    today: view.today,
    crew: view
      .all('person')
      .filter((person) => person.roles.includes('crew') && !person.leftAt)
      .sort((a, b) => a.name.localeCompare(b.name)),
  }));
  const next = nextWorkDay(today);
  return (
    <>
      <TextField
        label="Estimate, in hours"
        hint="Like 3 or 2 1/2. Empty where there is none."
        value={draft.estimate}
        onChange={(estimate) => change({ estimate })}
        problem={problems.estimate}
        autoComplete="off"
      />
      <fieldset className="grid gap-3">
        <legend className="pb-1 text-[18px] font-semibold">Who it is for</legend>
        {crew.map(({ id, name }) => (
          <CheckKey
            key={id}
            label={name}
            isChecked={draft.assigneeIds.includes(id)}
            onChange={(isOn) =>
              change({
                assigneeIds: isOn
                  ? [...draft.assigneeIds, id]
                  : draft.assigneeIds.filter((one) => one !== id),
              })
            }
          />
        ))}
      </fieldset>
      <div className="grid gap-3">
        <TextField
          label="Planned for"
          type="date"
          value={draft.plannedFor ?? ''}
          onChange={(day) => change({ plannedFor: day || null })}
        />
        <div className="grid grid-cols-2 gap-3">
          <Key onClick={() => change({ plannedFor: next })}>{dayWords(next, today)}</Key>
          <Key onClick={() => change({ plannedFor: null })} disabled={draft.plannedFor === null}>
            No day
          </Key>
        </div>
      </div>
    </>
  );
}
