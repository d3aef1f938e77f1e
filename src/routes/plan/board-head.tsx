import { useState } from 'react';
import { useNavigate } from 'react-router-dom';
import { addDays, type Day } from '#shared/sync/day.ts';
import { isWorkDay, nextWorkDay } from '#shared/task/plan.ts';
import { Key, KeyLink } from '#src/components/key.tsx';
import { OtherDay } from '#src/components/other-day.tsx';
import { counted, dayWords, longDayWords } from '#src/words/day-words.ts';
import type { Board } from './read-board.ts';

/** The day that is planned, and the ways to the working days beside it and to any other. */
export function BoardHead({ board: { day, today, people, taskCount } }: { board: Board }) {
  const withNothing = people.filter(({ tasks }) => tasks.length === 0).length;
  return (
    <div className="flex flex-wrap items-center justify-between gap-x-6 gap-y-3 px-4 pt-5 pb-4 md:px-0">
      <div>
        <h1 className="text-[34px] leading-tight font-bold tracking-[-0.01em]">{longDayWords(day, today)}</h1>
        <p className="text-slate">
          {nearWords(day, today)}
          {counted(taskCount, 'task')} planned
          {withNothing > 0 && `, ${counted(withNothing, 'person', 'people')} with nothing yet`}
        </p>
      </div>
      <DayKeys day={day} today={today} />
    </div>
  );
}

function nearWords(day: Day, today: Day): string {
  if (day === today) return 'today, ';
  return day === addDays(today, 1) ? 'tomorrow, ' : '';
}

function DayKeys({ day, today }: { day: Day; today: Day }) {
  const navigate = useNavigate();
  const [isAsking, setAsking] = useState(false);
  const [before, after] = [workDayBefore(day), nextWorkDay(day)];
  const short = (one: Day) => dayWords(one, day).split(' ').slice(0, 2).join(' ');
  return (
    <div data-keys className="flex w-full flex-wrap gap-3 sm:w-auto">
      <KeyLink to={`/plan/${before}`} className="flex-1 whitespace-nowrap">
        <span className="sr-only">The working day before, </span>
        {before === today ? 'Today' : short(before)}
      </KeyLink>
      <KeyLink to={`/plan/${after}`} className="flex-1 whitespace-nowrap">
        <span className="sr-only">The working day after, </span>
        {after === today ? 'Today' : short(after)}
      </KeyLink>
      <Key className="flex-1 whitespace-nowrap" onClick={() => setAsking(true)}>
        Another day
      </Key>
      {isAsking && (
        <OtherDay
          day={day}
          onShow={(other) => void navigate(`/plan/${other}`)}
          onClose={() => setAsking(false)}
        />
      )}
    </div>
  );
}

function workDayBefore(day: Day): Day {
  let before = addDays(day, -1);
  while (!isWorkDay(before)) before = addDays(before, -1);
  return before;
}
