import type { SyncState } from '#src/replica/sync-state.ts';
import { momentWords, spanWords } from '#src/words/day-words.ts';

export interface Warning {
  kind: 'clock' | 'storage' | 'gap' | 'shut-out';
  words: string;
}

interface Here {
  timeZone: string;
  today: string;
  nowMs: number;
  device: string;
}

const OLD_MS = 24 * 60 * 60_000;

/** What is wrong with this device, each in one sentence with what to do. */
export function readWarnings(sync: SyncState, here: Here): Warning[] {
  return [
    ...shutOutWarning(sync, here),
    ...clockWarning(sync, here),
    ...storageWarning(sync, here),
    ...gapWarning(sync, here),
  ];
}

function shutOutWarning({ isShutOut }: SyncState, { device }: Here): Warning[] {
  if (!isShutOut) return [];
  const words = `The foreman has shut this ${device} out. It hears nothing new, and what you log on it counts only once the foreman lets it. Ask the foreman.`;
  return [{ kind: 'shut-out', words }];
}

function clockWarning({ clockAheadMs }: SyncState, { device }: Here): Warning[] {
  if (clockAheadMs === null) return [];
  const way = clockAheadMs > 0 ? 'ahead' : 'behind';
  const words = `The clock of this ${device} is ${spanWords(Math.abs(clockAheadMs))} ${way}. Let it set its time by itself; meanwhile the record goes by the server's clock.`;
  return [{ kind: 'clock', words }];
}

// the browser's promise matters only while something is here that is nowhere else
function storageWarning(
  { storage, heldOps, heldPhotos, oldestHeldAt }: SyncState,
  { device, nowMs }: Here,
): Warning[] {
  const isOld = oldestHeldAt !== null && nowMs - Date.parse(oldestHeldAt) > OLD_MS;
  if (storage === 'persistent' || heldOps + heldPhotos === 0 || !isOld) return [];
  const words = `What is held here is older than a day, and this browser may clear it to make room. Bring this ${device} into signal, or put Ribband on its home screen.`;
  return [{ kind: 'storage', words }];
}

function gapWarning({ replacedDevice }: SyncState, { timeZone, today }: Here): Warning[] {
  if (!replacedDevice) return [];
  const { label, lastHeardAt } = replacedDevice;
  if (!lastHeardAt)
    return [{ kind: 'gap', words: `${label} was never heard. What was said on it is not here.` }];
  const heard = momentWords(lastHeardAt, timeZone, today);
  return [
    {
      kind: 'gap',
      words: `Your old device, ${label}, was last heard ${heard}. Anything said on it after that is not here.`,
    },
  ];
}
