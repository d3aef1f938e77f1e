import { useState } from 'react';
import { Link, useNavigate } from 'react-router-dom';
import { BungMark } from '#src/components/bung-mark.tsx';
import { Empty } from '#src/components/empty.tsx';
import { Hours } from '#src/components/hours.tsx';
import { Key } from '#src/components/key.tsx';
import { Section } from '#src/components/page.tsx';
import { Planks } from '#src/components/ribband.tsx';
import { useMe, useRead } from '#src/replica/hooks.tsx';
import { PlacePage } from '#src/shell/place-page.tsx';
import { BoatSheet } from './boat-sheet.tsx';
import { readBoats, type BoatLine } from './read-boats.ts';

/** The boats of the shop and how far each is. */
export default function BoatsPage() {
  const { here, struck } = useRead(['boats-list'], readBoats);
  const isForeman = useMe()?.roles.includes('foreman') ?? false;
  const navigate = useNavigate();
  const [isAdding, setAdding] = useState(false);
  return (
    <PlacePage title="Boats">
      <Section
        title="Boats"
        level={1}
        aside={
          isForeman && (
            <Key kind="main" icon="plus" onClick={() => setAdding(true)}>
              Add a boat
            </Key>
          )
        }
      >
        {here.length === 0 ? (
          <Empty>No boat is here yet. The foreman adds the first one.</Empty>
        ) : (
          <Planks>
            {here.map((boat) => (
              <Boat key={boat.id} boat={boat} />
            ))}
          </Planks>
        )}
      </Section>
      {struck.length > 0 && (
        <Section title="Struck">
          <Planks>
            {struck.map(({ id, name, why }) => (
              <li key={id} className="bg-plank px-4 py-3 md:px-6">
                <Link to={`/boats/${id}`} className="font-bold underline">
                  {name}
                </Link>
                <span className="text-slate"> · {why}</span>
              </li>
            ))}
          </Planks>
        </Section>
      )}
      {isAdding && (
        <BoatSheet
          boat={null}
          onClose={() => setAdding(false)}
          onDone={(id) => void navigate(`/boats/${id}`)}
        />
      )}
    </PlacePage>
  );
}

function Boat({ boat }: { boat: BoatLine }) {
  return (
    <li className="relative grid grid-cols-[minmax(0,1fr)_auto] gap-x-4 bg-plank px-4 py-3 has-[a:hover]:bg-primer md:px-6">
      <h2 className="text-[22px] leading-snug font-bold break-words">
        <Link to={`/boats/${boat.id}`} className="text-mahogany after:absolute after:inset-0">
          {boat.name}
        </Link>
        {boat.isHeld && (
          <span className="pl-2 align-[-4px]">
            <BungMark mark="held" />
          </span>
        )}
      </h2>
      <p className="text-[26px] leading-tight font-bold">
        <Hours minutes={boat.minutes} />
      </p>
      <p className="col-span-2 leading-snug text-slate">
        {[boat.dayOfStay !== null && `day ${boat.dayOfStay}`, boat.type, boat.arrived]
          .filter(Boolean)
          .join(' · ')}
      </p>
      <p className="col-span-2 leading-snug">
        {boat.stages} · {boat.tasks}
      </p>
      {boat.under && <p className="col-span-2 leading-snug">Now: {boat.under}</p>}
    </li>
  );
}
