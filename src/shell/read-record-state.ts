import type { SyncState } from '#src/replica/sync-state.ts';
import type { BarTone } from '#src/components/bars.tsx';
import { counted, momentWords } from '#src/words/day-words.ts';

export interface RecordState {
  tone: BarTone;
  /** 'All sent 14:05', '3 held on this phone' */
  left: string;
  /** 'last heard 07:40' */
  right: string | null;
}

interface Here {
  timeZone: string;
  today: string;
  /** 'phone', 'tablet', 'computer' */
  device: string;
}

/** The state of the record in a few words, for the bar that is always in sight. */
export function readRecordState(sync: SyncState, { timeZone, today, device }: Here): RecordState {
  const heard = sync.lastHeardAt && momentWords(sync.lastHeardAt, timeZone, today);
  const lastHeard = heard ? `last heard ${heard}` : 'not heard yet';
  const held = heldWords(sync, device);
  if (sync.phase === 'sign-in-needed')
    return { tone: 'warning', left: 'Sign in to send', right: held ?? lastHeard };
  if (held)
    return {
      tone: 'held',
      left: held,
      right: sync.phase === 'syncing' || sync.isSendingPhotos ? 'sending …' : lastHeard,
    };
  if (sync.phase === 'offline') return { tone: 'quiet', left: 'No signal, nothing held', right: lastHeard };
  if (sync.phase === 'failed') return { tone: 'quiet', left: 'Server not reached', right: lastHeard };
  if (!heard) return { tone: 'quiet', left: 'Getting the record …', right: null };
  return { tone: 'quiet', left: `All sent ${heard}`, right: null };
}

// '3 held on this phone', '2 photos held on this phone', '3 and 2 photos held on this phone'
function heldWords({ heldOps, heldPhotos }: SyncState, device: string): string | null {
  const held = [heldOps > 0 && String(heldOps), heldPhotos > 0 && counted(heldPhotos, 'photo')].filter(
    Boolean,
  );
  return held.length > 0 ? `${held.join(' and ')} held on this ${device}` : null;
}
