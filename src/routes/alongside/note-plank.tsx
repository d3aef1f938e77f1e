import { Link } from 'react-router-dom';
import { BUNG_WORDS } from '#src/components/bung-mark.tsx';
import { Fractions } from '#src/components/fractions.tsx';
import { Plank } from '#src/components/plank.tsx';
import { EndQuestion } from '#src/routes/alongside/entry-parts.tsx';
import { PhotoStrip } from '#src/routes/alongside/photo-strip.tsx';
import { PLANK_LINK } from '#src/routes/alongside/plank-link.ts';
import type { NoteLine } from '#src/routes/alongside/read-note-line.ts';
import { deviceWord } from '#src/shell/device-words.ts';
import { capital } from '#src/words/who.ts';

/** A finding, or what was found sound, on the ribband line; a tap on it opens its page. */
export function NotePlank({ note }: { note: NoteLine }) {
  return (
    <Plank
      mark={note.mark}
      markWord={BUNG_WORDS[note.mark]}
      time={note.time}
      id={`${note.entity}-${note.id}`}
    >
      <NoteParts note={note} author={null} />
    </Plank>
  );
}

interface NotePartsProps {
  note: NoteLine;
  /** whose entry it stands in, so that the same name is not said twice; null where it stands alone */
  author: string | null;
  /** in another plank, whose link it stands above */
  isInside?: boolean;
}

export function NoteParts({ note, author, isInside = false }: NotePartsProps) {
  const { title, facts, words, struck } = note;
  const link = isInside
    ? 'relative z-10 inline-flex min-h-key items-center underline decoration-2 underline-offset-4'
    : PLANK_LINK;
  return (
    <>
      <Link
        to={`/${note.entity}/${note.id}`}
        className={`${link} font-bold ${struck ? 'text-slate line-through' : ''}`}
      >
        {title}
      </Link>
      <p className="text-slate">
        {note.author !== author && <span className="font-semibold">{capital(note.author)} · </span>}
        <Fractions text={facts.join(' · ')} />
      </p>
      {words.trim() !== '' && <p className="line-clamp-4 whitespace-pre-line">{words}</p>}
      <PhotoStrip photos={note.photos} />
      {note.ends.map((end) => (
        <EndQuestion key={end.id} end={end} />
      ))}
      {struck && <p className="text-slate">{struck}</p>}
      {note.isHeld && !isInside && <p className="text-slate">Held on this {deviceWord()}</p>}
    </>
  );
}
