import { useState } from 'react';
import { Link, useNavigate, useSearchParams } from 'react-router-dom';
import { Hours } from '#src/components/hours.tsx';
import { Key, KeyLink } from '#src/components/key.tsx';
import { OtherDay } from '#src/components/other-day.tsx';
import { keyLook } from '#src/components/key-look.ts';
import { useRead } from '#src/replica/hooks.tsx';
import { counted, longDayWords } from '#src/words/day-words.ts';
import { AsLastHeard } from './as-last-heard.tsx';
import { readNeighbours, type DaySheet } from './read-day-sheet.ts';

interface SheetHeadProps {
  sheet: DaySheet;
  isByBoat: boolean;
  endCount: number;
  setAsideCount: number;
}

/** The day in words, what it came to, and the ways to other days. */
export function SheetHead({ sheet, isByBoat, endCount, setAsideCount }: SheetHeadProps) {
  const today = useRead(['today'], (view) => view.today);
  return (
    <div className="grid gap-3 px-4 pt-5 pb-4 md:px-0">
      <div className="flex flex-wrap items-center justify-between gap-x-6 gap-y-3">
        <div>
          <h1 className="text-[34px] leading-tight font-bold tracking-[-0.01em]">
            {longDayWords(sheet.day, today)}
          </h1>
          <p className="text-slate">
            {counted(sheet.loggedCount, 'person', 'people')}, {counted(sheet.boats.length, 'boat')},{' '}
            <Hours minutes={sheet.minutes} />
            {sheet.isToday && ' so far'}
          </p>
        </div>
        <DayKeys sheet={sheet} />
      </div>
      <AsLastHeard />
      <div data-keys className="flex flex-wrap items-center justify-between gap-3">
        <CutChoice isByBoat={isByBoat} />
        <KeyLink to={`/week/${sheet.day}`}>Week</KeyLink>
        <WaitingLink endCount={endCount} setAsideCount={setAsideCount} />
      </div>
    </div>
  );
}

// four of them stand in a row on a phone
const DAY_KEY = '!px-2 whitespace-nowrap sm:!px-4';

function DayKeys({ sheet }: { sheet: DaySheet }) {
  const [isAsking, setAsking] = useState(false);
  const navigate = useNavigate();
  const [search] = useSearchParams();
  const suffix = search.size > 0 ? `?${search}` : '';
  const { previous, next, previousWords, nextWords } = readNeighbours(sheet.day);
  return (
    <div data-keys className="flex w-full flex-wrap gap-3 *:flex-1 sm:w-auto sm:*:flex-none">
      <KeyLink to={`/day/${previous}${suffix}`} className={DAY_KEY}>
        <span className="sr-only">The day before, </span>
        {shortDay(previousWords)}
      </KeyLink>
      {!sheet.isToday && (
        <KeyLink to={`/day${suffix}`} className={DAY_KEY}>
          Today
        </KeyLink>
      )}
      <KeyLink to={`/day/${next}${suffix}`} className={DAY_KEY}>
        <span className="sr-only">The day after, </span>
        {shortDay(nextWords)}
      </KeyLink>
      <Key className={DAY_KEY} onClick={() => setAsking(true)}>
        <span className="sm:hidden">Other</span>
        <span className="hidden sm:inline">Another day</span>
      </Key>
      {isAsking && (
        <OtherDay
          day={sheet.day}
          onShow={(day) => void navigate(`/day/${day}`)}
          onClose={() => setAsking(false)}
        />
      )}
    </div>
  );
}

/** 'Mon 4' of 'Mon 4 May'. */
function shortDay(words: string): string {
  return words.split(' ').slice(0, 2).join(' ');
}

function CutChoice({ isByBoat }: { isByBoat: boolean }) {
  const look = (isChosen: boolean) =>
    `${keyLook('plain')} flex-1 rounded-none first:rounded-l-key last:rounded-r-key last:border-l-0 sm:flex-none ${isChosen ? '!bg-bilge !text-primer' : ''}`;
  return (
    <nav aria-label="How the day is laid out" className="flex w-full sm:w-auto">
      <Link
        to={{ search: '' }}
        replace
        className={look(!isByBoat)}
        aria-current={!isByBoat ? 'true' : undefined}
      >
        By person
      </Link>
      <Link
        to={{ search: 'by=boat' }}
        replace
        className={look(isByBoat)}
        aria-current={isByBoat ? 'true' : undefined}
      >
        By boat
      </Link>
    </nav>
  );
}

function WaitingLink({ endCount, setAsideCount }: Pick<SheetHeadProps, 'endCount' | 'setAsideCount'>) {
  if (endCount + setAsideCount === 0) return null;
  const words = [
    endCount > 0 && counted(endCount, 'loose end'),
    setAsideCount > 0 && `${setAsideCount} set aside`,
  ];
  return (
    <a href="#loose-ends" className={`${keyLook('quiet')} !px-0 xl:hidden`}>
      {words.filter(Boolean).join(', ')}
    </a>
  );
}
