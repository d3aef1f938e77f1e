import { useState } from 'react';
import { BackBar } from '#src/components/back-bar.tsx';
import { CheckKey } from '#src/components/check-key.tsx';
import { Choice } from '#src/components/choice.tsx';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { KeyRack, Page } from '#src/components/page.tsx';
import { TextBox } from '#src/components/text-box.tsx';
import { useRead, useReplica } from '#src/replica/hooks.tsx';
import { BoatSheet } from '#src/routes/alongside/boat-sheet.tsx';
import type { Done } from '#src/routes/alongside/done.ts';
import { certaintyOf, foundProblems, isFoundWorthKeeping } from '#src/routes/alongside/found/found-draft.ts';
import { KindKeys } from '#src/routes/alongside/found/kind-keys.tsx';
import { CertaintyChoice, KnownKeys } from '#src/routes/alongside/found/known-fields.tsx';
import { SizeFields } from '#src/routes/alongside/found/size-fields.tsx';
import { useFoundForm } from '#src/routes/alongside/found/use-found-form.ts';
import { PictureFields } from '#src/routes/alongside/photos/picture-fields.tsx';
import { readCarried } from '#src/routes/alongside/place/carried.ts';
import { PlaceFields } from '#src/routes/alongside/place/place-fields.tsx';
import type { Where } from '#src/routes/alongside/read-boats.ts';
import { boatWords, stageWords } from '#src/words/where.ts';

interface FoundFormProps {
  where: Where;
  /** the entry that it comes with */
  entryId: string | null;
  onMove: (where: Where) => void;
  onLogged: (done: Done) => void;
}

const WHICH = [
  { value: 'finding', label: 'Found' },
  { value: 'sound', label: 'Looked, sound' },
] as const;

/** A finding, or what was looked at and found sound: kept at every tap until it is logged. */
export function FoundForm({ where, entryId, onMove, onLogged }: FoundFormProps) {
  const replica = useReplica();
  const form = useFoundForm(where, entryId, onLogged);
  const { draft, change } = form;
  const { boatId, stageId, isSound } = draft;
  const place = useRead(['found at', boatId, stageId], (view) => ({
    boat: boatWords(view, boatId),
    stage: stageWords(view, stageId),
  }));
  const [isMoving, setMoving] = useState(false);
  const problems = form.isAsked ? foundProblems(draft) : {};
  const back = entryId ? `/entry/${entryId}` : '/alongside';

  return (
    <Page
      bars={
        <>
          <title>Found · Ribband</title>
          <BackBar
            isCoaming
            title={place.boat}
            subTitle={place.stage}
            to={back}
            backWord="Back; what you chose is kept"
            right={
              entryId ? undefined : (
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
          {Object.keys(problems).length > 0 && <Notice tone="error">{Object.values(problems)[0]}</Notice>}
          <Key
            kind="main"
            icon={isSound ? 'tick' : 'found'}
            isGreat
            disabled={form.isLogging}
            onClick={form.log}
          >
            {isSound ? 'Log it as sound' : 'Log the finding'}
          </Key>
        </KeyRack>
      }
    >
      <form
        key={draft.rowId}
        className="grid gap-5 p-4 pb-8 md:p-6"
        onSubmit={(event) => event.preventDefault()}
      >
        <Choice
          label="A finding, or sound?"
          options={WHICH}
          value={isSound ? 'sound' : 'finding'}
          onChange={(which) => change({ isSound: which === 'sound' })}
          isRow
        />
        {form.isUnkept && (
          <Notice tone="error">
            This device has no room to keep what you choose. Log it before you leave this screen.
          </Notice>
        )}
        <KindKeys
          legend={isSound ? 'What did you look for? (if for one thing)' : 'What did you find?'}
          kind={draft.kind}
          onChange={(kind) => change({ kind })}
          problem={problems.kind}
        />
        <PlaceFields boatId={boatId} place={draft.place} onChange={(next) => change({ place: next })} />
        <PictureFields
          pictures={draft.pictures}
          onAdd={form.addPictures}
          onRemove={(picture) => {
            change({ pictures: draft.pictures.filter(({ photoId }) => photoId !== picture.photoId) });
            void replica.dropKept([picture]).catch(() => undefined);
          }}
        />
        <KnownKeys known={draft.known} onChange={(known) => change({ known })} />
        {!isSound && (
          <>
            <CertaintyChoice certainty={certaintyOf(draft)} onChange={(certainty) => change({ certainty })} />
            <SizeFields seen={draft.seenExtent} feared={draft.fearedExtent} onChange={change} />
            <CheckKey
              label="Only opening will tell how far"
              isChecked={draft.openToKnow}
              onChange={(openToKnow) => change({ openToKnow })}
            />
          </>
        )}
        <TextBox
          label="In your own words"
          rows={3}
          value={draft.text}
          onChange={(text) => change({ text })}
          problem={problems.text}
        />
        {isFoundWorthKeeping(draft) && (
          <Key kind="quiet" onClick={form.empty}>
            Empty the form
          </Key>
        )}
      </form>
      <BoatSheet
        isOpen={isMoving}
        where={{ boatId, stageId }}
        onClose={() => setMoving(false)}
        onChoose={(chosen) => {
          // a place is of the boat that was left
          const isSame = chosen.boatId === boatId;
          change(isSame ? chosen : { ...chosen, place: readCarried(replica, chosen.boatId).place });
          onMove(chosen);
          setMoving(false);
        }}
      />
    </Page>
  );
}
