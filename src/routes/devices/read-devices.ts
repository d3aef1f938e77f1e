import { dayAt } from '#shared/sync/day.ts';
import type { DeviceRow } from '#shared/identity/device.ts';
import type { View } from '#src/replica/view.ts';
import { counted, dayWords, momentWords } from '#src/words/day-words.ts';
import { heardWords, heldCount, readGaps } from '#src/words/heard.ts';
import { listWords } from '#src/words/name-words.ts';
import { whoWords } from '#src/words/who.ts';

export interface DeviceLine {
  id: string;
  label: string;
  isThis: boolean;
  /** 'Lenny and Rosa' */
  people: string;
  heard: string;
  /** 'held 4, the oldest of Mon 13:20'; null where it held nothing */
  held: string | null;
  heldCount: number;
  version: string;
  /** "in place of Hob's first phone"; "Hob's phone came in its place" */
  notes: string[];
  gap: string | null;
  revoked: string | null;
}

/** Every device of the shop: those that hold something first, then by when they were heard; those out of use last. */
export function readDevices(view: View): DeviceLine[] {
  const devices = view.all('device');
  const gaps = new Map(readGaps(view).map((gap) => [gap.deviceId, gap.words]));
  const replacedBy = new Map(
    devices.flatMap((device) => (device.replaces ? [[device.replaces, device]] : [])),
  );
  const isOut = (device: DeviceRow) => Number(device.revokedAt !== null || replacedBy.has(device.id));
  return [...devices]
    .sort(
      (a, b) =>
        isOut(a) - isOut(b) ||
        heldCount(b) - heldCount(a) ||
        ((a.lastHeardAt ?? '') < (b.lastHeardAt ?? '') ? 1 : -1),
    )
    .map((device) => ({
      id: device.id,
      label: device.label,
      isThis: device.id === view.me.deviceId,
      people: listWords(device.personIds.map((id) => whoWords(view, id))),
      heard: heardWords(view, device),
      held: heldWords(view, device),
      heldCount: heldCount(device),
      version: device.appVersion ? `version ${device.appVersion}` : 'version not known',
      notes: notesOf(devices, device, replacedBy.get(device.id)),
      gap: gaps.get(device.id) ?? null,
      revoked:
        device.revokedAt &&
        `shut out ${dayWords(dayAt(Date.parse(device.revokedAt), view.timeZone), view.today)}`,
    }));
}

function heldWords(view: View, device: DeviceRow): string | null {
  const count = heldCount(device);
  if (count === 0) return null;
  const oldest = device.held?.oldest
    ? `, the oldest of ${momentWords(device.held.oldest, view.timeZone, view.today)}`
    : '';
  return `held ${counted(count, 'thing')}${oldest}`;
}

function notesOf(devices: DeviceRow[], device: DeviceRow, successor: DeviceRow | undefined): string[] {
  const replaced = devices.find((other) => other.id === device.replaces);
  return [
    ...(replaced ? [`in place of ${replaced.label}`] : []),
    ...(successor ? [`${successor.label} came in its place`] : []),
  ];
}
