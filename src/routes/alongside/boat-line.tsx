import { DayHead } from '#src/components/day-head.tsx';
import { DayTicks } from '#src/components/day-ticks.tsx';
import { Empty } from '#src/components/empty.tsx';
import { Hours } from '#src/components/hours.tsx';
import { Key, KeyLink } from '#src/components/key.tsx';
import { Planks, Ribband } from '#src/components/ribband.tsx';
import { ItemPlank } from '#src/routes/alongside/item-planks.tsx';
import { OwnDayLine } from '#src/routes/alongside/own-day-line.tsx';
import type { AlongsideLine, DayOnLine } from '#src/routes/alongside/read-alongside.ts';

interface BoatLineProps {
  line: AlongsideLine;
  onMore: () => void;
  onEarlier: () => void;
  onToday: () => void;
}

/** A boat's days on the ribband line, the way to earlier ones, and to what is looked for. */
export function BoatLine({ line, onMore, onEarlier, onToday }: BoatLineProps) {
  const ways = <Ways onEarlier={onEarlier} onToday={line.isEarlier ? onToday : null} />;
  return (
    <>
      {line.isEarlier && ways}
      {line.days.length === 0 && <Empty>Nothing was logged on her up to that day.</Empty>}
      <Ribband label={`${line.boatName}, day by day`}>
        {line.days.map((day) => (
          <LineDay key={day.day} day={day} line={line}>
            {day.isToday && ways}
          </LineDay>
        ))}
        {line.olderDays > 0 && (
          <div className="relative z-20 bg-primer p-4">
            <Key className="w-full" onClick={onMore}>
              Show earlier days ({line.olderDays} more)
            </Key>
          </div>
        )}
      </Ribband>
    </>
  );
}

function Ways({ onEarlier, onToday }: { onEarlier: () => void; onToday: (() => void) | null }) {
  return (
    <div className="relative z-20 grid auto-cols-fr grid-flow-col gap-3 bg-primer p-3">
      {onToday && <Key onClick={onToday}>Today</Key>}
      <Key {...(onToday ? {} : { icon: 'days' as const })} className="!px-2" onClick={onEarlier}>
        {onToday ? 'Other day' : 'Earlier days'}
      </Key>
      <KeyLink to="/search" icon="search" className="!px-2">
        Search
      </KeyLink>
    </div>
  );
}

interface LineDayProps {
  day: DayOnLine;
  line: AlongsideLine;
  children: React.ReactNode;
}

function LineDay({ day, line, children }: LineDayProps) {
  return (
    <>
      <DayHead dayOfStay={day.dayOfStay} date={day.date} note={dayNote(day)} />
      {day.isToday && <OwnDayLine own={line.own} />}
      {day.items.length > 0 && (
        <Planks>
          {day.items.map((item) => (
            <ItemPlank key={item.id} item={item} />
          ))}
        </Planks>
      )}
      {children}
      {day.gap && <DayTicks days={day.gap.days}>{day.gap.words}</DayTicks>}
    </>
  );
}

function dayNote({ isToday, minutes, items }: DayOnLine) {
  if (isToday && items.length === 0) return 'today, nothing logged yet';
  if (minutes === 0) return isToday ? 'today' : undefined;
  return (
    <>
      {isToday && 'today, '}
      <Hours minutes={minutes} />
    </>
  );
}
