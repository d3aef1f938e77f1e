import type { ReactNode } from 'react';

interface DayHeadProps {
  /** The day of this boat's stay, day 1 being her arrival; null where she has no arrival day yet. */
  dayOfStay: number | null;
  /** The date in words, for example 'Mon 31 Aug'. */
  date: string;
  /** What else the day has to say, for example 'today, 4 h'. */
  note?: ReactNode;
  /** 2 unless told. */
  level?: 2 | 3;
}

/** The head of a day on the ribband line: the large figure of the day, its date in words, its tick. */
export function DayHead({ dayOfStay, date, note, level = 2 }: DayHeadProps) {
  const Heading = level === 2 ? 'h2' : 'h3';
  return (
    <div className="relative pt-4 pb-[10px] after:absolute after:-bottom-seam after:left-[calc(var(--rib)-10px)] after:z-10 after:h-[3px] after:w-5 after:bg-bilge">
      <Heading className="flex items-end">
        <span className="w-[calc(var(--rib)-14px)] shrink-0 text-right">
          {dayOfStay !== null && (
            <>
              <span className="block text-[18px] leading-none font-semibold text-slate">day </span>
              <span className={`block leading-[0.95] font-bold tracking-[-0.02em] ${figureSize(dayOfStay)}`}>
                {dayOfStay}
              </span>
            </>
          )}
          <span className="sr-only">, </span>
        </span>
        <span className="pl-[42px] text-[20px] leading-[1.15] md:pl-[50px]">
          <span className="font-bold">{date}</span>
          {note !== undefined && <span className="text-[18px] text-slate"> · {note}</span>}
        </span>
      </Heading>
    </div>
  );
}

/** The left margin is narrow on a phone: three figures fit at the smaller size, four at the smallest. */
function figureSize(day: number): string {
  if (day < 100) return 'text-[42px] md:text-[52px]';
  return day < 1000 ? 'text-[31px] md:text-[42px]' : 'text-[24px] md:text-[31px]';
}
