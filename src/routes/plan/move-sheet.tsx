import { useState } from 'react';
import { daySchema } from '#shared/sync/day.ts';
import { nextWorkDay } from '#shared/task/plan.ts';
import { Key, KeyLink } from '#src/components/key.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { TextField } from '#src/components/text-field.tsx';
import type { Deeds } from '#src/shell/use-deeds.ts';
import { dayWords } from '#src/words/day-words.ts';
import { openingWords } from '#src/words/name-words.ts';
import { moveToDay, moveToPerson, takeOff, type PlanChange } from './plan-changes.ts';
import type { Board, PersonOnBoard } from './read-board.ts';
import type { PlannedLine } from './read-planned.ts';

interface MoveSheetProps {
  board: Board;
  person: PersonOnBoard;
  line: PlannedLine;
  deeds: Deeds;
  onClose: () => void;
}

/** A planned task goes to somebody else, to another day, or out of the plan. */
export function MoveSheet({ board, person, line, deeds, onClose }: MoveSheetProps) {
  const { day, today, people } = board;
  const [other, setOther] = useState('');
  const title = openingWords(line.row.title, 40);
  const press = (words: string, change: PlanChange) => () =>
    deeds.doIt({ words: `${title}: ${words}`, ...change }, onClose);
  const toDay = (to: string) => press(`planned for ${dayWords(to, today)}`, moveToDay([line.row], to));
  const next = nextWorkDay(line.row.plannedFor ?? day);
  const others = people.filter(({ personId }) => personId !== person.personId);
  return (
    <Sheet isOpen onClose={onClose} title={line.row.title}>
      <p className="text-slate">
        {line.boatName} · {line.stageName} · {person.name}, {line.plannedFor}
        {line.along && ` · ${line.along}`}
      </p>
      {deeds.failure && <p className="font-semibold text-redlead">{deeds.failure}</p>}
      {others.length > 0 && (
        <fieldset className="grid grid-cols-2 gap-3">
          <legend className="pb-2 font-semibold">To somebody else</legend>
          {others.map(({ personId, name }) => (
            <Key
              key={personId}
              onClick={press(`to ${name}`, moveToPerson(line.row, person.personId, personId))}
            >
              {name}
            </Key>
          ))}
        </fieldset>
      )}
      <fieldset className="grid grid-cols-2 gap-3">
        <legend className="pb-2 font-semibold">To another day</legend>
        {line.row.plannedFor !== day && <Key onClick={toDay(day)}>{dayWords(day, today)}</Key>}
        {next !== day && <Key onClick={toDay(next)}>{dayWords(next, today)}</Key>}
      </fieldset>
      <div className="grid grid-cols-2 gap-3">
        <TextField label="Some other day" type="date" value={other} onChange={setOther} />
        <Key
          disabled={!daySchema.safeParse(other).success}
          onClick={toDay(other || day)}
          className="self-end"
        >
          To that day
        </Key>
      </div>
      <div className="grid grid-cols-2 gap-3">
        <Key onClick={press('taken off', takeOff(line.row, person.personId))}>
          Off {person.name}&rsquo;s day
        </Key>
        <KeyLink to={`/order/${line.row.boatId}`}>Her order of work</KeyLink>
      </div>
    </Sheet>
  );
}
