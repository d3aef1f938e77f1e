import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { Page } from '#src/components/page.tsx';
import { TopBar } from '#src/components/top-bar.tsx';
import { useMe, useRead, useSyncState } from '#src/replica/hooks.tsx';
import { deviceWord } from '#src/shell/device-words.ts';
import { placesFor } from '#src/shell/places.ts';
import { readRecordState } from '#src/shell/read-record-state.ts';
import { RecordBar } from '#src/shell/record-bar.tsx';
import { Warnings } from '#src/shell/warnings.tsx';

interface PlacePageProps {
  width?: 'wide' | 'line';
  children: ReactNode;
}

/** A place's whole screen: the places and the state of the record above it. On a desk both share one bar. */
export function PlacePage({ width = 'line', children }: PlacePageProps) {
  const me = useMe();
  const bars = (
    <>
      <TopBar places={placesFor(me?.roles ?? [])} right={<WhoAndRecord name={me?.name ?? ''} />} />
      <RecordUnlessQuiet />
    </>
  );
  return (
    <Page width={width} bars={bars}>
      <Warnings />
      {children}
    </Page>
  );
}

function useRecordState() {
  const sync = useSyncState();
  const { timeZone, today } = useRead(['clock'], (view) => ({ timeZone: view.timeZone, today: view.today }));
  return readRecordState(sync, { timeZone, today, device: deviceWord() });
}

function WhoAndRecord({ name }: { name: string }) {
  const { tone, left } = useRecordState();
  return (
    <p>
      <Link
        to="/me"
        className="inline-flex min-h-key items-center px-1 font-semibold underline-offset-4 hover:underline"
      >
        {name}
      </Link>
      {tone === 'quiet' && (
        <>
          <span aria-hidden="true"> · </span>
          <Link
            to="/held"
            className="inline-flex min-h-key items-center px-1 underline-offset-4 hover:underline"
          >
            {left}
          </Link>
        </>
      )}
    </p>
  );
}

/** The record's own bar, where it has something to say beyond that all is sent. */
function RecordUnlessQuiet() {
  const { tone } = useRecordState();
  return tone === 'quiet' ? null : <RecordBar />;
}
