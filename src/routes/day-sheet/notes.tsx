import { useState } from 'react';
import { Link } from 'react-router-dom';
import { BungMark } from '#src/components/bung-mark.tsx';
import { PhotoViewer } from '#src/components/photo/photo-viewer.tsx';
import { Thumb } from '#src/components/photo/thumb.tsx';
import type { AloneOnSheet, NoteOnSheet, PhotoOnSheet } from './read-notes.ts';

/** What was found, and found sound, with its photographs in small, then the photographs of the entry itself. */
export function Notes({ notes, photos }: Pick<AloneOnSheet, 'notes' | 'photos'>) {
  return (
    <>
      {notes.map((note) => (
        <Note key={note.id} note={note} />
      ))}
      <Thumbs photos={photos} />
    </>
  );
}

function Note({ note }: { note: NoteOnSheet }) {
  const { id, entity, title, facts, words, photos, struck, mark } = note;
  return (
    <div className="my-1 border-l-[3px] border-mahogany pl-2 leading-snug break-words">
      <p className={struck ? 'text-slate line-through' : ''}>
        <Link to={`/${entity}/${id}`} className="font-bold hover:underline">
          {title}
        </Link>
        <span className="text-slate">, {facts.join(', ')}</span>
        {words && <>. {words}</>}
        {mark !== 'sent' && (
          <span className="pl-2 align-[-3px]">
            <BungMark mark={mark} size={20} />
          </span>
        )}
      </p>
      {struck && <p className="text-[16px] text-slate">{struck}</p>}
      <Thumbs photos={photos} />
    </div>
  );
}

/** Photographs in a row, small; a tap opens them whole. */
export function Thumbs({ photos }: { photos: PhotoOnSheet[] }) {
  const [shownId, setShownId] = useState<string | null>(null);
  if (photos.length === 0) return null;
  return (
    <>
      <ul className="flex flex-wrap gap-3 py-2">
        {photos.map(({ id, sha256, words }) => (
          <li key={id} className="w-[96px]">
            <Thumb sha256={sha256} words={words} onOpen={() => setShownId(id)} />
          </li>
        ))}
      </ul>
      {shownId !== null && (
        <PhotoViewer photos={photos} shownId={shownId} onShow={setShownId} onClose={() => setShownId(null)} />
      )}
    </>
  );
}
