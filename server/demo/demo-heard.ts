import type { Held } from '#shared/identity/device.ts';
import type { DemoDays } from './demo-days.ts';
import { DEMO_DEVICES, type DeviceKey, type PersonKey } from './demo-people.ts';
import type { DemoBatch } from './demo-script.ts';

export interface DemoDeviceLine {
  id: string;
  label: string;
  replaces: string | null;
  personIds: string[];
  lastHeardMs: number;
  held: Held;
}

interface HeardFrom {
  days: DemoDays;
  /** nothing was heard after it */
  latestMs: number;
  startMs: number;
  batches: DemoBatch[];
  deviceIds: ReadonlyMap<DeviceKey, string>;
  personIds: ReadonlyMap<PersonKey, string>;
}

const NOTHING_HELD: Held = { ops: 0, photos: 0, oldest: null };

/** The demo's devices, as the server last heard them. */
export function deviceLines(from: HeardFrom): DemoDeviceLine[] {
  return (Object.keys(DEMO_DEVICES) as DeviceKey[]).map((key) => {
    const { label, people, replaces } = DEMO_DEVICES[key];
    return {
      id: from.deviceIds.get(key)!,
      label,
      replaces: replaces ? from.deviceIds.get(replaces)! : null,
      personIds: people.map((person) => from.personIds.get(person)!),
      ...lastHeard(key, from),
    };
  });
}

/** Both of Hob's phones were cut off in the middle of sending. */
function lastHeard(key: DeviceKey, from: HeardFrom): Pick<DemoDeviceLine, 'lastHeardMs' | 'held'> {
  const at = (day: number, time: string) => from.days.at(from.days.workday(day), time);
  const held = (ops: number, day: number, time: string) => ({
    ops,
    photos: 0,
    oldest: new Date(at(day, time)).toISOString(),
  });
  if (key === 'hobOldPhone') return { lastHeardMs: at(-9, '07:50'), held: held(2, -9, '07:41') };
  const sentMs = from.batches
    .filter((batch) => batch.deviceId === from.deviceIds.get(key))
    .map((batch) => batch.receivedMs);
  const lastMs = Math.max(from.startMs, ...sentMs);
  const thisMorning = (time: string) => (at(0, time) < from.latestMs ? at(0, time) : lastMs);
  if (key === 'hobPhone') return { lastHeardMs: thisMorning('07:35'), held: held(4, -1, '13:20') };
  return { lastHeardMs: key === 'laptop' ? thisMorning('07:10') : lastMs, held: NOTHING_HELD };
}
