import { Empty } from '#src/components/empty.tsx';
import { Icon } from '#src/components/icons.tsx';
import { Section } from '#src/components/page.tsx';
import { PlainPlank } from '#src/components/plank.tsx';
import { Planks } from '#src/components/ribband.tsx';
import { useRead } from '#src/replica/hooks.tsx';
import { readOwnBoats, type OwnBoat } from '#src/routes/own-boats/read-own-boats.ts';
import { PlacePage } from '#src/shell/place-page.tsx';

/** An owner's boats, and how far the work on each has come. */
export default function OwnBoatsPage() {
  const boats = useRead(['own boats'], readOwnBoats);
  return (
    <PlacePage title="My boats">
      <h1 className="px-4 pt-6 text-[30px] leading-tight font-bold md:px-6">
        {boats.length === 1 ? 'My boat' : 'My boats'}
      </h1>
      {boats.length === 0 && (
        <Empty>No boat of yours is here yet. The shop names you as her owner, then she shows here.</Empty>
      )}
      {boats.map((boat) => (
        <Boat key={boat.id} boat={boat} />
      ))}
    </PlacePage>
  );
}

function Boat({ boat }: { boat: OwnBoat }) {
  return (
    <Section title={boat.name}>
      <p className="px-4 pb-3 text-slate md:px-6">
        {[boat.since, `${boat.doneCount} of ${boat.stages.length} stages finished`]
          .filter(Boolean)
          .join(' · ')}
      </p>
      <Planks>
        {boat.stages.map((stage) => (
          <PlainPlank key={stage.id}>
            <div className="flex items-center gap-3">
              <span className="flex size-7 shrink-0 items-center justify-center border-2 border-bilge">
                {stage.isDone && <Icon name="tick" size={20} />}
              </span>
              <span className="flex-1 font-semibold">{stage.name}</span>
              <span className="text-slate">{doneWords(stage)}</span>
            </div>
          </PlainPlank>
        ))}
      </Planks>
    </Section>
  );
}

function doneWords({ isDone, doneOn }: OwnBoat['stages'][number]): string {
  if (!isDone) return 'open';
  return doneOn ? `finished ${doneOn}` : 'finished';
}
