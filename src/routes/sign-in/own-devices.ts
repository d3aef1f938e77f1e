import type { Replica } from '#src/replica/replica.ts';
import type { View } from '#src/replica/view.ts';
import { momentWords } from '#src/words/day-words.ts';

export interface OwnDevice {
  id: string;
  label: string;
  heard: string;
}

const ASKED_KEY = 'replaces-asked';

/** The person's other devices, once on each device of theirs: none where it was asked before, or cannot be known now. */
export async function findOwnDevices(replica: Replica): Promise<OwnDevice[]> {
  if (replica.draft.read(ASKED_KEY) !== undefined) return [];
  const heard = await replica.syncNow();
  if (heard.outcome !== 'done') return [];
  await replica.draft.write(ASKED_KEY, true);
  return readOwnDevices(replica.view());
}

/** A person's devices but this one, that nobody shut out and no other came in place of; the last heard first. */
export function readOwnDevices(view: View): OwnDevice[] {
  const { personId, deviceId } = view.me;
  const devices = view.all('device');
  if (devices.find(({ id }) => id === deviceId)?.replaces) return [];
  const replaced = new Set(devices.map(({ replaces }) => replaces));
  return devices
    .filter(
      ({ id, personIds, revokedAt }) =>
        id !== deviceId && personIds.includes(personId) && !revokedAt && !replaced.has(id),
    )
    .sort((a, b) => ((a.lastHeardAt ?? '') < (b.lastHeardAt ?? '') ? 1 : -1))
    .map(({ id, label, lastHeardAt }) => ({
      id,
      label,
      heard: lastHeardAt
        ? `last heard ${momentWords(lastHeardAt, view.timeZone, view.today)}`
        : 'never heard',
    }));
}
