import { useMutation } from '@tanstack/react-query';
import { useState } from 'react';
import { Choice } from '#src/components/choice.tsx';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { useReplica } from '#src/replica/hooks.tsx';
import type { SignInRequest } from '#src/replica/session.ts';
import type { OwnDevice } from '#src/routes/sign-in/own-devices.ts';
import { deviceWord } from '#src/shell/device-words.ts';

interface ReplacesStepProps {
  /** what was signed in with, to say it again with the device that this one replaces */
  request: SignInRequest;
  devices: OwnDevice[];
  onDone: () => void;
}

const NONE = 'none';

/** Asks whether this device came in place of another of the person's, so that the other's gap can be named. */
export function ReplacesStep({ request, devices, onDone }: ReplacesStepProps) {
  const replica = useReplica();
  const [chosen, setChosen] = useState<string>(NONE);
  const word = deviceWord();
  const saying = useMutation({
    mutationFn: async () => {
      if (chosen === NONE) return { ok: true } as const;
      const result = await replica.session.signIn({ ...request, replaces: chosen });
      if ('ok' in result) await replica.syncNow();
      return result;
    },
    networkMode: 'always',
    retry: false,
    onSuccess(result) {
      if ('ok' in result) onDone();
    },
  });
  const refused = saying.data && 'refused' in saying.data ? saying.data.refused : null;
  const isOffline = saying.data !== undefined && 'offline' in saying.data;

  return (
    <div className="grid gap-5">
      <h1 className="text-[30px] leading-tight font-bold">Is this {word} in place of another?</h1>
      <p>You have signed in elsewhere before. If one of those is lost or broken, say which.</p>
      <Choice
        label="It is in place of"
        options={[
          { value: NONE, label: `None: I use them ${devices.length > 1 ? 'all' : 'both'}` },
          ...devices.map(({ id, label, heard }) => ({ value: id, label, note: heard })),
        ]}
        value={chosen}
        onChange={setChosen}
      />
      {(refused ?? saying.error?.message) && <Notice tone="error">{refused ?? saying.error?.message}</Notice>}
      {isOffline && <Notice tone="error">The signal is gone. Try again when it is back.</Notice>}
      <Key kind="main" disabled={saying.isPending} onClick={() => saying.mutate()}>
        Go on
      </Key>
    </div>
  );
}
