import { useState } from 'react';
import { CheckKey } from '#src/components/check-key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextBox } from '#src/components/text-box.tsx';
import { useHold } from '#src/replica/hooks.tsx';
import { UNDONE_WHY, type Done } from '#src/routes/alongside/done.ts';
import { AmendSheet } from '#src/routes/alongside/entry/amend-sheet.tsx';
import { whyOf } from '#src/routes/alongside/entry/why-of.ts';
import { KindKeys } from '#src/routes/alongside/found/kind-keys.tsx';
import { certaintyBy } from '#src/routes/alongside/found/found-draft.ts';
import { CertaintyChoice, KnownKeys } from '#src/routes/alongside/found/known-fields.tsx';
import { SizeFields } from '#src/routes/alongside/found/size-fields.tsx';
import {
  changedFields,
  fieldsBefore,
  noteValuesSchema,
  valuesOf,
  type NoteValues,
} from '#src/routes/alongside/note/note-values.ts';
import type { NotePage } from '#src/routes/alongside/note/read-note-page.ts';
import { SetKeys } from '#src/routes/alongside/photos/set-keys.tsx';
import { PlaceFields } from '#src/routes/alongside/place/place-fields.tsx';
import { useDraft } from '#src/routes/alongside/use-draft.ts';
import { tooLongWords } from '#src/words/too-long.ts';

interface NoteAmendSheetProps {
  page: NotePage;
  onClose: () => void;
  onDone: (done: Done) => void;
}

/** What is to be said differently; what it was stays in its history. */
export default function NoteAmendSheet({ page, onClose, onDone }: NoteAmendSheetProps) {
  const { entity, row } = page;
  const { draft, change, clear } = useDraft<NoteValues>(`note/${row.id}`, (kept) => {
    const read = noteValuesSchema.safeParse(kept);
    return read.success ? read.data : valuesOf(entity, row);
  });
  const [why, setWhy] = useState('');
  const [isAsked, setAsked] = useState(false);
  const hold = useHold();
  const set = (next: Partial<NoteValues>) => change({ ...draft, ...next });
  const kindProblem = entity === 'finding' && draft.kind.trim() === '' ? 'Say what it is.' : undefined;
  const textProblem = tooLongWords(draft.text);

  function confirm() {
    setAsked(true);
    if (kindProblem || textProblem) return;
    const fields = changedFields(entity, row, draft);
    if (Object.keys(fields).length === 0) return void clear().then(onClose);
    const id = { [`${entity}Id`]: row.id };
    const kind = `${entity}.amend`;
    const back = fieldsBefore(entity, row, Object.keys(fields));
    hold.mutate(
      { kind, data: { ...id, set: fields, ...whyOf(why) } },
      {
        onSuccess: (op) => {
          onDone({
            done: op.id,
            words: 'Changed',
            undo: [{ kind, data: { ...id, set: back, why: UNDONE_WHY } }],
          });
          void clear().then(onClose);
        },
      },
    );
  }

  return (
    <AmendSheet
      title="Change it"
      onClose={onClose}
      why={why}
      onWhy={setWhy}
      onConfirm={confirm}
      failure={hold.error?.message}
    >
      {entity !== 'photo' && (
        <KnownKeys known={draft.known} onChange={(known) => set(knownBy(known, draft))} />
      )}
      {entity === 'finding' && (
        <>
          <CertaintyChoice certainty={draft.certainty} onChange={(certainty) => set({ certainty })} />
          <SizeFields seen={draft.seenExtent} feared={draft.fearedExtent} onChange={set} />
          <CheckKey
            label="Only opening will tell how far"
            isChecked={draft.openToKnow}
            onChange={(openToKnow) => set({ openToKnow })}
          />
        </>
      )}
      <TextBox
        label={entity === 'photo' ? 'Words under it' : 'In your own words'}
        rows={2}
        value={draft.text}
        onChange={(text) => set({ text })}
        problem={textProblem}
      />
      <PlaceFields boatId={row.boatId} place={draft.place} onChange={(place) => set({ place })} />
      {entity === 'photo' ? (
        <SetKeys set={draft.set} onChange={(next) => set({ set: next })} />
      ) : (
        <KindKeys
          legend={entity === 'finding' ? 'What is it?' : 'What did you look for? (if for one thing)'}
          kind={draft.kind}
          onChange={(kind) => set({ kind })}
          problem={isAsked ? kindProblem : undefined}
        />
      )}
      {isAsked && kindProblem && <Notice tone="error">{kindProblem}</Notice>}
    </AmendSheet>
  );
}

/** What is opened up proves it; what proved it once is not unproved by a look. */
function knownBy(known: NoteValues['known'], { certainty }: NoteValues): Partial<NoteValues> {
  return certaintyBy(known) === 'proved' ? { known, certainty: 'proved' } : { known, certainty };
}
