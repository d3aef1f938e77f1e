import { lazy, Suspense, useState } from 'react';
import { Thumb } from '#src/components/photo/thumb.tsx';
import type { PhotoLine } from '#src/routes/alongside/read-photos.ts';
import { counted } from '#src/words/day-words.ts';

const PhotoSheet = lazy(() => import('#src/routes/alongside/photos/photo-sheet.tsx'));

interface PhotoStripProps {
  photos: PhotoLine[];
  /** how many are shown at once; the rest are one tap away */
  shownMax?: number;
  /** as wide as the page, for the page of one */
  isLarge?: boolean;
}

/** Photographs in a row under what they belong to; a tap shows one whole. */
export function PhotoStrip({ photos, shownMax = 4, isLarge = false }: PhotoStripProps) {
  const [openId, setOpenId] = useState<string | null>(null);
  if (photos.length === 0) return null;
  const shown = photos.slice(0, shownMax);
  const more = photos.slice(shownMax);
  return (
    // above the link that the whole plank answers for
    <div className="relative z-10 my-2">
      <ul className={`grid gap-3 ${isLarge ? '' : 'grid-cols-2 md:grid-cols-4'}`}>
        {shown.map((photo, index) => (
          <li key={photo.id}>
            <Thumb
              sha256={photo.sha256}
              words={photos.length > 1 ? `${photo.words}, ${index + 1} of ${photos.length}` : photo.words}
              onOpen={() => setOpenId(photo.id)}
            />
          </li>
        ))}
      </ul>
      {more.length > 0 && (
        <button
          type="button"
          className="min-h-key font-semibold underline decoration-2 underline-offset-4"
          onClick={() => setOpenId(more[0]!.id)}
        >
          {counted(more.length, 'more photo')}
        </button>
      )}
      {openId !== null && photos.some(({ id }) => id === openId) && (
        <Suspense fallback={null}>
          <PhotoSheet photos={photos} shownId={openId} onShow={setOpenId} onClose={() => setOpenId(null)} />
        </Suspense>
      )}
    </div>
  );
}
