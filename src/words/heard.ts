import type { DeviceRow } from '#shared/identity/device.ts';
import { dayAt, type Day } from '#shared/sync/day.ts';
import { parseStamp, stampMs } from '#shared/sync/stamp.ts';
import type { View } from '#src/replica/view.ts';
import { counted, momentWords } from '#src/words/day-words.ts';

const SMALL_COUNTS = [
  'none',
  'one',
  'two',
  'three',
  'four',
  'five',
  'six',
  'seven',
  'eight',
  'nine',
  'ten',
  'eleven',
  'twelve',
];

/** 'four'; '23'. */
export function countWords(count: number): string {
  return SMALL_COUNTS[count] ?? String(count);
}

/** How much a device had not sent when it was last heard. */
export function heldCount(device: DeviceRow): number {
  return device.held ? device.held.ops + device.held.photos : 0;
}

/** 'heard 07:35'; 'not heard yet'. */
export function heardWords(view: View, device: DeviceRow): string {
  if (!device.lastHeardAt) return 'not heard yet';
  return `heard ${momentWords(device.lastHeardAt, view.timeZone, view.today)}`;
}

/** Days on which a device that was replaced may have known what nobody else does. */
export interface Gap {
  deviceId: string;
  label: string;
  successorLabel: string;
  personIds: string[];
  fromDay: Day;
  toDay: Day;
  words: string;
}

/** The gaps that replaced devices left: open until the old one is heard again with nothing held. */
export function readGaps(view: View): Gap[] {
  const devices = view.all('device');
  return devices.flatMap((successor) => {
    const replaced = devices.find((device) => device.id === successor.replaces);
    return replaced ? gapOf(view, replaced, successor) : [];
  });
}

function gapOf(view: View, replaced: DeviceRow, successor: DeviceRow): Gap[] {
  const successorFrom = firstHeardOf(view, successor.id);
  const isBack =
    replaced.lastHeardAt !== null &&
    successorFrom !== null &&
    Date.parse(replaced.lastHeardAt) >= successorFrom;
  if (isBack && heldCount(replaced) === 0) return [];
  const dayOf = (at: string | number) => dayAt(new Date(at).getTime(), view.timeZone);
  const heardDay = replaced.lastHeardAt ? dayOf(replaced.lastHeardAt) : null;
  const oldestDay = heldCount(replaced) > 0 && replaced.held?.oldest ? dayOf(replaced.held.oldest) : null;
  const toDay = successorFrom === null ? view.today : dayOf(successorFrom);
  const fromDay = [heardDay, oldestDay].filter((day) => day !== null).sort()[0] ?? toDay;
  return [
    {
      deviceId: replaced.id,
      label: replaced.label,
      successorLabel: successor.label,
      personIds: replaced.personIds,
      fromDay,
      toDay,
      words: gapWords(view, replaced),
    },
  ];
}

function gapWords(view: View, replaced: DeviceRow): string {
  const { label, lastHeardAt, held } = replaced;
  if (!lastHeardAt)
    return `${label} was replaced before it was ever heard. What was logged on it is not here.`;
  const heard = `${label} was last heard ${momentWords(lastHeardAt, view.timeZone, view.today)}`;
  const count = heldCount(replaced);
  if (count === 0) return `${heard}, and was replaced. What was logged on it after that is not here.`;
  const oldest = held?.oldest ? `, the oldest of ${momentWords(held.oldest, view.timeZone, view.today)}` : '';
  return `${heard} with ${counted(count, 'thing')} not sent${oldest}, and was replaced. They are not here, nor is what was logged on it later.`;
}

/** When the first thing came from a device, in milliseconds since 1970; null where nothing did. */
function firstHeardOf(view: View, deviceId: string): number | null {
  let first: number | null = null;
  for (const { stamps } of view.all('entry')) {
    for (const stamp of Object.values(stamps)) {
      if (parseStamp(stamp)?.deviceId !== deviceId) continue;
      first = Math.min(first ?? Infinity, stampMs(stamp));
    }
  }
  return first;
}
