import { Navigate, useParams } from 'react-router-dom';
import { addDays, daySchema, type Day } from '#shared/sync/day.ts';
import { Hours } from '#src/components/hours.tsx';
import { KeyLink } from '#src/components/key.tsx';
import { useRead } from '#src/replica/hooks.tsx';
import { PlacePage } from '#src/shell/place-page.tsx';
import { counted, dayWords } from '#src/words/day-words.ts';
import { HOURS_KIND_SHORT_WORDS } from '#src/words/hours-words.ts';
import { AsLastHeard } from '#src/routes/day-sheet/as-last-heard.tsx';
import { MissingHours } from './missing-hours.tsx';
import { readWeek, type Week } from './read-week.ts';
import { BoatsTable, PeopleTable } from './week-tables.tsx';

/** A week of the shop at a glance: people by days, boats by days, and whose hours are missing. */
export default function WeekPage() {
  const { date } = useParams();
  const today = useRead(['today'], (view) => view.today);
  if (date !== undefined && !daySchema.safeParse(date).success) return <Navigate to="/week" replace />;
  return <WeekSheet day={date ?? today} />;
}

function WeekSheet({ day }: { day: Day }) {
  const week = useRead(['week', day], (view) => readWeek(view, day));
  return (
    <PlacePage title="Week" width="wide">
      <div className="pb-10 md:px-6">
        <WeekHead week={week} />
        <PeopleTable week={week} />
        <BoatsTable week={week} />
        <Kinds week={week} />
        <MissingHours week={week} />
      </div>
    </PlacePage>
  );
}

function WeekHead({ week: { days, today, minutes, people, boats } }: { week: Week }) {
  const [first, last] = [days[0]!, days[6]!];
  const isNow = days.includes(today);
  const logged = people.filter(({ cells }) => cells.some(({ hasEntries }) => hasEntries)).length;
  return (
    <div className="grid gap-3 px-4 pt-5 pb-4 md:px-0">
      <div className="flex flex-wrap items-center justify-between gap-x-6 gap-y-3">
        <div>
          <h1 className="text-[34px] leading-tight font-bold tracking-[-0.01em]">
            {dayWords(first, today)} to {dayWords(last, today)}
          </h1>
          <p className="text-slate">
            {counted(logged, 'person', 'people')}, {counted(boats.length, 'boat')},{' '}
            <Hours minutes={minutes} />
            {isNow && ' so far'}
          </p>
        </div>
        <div data-keys className="flex w-full flex-wrap gap-3 *:flex-1 sm:w-auto">
          <KeyLink to={`/week/${addDays(first, -7)}`} className="whitespace-nowrap">
            Week before
          </KeyLink>
          {!isNow && (
            <KeyLink to="/week" className="whitespace-nowrap">
              This week
            </KeyLink>
          )}
          <KeyLink to={`/week/${addDays(first, 7)}`} className="whitespace-nowrap">
            Week after
          </KeyLink>
          <KeyLink to={isNow ? '/day' : `/day/${first}`} className="whitespace-nowrap">
            Day by day
          </KeyLink>
        </div>
      </div>
      <AsLastHeard />
    </div>
  );
}

function Kinds({ week: { kinds } }: { week: Week }) {
  if (kinds.length === 0) return null;
  return (
    <p className="px-4 pt-3 md:px-0">
      <span className="font-semibold">By kind:</span>{' '}
      {kinds.map(({ kind, minutes }, index) => (
        <span key={kind ?? ''}>
          {index > 0 && ' · '}
          {kind === null ? 'kind not set' : HOURS_KIND_SHORT_WORDS[kind]} <Hours minutes={minutes} />
        </span>
      ))}
    </p>
  );
}
