import { Suspense, useState } from 'react';
import { Link } from 'react-router-dom';
import { Icon, type IconName } from '#src/components/icons.tsx';
import { keyLook } from '#src/components/key-look.ts';
import { IconKey } from '#src/components/key.tsx';
import { KeyRack, KeyRow } from '#src/components/page.tsx';
import { useRead, useReplica } from '#src/replica/hooks.tsx';
import type { Done } from '#src/routes/alongside/done.ts';
import { DoneUndo, OwnHoursSheet } from '#src/routes/alongside/lazy-sheets.ts';
import { DRAFT_KEY, readWaiting, waitingWords } from '#src/routes/alongside/log/waiting-draft.ts';
import type { Where } from '#src/routes/alongside/read-boats.ts';
import { momentWords } from '#src/words/day-words.ts';
import { listWords } from '#src/words/name-words.ts';

interface AlongsideKeysProps {
  where: Where;
  /** what was just held, with the way back */
  done: Done | null;
  onDone: (done: Done | null) => void;
}

/** The keys at the foot: log, photo, tick off, found, hours; and what was just held with the way back. */
export function AlongsideKeys({ where, done, onDone }: AlongsideKeysProps) {
  const { isBegun, waiting } = useWaiting();
  const [isHours, setHours] = useState(false);
  return (
    <>
      <KeyRack>
        <Suspense fallback={null}>
          {done && <DoneUndo key={done.done} done={done} onGone={() => onDone(null)} />}
        </Suspense>
        {waiting.length > 0 && <p>Not logged yet: {listWords(waiting)}.</p>}
        <Link to="/log" className={keyLook('main', 'great')}>
          <Icon name="entry" size={32} />
          {isBegun ? 'Go on' : 'Log it'}
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

/** What was begun and is not logged yet. */
function useWaiting(): { isBegun: boolean; waiting: string[] } {
  const { draft } = useReplica();
  return useRead(['waiting'], (view) => {
    const entry = readWaiting(draft.read(DRAFT_KEY));
    const isBegun = entry !== null && !view.find('entry', entry.entryId);
    const others = waitingWords({ photos: draft.read('photos'), found: draft.read('found') });
    const words = isBegun ? `your words of ${momentWords(entry.keptAt, view.timeZone, view.today)}` : null;
    return { isBegun, waiting: [...(words ? [words] : []), ...others] };
  });
}
