import { useState } from 'react';
import { SHOP_DAY_MINUTES } from '#shared/task/plan.ts';
import { BungMark } from '#src/components/bung-mark.tsx';
import { Hours } from '#src/components/hours.tsx';
import { Icon } from '#src/components/icons.tsx';
import { Key } from '#src/components/key.tsx';
import type { Deeds } from '#src/shell/use-deeds.ts';
import { dayWords } from '#src/words/day-words.ts';
import { MoveSheet } from './move-sheet.tsx';
import { PickSheet } from './pick-sheet.tsx';
import { moveToDay } from './plan-changes.ts';
import type { Board, PersonOnBoard } from './read-board.ts';
import type { PlannedLine } from './read-planned.ts';

interface PersonColumnProps {
  board: Board;
  person: PersonOnBoard;
  deeds: Deeds;
}

/** What one person has for the day, what was left over, and the key that gives more. */
export function PersonColumn({ board, person, deeds }: PersonColumnProps) {
  const [open, setOpen] = useState<'pick' | { taskId: string } | null>(null);
  const lines = [...person.tasks, ...person.leftOver];
  const moved = typeof open === 'object' && lines.find(({ row }) => row.id === open?.taskId);
  const close = () => setOpen(null);
  const openLine = board.mayPlan ? ({ row }: PlannedLine) => setOpen({ taskId: row.id }) : null;
  return (
    <li className="flex min-w-0 flex-col bg-plank px-4 pt-3 pb-4 outline-3 outline-line">
      <ColumnHead person={person} />
      <ul className="my-2">
        {person.tasks.map((line) => (
          <PlannedRow key={line.row.id} line={line} onOpen={openLine} />
        ))}
      </ul>
      {person.tasks.length === 0 && <p className="pb-2 text-slate">Nothing yet.</p>}
      {board.mayPlan && (
        <div data-keys>
          <Key icon="plus" className="w-full" onClick={() => setOpen('pick')}>
            Give {person.name} work
          </Key>
        </div>
      )}
      <LeftOver board={board} person={person} deeds={deeds} onOpen={openLine} />
      {open === 'pick' && <PickSheet board={board} person={person} deeds={deeds} onClose={close} />}
      {moved && <MoveSheet board={board} person={person} line={moved} deeds={deeds} onClose={close} />}
    </li>
  );
}

function ColumnHead({ person: { name, minutes, withoutEstimate, tasks } }: { person: PersonOnBoard }) {
  const over = minutes - SHOP_DAY_MINUTES;
  return (
    <div>
      <div className="flex items-baseline justify-between gap-3">
        <h2 className="text-[22px] leading-tight font-bold break-words">{name}</h2>
        <p className="font-semibold whitespace-nowrap">
          <Hours minutes={minutes} unit="" /> of <Hours minutes={SHOP_DAY_MINUTES} />
        </p>
      </div>
      <div aria-hidden="true" className="mt-1 h-[9px] border-2 border-bilge print:hidden">
        <div
          className="h-full bg-bilge"
          style={{ width: `${Math.min(minutes / SHOP_DAY_MINUTES, 1) * 100}%` }}
        />
      </div>
      <p className="text-[16px] text-slate md:min-h-[1.4em]">
        {over > 0 && (
          <strong className="text-bilge">
            <Hours minutes={over} /> too many
          </strong>
        )}
        {over > 0 && withoutEstimate > 0 && ', '}
        {withoutEstimate > 0 && `${withoutEstimate} of ${tasks.length} without an estimate`}
      </p>
    </div>
  );
}

interface PlannedRowProps {
  line: PlannedLine;
  onOpen: ((line: PlannedLine) => void) | null;
}

const ROW_LOOK = 'grid w-full grid-cols-[minmax(0,1fr)_auto] gap-x-3 py-2 text-left leading-snug break-words';

function PlannedRow({ line, onOpen }: PlannedRowProps) {
  return (
    <li className="border-t-2 border-line">
      {onOpen ? (
        <button
          type="button"
          aria-haspopup="dialog"
          className={`min-h-key content-center hover:bg-primer ${ROW_LOOK}`}
          onClick={() => onOpen(line)}
        >
          <PlannedWords line={line} />
        </button>
      ) : (
        <div className={ROW_LOOK}>
          <PlannedWords line={line} />
        </div>
      )}
    </li>
  );
}

function PlannedWords({ line }: { line: PlannedLine }) {
  const { row, boatName, share, longerMinutes, along, state, waitsFor, isHeld } = line;
  const notes = [state, along, waitsFor && `comes ${waitsFor}`].filter(Boolean);
  return (
    <>
      <span className="min-w-0">
        <span className={row.done ? '' : 'font-semibold'}>
          {row.done && <Icon name="tick" size={18} className="mr-1 inline align-[-3px]" />}
          {row.title}
        </span>
        <span className="block font-semibold text-mahogany">{boatName}</span>
        {notes.length > 0 && <span className="block text-[16px] text-slate">{notes.join(' · ')}</span>}
        {longerMinutes !== null && (
          <span className="block text-[16px] text-slate">
            estimated <Hours minutes={longerMinutes} /> in all
          </span>
        )}
      </span>
      <span className="flex items-start gap-1 whitespace-nowrap text-slate">
        {isHeld && <BungMark mark="held" size={22} />}
        {share === null ? 'no est.' : <Hours minutes={share} />}
      </span>
    </>
  );
}

function LeftOver({ board, person, deeds, onOpen }: PersonColumnProps & Pick<PlannedRowProps, 'onOpen'>) {
  const { leftOver, name } = person;
  if (leftOver.length === 0) return null;
  const again = (lines: PlannedLine[]) =>
    deeds.doIt({
      words: `${lines.length === 1 ? lines[0]!.row.title : `${lines.length} tasks`}: again ${dayWords(board.day, board.today)}`,
      ...moveToDay(
        lines.map(({ row }) => row),
        board.day,
      ),
    });
  return (
    <section aria-label={`${name}: planned before, not done`} className="mt-4">
      <h3 className="font-semibold">Planned before, not done</h3>
      <ul>
        {leftOver.map((line) => (
          <li key={line.row.id} className="border-t-2 border-line pb-2">
            <button
              type="button"
              aria-haspopup="dialog"
              className={`min-h-key content-center hover:bg-primer disabled:hover:bg-transparent ${ROW_LOOK}`}
              disabled={!onOpen}
              onClick={() => onOpen?.(line)}
            >
              <PlannedWords line={line} />
              <span className="text-[16px] text-slate">for {line.plannedFor}</span>
            </button>
            {board.mayPlan && (
              <Key className="w-full" onClick={() => again([line])}>
                Again {dayWords(board.day, board.today).split(' ')[0]}
                <span className="sr-only">: {line.row.title}</span>
              </Key>
            )}
          </li>
        ))}
      </ul>
      {board.mayPlan && leftOver.length > 1 && (
        <Key className="w-full" onClick={() => again(leftOver)}>
          All {leftOver.length} again
        </Key>
      )}
    </section>
  );
}
