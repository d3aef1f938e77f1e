import { useState } from 'react';
import { boatOwnersAnswerSchema } from '#shared/identity/person.ts';
import { CheckKey } from '#src/components/check-key.tsx';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { useRead } from '#src/replica/hooks.tsx';
import { askedWords, useAsk } from '#src/replica/use-ask.ts';
import type { BoatPage } from './read-boat.ts';

/** Whose boat she is: people of the shop who are owners. Needs signal. */
export function OwnersSheet({ boat, onClose }: { boat: BoatPage; onClose: () => void }) {
  const people = useRead(['owners'], (view) =>
    view
      .all('person')
      .filter((person) => person.roles.includes('owner') && !person.leftAt)
      .sort((a, b) => a.name.localeCompare(b.name)),
  );
  const [chosen, setChosen] = useState(boat.owners.map(({ id }) => id));
  const { mutateAsync: askFor, data: asked, isPending } = useAsk(boatOwnersAnswerSchema);
  const save = async () => {
    const request = {
      path: `/api/boats/${boat.row.id}/owners`,
      method: 'PUT' as const,
      body: { personIds: chosen },
    };
    if ('ok' in (await askFor(request))) onClose();
  };
  return (
    <Sheet
      isOpen
      onClose={onClose}
      title={`Who owns ${boat.row.name}?`}
      foot={
        <Key kind="main" disabled={isPending} onClick={() => void save()}>
          Set her owners
        </Key>
      }
    >
      {askedWords(asked) && <Notice tone="error">{askedWords(asked)}</Notice>}
      {people.length === 0 && (
        <p>No person of the shop is an owner yet. Give somebody that role under People.</p>
      )}
      {people.map(({ id, name }) => (
        <CheckKey
          key={id}
          label={name}
          isChecked={chosen.includes(id)}
          onChange={(isOn) => setChosen(isOn ? [...chosen, id] : chosen.filter((one) => one !== id))}
        />
      ))}
    </Sheet>
  );
}
