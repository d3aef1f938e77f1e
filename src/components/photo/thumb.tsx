import type { ReactNode } from 'react';
import { BlobImage } from '#src/components/photo/blob-image.tsx';
import { pictureWords } from '#src/components/photo/picture-words.ts';
import { usePicture } from '#src/replica/hooks.tsx';
import { deviceWord } from '#src/shell/device-words.ts';

interface ThumbProps {
  sha256: string;
  /** What is to be seen: 'Deck beam 4 port, before: the scarf'. */
  words: string;
  /** Opens the picture whole; without it the thumbnail is no key. */
  onOpen?: () => void;
}

const BOX = 'relative block aspect-[4/3] w-full overflow-hidden rounded-key border-2 border-bilge bg-plank';

/** A small picture in a box that keeps its size whether the bytes are here or not, with how it stands in words. */
export function Thumb({ sha256, words, onOpen }: ThumbProps) {
  const seen = usePicture(sha256, 'thumb');
  const says = pictureWords(seen, deviceWord());
  const inside = (
    <>
      {seen.blob && <BlobImage blob={seen.blob} alt={words} className="size-full object-cover" />}
      {!seen.blob && <span className="sr-only">{words}</span>}
      {says && (
        <span
          className={`absolute inset-x-0 bottom-0 px-2 py-1 text-center text-[18px] leading-tight font-semibold ${seen.held ? 'bg-seam text-on-seam' : 'bg-plank text-bilge'}`}
        >
          {says}
        </span>
      )}
    </>
  );
  if (!onOpen) return <span className={BOX}>{inside}</span>;
  return (
    <button type="button" data-print className={BOX} onClick={onOpen}>
      {inside}
    </button>
  );
}

/** Thumbnails side by side, as many as there is room for; each child a Thumb. */
export function ThumbGrid({ children }: { children: ReactNode[] }) {
  return (
    <ul className="grid grid-cols-[repeat(auto-fill,minmax(148px,1fr))] gap-3">
      {children.map((child, index) => (
        <li key={index}>{child}</li>
      ))}
    </ul>
  );
}
