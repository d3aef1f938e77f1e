import { useState } from 'react';
import { useParams } from 'react-router-dom';
import { BackBar } from '#src/components/back-bar.tsx';
import { BUNG_WORDS, BungMark } from '#src/components/bung-mark.tsx';
import { Empty } from '#src/components/empty.tsx';
import { Page } from '#src/components/page.tsx';
import { useRead } from '#src/replica/hooks.tsx';
import { HoursByPerson } from '#src/routes/alongside/entry-parts.tsx';
import { DoneFoot } from '#src/routes/alongside/done-foot.tsx';
import { Additions } from '#src/routes/alongside/entry/additions.tsx';
import { ChangeSheets, type Change } from '#src/routes/alongside/entry/change-sheets.tsx';
import { EntryKeys } from '#src/routes/alongside/entry/entry-keys.tsx';
import { EntryHistory } from '#src/routes/alongside/entry/entry-history.tsx';
import { LooseEnds } from '#src/routes/alongside/entry/loose-ends.tsx';
import { readEntryPage, type EntryPage } from '#src/routes/alongside/entry/read-entry-page.ts';
import { settlingOp } from '#src/routes/alongside/entry/settle.ts';
import { NoteParts } from '#src/routes/alongside/note-plank.tsx';
import { PhotoStrip } from '#src/routes/alongside/photo-strip.tsx';
import { useJustDone } from '#src/routes/alongside/use-just-done.ts';
import { deviceWord } from '#src/shell/device-words.ts';
import { RecordBar } from '#src/shell/record-bar.tsx';
import { listWords } from '#src/words/name-words.ts';
import { capital } from '#src/words/who.ts';

/** An entry in full: its words, what was said about it since, and what this person may do with it. */
export default function EntryPageScreen() {
  const { id = '' } = useParams();
  const page = useRead(['entry', id], (view) => readEntryPage(view, id));
  const [change, setChange] = useState<Change | null>(null);
  const { done, setDone } = useJustDone();
  return (
    <Page
      bars={
        <>
          <title>Entry · Ribband</title>
          <BackBar
            isCoaming
            title={page ? page.day : 'Entry'}
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
          <EntryKeys page={page} onChoose={setChange} />
          <EntryHistory history={page.history} />
          {change && (
            <ChangeSheets page={page} change={change} onClose={() => setChange(null)} onDone={setDone} />
          )}
        </>
      ) : (
        <Empty>This entry is not on this device. It may not have come yet, or it is not yours to see.</Empty>
      )}
    </Page>
  );
}

function Body({ page }: { page: EntryPage }) {
  const { line } = page;
  return (
    <div className="grid gap-3 bg-plank px-4 py-5 md:px-6">
      <p className="flex items-center gap-2 text-slate">
        <BungMark mark={line.mark} word="" />
        {stateWords(line)}
      </p>
      <p
        className={`text-[20px] leading-snug break-words whitespace-pre-line ${line.struck ? 'line-through' : ''}`}
      >
        {line.words.trim() || 'Hours alone, no words.'}
      </p>
      <p>
        <span className="font-semibold">{capital(line.author)}</span>
        {line.hours.length > 0 && ' · '}
        <HoursByPerson hours={line.hours} author={line.author} />
      </p>
      <PhotoStrip photos={line.photos} shownMax={12} />
      {line.ticked.length > 0 && <p>Ticked off: {listWords(line.ticked)}</p>}
      {line.notes.map((note) => (
        <div key={note.id} className="border-l-[3px] border-bilge pl-3">
          <NoteParts note={note} author={line.author} isInside />
        </div>
      ))}
      {line.flags.length > 0 && <p className="text-slate">{line.flags.join(' · ')}</p>}
      {line.struck && <p className="font-semibold">{line.struck}</p>}
      <Additions entryId={line.id} additions={line.additions} />
      {line.ends.length > 0 && (
        <div className="grid gap-4 pt-3">
          <h2 className="text-[20px] leading-tight font-bold">Loose ends</h2>
          <LooseEnds ends={line.ends} settle={(end, opId) => settlingOp(page, end, opId)} />
        </div>
      )}
    </div>
  );
}

function stateWords({ mark, isHeld }: EntryPage['line']): string {
  const held = `held on this ${deviceWord()}`;
  if (mark === 'held') return capital(held);
  return capital(isHeld ? `${BUNG_WORDS[mark]}, ${held}` : BUNG_WORDS[mark]);
}
