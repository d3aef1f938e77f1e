import { useEffect, useState } from 'react';
import { Link, useLocation, useNavigate } from 'react-router-dom';
import { NameBar } from '#src/components/bars.tsx';
import { DayHead } from '#src/components/day-head.tsx';
import { DayTicks } from '#src/components/day-ticks.tsx';
import { Empty } from '#src/components/empty.tsx';
import { Hours } from '#src/components/hours.tsx';
import { Key, KeyLink } from '#src/components/key.tsx';
import { Page } from '#src/components/page.tsx';
import { Planks, Ribband } from '#src/components/ribband.tsx';
import { useRead } from '#src/replica/hooks.tsx';
import { AlongsideKeys } from '#src/routes/alongside/alongside-keys.tsx';
import { BoatSheet } from '#src/routes/alongside/boat-sheet.tsx';
import { EntryPlank } from '#src/routes/alongside/entry-plank.tsx';
import { readAlongside, type AlongsideLine, type DayOnLine } from '#src/routes/alongside/read-alongside.ts';
import { useWhere } from '#src/routes/alongside/use-where.ts';
import { RecordBar } from '#src/shell/record-bar.tsx';
import { Warnings } from '#src/shell/warnings.tsx';

const DAYS_AT_FIRST = 14;

/** Where the crew log: a boat's days on the ribband line, and the keys to add to them. */
export default function AlongsidePage() {
  const [where, choose] = useWhere();
  const [isChoosing, setChoosing] = useState(false);
  const [daysMax, setDaysMax] = useState(DAYS_AT_FIRST);
  const line = useRead(['alongside', where, daysMax], (view) => where && readAlongside(view, where, daysMax));
  const justDone = useJustDone();

  return (
    <Page
      bars={
        <>
          <title>{`${line?.boatName ?? 'Alongside'} · Ribband`}</title>
          <NameBar
            title={line?.boatName ?? 'No boat yet'}
            subTitle={line ? (line.stageName ?? 'no stage') : undefined}
            right={<PersonLink />}
            {...(line ? { onPress: () => setChoosing(true), pressWords: 'other boat' } : {})}
          />
          <RecordBar />
        </>
      }
      foot={line && where && <AlongsideKeys where={where} justDone={justDone} />}
    >
      <div className="grid gap-seam">
        <Warnings />
      </div>
      {line ? <Line line={line} onMore={() => setDaysMax(daysMax + DAYS_AT_FIRST)} /> : <NoBoat />}
      <BoatSheet
        isOpen={isChoosing}
        where={where}
        onClose={() => setChoosing(false)}
        onChoose={(chosen) => {
          choose(chosen);
          setDaysMax(DAYS_AT_FIRST);
          setChoosing(false);
        }}
      />
    </Page>
  );
}

/** What the screen before this one left, once: it is not there again after a reload. */
function useJustDone(): unknown {
  const location = useLocation();
  const navigate = useNavigate();
  const [justDone] = useState<unknown>(location.state);
  useEffect(() => {
    if (location.state !== null) void navigate('.', { replace: true, state: null });
  }, [location.state, navigate]);
  return justDone;
}

function PersonLink() {
  const name = useRead(['name'], (view) => view.me.name);
  return (
    <Link
      to="/me"
      className="flex min-h-key min-w-key items-center justify-end font-bold underline decoration-2 underline-offset-4"
    >
      {name.split(' ')[0]}
    </Link>
  );
}

function NoBoat() {
  const isForeman = useRead(['is foreman'], (view) => view.me.roles.includes('foreman'));
  return (
    <Empty action={isForeman && <KeyLink to="/boats">Add a boat</KeyLink>}>
      No boat is here yet. Once the foreman has added one and this device has heard of it, you can log on it.
    </Empty>
  );
}

function Line({ line, onMore }: { line: AlongsideLine; onMore: () => void }) {
  return (
    <Ribband label={`${line.boatName}, day by day`}>
      {line.days.map((day) => (
        <LineDay key={day.day} day={day} />
      ))}
      {line.olderDays > 0 && (
        <div className="relative z-20 bg-primer p-4">
          <Key className="w-full" onClick={onMore}>
            Show earlier days ({line.olderDays} more)
          </Key>
        </div>
      )}
    </Ribband>
  );
}

function LineDay({ day }: { day: DayOnLine }) {
  return (
    <>
      <DayHead dayOfStay={day.dayOfStay} date={day.date} note={dayNote(day)} />
      {day.entries.length > 0 && (
        <Planks>
          {day.entries.map((entry) => (
            <EntryPlank key={entry.id} entry={entry} />
          ))}
        </Planks>
      )}
      {day.gap && <DayTicks days={day.gap.days}>{day.gap.words}</DayTicks>}
    </>
  );
}

function dayNote({ isToday, minutes, entries }: DayOnLine) {
  if (isToday && entries.length === 0) return 'today, nothing logged yet';
  if (minutes === 0) return isToday ? 'today' : undefined;
  return (
    <>
      {isToday && 'today, '}
      <Hours minutes={minutes} />
    </>
  );
}
