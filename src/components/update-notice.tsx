import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { useUpdate } from '#src/components/use-update.ts';

/** Says that a newer version waits, with the key that lets it in; nothing where none does. */
export function UpdateNotice() {
  const { state, apply } = useUpdate();
  if (state === 'none') return null;
  return (
    <Notice action={<Key onClick={apply}>Change to it now</Key>}>
      {state === 'waiting'
        ? 'A newer version of Ribband is on this device.'
        : 'A newer version of Ribband was started in another window.'}{' '}
      Change when it suits you: what is held here stays.
    </Notice>
  );
}
