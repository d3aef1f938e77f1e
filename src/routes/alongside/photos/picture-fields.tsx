import { Key } from '#src/components/key.tsx';
import { PhotoPicker } from '#src/components/photo/photo-picker.tsx';
import { Thumb } from '#src/components/photo/thumb.tsx';
import { usePick } from '#src/components/photo/use-pick.ts';
import { useReplica } from '#src/replica/hooks.tsx';
import type { KeptPicture } from '#src/replica/photos/picture.ts';

interface PictureFieldsProps {
  pictures: KeptPicture[];
  onAdd: (pictures: KeptPicture[]) => void;
  onRemove: (picture: KeptPicture) => void;
}

/** Photographs for a form: from the camera or the gallery, each kept on the device before it is shown. */
export function PictureFields({ pictures, onAdd, onRemove }: PictureFieldsProps) {
  const replica = useReplica();
  const pick = usePick(replica.keepPictures, ({ kept }) => {
    if (kept.length > 0) onAdd(kept);
  });
  return (
    <fieldset className="grid gap-3">
      <legend className="pb-1 text-[18px] font-semibold">Photos</legend>
      {pictures.length > 0 && (
        <ul className="grid grid-cols-3 gap-3 md:grid-cols-5">
          {pictures.map((picture, index) => (
            <li key={picture.photoId} className="grid gap-1">
              <Thumb sha256={picture.sha256} words={`Photo ${index + 1} of ${pictures.length}`} />
              <Key
                kind="quiet"
                className="!px-1"
                aria-label={`Take photo ${index + 1} out`}
                onClick={() => onRemove(picture)}
              >
                Take out
              </Key>
            </li>
          ))}
        </ul>
      )}
      <PhotoPicker {...pick} />
    </fieldset>
  );
}
