import { useState } from 'react';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { UpdateNotice } from '#src/components/update-notice.tsx';
import { useRead, useReplica, useSyncState } from '#src/replica/hooks.tsx';
import { deviceWord } from '#src/shell/device-words.ts';
import { readWarnings } from '#src/shell/read-warnings.ts';

const KNOWN_KEY = 'gap-known';

interface WarningsProps {
  /** Also what was seen and put away before. */
  isAll?: boolean;
}

/** What is wrong with this device and what to do, and that a newer version of the app waits. Stands in the page. */
export function Warnings({ isAll = false }: WarningsProps) {
  const replica = useReplica();
  const sync = useSyncState();
  const [known, setKnown] = useState(() => replica.draft.read<string>(KNOWN_KEY));
  const { timeZone, today, nowMs } = useRead(['warnings'], (view) => ({
    timeZone: view.timeZone,
    today: view.today,
    nowMs: view.nowMs,
  }));
  const warnings = readWarnings(sync, { timeZone, today, nowMs, device: deviceWord() });
  return (
    <>
      <UpdateNotice />
      {warnings
        .filter(({ words }) => isAll || words !== known)
        .map(({ kind, words }) => (
          <Notice
            key={kind}
            tone="warn"
            action={
              kind === 'gap' && !isAll ? (
                <Key
                  onClick={() => {
                    setKnown(words);
                    void replica.draft.write(KNOWN_KEY, words);
                  }}
                >
                  I know
                </Key>
              ) : undefined
            }
          >
            {words}
          </Notice>
        ))}
    </>
  );
}
