import { Suspense, useState } from 'react';
import { Link } from 'react-router-dom';
import { Icon, type IconName } from '#src/components/icons.tsx';
import { keyLook } from '#src/components/key-look.ts';
import { IconKey } from '#src/components/key.tsx';
import { KeyRack, KeyRow } from '#src/components/page.tsx';
import { useRead, useReplica } from '#src/replica/hooks.tsx';
import { DoneUndo } from '#src/routes/alongside/done-undo.tsx';
import type { Done } from '#src/routes/alongside/done.ts';
import { OwnHoursSheet } from '#src/routes/alongside/lazy-sheets.ts';
import { DRAFT_KEY, isWorthKeeping, readDraft } from '#src/routes/alongside/log/entry-draft.ts';
import type { Where } from '#src/routes/alongside/read-boats.ts';
import { momentWords } from '#src/words/day-words.ts';

interface AlongsideKeysProps {
  where: Where;
  /** what was just held, with the way back */
  done: Done | null;
  onDone: (done: Done | null) => void;
}

/** The keys at the foot: log, photo, tick off, found, hours; and what was just held with the way back. */
export function AlongsideKeys({ where, done, onDone }: AlongsideKeysProps) {
  const kept = useKeptDraft();
  const [isHours, setHours] = useState(false);
  return (
    <>
      <KeyRack>
        {done && <DoneUndo key={done.done} done={done} onGone={() => onDone(null)} />}
        {kept && <p>Not logged yet: your words of {kept}.</p>}
        <Link to="/log" className={keyLook('main', 'great')}>
          <Icon name="entry" size={32} />
          {kept ? 'Go on' : 'Log it'}
        </Link>
        <KeyRow>
          <RackLink to="/photos" icon="photo" word="Photo" />
          <RackLink to="/tasks" icon="tick" word="Tick off" />
          <RackLink to="/found" icon="found" word="Found" />
          <IconKey icon="hours" word="Hours" onClick={() => setHours(true)} />
        </KeyRow>
      </KeyRack>
      {isHours && (
        <Suspense fallback={null}>
          <OwnHoursSheet
            where={where}
            onClose={() => setHours(false)}
            onDone={(next) => {
              setHours(false);
              onDone(next);
            }}
          />
        </Suspense>
      )}
    </>
  );
}

function RackLink({ to, icon, word }: { to: string; icon: IconName; word: string }) {
  return (
    <Link to={to} className={keyLook('plain', 'stacked')}>
      <Icon name={icon} />
      <span>{word}</span>
    </Link>
  );
}

/** When the words that wait on the form were last changed; null where none wait. */
function useKeptDraft(): string | null {
  const replica = useReplica();
  return useRead(['kept draft'], (view) => {
    const draft = readDraft(replica.draft.read(DRAFT_KEY));
    if (!draft || !isWorthKeeping(draft) || !draft.keptAt) return null;
    return view.find('entry', draft.entryId) ? null : momentWords(draft.keptAt, view.timeZone, view.today);
  });
}
