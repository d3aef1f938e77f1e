import { Link } from 'react-router-dom';
import { BungMark } from '#src/components/bung-mark.tsx';
import { Hours } from '#src/components/hours.tsx';
import { deviceWord } from '#src/shell/device-words.ts';
import { KindSelect } from './kind-select.tsx';
import { Notes as FoundNotes } from './notes.tsx';
import type { Correction, EntryLine, Figure } from './read-entry.ts';

interface EntryRowProps {
  entry: EntryLine;
  personName: string;
  /** Null where this person may not divide it. */
  onSplit: ((entryId: string) => void) | null;
}

/** An entry under one person: its mark on the line, where, the words, and that person's hours. */
export function EntryRow({ entry, personName, onSplit }: EntryRowProps) {
  const { figure, struck } = entry;
  return (
    <li className="relative grid grid-cols-[minmax(0,1fr)] gap-x-4 py-[5px] pl-[44px] sm:grid-cols-[minmax(0,1fr)_auto]">
      <span className="absolute top-[6px] left-[1px] z-20">
        <BungMark mark={entry.mark} />
      </span>
      <div className="min-w-0">
        <Link
          to={`/entry/${entry.id}`}
          className="group block rounded-key break-words focus-visible:outline-offset-[2px]"
        >
          <span className="font-bold text-mahogany group-hover:underline">{entry.boatName}</span>
          <span className="text-slate"> · {entry.stageName}</span>
          {entry.author && <span className="text-slate"> · logged by {entry.author}</span>}
          <span className={`block ${struck ? 'text-slate line-through' : ''}`}>{entry.text}</span>
        </Link>
        <FoundNotes notes={entry.notes} photos={entry.photos} />
        <Remarks entry={entry} />
      </div>
      <div className="flex flex-wrap items-center justify-between gap-3 py-1 sm:w-[164px] sm:flex-col sm:flex-nowrap sm:items-end sm:justify-start sm:gap-0 sm:py-0">
        {figure && (
          <FigureCell entryId={entry.id} figure={figure} personName={personName} isStruck={struck !== null} />
        )}
        {onSplit && !struck && <SplitKey entry={entry} onSplit={onSplit} />}
      </div>
    </li>
  );
}

function Remarks({ entry }: { entry: EntryLine }) {
  const notes = [entry.struck, ...entry.flags].filter((words) => words !== null);
  return (
    <div className="text-[16px] leading-snug">
      {entry.additions.map(({ id, who, text }) => (
        <p key={id} className="border-l-2 border-bilge pl-2">
          <span className="font-semibold">{who} added:</span> {text}
        </p>
      ))}
      {notes.map((words) => (
        <p key={words} className="text-slate">
          {words}
        </p>
      ))}
      {entry.figure?.corrections.map((correction) => (
        <CorrectionLine key={`${correction.when} ${correction.afterMinutes}`} correction={correction} />
      ))}
      {entry.mark === 'held' && <p className="text-slate">held on this {deviceWord()}</p>}
      {entry.mark === 'loose' && <LooseLine figure={entry.figure} />}
    </div>
  );
}

function CorrectionLine({ correction }: { correction: Correction }) {
  const { beforeMinutes, afterMinutes, who, when, why } = correction;
  return (
    <p className="text-slate">
      <Hours minutes={beforeMinutes} /> became <Hours minutes={afterMinutes} />
      {why && <>: {why}</>} ({who}, {when})
    </p>
  );
}

/** What else is said, with the way to where it is settled. */
function LooseLine({ figure }: { figure: Figure | null }) {
  return (
    <p className="font-semibold">
      {figure?.others.map((minutes) => (
        <span key={minutes}>
          or <Hours minutes={minutes} />
          {'? '}
        </span>
      ))}
      <a href="#loose-ends" className="text-verdigris underline">
        a loose end
      </a>
    </p>
  );
}

function SplitKey({ entry, onSplit }: { entry: EntryLine; onSplit: (entryId: string) => void }) {
  return (
    <button
      type="button"
      aria-haspopup="dialog"
      className="flex min-h-key items-center text-[16px] text-slate underline underline-offset-4 order-first mr-auto sm:order-none sm:mr-0 sm:min-h-11"
      onClick={() => onSplit(entry.id)}
    >
      Split or move<span className="sr-only"> the entry on {entry.boatName}</span>
    </button>
  );
}

interface FigureCellProps {
  entryId: string;
  figure: Figure;
  personName: string;
  isStruck: boolean;
}

function FigureCell({ entryId, figure, personName, isStruck }: FigureCellProps) {
  const isKindless = isStruck || figure.minutes === 0;
  const hours = <Hours minutes={figure.minutes} />;
  return (
    <>
      <p className={isKindless ? 'text-slate' : ''}>{isStruck ? <s>{hours}</s> : hours}</p>
      {!isKindless && <KindSelect entryId={entryId} figure={figure} personName={personName} />}
    </>
  );
}
