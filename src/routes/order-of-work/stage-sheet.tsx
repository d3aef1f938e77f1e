import { useState } from 'react';
import { CheckKey } from '#src/components/check-key.tsx';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { Why } from '#src/components/why.tsx';
import { useHold, useReplica } from '#src/replica/hooks.tsx';
import type { OrderOfWork } from './read-order.ts';
import type { StageOfOrder } from './read-stages.ts';

interface StageSheetProps {
  order: OrderOfWork;
  /** null: a new stage */
  stage: StageOfOrder | null;
  onClose: () => void;
}

const FIRST = 'first';

/** Adds a stage, or changes its name, its place in the order and what comes before it. */
export function StageSheet({ order, stage, onClose }: StageSheetProps) {
  const replica = useReplica();
  const { mutateAsync: hold, error, isPending } = useHold();
  const others = order.stages.map(({ row }) => row).filter((row) => row.id !== stage?.row.id);
  const [name, setName] = useState(stage?.row.name ?? '');
  const [follows, setFollows] = useState(() => before(order, stage));
  const [after, setAfter] = useState(stage?.row.after ?? []);
  const [isAsked, setAsked] = useState(false);
  const [isStriking, setStriking] = useState(false);

  async function save() {
    setAsked(true);
    if (name.trim() === '') return;
    if (stage) await amend(stage);
    else {
      const data = {
        stageId: replica.newId(),
        boatId: order.boat.id,
        name: name.trim(),
        order: orderAfter(others, follows),
        after,
      };
      await hold({ kind: 'stage.add', data });
    }
    onClose();
  }

  async function amend({ row }: StageOfOrder) {
    const set = {
      ...(name.trim() !== row.name ? { name: name.trim() } : {}),
      ...(follows !== before(order, stage) ? { order: orderAfter(others, follows) } : {}),
      ...([...after].sort().join() !== [...row.after].sort().join() ? { after } : {}),
    };
    if (Object.keys(set).length > 0) await hold({ kind: 'stage.amend', data: { stageId: row.id, set } });
  }

  return (
    <Sheet
      isOpen
      onClose={onClose}
      title={stage?.row.name ?? `A stage of ${order.boat.name}`}
      foot={
        <Key kind="main" disabled={isPending} onClick={() => void save()}>
          {stage ? 'Change' : 'Add it'}
        </Key>
      }
    >
      {error && <Notice tone="error">{error.message}</Notice>}
      <TextField
        label="Name"
        value={name}
        onChange={setName}
        problem={isAsked && name.trim() === '' ? 'Write its name.' : undefined}
      />
      <SelectField
        label="Stands in the list"
        value={follows}
        onChange={setFollows}
        options={[
          { value: FIRST, label: 'first' },
          ...others.map((row) => ({ value: row.id, label: `after ${row.name}` })),
        ]}
      />
      {others.length > 0 && (
        <fieldset className="grid gap-3">
          <legend className="pb-1 text-[18px] font-semibold">What must be finished before it</legend>
          {others.map((row) => (
            <CheckKey
              key={row.id}
              label={row.name}
              isChecked={after.includes(row.id)}
              onChange={(isOn) => setAfter(isOn ? [...after, row.id] : after.filter((id) => id !== row.id))}
            />
          ))}
        </fieldset>
      )}
      {stage && (
        <Key kind="danger" onClick={() => setStriking(true)}>
          Strike this stage
        </Key>
      )}
      <Why
        isOpen={isStriking}
        onClose={() => setStriking(false)}
        title={`Strike ${name}`}
        question="Why is it struck? What was logged on it stays."
        confirm="Strike it"
        isDanger
        onConfirm={(why) =>
          void hold({ kind: 'stage.strike', data: { stageId: stage!.row.id, why, saw: [] } }).then(onClose)
        }
      />
    </Sheet>
  );
}

/** The stage that stands before one in the list; a new one stands last. */
function before(order: OrderOfWork, stage: StageOfOrder | null): string {
  const ids = order.stages.map(({ row }) => row.id);
  const index = stage ? ids.indexOf(stage.row.id) : ids.length;
  return ids[index - 1] ?? FIRST;
}

/** An order between the stage that it follows and the one after that, so that no other stage has to change. */
function orderAfter(others: { id: string; order: number }[], follows: string): number {
  const index = others.findIndex((row) => row.id === follows);
  const [previous, next] = [others[index]?.order, others[index + 1]?.order];
  if (previous === undefined) return next === undefined ? 1 : next - 1;
  return next === undefined ? previous + 1 : (previous + next) / 2;
}
