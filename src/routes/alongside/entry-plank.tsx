import { Link } from 'react-router-dom';
import { BUNG_WORDS } from '#src/components/bung-mark.tsx';
import { Plank } from '#src/components/plank.tsx';
import { EndQuestion, HoursByPerson } from '#src/routes/alongside/entry-parts.tsx';
import { NoteParts } from '#src/routes/alongside/note-plank.tsx';
import { PhotoStrip } from '#src/routes/alongside/photo-strip.tsx';
import { PLANK_LINK } from '#src/routes/alongside/plank-link.ts';
import type { EntryLine } from '#src/routes/alongside/read-entry-line.ts';
import type { EntryItem } from '#src/routes/alongside/read-line-items.ts';
import { deviceWord } from '#src/shell/device-words.ts';
import { listWords } from '#src/words/name-words.ts';
import { capital } from '#src/words/who.ts';

/** An entry on the ribband line with what came with it; a tap anywhere on it opens its page. */
export function EntryPlank({ entry }: { entry: EntryItem }) {
  const notes = [entry.stageName, ...entry.flags].filter((note) => note !== null);
  return (
    <Plank mark={entry.mark} markWord={markWord(entry)} time={entry.time} id={`entry-${entry.id}`}>
      <Link
        to={`/entry/${entry.id}`}
        className={`whitespace-pre-line ${PLANK_LINK} ${entry.struck ? 'line-clamp-2 text-slate line-through' : 'line-clamp-6'}`}
      >
        {entry.words.trim() || 'Hours alone'}
      </Link>
      <p className="text-slate">
        <span className="font-semibold">{capital(entry.author)}</span>
        {entry.hours.length > 0 && ' · '}
        <HoursByPerson hours={entry.hours} author={entry.author} />
      </p>
      {notes.length > 0 && <p className="text-slate">{notes.join(' · ')}</p>}
      <PhotoStrip photos={entry.photos} />
      {entry.ticked.length > 0 && <p className="text-slate">Ticked off: {listWords(entry.ticked)}</p>}
      {entry.notes.map((note) => (
        <div key={note.id} className="mt-3 border-l-[3px] border-bilge pl-3">
          <NoteParts note={note} author={entry.author} isInside />
        </div>
      ))}
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

/** A mark's word, with that something of it is held where the mark itself says another thing. */
export function markWord({ mark, isHeld }: Pick<EntryLine, 'mark' | 'isHeld'>): string {
  return isHeld && mark !== 'held' ? `${BUNG_WORDS[mark]}, ${BUNG_WORDS.held}` : BUNG_WORDS[mark];
}
