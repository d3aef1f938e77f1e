import { useId } from 'react';
import { Icon, type IconName } from '#src/components/icons.tsx';
import { keyLook } from '#src/components/key-look.ts';
import { Notice } from '#src/components/notice.tsx';
import type { FailedPicture, PickProgress } from '#src/replica/photos/picture.ts';

interface PhotoPickerProps {
  onPick: (files: File[]) => void;
  /** How far the last pick has come; null where none is under way. */
  progress: PickProgress | null;
  /** What of the last pick was not taken in. */
  failed: FailedPicture[];
}

/** Two keys: the camera, and the pictures that are there already, several at once. What was not taken in is named. */
export function PhotoPicker({ onPick, progress, failed }: PhotoPickerProps) {
  return (
    <div className="grid gap-3">
      <div className="grid auto-cols-fr grid-flow-col gap-3">
        <FileKey icon="photo" word="Take a photo" isCamera onPick={onPick} isBusy={progress !== null} />
        <FileKey icon="pictures" word="Choose photos" onPick={onPick} isBusy={progress !== null} />
      </div>
      <p role="status" className={progress ? '' : 'sr-only'}>
        {progress && `Keeping ${Math.min(progress.done + 1, progress.of)} of ${progress.of} …`}
      </p>
      {failed.length > 0 && (
        <Notice tone="error">
          <ul className="grid gap-1">
            {failed.map(({ name, words }, index) => (
              <li key={index}>{words.includes(name) ? words : `‘${name}’: ${words}`}</li>
            ))}
          </ul>
        </Notice>
      )}
    </div>
  );
}

interface FileKeyProps {
  icon: IconName;
  word: string;
  isCamera?: boolean;
  isBusy: boolean;
  onPick: (files: File[]) => void;
}

// a label, so that the browser's own file control stays what is tapped, named and focused
function FileKey({ icon, word, isCamera = false, isBusy, onPick }: FileKeyProps) {
  const id = useId();
  return (
    <label
      htmlFor={id}
      className={`${keyLook('plain', 'stacked')} cursor-pointer has-disabled:border-dashed has-disabled:border-slate has-disabled:text-slate has-focus-visible:outline-3 has-focus-visible:outline-offset-3 has-focus-visible:outline-bilge`}
    >
      <Icon name={icon} />
      {word}
      <input
        id={id}
        type="file"
        accept="image/*"
        disabled={isBusy}
        className="sr-only"
        {...(isCamera ? { capture: 'environment' as const } : { multiple: true })}
        onChange={(event) => {
          const files = [...(event.target.files ?? [])];
          // else the same picture cannot be chosen twice
          event.target.value = '';
          if (files.length > 0) onPick(files);
        }}
      />
    </label>
  );
}
