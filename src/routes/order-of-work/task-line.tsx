import { BungMark } from '#src/components/bung-mark.tsx';
import { Hours } from '#src/components/hours.tsx';
import { Icon } from '#src/components/icons.tsx';
import type { TaskOfOrder } from './read-task.ts';

interface TaskLineProps {
  task: TaskOfOrder;
  onOpen: () => void;
}

/** A task in a list: its state by sign and word, for whom, for when; a tap opens it. */
export function TaskLine({ task, onOpen }: TaskLineProps) {
  const { row, state, words, assigned, planned, isHeld } = task;
  const notes = [words, state === 'done' ? null : assigned, planned].filter((note) => note !== null);
  return (
    <li className="border-t-2 border-line first:border-t-0">
      <button
        type="button"
        className="grid min-h-key w-full grid-cols-[26px_minmax(0,1fr)_auto] content-center items-start gap-x-3 py-2 text-left leading-snug break-words hover:bg-primer"
        onClick={onOpen}
        aria-haspopup="dialog"
      >
        <StateSign task={task} />
        <span>
          <span className="sr-only">{SIGN_WORDS[state]}: </span>
          <span className={state === 'done' ? '' : 'font-semibold'}>{row.title}</span>
          {notes.length > 0 && <span className="block text-slate">{notes.join(' · ')}</span>}
        </span>
        <span className="flex items-center gap-2 text-slate">
          {isHeld && <BungMark mark="held" size={22} />}
          {row.estimateMinutes ? (
            <>
              <span className="sr-only">estimated </span>
              <Hours minutes={row.estimateMinutes} />
            </>
          ) : null}
        </span>
      </button>
    </li>
  );
}

const SIGN_WORDS = { open: 'To do', started: 'Started', done: 'Done' } as const;

/** An empty box, a half filled one, a tick: told by shape, the word is for a screen reader. */
function StateSign({ task: { state } }: { task: TaskOfOrder }) {
  if (state === 'done') return <Icon name="tick" />;
  return (
    <span
      aria-hidden="true"
      className="mt-[2px] grid size-[22px] content-end rounded-key border-2 border-bilge bg-plank"
    >
      {state === 'started' && <span className="block h-[9px] bg-bilge" />}
    </span>
  );
}
