import { useEffect, useState } from 'react';
import { Navigate, useNavigate, useParams, useSearchParams } from 'react-router-dom';
import { daySchema, type Day } from '#shared/sync/day.ts';
import { useMe, useRead } from '#src/replica/hooks.tsx';
import { DeedBar } from '#src/shell/deed-bar.tsx';
import { PlacePage } from '#src/shell/place-page.tsx';
import { useDeeds } from '#src/shell/use-deeds.ts';
import { BoatsList } from './boats-list.tsx';
import { KindsBar } from './kinds-bar.tsx';
import { LooseEnds } from './loose-ends.tsx';
import { PeopleList } from './people-list.tsx';
import { readDaySheet, readNeighbours } from './read-day-sheet.ts';
import { readLooseEnds } from './read-loose-ends.ts';
import { readSetAsides } from './read-set-aside.ts';
import { SetAsides } from './set-asides.tsx';
import { SheetHead } from './sheet-head.tsx';
import { SplitSheet } from './split/split-sheet.tsx';

/** One day of the shop, by person and by boat, with what a person must settle beside it. */
export default function DaySheetPage() {
  const { date } = useParams();
  const today = useRead(['today'], (view) => view.today);
  if (date !== undefined && !daySchema.safeParse(date).success) return <Navigate to="/day" replace />;
  return <DaySheet day={date ?? today} />;
}

function DaySheet({ day }: { day: Day }) {
  const sheet = useRead(['day-sheet', day], (view) => readDaySheet(view, day));
  const ends = useRead(['loose-ends', day], (view) => readLooseEnds(view, day));
  const setAsides = useRead(['set-asides'], readSetAsides);
  const [search] = useSearchParams();
  const isByBoat = search.get('by') === 'boat';
  useArrowKeys(day);
  const deeds = useDeeds();
  const [splitId, setSplitId] = useState<string | null>(null);
  const isForeman = useMe()?.roles.includes('foreman') ?? false;
  return (
    <PlacePage title="Day sheet" width="wide" foot={<DeedBar deeds={deeds} />}>
      <div className="xl:grid xl:min-h-[calc(100dvh-64px)] xl:grid-cols-[minmax(0,1fr)_372px]">
        <div className="pb-6 md:px-6">
          <SheetHead
            sheet={sheet}
            isByBoat={isByBoat}
            endCount={ends.length}
            setAsideCount={setAsides.length}
          />
          <div className={isByBoat ? 'hidden print:block' : ''}>
            <PeopleList sheet={sheet} onSplit={isForeman ? setSplitId : null} />
            <KindsBar sheet={sheet} />
          </div>
          <div className={isByBoat ? '' : 'hidden print:block'}>
            <BoatsList boats={sheet.boats} />
          </div>
        </div>
        <div className="border-bilge pb-10 md:px-6 xl:border-l-[3px] xl:px-5">
          <LooseEnds ends={ends} />
          <SetAsides lines={setAsides} />
        </div>
      </div>
      {splitId && <SplitSheet entryId={splitId} deeds={deeds} onClose={() => setSplitId(null)} />}
    </PlacePage>
  );
}

/** The left and right arrows go a day back and on, except while something is being typed or chosen. */
function useArrowKeys(day: Day): void {
  const navigate = useNavigate();
  useEffect(() => {
    const { previous, next } = readNeighbours(day);
    function turn(event: KeyboardEvent) {
      if (event.altKey || event.ctrlKey || event.metaKey || event.shiftKey) return;
      if ((event.target as HTMLElement).closest('input, select, textarea, dialog')) return;
      const to = { ArrowLeft: previous, ArrowRight: next }[event.key];
      if (to) void navigate({ pathname: `/day/${to}`, search: window.location.search });
    }
    window.addEventListener('keydown', turn);
    return () => window.removeEventListener('keydown', turn);
  }, [day, navigate]);
}
