import { useState } from 'react';
import { Navigate, useNavigate } from 'react-router-dom';
import { Page } from '#src/components/page.tsx';
import { useMe, useReplica, useSyncState } from '#src/replica/hooks.tsx';
import type { SignInRequest } from '#src/replica/session.ts';
import { findOwnDevices, type OwnDevice } from '#src/routes/sign-in/own-devices.ts';
import { ReplacesStep } from '#src/routes/sign-in/replaces-step.tsx';
import { SignInForm } from '#src/routes/sign-in/sign-in-form.tsx';

/** Signing in; a new device is asked which one it came in place of. */
export default function SignInPage() {
  const me = useMe();
  const { phase } = useSyncState();
  const replica = useReplica();
  const navigate = useNavigate();
  const [isUnderWay, setUnderWay] = useState(false);
  const [asking, setAsking] = useState<{ request: SignInRequest; devices: OwnDevice[] } | null>(null);

  if (me && phase !== 'sign-in-needed' && !isUnderWay) return <Navigate to="/" replace />;

  async function afterSignIn(request: SignInRequest) {
    const devices = await findOwnDevices(replica);
    if (devices.length > 0) setAsking({ request, devices });
    else void navigate('/', { replace: true });
  }

  return (
    <Page>
      <title>Sign in · Ribband</title>
      <div className="mx-auto grid max-w-[480px] gap-6 px-4 py-8">
        {asking ? (
          <ReplacesStep {...asking} onDone={() => void navigate('/', { replace: true })} />
        ) : (
          <SignInForm onStart={() => setUnderWay(true)} onSignedIn={(request) => void afterSignIn(request)} />
        )}
      </div>
    </Page>
  );
}
