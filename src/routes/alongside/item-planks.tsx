import { Plank } from '#src/components/plank.tsx';
import { EntryPlank } from '#src/routes/alongside/entry-plank.tsx';
import { NotePlank } from '#src/routes/alongside/note-plank.tsx';
import { PhotoStrip } from '#src/routes/alongside/photo-strip.tsx';
import type { LineItem, PhotosItem, TicksItem } from '#src/routes/alongside/read-line-items.ts';
import { deviceWord } from '#src/shell/device-words.ts';
import { counted } from '#src/words/day-words.ts';
import { listWords } from '#src/words/name-words.ts';
import { capital } from '#src/words/who.ts';

/** Whatever a day holds, as a row of the line. */
export function ItemPlank({ item }: { item: LineItem }) {
  switch (item.item) {
    case 'entry':
      return <EntryPlank entry={item} />;
    case 'note':
      return <NotePlank note={item} />;
    case 'photos':
      return <PhotosPlank item={item} />;
    case 'ticks':
      return <TicksPlank item={item} />;
  }
}

function PhotosPlank({ item }: { item: PhotosItem }) {
  return (
    <Plank mark={item.isHeld ? 'held' : 'sent'} time={item.time}>
      <p>
        <span className="font-semibold">{item.title === 'Photograph' ? 'Photos' : capital(item.title)}</span>
      </p>
      <p className="text-slate">
        <span className="font-semibold">{capital(item.author)}</span> · {counted(item.photos.length, 'photo')}
      </p>
      <PhotoStrip photos={item.photos} />
      {item.isHeld && <p className="text-slate">Held on this {deviceWord()}</p>}
    </Plank>
  );
}

function TicksPlank({ item }: { item: TicksItem }) {
  return (
    <Plank mark={item.isHeld ? 'held' : 'sent'} time={item.time}>
      <p>
        <span className="font-semibold">Ticked off:</span> {listWords(item.titles)}
      </p>
      <p className="font-semibold text-slate">{capital(item.author)}</p>
      {item.isHeld && <p className="text-slate">Held on this {deviceWord()}</p>}
    </Plank>
  );
}
