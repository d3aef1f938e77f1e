import { useMutation } from '@tanstack/react-query';
import { Key, KeyLink } from '#src/components/key.tsx';
import { KeyRack } from '#src/components/page.tsx';
import { useRead, useReplica, useSyncState } from '#src/replica/hooks.tsx';
import { sendWords } from '#src/routes/held/send-words.ts';

/** How sending stands, in words, and the key that tries at once. */
export function SendNow() {
  const replica = useReplica();
  const sync = useSyncState();
  const { timeZone, today } = useRead(['clock'], (view) => ({ timeZone: view.timeZone, today: view.today }));
  const sending = useMutation({ mutationFn: () => replica.sendNow(), networkMode: 'always', retry: false });
  const isBusy = sending.isPending || sync.phase === 'syncing' || sync.isSendingPhotos;
  return (
    <KeyRack>
      <p role="status">{isBusy ? 'Sending …' : sendWords(sync, timeZone, today)}</p>
      {sync.phase === 'sign-in-needed' ? (
        <KeyLink to="/sign-in" kind="main">
          Sign in again
        </KeyLink>
      ) : (
        <Key kind="main" disabled={isBusy} onClick={() => sending.mutate()}>
          {sync.heldOps + sync.heldPhotos > 0 ? 'Send now' : 'Ask for news now'}
        </Key>
      )}
    </KeyRack>
  );
}
