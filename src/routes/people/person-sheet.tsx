import { useState } from 'react';
import { z } from 'zod';
import {
  newPersonSchema,
  personAnswerSchema,
  personChangeSchema,
  type PersonRow,
} from '#shared/identity/person.ts';
import { roleSchema, type Role } from '#shared/identity/role.ts';
import { CheckKey } from '#src/components/check-key.tsx';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { useMe, useReplica } from '#src/replica/hooks.tsx';
import { askedWords, useAsk } from '#src/replica/use-ask.ts';
import { ROLE_NOTES, ROLE_WORDS } from '#src/words/role-words.ts';

interface PersonSheetProps {
  /** null: somebody new */
  person: PersonRow | null;
  onClose: () => void;
}

interface Draft {
  name: string;
  email: string;
  password: string;
  roles: Role[];
}

type Problems = Partial<Record<keyof Draft, string>>;

/** Adds a person, or changes one. Both need signal. */
export function PersonSheet({ person, onClose }: PersonSheetProps) {
  const replica = useReplica();
  const me = useMe();
  const { mutateAsync: askFor, data: asked, isPending } = useAsk(personAnswerSchema);
  const [problems, setProblems] = useState<Problems>({});
  const [draft, setDraft] = useState<Draft>({
    name: person?.name ?? '',
    email: person?.email ?? '',
    password: '',
    roles: person?.roles ?? ['crew'],
  });
  const change = (part: Partial<Draft>) => setDraft({ ...draft, ...part });
  const mayMakeForemen = me?.roles.includes('foreman') ?? false;

  async function send(path: string, method: 'POST' | 'PATCH', body: object) {
    if ('ok' in (await askFor({ path, method, body }))) onClose();
  }

  async function save() {
    const body = person ? changesOf(person, draft) : { id: replica.newId(), ...draft };
    if (person && Object.keys(body).length === 0) return onClose();
    const read = (person ? personChangeSchema : newPersonSchema).safeParse(body);
    if (!read.success) return setProblems(problemsOf(read.error));
    setProblems({});
    await send(person ? `/api/people/${person.id}` : '/api/people', person ? 'PATCH' : 'POST', body);
  }

  const setLeft = (hasLeft: boolean) => void send(`/api/people/${person!.id}`, 'PATCH', { hasLeft });

  return (
    <Sheet
      isOpen
      onClose={onClose}
      title={person?.name ?? 'Add a person'}
      foot={
        <Key kind="main" disabled={isPending} onClick={() => void save()}>
          {person ? 'Change' : 'Add'}
        </Key>
      }
    >
      <form
        className="grid gap-4"
        onSubmit={(event) => {
          event.preventDefault();
          void save();
        }}
      >
        {askedWords(asked) && <Notice tone="error">{askedWords(asked)}</Notice>}
        <TextField
          label="Name"
          value={draft.name}
          problem={problems.name}
          onChange={(name) => change({ name })}
          autoComplete="off"
        />
        <TextField
          label="E-mail"
          type="email"
          hint="They sign in with it."
          value={draft.email}
          problem={problems.email}
          onChange={(email) => change({ email })}
          autoComplete="off"
        />
        <TextField
          label={person ? 'New password' : 'Password'}
          hint={
            person
              ? 'Only where it is to change; they then sign in again.'
              : 'At least 8 characters. Say it to them.'
          }
          value={draft.password}
          problem={problems.password}
          onChange={(password) => change({ password })}
          autoComplete="off"
        />
        <fieldset className="grid gap-3">
          <legend className="pb-1 text-[18px] font-semibold">Roles</legend>
          {roleSchema.options
            .filter((role) => role !== 'foreman' || mayMakeForemen)
            .map((role) => (
              <CheckKey
                key={role}
                label={ROLE_WORDS[role]}
                note={ROLE_NOTES[role]}
                isChecked={draft.roles.includes(role)}
                onChange={(isOn) =>
                  change({ roles: isOn ? [...draft.roles, role] : draft.roles.filter((one) => one !== role) })
                }
              />
            ))}
          {problems.roles && <p className="font-semibold text-redlead">{problems.roles}</p>}
        </fieldset>
        <button type="submit" hidden />
      </form>
      {person && person.id !== me?.personId && (
        <Key
          kind={person.leftAt ? 'plain' : 'danger'}
          disabled={isPending}
          onClick={() => setLeft(!person.leftAt)}
        >
          {person.leftAt ? `${person.name} is back` : `${person.name} has left the shop`}
        </Key>
      )}
    </Sheet>
  );
}

function changesOf(person: PersonRow, { name, email, password, roles }: Draft): object {
  return {
    ...(name !== person.name ? { name } : {}),
    ...(email !== person.email ? { email } : {}),
    ...(password !== '' ? { password } : {}),
    ...([...roles].sort().join() !== [...person.roles].sort().join() ? { roles } : {}),
  };
}

const WORDS: Required<Problems> = {
  name: 'Write their name.',
  email: 'That is no e-mail address.',
  password: 'It needs at least 8 characters, and no more than 72 bytes.',
  roles: 'Choose at least one role.',
};

function problemsOf(error: z.ZodError): Problems {
  const fields = new Set(error.issues.map((issue) => issue.path[0] as keyof Draft));
  return Object.fromEntries([...fields].map((field) => [field, WORDS[field]]));
}
