import { useState } from 'react';
import type { PersonRow } from '#shared/identity/person.ts';
import { Key } from '#src/components/key.tsx';
import { Section } from '#src/components/page.tsx';
import { Planks } from '#src/components/ribband.tsx';
import { useRead, useSyncState } from '#src/replica/hooks.tsx';
import { PlacePage } from '#src/shell/place-page.tsx';
import { PersonSheet } from './person-sheet.tsx';
import { readPeople, type PersonLine } from './read-people.ts';

/** The people of the shop: who they are and what they may do. */
export default function PeoplePage() {
  const { here, left } = useRead(['people'], readPeople);
  const isOffline = useSyncState().phase === 'offline';
  const [open, setOpen] = useState<PersonRow | 'new' | null>(null);
  return (
    <PlacePage title="People">
      <Section
        title="People"
        level={1}
        aside={
          <Key icon="plus" kind="main" disabled={isOffline} onClick={() => setOpen('new')}>
            Add a person
          </Key>
        }
      >
        {isOffline && (
          <p className="px-4 pb-3 text-slate md:px-6">People are changed with signal. There is none now.</p>
        )}
        <PersonList lines={here} isOffline={isOffline} onOpen={setOpen} />
      </Section>
      {left.length > 0 && (
        <Section title="Have left">
          <PersonList lines={left} isOffline={isOffline} onOpen={setOpen} />
        </Section>
      )}
      {open !== null && <PersonSheet person={open === 'new' ? null : open} onClose={() => setOpen(null)} />}
    </PlacePage>
  );
}

interface PersonListProps {
  lines: PersonLine[];
  isOffline: boolean;
  onOpen: (person: PersonRow) => void;
}

function PersonList({ lines, isOffline, onOpen }: PersonListProps) {
  return (
    <Planks>
      {lines.map(({ row, words, left, isMe }) => (
        <li key={row.id} className="flex items-center justify-between gap-4 bg-plank px-4 py-3 md:px-6">
          <div className="min-w-0 break-words">
            <h2 className="text-[20px] leading-snug font-bold">
              {row.name}
              {isMe && <span className="font-normal text-slate"> (you)</span>}
            </h2>
            <p className="leading-snug">
              {words}
              {left && ` · ${left}`}
            </p>
            {row.email && <p className="text-[16px] text-slate">{row.email}</p>}
          </div>
          <Key className="shrink-0" disabled={isOffline} onClick={() => onOpen(row)}>
            Change<span className="sr-only"> {row.name}</span>
          </Key>
        </li>
      ))}
    </Planks>
  );
}
