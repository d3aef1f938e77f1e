import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import type { Day } from '#shared/sync/day.ts';
import { BungMark } from '#src/components/bung-mark.tsx';
import { Hours } from '#src/components/hours.tsx';
import { dayWords, weekdayWords } from '#src/words/day-words.ts';
import type { Week, WeekCell } from './read-week.ts';

// on a phone the sums stand under the names, where seven days leave no room for an eighth column
const NAME_CELL =
  'w-[106px] bg-plank py-2 pr-1 pl-3 text-left align-middle leading-tight md:w-[190px] md:pl-4';
const SUM_CELL = 'hidden bg-plank px-3 text-right text-[22px] font-bold md:table-cell';

/** People by days: a tap on a cell opens that day. */
export function PeopleTable({ week }: { week: Week }) {
  return (
    <WeekTable week={week} caption="By person">
      {week.people.map(({ id, name, minutes, cells }) => (
        <tr key={id}>
          <th scope="row" className={NAME_CELL}>
            <NameAndSum name={name} minutes={minutes} />
          </th>
          {cells.map((cell) => (
            <td key={cell.day} className={`p-0 text-center ${groundOf(cell.day, week.today)}`}>
              <Cell cell={cell} name={name} today={week.today} />
            </td>
          ))}
          <td className={SUM_CELL}>
            <Hours minutes={minutes} unit="" />
          </td>
        </tr>
      ))}
    </WeekTable>
  );
}

/** Boats by days. */
export function BoatsTable({ week }: { week: Week }) {
  if (week.boats.length === 0) return null;
  return (
    <WeekTable week={week} caption="By boat">
      {week.boats.map(({ id, name, minutes, byDay }) => (
        <tr key={id}>
          <th scope="row" className={NAME_CELL}>
            <Link
              to={`/order/${id}`}
              className="inline-flex min-h-11 items-center text-mahogany hover:underline"
            >
              <NameAndSum name={name} minutes={minutes} />
            </Link>
          </th>
          {byDay.map((own, index) => (
            <td
              key={week.days[index]}
              className={`h-key text-center ${groundOf(week.days[index]!, week.today)}`}
            >
              {own > 0 && <Hours minutes={own} unit="" />}
            </td>
          ))}
          <td className={SUM_CELL}>
            <Hours minutes={minutes} unit="" />
          </td>
        </tr>
      ))}
    </WeekTable>
  );
}

function WeekTable({ week, caption, children }: { week: Week; caption: string; children: ReactNode }) {
  return (
    // type twice as large makes it wider than a phone: it slides, the page does not
    <div className="overflow-x-auto">
      <table className="mb-2 w-full table-fixed border-separate border-spacing-y-seam bg-line">
        <caption className="bg-primer px-4 pt-3 pb-2 text-left text-[24px] leading-tight font-bold md:px-0">
          {caption}
        </caption>
        <thead>
          <tr>
            <th className={NAME_CELL}>
              <span className="sr-only">{caption}</span>
            </th>
            {week.days.map((day) => (
              <th key={day} scope="col" className={`p-0 font-semibold ${groundOf(day, week.today)}`}>
                <DayLink day={day} today={week.today} />
              </th>
            ))}
            <th scope="col" className={SUM_CELL}>
              <span className="text-[18px]">Week</span>
            </th>
          </tr>
        </thead>
        <tbody>{children}</tbody>
        <tfoot>
          <tr className="font-bold">
            <th scope="row" className={NAME_CELL}>
              <NameAndSum name="All" minutes={week.minutes} />
            </th>
            {week.byDay.map((minutes, index) => (
              <td
                key={week.days[index]}
                className={`h-key text-center ${groundOf(week.days[index]!, week.today)}`}
              >
                {minutes > 0 && <Hours minutes={minutes} unit="" />}
              </td>
            ))}
            <td className={SUM_CELL}>
              <Hours minutes={week.minutes} unit="" />
            </td>
          </tr>
        </tfoot>
      </table>
    </div>
  );
}

function NameAndSum({ name, minutes }: { name: string; minutes: number }) {
  return (
    <span className="block min-w-0 text-[16px] font-bold [overflow-wrap:anywhere] md:text-[18px]">
      {name}
      <span className="block font-normal text-slate md:hidden">
        <span className="sr-only">, all week: </span>
        <Hours minutes={minutes} />
      </span>
    </span>
  );
}

function DayLink({ day, today }: { day: Day; today: Day }) {
  return (
    <Link
      to={`/day/${day}`}
      aria-label={dayWords(day, today)}
      aria-current={day === today ? 'date' : undefined}
      className="flex min-h-key flex-col items-center justify-center leading-tight hover:underline focus-visible:outline-offset-[-3px]"
    >
      {weekdayWords(day)}
      <span className={day === today ? 'border-b-[3px] border-bilge font-bold' : 'font-normal'}>
        {Number(day.slice(8))}
      </span>
    </Link>
  );
}

/** A day of a person: the hours, and under them what is not as it should be. */
function Cell({ cell, name, today }: { cell: WeekCell; name: string; today: Day }) {
  const { day, minutes, mark, isShort, hasEntries } = cell;
  const isEmpty = minutes === 0 && !hasEntries;
  return (
    <Link
      to={`/day/${day}`}
      className="flex min-h-key flex-col items-center justify-center leading-none hover:underline focus-visible:outline-offset-[-3px]"
    >
      <span className="sr-only">
        {name}, {dayWords(day, today)}:{' '}
      </span>
      <span className={isShort ? 'border-b-[3px] border-dashed border-bilge px-1 pb-[2px] font-bold' : ''}>
        {isEmpty && !isShort ? <span className="sr-only">nothing</span> : <Hours minutes={minutes} unit="" />}
      </span>
      {isShort && <span className="sr-only">, hours missing</span>}
      {mark && <BungMark mark={mark} size={18} />}
    </Link>
  );
}

/** Weekends and days to come stand back. */
function groundOf(day: Day, today: Day): string {
  const isWeekend = [0, 6].includes(new Date(day).getUTCDay());
  return isWeekend || day > today ? 'bg-primer' : 'bg-plank';
}
