import { useMutation } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { Link } from 'react-router-dom';
import { Choice } from '#src/components/choice.tsx';
import { Key, KeyLink } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { useReplica } from '#src/replica/hooks.tsx';
import type { Replica } from '#src/replica/replica.ts';
import type { SignInRequest, SignInResult } from '#src/replica/session.ts';
import { firstLabel, keepLabel } from '#src/routes/sign-in/device-label.ts';
import { deviceWord } from '#src/shell/device-words.ts';

interface SignInFormProps {
  onStart: () => void;
  onSignedIn: (request: SignInRequest) => void;
}

/** E-mail, password, and what this device is called; the shop too where the e-mail is in several. */
export function SignInForm({ onStart, onSignedIn }: SignInFormProps) {
  const replica = useReplica();
  const known = knownHere(replica);
  const [email, setEmail] = useState(known?.email ?? '');
  const [password, setPassword] = useState('');
  const [label, setLabel] = useState(known?.label ?? firstLabel);
  const [shopId, setShopId] = useState<string | null>(null);
  const [isAsked, setAsked] = useState(false);
  const signingIn = useMutation({
    mutationFn: (request: SignInRequest) => replica.session.signIn(request),
    networkMode: 'always',
    retry: false,
    onSuccess(result, request) {
      if (!('ok' in result)) return;
      keepLabel(request.label);
      onSignedIn(request);
    },
  });
  const shops = signingIn.data && 'choose' in signingIn.data ? signingIn.data.choose : null;

  function submit(event: FormEvent) {
    event.preventDefault();
    setAsked(true);
    if (!email.trim() || !password || !label.trim() || (shops && !shopId)) return;
    onStart();
    signingIn.mutate({ email: email.trim(), password, label: label.trim(), ...(shopId ? { shopId } : {}) });
  }

  return (
    <form className="grid gap-5" onSubmit={submit} noValidate>
      <div>
        <h1 className="text-[34px] leading-tight font-bold">Ribband</h1>
        <p className="text-slate">
          {known
            ? `${known.name}, the server asks for your password again. What is held here stays.`
            : 'The day record of the shop. Sign in once; then it opens without signal.'}
        </p>
      </div>
      <TextField
        label="E-mail"
        type="email"
        autoComplete="username"
        autoCapitalize="none"
        value={email}
        onChange={setEmail}
        problem={isAsked && !email.trim() ? 'Write your e-mail.' : undefined}
      />
      <TextField
        label="Password"
        type="password"
        autoComplete="current-password"
        value={password}
        onChange={setPassword}
        problem={isAsked && !password ? 'Write your password.' : undefined}
      />
      <TextField
        label={`This ${deviceWord()} is called`}
        hint="So that the shop knows which one was heard."
        value={label}
        onChange={setLabel}
        maxLength={200}
        problem={isAsked && !label.trim() ? 'Give it a name.' : undefined}
      />
      {shops && (
        <Choice
          label="Your e-mail is in more than one shop. Which one?"
          options={shops.map(({ id, name }) => ({ value: id, label: name }))}
          value={shopId}
          onChange={setShopId}
        />
      )}
      <Problem result={signingIn.data} error={signingIn.error} />
      <Key kind="main" type="submit" disabled={signingIn.isPending}>
        {signingIn.isPending ? 'Signing in …' : 'Sign in'}
      </Key>
      {known ? <KeyLink to="/">Later: go on without sending</KeyLink> : <NewShopLink />}
    </form>
  );
}

function NewShopLink() {
  return (
    <p>
      A new server without a shop?{' '}
      <Link
        to="/first-run"
        className="inline-flex min-h-key items-center text-verdigris underline decoration-2 underline-offset-4"
      >
        Set the shop up
      </Link>
    </p>
  );
}

/** Who is signed in on this device already, as far as their rows tell. */
function knownHere(replica: Replica): { name: string; email: string; label: string | undefined } | null {
  const me = replica.session.current();
  if (!me) return null;
  const view = replica.view();
  return {
    name: me.name,
    email: view.find('person', me.personId)?.email ?? '',
    label: view.find('device', me.deviceId)?.label,
  };
}

function Problem({ result, error }: { result: SignInResult | undefined; error: Error | null }) {
  if (error) return <Notice tone="error">{error.message}</Notice>;
  if (!result) return null;
  if ('refused' in result) return <Notice tone="error">{result.refused}</Notice>;
  if ('offline' in result) {
    return (
      <Notice tone="error">
        The server is out of reach. The first sign-in needs signal: go where there is some and try again.
      </Notice>
    );
  }
  return null;
}
