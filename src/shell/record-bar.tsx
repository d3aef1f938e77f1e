import { StateBar } from '#src/components/bars.tsx';
import { useRead, useSyncState } from '#src/replica/hooks.tsx';
import { deviceWord } from '#src/shell/device-words.ts';
import { readRecordState } from '#src/shell/read-record-state.ts';

/** The state of the record in words, one tap from the list of what is held. */
export function RecordBar() {
  const sync = useSyncState();
  const { timeZone, today } = useRead(['clock'], (view) => ({ timeZone: view.timeZone, today: view.today }));
  const { tone, left, right } = readRecordState(sync, { timeZone, today, device: deviceWord() });
  return <StateBar tone={tone} left={left} right={right ?? undefined} to="/held" />;
}
