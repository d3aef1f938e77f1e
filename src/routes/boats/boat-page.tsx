import { useState } from 'react';
import { useParams } from 'react-router-dom';
import { Empty } from '#src/components/empty.tsx';
import { Hours } from '#src/components/hours.tsx';
import { Key, KeyLink } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Section } from '#src/components/page.tsx';
import { Planks } from '#src/components/ribband.tsx';
import { Why } from '#src/components/why.tsx';
import { useHold, useRead, useSyncState } from '#src/replica/hooks.tsx';
import { PlacePage } from '#src/shell/place-page.tsx';
import { BoatSheet } from './boat-sheet.tsx';
import { OwnersSheet } from './owners-sheet.tsx';
import { readBoat, type BoatPage as Boat } from './read-boat.ts';

/** One boat: what is known of her, whose she is, her stages and their tasks. */
export default function BoatPage() {
  const { id = '' } = useParams();
  const boat = useRead(['boat', id], (view) => readBoat(view, id));
  if (!boat) {
    return (
      <PlacePage title="No such boat">
        <Empty action={<KeyLink to="/boats">All boats</KeyLink>}>This boat is not known here.</Empty>
      </PlacePage>
    );
  }
  return (
    <PlacePage title={boat.row.name}>
      <Head boat={boat} />
      <Particulars boat={boat} />
      <Owners boat={boat} />
      <Stages boat={boat} />
      <StrikeHer boat={boat} />
    </PlacePage>
  );
}

function Head({ boat: { row, minutes, progress } }: { boat: Boat }) {
  return (
    <div className="px-4 pt-6 md:px-6">
      <h1 className="text-[34px] leading-tight font-bold tracking-[-0.01em] break-words text-mahogany">
        {row.name}
      </h1>
      <p>
        <Hours minutes={minutes} /> · {progress.stages} · {progress.tasks}
      </p>
      {row.struck && <Notice tone="warn">Struck: {row.struck.why}</Notice>}
    </div>
  );
}

function Particulars({ boat }: { boat: Boat }) {
  const [isOpen, setOpen] = useState(false);
  return (
    <Section title="Particulars" aside={boat.mayChange && <Key onClick={() => setOpen(true)}>Change</Key>}>
      {boat.particulars.length === 0 && <Empty>Nothing is written down about her yet.</Empty>}
      <dl className="grid grid-cols-[auto_minmax(0,1fr)] gap-x-5 gap-y-1 bg-plank px-4 py-3 empty:hidden md:px-6">
        {boat.particulars.map(({ label, words }) => (
          <div key={label} className="contents">
            <dt className="text-slate">{label}</dt>
            <dd className="break-words">{words}</dd>
          </div>
        ))}
      </dl>
      {isOpen && <BoatSheet boat={boat.row} onClose={() => setOpen(false)} />}
    </Section>
  );
}

function Owners({ boat }: { boat: Boat }) {
  const [isOpen, setOpen] = useState(false);
  const isOffline = useSyncState().phase === 'offline';
  return (
    <Section
      title={boat.owners.length > 1 ? 'Owners' : 'Owner'}
      aside={
        boat.mayChange && (
          <Key disabled={isOffline} onClick={() => setOpen(true)}>
            {isOffline ? 'Change (needs signal)' : 'Change'}
          </Key>
        )
      }
    >
      <p className="bg-plank px-4 py-3 md:px-6">
        {boat.owners.length > 0
          ? boat.owners.map(({ name }) => name).join(', ')
          : 'Nobody yet: no owner sees anything of her.'}
      </p>
      {isOpen && <OwnersSheet boat={boat} onClose={() => setOpen(false)} />}
    </Section>
  );
}

function Stages({ boat }: { boat: Boat }) {
  const orderKey = <KeyLink to={`/order/${boat.row.id}`}>Her order of work</KeyLink>;
  return (
    <Section title="Stages and tasks" aside={orderKey}>
      {boat.stages.length === 0 ? (
        <Empty>She has no stages yet. Work can be logged on her without one.</Empty>
      ) : (
        <Planks>
          {boat.stages.map(({ id, name, finished, tasks, minutes }) => (
            <li key={id} className="flex items-baseline gap-4 bg-plank px-4 py-2 md:px-6">
              <p className="min-w-0 flex-1 leading-snug break-words">
                <span className={finished ? '' : 'font-semibold'}>{name}</span>
                <span className="block text-slate">{[finished, tasks].filter(Boolean).join(' · ')}</span>
              </p>
              {minutes > 0 && <Hours minutes={minutes} />}
            </li>
          ))}
        </Planks>
      )}
    </Section>
  );
}

function StrikeHer({ boat: { row, mayChange } }: { boat: Boat }) {
  const { mutate: hold } = useHold();
  const [isAsked, setAsked] = useState(false);
  if (!mayChange) return null;
  const kind = row.struck ? 'boat.restore' : 'boat.strike';
  return (
    <div data-keys className="px-4 py-6 md:px-6">
      <Key kind={row.struck ? 'plain' : 'danger'} onClick={() => setAsked(true)}>
        {row.struck ? 'Restore her' : 'Strike this boat'}
      </Key>
      <Why
        isOpen={isAsked}
        onClose={() => setAsked(false)}
        title={row.struck ? `Restore ${row.name}` : `Strike ${row.name}`}
        question={row.struck ? 'Why is she restored?' : 'Why is she struck? What was logged on her stays.'}
        confirm={row.struck ? 'Restore her' : 'Strike her'}
        isDanger={!row.struck}
        onConfirm={(why) => {
          hold({ kind, data: { boatId: row.id, why, ...(row.struck ? {} : { saw: [] }) } });
          setAsked(false);
        }}
      />
    </div>
  );
}
