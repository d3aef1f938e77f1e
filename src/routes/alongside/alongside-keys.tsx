import { useState } from 'react';
import { Icon } from '#src/components/icons.tsx';
import { keyLook } from '#src/components/key-look.ts';
import { KeyRack } from '#src/components/page.tsx';
import { useRead, useReplica } from '#src/replica/hooks.tsx';
import { Link } from 'react-router-dom';
import { DRAFT_KEY, isWorthKeeping, readDraft } from '#src/routes/alongside/log/entry-draft.ts';
import { isLogged, LoggedUndo } from '#src/routes/alongside/log/logged-undo.tsx';
import { readTasks, type TaskGroup } from '#src/routes/alongside/tasks/read-tasks.ts';
import type { Where } from '#src/routes/alongside/read-boats.ts';
import { momentWords } from '#src/words/day-words.ts';

interface AlongsideKeysProps {
  where: Where;
  /** what the screen before this one left: an entry just logged */
  justDone: unknown;
}

/** The keys at the foot: log, tick off; and what was just logged with the way back. */
export function AlongsideKeys({ where, justDone }: AlongsideKeysProps) {
  const [gone, setGone] = useState<unknown>(null);
  const kept = useKeptDraft();
  const open = useRead(['open tasks', where], (view) => countOpen(readTasks(view, where)));
  return (
    <>
      <KeyRack>
        {isLogged(justDone) && justDone !== gone && (
          <LoggedUndo key={justDone.entryId} logged={justDone} onGone={() => setGone(justDone)} />
        )}
        {kept && <p>Not logged yet: your words of {kept}.</p>}
        <div className="grid grid-cols-[5fr_3fr] gap-3">
          <Link to="/log" className={keyLook('main', 'great')}>
            <Icon name="entry" size={32} />
            {kept ? 'Go on' : 'Log it'}
          </Link>
          <Link to="/tasks" className={`${keyLook('plain')} !gap-3`}>
            <Icon name="tick" />
            <span>
              Tick off
              {open > 0 && <span className="block font-normal">{open} open</span>}
            </span>
          </Link>
        </div>
      </KeyRack>
    </>
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

function countOpen(groups: TaskGroup[]): number {
  return groups.reduce((sum, group) => sum + group.open.length, 0);
}
