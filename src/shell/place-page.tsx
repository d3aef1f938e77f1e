import type { ReactNode } from 'react';
import { Link } from 'react-router-dom';
import { Empty, Loading } from '#src/components/empty.tsx';
import { Page } from '#src/components/page.tsx';
import { TopBar } from '#src/components/top-bar.tsx';
import { useMe, useRead, useSyncState } from '#src/replica/hooks.tsx';
import { deviceWord } from '#src/shell/device-words.ts';
import { placesFor } from '#src/shell/places.ts';
import { readRecordState } from '#src/shell/read-record-state.ts';
import { RecordBar } from '#src/shell/record-bar.tsx';
import { Warnings } from '#src/shell/warnings.tsx';

interface PlacePageProps {
  /** For the window's title. */
  title: string;
  width?: 'wide' | 'line';
  /** What stands at the foot: a DeedBar. */
  foot?: ReactNode;
  children: ReactNode;
}

/** A place's whole screen: the places and the state of the record above it. On a desk both share one bar. */
export function PlacePage({ title, width = 'line', foot, children }: PlacePageProps) {
  const me = useMe();
  const isHeard = useRead(['heard'], (view) => view.all('shop').length > 0);
  const bars = (
    <>
      <title>{`${title} · Ribband`}</title>
      <TopBar places={placesFor(me?.roles ?? [])} right={<WhoAndRecord name={me?.name ?? ''} />} />
      <RecordUnlessQuiet />
    </>
  );
  return (
    <Page width={width} bars={bars} foot={foot}>
      <Warnings />
      {isHeard ? children : <NotHeard />}
    </Page>
  );
}

/** Before this device has heard the record for the first time. */
function NotHeard() {
  const { phase } = useSyncState();
  if (phase !== 'offline' && phase !== 'failed') return <Loading words="Getting the record …" />;
  const why = phase === 'offline' ? 'there is no signal here' : 'the server is not reached';
  return (
    <Empty>This device has not heard the record yet, and {why}. It comes by itself as soon as it can.</Empty>
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
    <p className="flex flex-wrap items-center justify-end">
      <Link
        to="/me"
        className="inline-flex min-h-key min-w-key items-center justify-end font-semibold underline-offset-4 hover:underline"
      >
        {name}
      </Link>
      {tone === 'quiet' && (
        <>
          <span aria-hidden="true" className="w-[14px] text-center">
            ·
          </span>
          <Link to="/held" className="inline-flex min-h-key items-center underline-offset-4 hover:underline">
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
