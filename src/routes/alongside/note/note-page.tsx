import { lazy, Suspense, useState } from 'react';
import { Link, useParams } from 'react-router-dom';
import { BackBar } from '#src/components/back-bar.tsx';
import { BUNG_WORDS, BungMark } from '#src/components/bung-mark.tsx';
import { Empty } from '#src/components/empty.tsx';
import { Fractions } from '#src/components/fractions.tsx';
import { Key, KeyLink } from '#src/components/key.tsx';
import { Page } from '#src/components/page.tsx';
import { Why } from '#src/components/why.tsx';
import { useHold, useRead } from '#src/replica/hooks.tsx';
import { DoneFoot } from '#src/routes/alongside/done-foot.tsx';
import { UNDONE_WHY, type Done } from '#src/routes/alongside/done.ts';
import { EntryHistory } from '#src/routes/alongside/entry/entry-history.tsx';
import { LooseEnds } from '#src/routes/alongside/entry/loose-ends.tsx';
import type { NoteEntity } from '#src/routes/alongside/note/note-values.ts';
import { readNotePage, settleNote, type NotePage } from '#src/routes/alongside/note/read-note-page.ts';
import { PhotoStrip } from '#src/routes/alongside/photo-strip.tsx';
import { useJustDone } from '#src/routes/alongside/use-just-done.ts';
import { RecordBar } from '#src/shell/record-bar.tsx';
import { capital } from '#src/words/who.ts';

const NoteAmendSheet = lazy(() => import('#src/routes/alongside/note/note-amend-sheet.tsx'));

const NAMES: Record<NoteEntity, string> = { finding: 'Finding', sound: 'Found sound', photo: 'Photo' };

/** A finding, what was found sound, or a photograph: all that was said of it, and what can be done with it. */
export function NotePageScreen({ entity }: { entity: NoteEntity }) {
  const { id = '' } = useParams();
  const page = useRead(['note', entity, id], (view) => readNotePage(view, entity, id));
  const { done, setDone } = useJustDone();
  return (
    <Page
      bars={
        <>
          <title>{`${NAMES[entity]} · Ribband`}</title>
          <BackBar
            isCoaming
            title={page?.title ?? NAMES[entity]}
            subTitle={page?.where}
            to="/alongside"
            backWord="Back to Alongside"
          />
          <RecordBar />
        </>
      }
      foot={done && <DoneFoot done={done} onGone={() => setDone(null)} />}
    >
      {page ? (
        <>
          <Body page={page} />
          <NoteKeys key={page.row.id} page={page} onDone={setDone} />
          <EntryHistory history={page.history} of={NAMES[entity].toLowerCase()} />
        </>
      ) : (
        <Empty>This is not on this device. It may not have come yet, or it is not yours to see.</Empty>
      )}
    </Page>
  );
}

function Body({ page }: { page: NotePage }) {
  return (
    <div className="grid gap-3 bg-plank px-4 py-5 md:px-6">
      <p className="flex items-center gap-2 text-slate">
        <BungMark mark={page.mark} word="" />
        {capital(BUNG_WORDS[page.mark])}
        {page.isHeld && page.mark !== 'held' && `, ${BUNG_WORDS.held}`}
      </p>
      {page.facts.map((fact) => (
        <p key={fact} className="font-semibold">
          <Fractions text={fact} />
        </p>
      ))}
      {page.words.trim() !== '' && (
        <p className="text-[20px] leading-snug break-words whitespace-pre-line">{page.words}</p>
      )}
      <p className="text-slate">{page.said}</p>
      <PhotoStrip photos={page.photos} shownMax={12} isLarge={page.entity === 'photo'} />
      {page.struck && <p className="font-semibold">{page.struck}</p>}
      {page.links.map(({ to, words }) => (
        <Link
          key={to}
          to={to}
          className="inline-flex min-h-key items-center font-semibold text-verdigris underline decoration-2 underline-offset-4"
        >
          {words}
        </Link>
      ))}
      {page.ends.length > 0 && (
        <div className="grid gap-4 pt-3">
          <h2 className="text-[20px] leading-tight font-bold">Loose ends</h2>
          <LooseEnds ends={page.ends} settle={(end, opId) => settleNote(page, end, opId)} />
        </div>
      )}
    </div>
  );
}

interface NoteKeysProps {
  page: NotePage;
  onDone: (done: Done) => void;
}

function NoteKeys({ page, onDone }: NoteKeysProps) {
  const [open, setOpen] = useState<'amend' | 'strike' | 'restore' | null>(null);
  const { entity, row } = page;
  const isStruck = row.struck !== null;
  return (
    <div className="grid gap-3 px-4 py-5 min-[360px]:grid-cols-2 md:px-6">
      {page.mayAmend && <Key onClick={() => setOpen('amend')}>Change it</Key>}
      {page.mayAmend && entity === 'finding' && (
        <KeyLink to={`/photos?finding=${row.id}`} icon="photo">
          Photo
        </KeyLink>
      )}
      {page.mayStrike && !isStruck && (
        <Key kind="danger" onClick={() => setOpen('strike')}>
          Strike it
        </Key>
      )}
      {page.mayStrike && isStruck && <Key onClick={() => setOpen('restore')}>Bring it back</Key>}
      {open === 'amend' && (
        <Suspense fallback={null}>
          <NoteAmendSheet page={page} onClose={() => setOpen(null)} onDone={onDone} />
        </Suspense>
      )}
      {(open === 'strike' || open === 'restore') && (
        <StrikeSheet page={page} verb={open} onClose={() => setOpen(null)} onDone={onDone} />
      )}
    </div>
  );
}

interface StrikeSheetProps extends NoteKeysProps {
  verb: 'strike' | 'restore';
  onClose: () => void;
}

function StrikeSheet({ page, verb, onClose, onDone }: StrikeSheetProps) {
  const hold = useHold();
  const { entity, row } = page;
  const id = { [`${entity}Id`]: row.id };
  const isStrike = verb === 'strike';
  const back = `${entity}.${isStrike ? 'restore' : 'strike'}`;
  return (
    <Why
      isOpen
      onClose={onClose}
      title={isStrike ? 'Strike this' : 'Bring this back'}
      question={isStrike ? 'Why is it struck? It stays to be read.' : 'Why is it brought back?'}
      confirm={isStrike ? 'Strike it' : 'Bring it back'}
      isDanger={isStrike}
      problem={hold.error?.message}
      onConfirm={(why) =>
        hold.mutate(
          { kind: `${entity}.${verb}`, data: { ...id, why } },
          {
            onSuccess: (op) => {
              const words = isStrike ? 'Struck' : 'Brought back';
              onDone({ done: op.id, words, undo: [{ kind: back, data: { ...id, why: UNDONE_WHY } }] });
              onClose();
            },
          },
        )
      }
    />
  );
}
