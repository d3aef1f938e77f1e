import { useState } from 'react';
import { useNavigate, useSearchParams } from 'react-router-dom';
import { BackBar } from '#src/components/back-bar.tsx';
import { Empty } from '#src/components/empty.tsx';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { KeyRack, Page } from '#src/components/page.tsx';
import { TextBox } from '#src/components/text-box.tsx';
import { useRead, useReplica } from '#src/replica/hooks.tsx';
import type { View } from '#src/replica/view.ts';
import { BoatSheet } from '#src/routes/alongside/boat-sheet.tsx';
import type { Done } from '#src/routes/alongside/done.ts';
import { PictureFields } from '#src/routes/alongside/photos/picture-fields.tsx';
import { SetKeys } from '#src/routes/alongside/photos/set-keys.tsx';
import { usePhotosForm, type PhotosOf } from '#src/routes/alongside/photos/use-photos-form.ts';
import { readCarried } from '#src/routes/alongside/place/carried.ts';
import { PlaceFields } from '#src/routes/alongside/place/place-fields.tsx';
import type { Where } from '#src/routes/alongside/read-boats.ts';
import { useWhere } from '#src/routes/alongside/use-where.ts';
import { counted } from '#src/words/day-words.ts';
import { boatWords, stageWords } from '#src/words/where.ts';

/** Photographs by themselves, or (`?entry=<id>`, `?finding=<id>`) for what is in the record already. */
export default function PhotosPage() {
  const [where, choose] = useWhere();
  const navigate = useNavigate();
  const [search] = useSearchParams();
  const of = { entryId: search.get('entry'), findingId: search.get('finding') };
  const at = useRead(['photos of', of.entryId, of.findingId], (view) => readWhereOf(view, of));
  const [openedAt] = useState(at ?? where);
  const back = of.findingId ? `/finding/${of.findingId}` : of.entryId ? `/entry/${of.entryId}` : '/alongside';
  if (!openedAt) {
    return (
      <Page
        bars={
          <>
            <title>Photo · Ribband</title>
            <BackBar title="Photo" to="/alongside" backWord="Back to Alongside" />
          </>
        }
      >
        <Empty>No boat is here yet to take a photo of.</Empty>
      </Page>
    );
  }
  return (
    <PhotosForm
      where={openedAt}
      of={at ? of : { entryId: null, findingId: null }}
      back={back}
      onMove={choose}
      onLogged={(done) => void navigate(back, { state: done })}
    />
  );
}

function readWhereOf(view: View, { entryId, findingId }: PhotosOf): Where | null {
  const row = findingId ? view.find('finding', findingId) : entryId ? view.find('entry', entryId) : undefined;
  return row ? { boatId: row.boatId, stageId: row.stageId } : null;
}

interface PhotosFormProps {
  where: Where;
  of: PhotosOf;
  back: string;
  onMove: (where: Where) => void;
  onLogged: (done: Done) => void;
}

function PhotosForm({ where, of, back, onMove, onLogged }: PhotosFormProps) {
  const replica = useReplica();
  const form = usePhotosForm(where, of, onLogged);
  const { draft, change } = form;
  const { boatId, stageId, pictures } = draft;
  const [isMoving, setMoving] = useState(false);
  const place = useRead(['photos at', boatId, stageId], (view) => ({
    boat: boatWords(view, boatId),
    stage: stageWords(view, stageId),
  }));
  const isBound = draft.entryId !== null || draft.findingId !== null;
  return (
    <Page
      bars={
        <>
          <title>Photo · Ribband</title>
          <BackBar
            isCoaming
            title={place.boat}
            subTitle={place.stage}
            to={back}
            backWord="Back; your photos are kept"
            right={
              !isBound && (
                <Key kind="onDeep" onClick={() => setMoving(true)}>
                  Other boat
                </Key>
              )
            }
          />
        </>
      }
      foot={
        <KeyRack>
          {form.failure && <Notice tone="error">{form.failure}</Notice>}
          {form.problem && <Notice tone="error">{form.problem}</Notice>}
          <Key kind="main" icon="photo" isGreat disabled={form.isLogging} onClick={form.log}>
            {pictures.length === 0 ? 'Log the photos' : `Log ${counted(pictures.length, 'photo')}`}
          </Key>
        </KeyRack>
      }
    >
      <form className="grid gap-5 p-4 pb-8 md:p-6" onSubmit={(event) => event.preventDefault()}>
        {form.isUnkept && (
          <Notice tone="error">This device has no room to keep this form. Log it before you leave.</Notice>
        )}
        <PictureFields pictures={pictures} onAdd={form.add} onRemove={form.remove} />
        <PlaceFields boatId={boatId} place={draft.place} onChange={(next) => change({ place: next })} />
        <SetKeys set={draft.set} onChange={(set) => change({ set })} />
        <TextBox
          label="Words under them (if any)"
          rows={1}
          value={draft.caption}
          onChange={(caption) => change({ caption })}
        />
      </form>
      <BoatSheet
        isOpen={isMoving}
        where={{ boatId, stageId }}
        onClose={() => setMoving(false)}
        onChoose={(chosen) => {
          const isSame = chosen.boatId === boatId;
          change(isSame ? chosen : { ...chosen, ...readCarried(replica, chosen.boatId) });
          onMove(chosen);
          setMoving(false);
        }}
      />
    </Page>
  );
}
