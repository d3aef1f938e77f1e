import { Fold } from '#src/components/fold.tsx';
import type { DraftFields } from '#src/routes/alongside/log/entry-draft.ts';
import { SetKeys } from '#src/routes/alongside/photos/set-keys.tsx';
import { PlaceFields } from '#src/routes/alongside/place/place-fields.tsx';
import { placeWords } from '#src/words/place-words.ts';

/** Where an entry's photographs were taken and for which set: folded away while the place that is carried on will do. */
export function PicturePlace({ draft, change }: DraftFields) {
  const where = placeWords(draft.place);
  return (
    <Fold title={where ? `Photos of ${where}` : 'Where were the photos taken?'} isOpenAtFirst={where === ''}>
      <div className="grid gap-5">
        <PlaceFields boatId={draft.boatId} place={draft.place} onChange={(place) => change({ place })} />
        <SetKeys set={draft.set} onChange={(set) => change({ set })} />
      </div>
    </Fold>
  );
}
