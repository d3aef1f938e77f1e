import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { Empty } from '#src/components/empty.tsx';
import { KeyLink } from '#src/components/key.tsx';
import { Section } from '#src/components/page.tsx';
import { Planks } from '#src/components/ribband.tsx';
import { useMe, useRead } from '#src/replica/hooks.tsx';
import { PlacePage } from '#src/shell/place-page.tsx';
import { counted } from '#src/words/day-words.ts';
import { openingWords } from '#src/words/name-words.ts';
import { HoursAgainst } from './hours-against.tsx';
import { readWork, type BoatAtWork } from './read-work.ts';

/** The order of work, boat by boat: what is under way, what may start now, who is on what. */
export default function WorkPage() {
  const boats = useRead(['work'], readWork);
  const isForeman = useMe()?.roles.includes('foreman') ?? false;
  return (
    <PlacePage title="Order of work">
      <Section title="Order of work" level={1} aside={<KeyLink to="/plan">Tomorrow&rsquo;s plan</KeyLink>}>
        {boats.length === 0 ? (
          <Empty action={isForeman && <KeyLink to="/boats">Add a boat</KeyLink>}>
            No boat is here yet. Each has her stages and tasks here once the foreman has added her.
          </Empty>
        ) : (
          <Planks>
            {boats.map((boat) => (
              <Boat key={boat.id} boat={boat} />
            ))}
          </Planks>
        )}
      </Section>
    </PlacePage>
  );
}

function Boat({ boat }: { boat: BoatAtWork }) {
  const taskCount = boat.openTasks + boat.doneTasks;
  return (
    <li className="relative grid gap-1 bg-plank px-4 py-3 has-[a:hover]:bg-primer md:px-6">
      <div className="flex flex-wrap items-baseline justify-between gap-x-4">
        <h2 className="text-[22px] leading-snug font-bold break-words">
          <Link to={`/order/${boat.id}`} className="text-mahogany after:absolute after:inset-0">
            {boat.name}
          </Link>
        </h2>
        <p className="font-semibold">
          <HoursAgainst minutes={boat.minutes} estimateMinutes={boat.estimateMinutes} />
        </p>
      </div>
      <p className="text-slate">
        {taskCount === 0 ? 'no tasks yet' : `${boat.doneTasks} of ${counted(taskCount, 'task')} done`}
      </p>
      {boat.underWay.length > 0 && <Fact label="Under way">{boat.underWay.join('; ')}</Fact>}
      {boat.free.length > 0 && <Fact label="May start now">{boat.free.join('; ')}</Fact>}
      {boat.started.map(({ row, words }) => (
        <Fact key={row.id} label="Started">
          {openingWords(row.title, 60)}{' '}
          <span className="text-slate">· {words!.replace('started by ', '')}</span>
        </Fact>
      ))}
    </li>
  );
}

function Fact({ label, children }: { label: string; children: ReactNode }) {
  return (
    <p className="leading-snug break-words">
      <span className="font-semibold">{label}:</span> {children}
    </p>
  );
}
