import { Link } from 'react-router-dom';
import { SHOP_DAY_MINUTES } from '#shared/task/plan.ts';
import { Hours } from '#src/components/hours.tsx';
import { weekdayWords } from '#src/words/day-words.ts';
import type { MissingDay } from '#src/routes/day-sheet/read-missing.ts';
import type { Week } from './read-week.ts';

/** Whose hours are missing, and on which days: the list to go round with. */
export function MissingHours({ week: { missing, today } }: { week: Week }) {
  return (
    <section aria-label="Hours missing" className="pt-4">
      <h2 className="px-4 pb-3 text-[24px] leading-tight font-bold md:px-0">
        Hours missing{' '}
        <span className="font-normal text-slate">
          {missing.filter(({ missingMinutes }) => missingMinutes > 0).length}
        </span>
      </h2>
      {missing.length === 0 && (
        <p className="px-4 text-slate md:px-0">Nobody&rsquo;s. Every working day has its 8 h.</p>
      )}
      <ul className="grid gap-seam bg-line py-seam empty:hidden">
        {missing.map(({ personId, name, days, missingMinutes }) => (
          <li
            key={personId}
            className="grid grid-cols-[minmax(0,1fr)] gap-x-4 bg-plank px-4 py-2 print:flex print:flex-wrap print:items-baseline md:grid-cols-[174px_minmax(0,1fr)_auto] md:items-center"
          >
            <h3 className="text-[20px] font-bold break-words">{name}</h3>
            <ul className="flex flex-wrap gap-x-5">
              {days.map((day) => (
                <li key={day.day}>
                  <MissingLink missing={day} today={today} />
                </li>
              ))}
            </ul>
            {missingMinutes > 0 && (
              <p className="font-semibold">
                <Hours minutes={missingMinutes} /> missing
              </p>
            )}
          </li>
        ))}
      </ul>
    </section>
  );
}

function MissingLink({ missing: { day, minutes, isSure }, today }: { missing: MissingDay; today: string }) {
  return (
    <Link
      to={`/day/${day}`}
      className="inline-flex min-h-key items-center gap-1 underline underline-offset-4 md:min-h-11 print:min-h-0"
    >
      <span className="md:whitespace-nowrap">
        {day === today ? 'Today' : weekdayWords(day)}: <Hours minutes={minutes} unit="" /> of{' '}
        <Hours minutes={SHOP_DAY_MINUTES} unit="" />
        {day === today && ' so far'}
        {!isSure && ', may not be all'}
      </span>
    </Link>
  );
}
