import type { DeviceRow } from '#shared/identity/device.ts';
import { clockAheadMs } from './device-clock.ts';
import type { DeviceStore } from './device-store.ts';
import type { PersonStore } from './person-store.ts';
import type { HeldPicture } from './photos/picture.ts';
import type { SyncState } from './sync-state.ts';

/** How the last attempt to send and hear stands. */
export type Attempt = { phase: 'idle' | 'syncing' | 'offline' } | { phase: 'failed'; words: string };

interface Standing {
  device: DeviceStore;
  person: PersonStore | null;
  attempt: Attempt;
  /** oldest first */
  heldPictures: HeldPicture[];
  isSendingPhotos: boolean;
  storage: SyncState['storage'];
  needsSignIn: boolean;
}

export function composeSyncState(standing: Standing): SyncState {
  const { device, person, attempt, heldPictures, isSendingPhotos, storage, needsSignIn } = standing;
  const replaced = person && replacedDevice(device.deviceId, person);
  return {
    phase: needsSignIn && attempt.phase !== 'syncing' ? 'sign-in-needed' : attempt.phase,
    heldOps: device.outbox.length,
    heldPhotos: heldPictures.length,
    isSendingPhotos,
    oldestHeldAt: oldestOf(device.outbox[0]?.heldSince, heldPictures[0]?.since),
    lastHeardAt: person?.heardAt ?? null,
    clockAheadMs: clockAheadMs(device.state.offsetMs),
    storage,
    ...('words' in attempt ? { words: attempt.words } : {}),
    // a device that is shut out is told so by what becomes of its ops, and by nothing else
    ...(device.sent.at(-1)?.reason === 'device-revoked' ? { isShutOut: true } : {}),
    ...(replaced ? { replacedDevice: replaced } : {}),
  };
}

/** The earliest of ISO times. */
export function oldestOf(...times: (string | undefined)[]): string | null {
  return times.filter((time) => time !== undefined).sort()[0] ?? null;
}

function replacedDevice(deviceId: string, { rows }: PersonStore): SyncState['replacedDevice'] | null {
  const rowOf = (id: string) => rows.get(`device/${id}`)?.row as DeviceRow | undefined;
  const replaces = rowOf(deviceId)?.replaces;
  const replaced = replaces && rowOf(replaces);
  return replaced ? { label: replaced.label, lastHeardAt: replaced.lastHeardAt } : null;
}
