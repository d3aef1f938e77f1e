import { useMutation } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { useNavigate } from 'react-router-dom';
import { BackBar } from '#src/components/back-bar.tsx';
import { Choice } from '#src/components/choice.tsx';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Page } from '#src/components/page.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { useReplica } from '#src/replica/hooks.tsx';
import {
  makeShop,
  readForm,
  type FieldProblems,
  type FirstRunForm,
  type FirstRunResult,
} from '#src/routes/first-run/first-run-api.ts';
import { deviceWord } from '#src/shell/device-words.ts';

const UNITS = [
  { value: 'imperial', label: 'Inches', note: 'to the sixteenth' },
  { value: 'metric', label: 'Millimetres' },
] as const;

/** The first page of an empty server: the shop, and its first foreman, who is signed in with it. */
export default function FirstRunPage() {
  const replica = useReplica();
  const navigate = useNavigate();
  const [form, setForm] = useState<FirstRunForm>(emptyForm);
  const [isAsked, setAsked] = useState(false);
  const read = readForm(form);
  const problems: FieldProblems = isAsked && 'problems' in read ? read.problems : {};
  const making = useMutation({
    mutationFn: async () => {
      if (!('request' in read)) return null;
      const made = await makeShop(read.request);
      if (!('ok' in made)) return made;
      const word = deviceWord();
      await replica.session.signIn({
        ...read.request.person,
        label: word.charAt(0).toUpperCase() + word.slice(1),
      });
      return made;
    },
    networkMode: 'always',
    retry: false,
    onSuccess(result) {
      if (result && 'ok' in result) void navigate('/', { replace: true });
    },
  });

  function submit(event: FormEvent) {
    event.preventDefault();
    setAsked(true);
    if ('request' in read) making.mutate();
  }

  const field = (name: Exclude<keyof FirstRunForm, 'units'>) => ({
    value: form[name],
    onChange: (text: string) => setForm({ ...form, [name]: text }),
    problem: problems[name],
  });

  return (
    <Page bars={<BackBar title="A new shop" to="/sign-in" backWord="Back to signing in" />}>
      <title>A new shop · Ribband</title>
      <form className="mx-auto grid max-w-[560px] gap-5 px-4 py-6" onSubmit={submit} noValidate>
        <TextField
          label="The code"
          hint="The server prints it when it starts without a shop."
          autoComplete="off"
          autoCapitalize="none"
          {...field('code')}
        />
        <TextField label="Name of the shop" autoComplete="organization" {...field('shopName')} />
        <TextField
          label="Time zone"
          hint="A day of the record begins and ends by it."
          autoComplete="off"
          {...field('timeZone')}
        />
        <TextField label="Money is counted in" autoComplete="off" maxLength={3} {...field('currency')} />
        <Choice
          label="Lengths are shown in"
          options={UNITS}
          value={form.units}
          onChange={(units) => setForm({ ...form, units })}
          isRow
        />
        <h2 className="pt-3 text-[24px] leading-tight font-bold">Its first foreman</h2>
        <TextField label="Your name" autoComplete="name" {...field('name')} />
        <TextField
          label="Your e-mail"
          type="email"
          autoComplete="username"
          autoCapitalize="none"
          {...field('email')}
        />
        <TextField
          label="A password"
          hint="At least 8 characters."
          type="password"
          autoComplete="new-password"
          {...field('password')}
        />
        <Problem result={making.data} error={making.error} />
        <Key kind="main" type="submit" disabled={making.isPending}>
          {making.isPending ? 'Making it …' : 'Make the shop'}
        </Key>
      </form>
    </Page>
  );
}

function emptyForm(): FirstRunForm {
  const { timeZone, locale } = Intl.DateTimeFormat().resolvedOptions();
  const isImperial = locale === 'en-US';
  return {
    code: '',
    shopName: '',
    timeZone,
    currency: isImperial ? 'USD' : 'EUR',
    units: isImperial ? 'imperial' : 'metric',
    name: '',
    email: '',
    password: '',
  };
}

function Problem({ result, error }: { result: FirstRunResult | null | undefined; error: Error | null }) {
  if (error) return <Notice tone="error">{error.message}</Notice>;
  if (!result || 'ok' in result) return null;
  if ('offline' in result)
    return <Notice tone="error">The server is out of reach. Try again when it is back.</Notice>;
  return <Notice tone="error">{result.refused}</Notice>;
}
