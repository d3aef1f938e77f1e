import { Link } from 'react-router-dom';
import { DayHead } from '#src/components/day-head.tsx';
import { Hours } from '#src/components/hours.tsx';
import { Section } from '#src/components/page.tsx';
import { Plank } from '#src/components/plank.tsx';
import { Planks, Ribband } from '#src/components/ribband.tsx';
import { useRead } from '#src/replica/hooks.tsx';
import { dayWords } from '#src/words/day-words.ts';
import { readOwnPlan, type DayOfPlan } from './read-own-plan.ts';
import type { PlannedLine } from './read-planned.ts';

/** What a person has, day by day, from today on: to be read, planned by the foreman. */
export function OwnPlan() {
  const { today, days, leftOver } = useRead(['own-plan'], readOwnPlan);
  return (
    <>
      <Section title="What you have" level={1}>
        <Ribband label="Your plan, day by day">
          {days.map((day) => (
            <PlanDay key={day.day} day={day} today={today} />
          ))}
        </Ribband>
      </Section>
      {leftOver.length > 0 && (
        <Section title="Planned before, not done">
          <Planks>
            {leftOver.map((line) => (
              <li key={line.row.id} className="bg-plank px-4 py-3 md:px-6">
                <Task line={line} note={line.plannedFor} />
              </li>
            ))}
          </Planks>
        </Section>
      )}
    </>
  );
}

function PlanDay({ day: { day, tasks, minutes }, today }: { day: DayOfPlan; today: string }) {
  const nothing = day === today ? 'nothing planned' : 'nothing planned yet';
  const hours = minutes > 0 && <Hours minutes={minutes} />;
  return (
    <>
      <DayHead
        dayOfStay={null}
        date={dayWords(day, today)}
        note={
          <>
            {day === today && 'today, '}
            {tasks.length === 0 ? nothing : hours || `${tasks.length} to do`}
          </>
        }
      />
      {tasks.length > 0 && (
        <Planks>
          {tasks.map((line) => (
            <Plank key={line.row.id} mark={line.isHeld ? 'held' : 'sent'}>
              <Task line={line} note={null} />
            </Plank>
          ))}
        </Planks>
      )}
    </>
  );
}

function Task({ line, note }: { line: PlannedLine; note: string | null }) {
  const { row, boatName, stageName, along, state, waitsFor, share } = line;
  const notes = [state, along, waitsFor && `comes ${waitsFor}`, note].filter(Boolean);
  return (
    <Link to={`/order/${row.boatId}`} className="group block leading-snug">
      <span className="font-bold text-mahogany">{boatName}</span>
      <span className="text-slate"> · {stageName}</span>
      <span className={`block group-hover:underline ${row.done ? '' : 'font-semibold'}`}>{row.title}</span>
      <span className="block text-slate">
        {share !== null && <Hours minutes={share} />}
        {share !== null && notes.length > 0 && ' · '}
        {notes.join(' · ')}
      </span>
    </Link>
  );
}
