import { photoSetSchema, type PhotoSet } from '#shared/photo/photo.ts';
import { Icon } from '#src/components/icons.tsx';
import { keyLook } from '#src/components/key-look.ts';
import { PHOTO_SET_WORDS } from '#src/words/photo-words.ts';
import { capital } from '#src/words/who.ts';

interface SetKeysProps {
  set: PhotoSet | null;
  onChange: (set: PhotoSet | null) => void;
}

/** The set that photographs belong to; a second tap takes them out of it. */
export function SetKeys({ set, onChange }: SetKeysProps) {
  return (
    <fieldset>
      <legend className="pb-1 text-[18px] font-semibold">Which set? (if any)</legend>
      <div className="grid grid-cols-2 gap-3 md:grid-cols-5">
        {photoSetSchema.options.map((each) => (
          <button
            key={each}
            type="button"
            aria-pressed={each === set}
            className={`${keyLook('plain')} !px-2 aria-pressed:bg-bilge aria-pressed:text-primer`}
            onClick={() => onChange(each === set ? null : each)}
          >
            {each === set && <Icon name="tick" size={20} />}
            {capital(PHOTO_SET_WORDS[each])}
          </button>
        ))}
      </div>
    </fieldset>
  );
}
