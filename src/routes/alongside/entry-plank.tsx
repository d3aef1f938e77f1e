import { Link } from 'react-router-dom';
import { BUNG_WORDS } from '#src/components/bung-mark.tsx';
import { Plank } from '#src/components/plank.tsx';
import { EndQuestion, HoursByPerson } from '#src/routes/alongside/entry-parts.tsx';
import type { EntryLine } from '#src/routes/alongside/read-entry-line.ts';
import { deviceWord } from '#src/shell/device-words.ts';
import { capital } from '#src/words/who.ts';

/** An entry on the ribband line; a tap anywhere on it opens its page. */
export function EntryPlank({ entry }: { entry: EntryLine }) {
  const notes = [entry.stageName, ...entry.flags].filter((note) => note !== null);
  return (
    <Plank mark={entry.mark} markWord={markWord(entry)} time={entry.time} id={`entry-${entry.id}`}>
      <Link
        to={`/entry/${entry.id}`}
        className={`whitespace-pre-line after:absolute after:inset-0 focus-visible:outline-none focus-visible:after:outline-3 focus-visible:after:outline-offset-[-5px] focus-visible:after:outline-bilge ${entry.struck ? 'line-clamp-2 text-slate line-through' : 'line-clamp-6'}`}
      >
        {entry.words.trim() || 'Hours alone'}
      </Link>
      <p className="text-slate">
        <span className="font-semibold">{capital(entry.author)}</span>
        {entry.hours.length > 0 && ' · '}
        <HoursByPerson hours={entry.hours} author={entry.author} />
      </p>
      {notes.length > 0 && <p className="text-slate">{notes.join(' · ')}</p>}
      {entry.additions
        .filter(({ takenBackBy }) => takenBackBy === null)
        .map((addition) => (
          <p key={addition.id} className="mt-1 border-l-[3px] border-line pl-3">
            <span className="font-semibold">{capital(addition.who)} added:</span> {addition.text}
          </p>
        ))}
      {entry.ends.map((end) => (
        <EndQuestion key={end.id} end={end} />
      ))}
      {entry.struck && <p className="text-slate">{entry.struck}</p>}
      {entry.isHeld && <p className="text-slate">Held on this {deviceWord()}</p>}
    </Plank>
  );
}

function markWord(entry: EntryLine): string {
  return entry.isHeld && entry.mark !== 'held'
    ? `${BUNG_WORDS[entry.mark]}, ${BUNG_WORDS.held}`
    : BUNG_WORDS[entry.mark];
}
