import { useState } from 'react';
import { useParams } from 'react-router-dom';
import { BackBar } from '#src/components/back-bar.tsx';
import { BUNG_WORDS, BungMark } from '#src/components/bung-mark.tsx';
import { Empty } from '#src/components/empty.tsx';
import { Page } from '#src/components/page.tsx';
import { useRead } from '#src/replica/hooks.tsx';
import { HoursByPerson } from '#src/routes/alongside/entry-parts.tsx';
import { Additions } from '#src/routes/alongside/entry/additions.tsx';
import { ChangeSheets, type Change } from '#src/routes/alongside/entry/change-sheets.tsx';
import { EntryKeys } from '#src/routes/alongside/entry/entry-keys.tsx';
import { EntryHistory } from '#src/routes/alongside/entry/entry-history.tsx';
import { LooseEnds } from '#src/routes/alongside/entry/loose-ends.tsx';
import { readEntryPage, type EntryPage } from '#src/routes/alongside/entry/read-entry-page.ts';
import { RecordBar } from '#src/shell/record-bar.tsx';
import { capital } from '#src/words/who.ts';

/** An entry in full: its words, what was said about it since, and what this person may do with it. */
export default function EntryPageScreen() {
  const { id = '' } = useParams();
  const page = useRead(['entry', id], (view) => readEntryPage(view, id));
  const [change, setChange] = useState<Change | null>(null);
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
    >
      {page ? (
        <>
          <Body page={page} />
          <EntryKeys page={page} onChoose={setChange} />
          <EntryHistory history={page.history} />
          {change && <ChangeSheets page={page} change={change} onClose={() => setChange(null)} />}
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
      {line.flags.length > 0 && <p className="text-slate">{line.flags.join(' · ')}</p>}
      {line.struck && <p className="font-semibold">{line.struck}</p>}
      <Additions entryId={line.id} additions={line.additions} />
      {line.ends.length > 0 && (
        <div className="grid gap-4 pt-3">
          <h2 className="text-[20px] leading-tight font-bold">Loose ends</h2>
          <LooseEnds page={page} />
        </div>
      )}
    </div>
  );
}

function stateWords({ mark, isHeld }: EntryPage['line']): string {
  const words = capital(BUNG_WORDS[mark]);
  return isHeld && mark !== 'held' ? `${words}, ${BUNG_WORDS.held}` : words;
}
