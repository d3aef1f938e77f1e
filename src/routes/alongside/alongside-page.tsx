import { Suspense, useDeferredValue, useState } from 'react';
import { Link } from 'react-router-dom';
import type { Day } from '#shared/sync/day.ts';
import { NameBar } from '#src/components/bars.tsx';
import { Empty } from '#src/components/empty.tsx';
import { KeyLink } from '#src/components/key.tsx';
import { Page } from '#src/components/page.tsx';
import { useRead } from '#src/replica/hooks.tsx';
import { AlongsideKeys } from '#src/routes/alongside/alongside-keys.tsx';
import { BoatLine } from '#src/routes/alongside/boat-line.tsx';
import { BoatSheet, EarlierSheet } from '#src/routes/alongside/lazy-sheets.ts';
import { readAlongside } from '#src/routes/alongside/read-alongside.ts';
import { useJustDone } from '#src/routes/alongside/use-just-done.ts';
import { useWhere } from '#src/routes/alongside/use-where.ts';
import { RecordBar } from '#src/shell/record-bar.tsx';
import { Warnings } from '#src/shell/warnings.tsx';

const DAYS_AT_FIRST = 14;
const DAYS_MADE_FIRST = 2;
const FROM_TODAY = { upTo: null as Day | null, daysMax: DAYS_AT_FIRST };

/** Where the crew log: a boat's days on the ribband line, and the keys to add to them. */
export default function AlongsidePage() {
  const [where, choose] = useWhere();
  const [open, setOpen] = useState<'boat' | 'earlier' | null>(null);
  const [shown, setShown] = useState(FROM_TODAY);
  const { upTo, daysMax } = shown;
  // a few days are on the screen before the rest of them are made
  const daysMade = useDeferredValue(daysMax, DAYS_MADE_FIRST);
  const line = useRead(
    ['alongside', where, daysMade, upTo],
    (view) => where && readAlongside(view, where, daysMade, upTo),
  );
  const { done, setDone } = useJustDone();

  function show(from: typeof FROM_TODAY) {
    setShown(from);
    setOpen(null);
    window.scrollTo(0, 0);
  }

  return (
    <Page
      bars={
        <>
          <title>{`${line?.boatName ?? 'Alongside'} · Ribband`}</title>
          <NameBar
            title={line?.boatName ?? 'No boat yet'}
            subTitle={line ? (line.stageName ?? 'no stage') : undefined}
            right={<PersonLink />}
            {...(line ? { onPress: () => setOpen('boat'), pressWords: 'other boat' } : {})}
          />
          <RecordBar />
        </>
      }
      foot={line && where && <AlongsideKeys where={where} done={done} onDone={setDone} />}
    >
      <div className="grid gap-seam">
        <Warnings />
      </div>
      {line ? (
        <BoatLine
          line={line}
          onMore={() => setShown({ upTo, daysMax: daysMax + DAYS_AT_FIRST })}
          onEarlier={() => setOpen('earlier')}
          onToday={() => show(FROM_TODAY)}
        />
      ) : (
        <NoBoat />
      )}
      <Suspense fallback={null}>
        {open === 'boat' && (
          <BoatSheet
            isOpen
            where={where}
            onClose={() => setOpen(null)}
            onChoose={(chosen) => {
              choose(chosen);
              show(FROM_TODAY);
            }}
          />
        )}
        {open === 'earlier' && line && where && (
          <EarlierSheet
            boatId={where.boatId}
            boatName={line.boatName}
            onClose={() => setOpen(null)}
            onChoose={(day) => show({ upTo: day, daysMax: DAYS_AT_FIRST })}
          />
        )}
      </Suspense>
    </Page>
  );
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
