import { useRead, useSyncState } from '#src/replica/hooks.tsx';
import { momentWords } from '#src/words/day-words.ts';

/** Without signal, or while the server fails, a sheet says how old its news is. */
export function AsLastHeard() {
  const sync = useSyncState();
  const { timeZone, today } = useRead(['clock'], (view) => ({ timeZone: view.timeZone, today: view.today }));
  if (sync.phase !== 'offline' && sync.phase !== 'failed') return null;
  const heard = sync.lastHeardAt
    ? `as last heard ${momentWords(sync.lastHeardAt, timeZone, today)}`
    : 'nothing heard yet';
  const why = sync.phase === 'offline' ? 'No signal here' : 'The server is not reached';
  return (
    <p className="justify-self-start bg-seam px-2 py-1 text-on-seam" role="status">
      {why}: this is {heard}. What you settle is held and sent later.
    </p>
  );
}
