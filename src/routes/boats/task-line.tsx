import { Hours } from '#src/components/hours.tsx';
import { Icon } from '#src/components/icons.tsx';
import type { TaskOfBoat } from './read-boat.ts';

interface TaskLineProps {
  task: TaskOfBoat;
  /** Null where this person may not change it. */
  onOpen: (() => void) | null;
}

/** A task of a stage: a tick where it is done, and by whom. A tap opens it to be changed. */
export function TaskLine({ task, onOpen }: TaskLineProps) {
  const look = 'grid w-full grid-cols-[26px_minmax(0,1fr)] gap-x-3 py-2 text-left leading-snug break-words';
  return (
    <li className="border-t-2 border-line first:border-t-0">
      {onOpen ? (
        <button
          type="button"
          className={`${look} min-h-key content-center hover:underline`}
          onClick={onOpen}
          aria-haspopup="dialog"
        >
          <TaskWords task={task} />
        </button>
      ) : (
        <div className={look}>
          <TaskWords task={task} />
        </div>
      )}
    </li>
  );
}

function TaskWords({ task: { row, words, assigned } }: { task: TaskOfBoat }) {
  const notes = [words, assigned].filter((note) => note !== null);
  return (
    <>
      <span>{row.done && <Icon name="tick" />}</span>
      <span>
        <span className="sr-only">{row.done ? 'Done: ' : 'To do: '}</span>
        <span className={row.done ? '' : 'font-semibold'}>{row.title}</span>
        {row.estimateMinutes ? (
          <span className="text-slate">
            {' · est. '}
            <Hours minutes={row.estimateMinutes} />
          </span>
        ) : null}
        {notes.length > 0 && <span className="block text-[16px] text-slate">{notes.join(' · ')}</span>}
      </span>
    </>
  );
}
