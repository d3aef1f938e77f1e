import type { ReactNode } from 'react';

interface DayTicksProps {
  /** The days without an item, newest first; a day that starts a week gets a longer tick. */
  days: readonly { isWeekStart: boolean }[];
  /** What the gap is, in words, for example 'Sat and Sun: no one in'. */
  children: ReactNode;
}

const SPACING_PX = 18;
const GAP_HEIGHT_MAX_PX = 360;
const SPACING_MIN_PX = 5;

/** Days of the line without an item: a tick a day, so that a gap is seen as a gap. */
export function DayTicks({ days, children }: DayTicksProps) {
  const spacingPx = tickSpacingPx(days.length);
  const isWeeksOnly = spacingPx < SPACING_MIN_PX;
  return (
    <div
      className="relative grid min-h-[52px] items-center py-2 pr-4 pl-[calc(var(--rib)+28px)] text-slate md:pl-[calc(var(--rib)+36px)]"
      style={{ height: days.length * spacingPx + SPACING_PX }}
    >
      <div aria-hidden="true" className="absolute inset-0 z-10">
        {days.map((day, index) => (
          <Tick
            key={index}
            isLong={day.isWeekStart}
            isHidden={isWeeksOnly && !day.isWeekStart}
            share={(index + 0.5) / days.length}
          />
        ))}
      </div>
      <p>{children}</p>
    </div>
  );
}

interface TickProps {
  isLong: boolean;
  isHidden: boolean;
  /** How far down the gap, 0 to 1. */
  share: number;
}

function Tick({ isLong, isHidden, share }: TickProps) {
  if (isHidden) return null;
  const width = isLong ? 'w-5 -ml-[10px] h-[3px] -mt-[1.5px]' : 'w-[11px] -ml-[5.500px] h-[2px] -mt-px';
  return <i className={`absolute left-[var(--rib)] bg-bilge ${width}`} style={{ top: `${share * 100}%` }} />;
}

/** Even spacing until a gap would fill the screen; then the ticks close up. */
function tickSpacingPx(days: number): number {
  return days === 0 ? 0 : Math.min(SPACING_PX, GAP_HEIGHT_MAX_PX / days);
}
