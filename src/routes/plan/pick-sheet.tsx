import { useState } from 'react';
import { CheckKey } from '#src/components/check-key.tsx';
import { Fold } from '#src/components/fold.tsx';
import { Hours } from '#src/components/hours.tsx';
import { Key } from '#src/components/key.tsx';
import { SelectField } from '#src/components/select-field.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { useRead } from '#src/replica/hooks.tsx';
import type { Deeds } from '#src/shell/use-deeds.ts';
import { counted, dayWords } from '#src/words/day-words.ts';
import { give } from './plan-changes.ts';
import type { Board, PersonOnBoard } from './read-board.ts';
import { readBoatsToPick, readPick, type StageToPick } from './read-pick.ts';
import type { PlannedLine } from './read-planned.ts';

interface PickSheetProps {
  board: Board;
  person: PersonOnBoard;
  deeds: Deeds;
  onClose: () => void;
}

/** Picks a person's work for the day out of the open tasks of the boats, theirs first. */
export function PickSheet({ board: { day, today }, person, deeds, onClose }: PickSheetProps) {
  const { personId, name } = person;
  const boats = useRead(['boats-to-pick', personId], (view) => readBoatsToPick(view, personId));
  const [chosen, setChosen] = useState<string | null>(null);
  const [picked, setPicked] = useState<PlannedLine[]>([]);
  const boatId = chosen ?? boats[0]?.id ?? null;
  const stages = useRead(['pick', boatId, personId, day], (view) =>
    boatId ? readPick(view, boatId, personId, day) : [],
  );

  function giveThem() {
    const words = `${name}: ${counted(picked.length, 'task')} for ${dayWords(day, today)}`;
    const rows = picked.map(({ row }) => row);
    deeds.doIt({ words, ...give(rows, personId, day) }, onClose);
  }

  return (
    <Sheet
      isOpen
      onClose={onClose}
      title={`${name}, ${dayWords(day, today)}`}
      foot={
        <>
          {deeds.failure && <p className="font-semibold text-redlead">{deeds.failure}</p>}
          <Key kind="main" disabled={picked.length === 0 || deeds.isPending} onClick={giveThem}>
            {picked.length === 0 ? 'Tap what is to be done' : <GiveWords picked={picked} person={person} />}
          </Key>
        </>
      }
    >
      {boats.length === 0 && (
        <p className="text-slate">No boat has an open task. Add some in the order of work.</p>
      )}
      {boats.length > 1 && (
        <SelectField
          label="Boat"
          value={boatId!}
          onChange={setChosen}
          options={boats.map(({ id, name: label, openCount }) => ({
            value: id,
            label: `${label}, ${openCount} open`,
          }))}
        />
      )}
      {boats.length > 0 && stages.length === 0 && (
        <p className="text-slate">{name} has all of her open tasks.</p>
      )}
      {stages.map((stage) => (
        <StageTasks key={stage.stageId} stage={stage} picked={picked} onPick={setPicked} />
      ))}
    </Sheet>
  );
}

function GiveWords({ picked, person }: { picked: PlannedLine[]; person: PersonOnBoard }) {
  const minutes = picked.reduce((sum, { share }) => sum + (share ?? 0), person.minutes);
  return (
    <span>
      Give {picked.length === 1 ? 'it' : `these ${picked.length}`}: <Hours minutes={minutes} unit="" /> of 8 h
    </span>
  );
}

interface StageTasksProps {
  stage: StageToPick;
  picked: PlannedLine[];
  onPick: (picked: PlannedLine[]) => void;
}

/** A stage's tasks; folded where it is not its turn. */
function StageTasks({ stage, picked, onPick }: StageTasksProps) {
  const { name, notNow, tasks } = stage;
  const keys = tasks.map((line) => (
    <CheckKey
      key={line.row.id}
      label={line.row.title}
      note={<TaskNote line={line} />}
      isChecked={picked.some(({ row }) => row.id === line.row.id)}
      onChange={(isOn) =>
        onPick(isOn ? [...picked, line] : picked.filter(({ row }) => row.id !== line.row.id))
      }
    />
  ));
  if (notNow)
    return (
      <Fold title={`${name} ${notNow} (${tasks.length})`}>
        <div className="grid gap-3">{keys}</div>
      </Fold>
    );
  return (
    <fieldset className="grid gap-3">
      <legend className="pb-2 font-semibold">{name}</legend>
      {keys}
    </fieldset>
  );
}

function TaskNote({ line: { row, state, along, plannedFor } }: { line: PlannedLine }) {
  const words = [state, along?.replace(/^with/, 'for'), plannedFor && `planned ${plannedFor}`].filter(
    Boolean,
  );
  return (
    <>
      {row.estimateMinutes ? <Hours minutes={row.estimateMinutes} /> : 'no estimate'}
      {words.length > 0 && ` · ${words.join(' · ')}`}
    </>
  );
}
