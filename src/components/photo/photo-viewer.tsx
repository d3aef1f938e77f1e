import { type KeyboardEvent, type ReactNode, type RefObject, useLayoutEffect, useRef } from 'react';
import type { IconName } from '#src/components/icons.tsx';
import { IconKey, Key } from '#src/components/key.tsx';
import { KeyRow } from '#src/components/page.tsx';
import { BlobImage } from '#src/components/photo/blob-image.tsx';
import { pictureWords } from '#src/components/photo/picture-words.ts';
import { ZOOM_MAX, useZoom, type Zoom } from '#src/components/photo/use-zoom.ts';
import { usePicture } from '#src/replica/hooks.tsx';
import { deviceWord } from '#src/shell/device-words.ts';

export interface ViewedPhoto {
  id: string;
  sha256: string;
  width: number;
  height: number;
  /** What is to be seen: the caption, or what the picture is of. */
  words: string;
}

interface PhotoViewerProps {
  photos: ViewedPhoto[];
  /** The id of the one that is shown. */
  shownId: string;
  onShow: (id: string) => void;
  onClose: () => void;
  /** More about the one that is shown, under its words. */
  children?: ReactNode;
}

/** Pictures over the whole screen, one at a time: larger and smaller, next and previous, all by keys, taps or the keyboard. */
export function PhotoViewer({ photos, shownId, onShow, onClose, children }: PhotoViewerProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const index = Math.max(
    0,
    photos.findIndex(({ id }) => id === shownId),
  );
  const photo = photos[index]!;
  const [roomRef, zoom] = useZoom(photo.id);
  // closed before it leaves the page, or the focus does not go back to the key that opened it
  useLayoutEffect(() => {
    const element = dialog.current;
    element?.showModal();
    return () => element?.close();
  }, []);
  const show = (to: number) => {
    const next = photos[to];
    if (next) onShow(next.id);
  };
  return (
    <dialog
      ref={dialog}
      aria-label="Photo"
      className="fixed inset-0 m-0 hidden h-dvh max-h-none w-full max-w-none flex-col border-0 bg-deep p-0 text-on-deep focus-deep open:flex"
      onCancel={(event) => {
        event.preventDefault();
        onClose();
      }}
      onKeyDown={(event) =>
        onKey(event, { zoom, next: () => show(index + 1), previous: () => show(index - 1) })
      }
    >
      <div className="flex items-start justify-between gap-3 py-2 pr-2 pl-4">
        <div className="py-2 text-[18px]" aria-live="polite">
          <p className="font-semibold">{photo.words}</p>
          {photos.length > 1 && (
            <p>
              {index + 1} of {photos.length}
            </p>
          )}
          {children}
        </div>
        <IconKey icon="close" word="Close" kind="onDeep" isBare className="max-md:hidden" onClick={onClose} />
      </div>
      <Whole key={photo.sha256} photo={photo} zoom={zoom} roomRef={roomRef} />
      <div className="mx-auto grid w-full max-w-[820px] gap-3 p-3 pb-[calc(12px+env(safe-area-inset-bottom))]">
        <KeyRow>
          {photos.length > 1 && (
            <ViewKey icon="back" word="Previous" isAtEnd={index === 0} onPress={() => show(index - 1)} />
          )}
          <ViewKey icon="minus" word="Smaller" isAtEnd={zoom.times === 1} onPress={zoom.smaller} />
          <ViewKey icon="plus" word="Larger" isAtEnd={zoom.times === ZOOM_MAX} onPress={zoom.larger} />
          {photos.length > 1 && (
            <ViewKey
              icon="forward"
              word="Next"
              isAtEnd={index === photos.length - 1}
              onPress={() => show(index + 1)}
            />
          )}
        </KeyRow>
        {/* within the thumb's reach, where the hand that holds the phone is the only one free */}
        <Key kind="onDeep" className="md:hidden" onClick={onClose}>
          Close
        </Key>
      </div>
    </dialog>
  );
}

interface ViewKeyProps {
  icon: IconName;
  word: string;
  /** It goes no further this way. */
  isAtEnd: boolean;
  onPress: () => void;
}

// never `disabled`: the key that was pressed last would lose the focus, and the keyboard with it
function ViewKey({ icon, word, isAtEnd, onPress }: ViewKeyProps) {
  return (
    <IconKey
      icon={icon}
      word={word}
      kind="onDeep"
      aria-disabled={isAtEnd}
      className="aria-disabled:border-dashed"
      onClick={() => !isAtEnd && onPress()}
    />
  );
}

interface WholeProps {
  photo: ViewedPhoto;
  zoom: Zoom;
  /** given to what scrolls */
  roomRef: RefObject<HTMLDivElement | null>;
}

/** The picture in its room: what fits a screen, and all of it where it is made larger. A tap makes the place larger that it meets. */
function Whole({ photo, zoom, roomRef }: WholeProps) {
  const thumb = usePicture(photo.sha256, 'thumb');
  const view = usePicture(photo.sha256, 'view');
  const says = view.blob ? null : pictureWords(view, deviceWord());
  const blob = view.blob ?? thumb.blob;
  const ratio = photo.width / photo.height;
  return (
    <div
      ref={roomRef}
      // scrolled by the keyboard too, once it is larger than the screen
      tabIndex={zoom.times > 1 ? 0 : -1}
      className="flex min-h-0 flex-1 overflow-auto [container-type:size]"
    >
      <div
        className="relative m-auto shrink-0"
        style={{
          width: `calc(min(100cqw, 100cqh * ${ratio}) * ${zoom.times})`,
          aspectRatio: `${photo.width} / ${photo.height}`,
        }}
        onClick={zoom.tap}
      >
        {blob && <BlobImage blob={blob} alt={photo.words} className="size-full" />}
        {zoom.times > 1 && view.blob && <InFull photo={photo} />}
        {says && (
          <p className="absolute inset-x-0 bottom-0 bg-plank p-3 text-center text-[18px] font-semibold text-bilge">
            {says}
          </p>
        )}
      </div>
    </div>
  );
}

/** All the pixels that there are, over what was made for a screen. */
function InFull({ photo }: { photo: ViewedPhoto }) {
  const { blob } = usePicture(photo.sha256, 'full');
  return blob && <BlobImage blob={blob} alt="" className="absolute inset-0 size-full" />;
}

interface Moves {
  zoom: Zoom;
  next: () => void;
  previous: () => void;
}

function onKey(event: KeyboardEvent, { zoom, next, previous }: Moves): void {
  const moves: Record<string, () => void> = {
    '+': zoom.larger,
    '=': zoom.larger,
    '-': zoom.smaller,
    '0': zoom.whole,
    // a picture that is larger than the screen is moved by the arrows
    ...(zoom.times === 1 ? { ArrowRight: next, ArrowLeft: previous } : {}),
    PageDown: next,
    PageUp: previous,
  };
  const move = moves[event.key];
  if (!move || event.ctrlKey || event.metaKey || event.altKey) return;
  event.preventDefault();
  move();
}
