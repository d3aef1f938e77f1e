import type { DeviceRow } from '#shared/identity/device.ts';
import { dayAt, type Day } from '#shared/sync/day.ts';
import type { View } from '#src/replica/view.ts';
import { momentWords } from '#src/words/day-words.ts';
import { countWords, heardWords, heldCount } from '#src/words/heard.ts';
import { listWords } from '#src/words/name-words.ts';

/** What is known of a person's devices. */
export interface Heard {
  /** '4 held, heard 07:35' for each device that holds something */
  holding: string[];
  /** 'heard 12:05', of the device heard last; null where one is holding */
  words: string | null;
}

/** The devices that a person uses: not shut out, and not replaced by another. */
function devicesOf(view: View, personId: string): DeviceRow[] {
  const devices = view.all('device');
  const replaced = new Set(devices.map((device) => device.replaces));
  return devices
    .filter((device) => device.personIds.includes(personId) && !device.revokedAt && !replaced.has(device.id))
    .sort((a, b) => ((a.lastHeardAt ?? '') < (b.lastHeardAt ?? '') ? 1 : -1));
}

export function readHeard(view: View, personId: string): Heard {
  const devices = devicesOf(view, personId);
  const holding = devices.filter((device) => heldCount(device) > 0);
  if (holding.length > 0)
    return { holding: holding.map((device) => holdingWords(view, device, devices.length)), words: null };
  const [latest] = devices;
  return { holding: [], words: latest ? heardWords(view, latest) : 'no device here' };
}

function holdingWords(view: View, device: DeviceRow, deviceCount: number): string {
  const words = `${heldCount(device)} held, ${heardWords(view, device)}`;
  return deviceCount > 1 ? `${device.label}: ${words}` : words;
}

/** Why somebody has nothing on a day: never that there is nothing, while a device may hold it. */
export interface Nothing {
  words: string;
  /** everything that they could have logged that day has been heard */
  isSure: boolean;
}

export function readNothing(view: View, personId: string, day: Day): Nothing {
  const devices = devicesOf(view, personId);
  const holding = devices.filter((device) => heldCount(device) > 0);
  if (holding.length > 0) {
    const said = holding.map(
      (device) =>
        `${device.label} was last ${heardWords(view, device)} and held ${countWords(heldCount(device))}`,
    );
    return { words: `Nothing yet. ${listWords(said)}.`, isSure: false };
  }
  const [latest] = devices;
  if (!latest) return { words: 'Nothing yet. No device is signed in.', isSure: true };
  if (!latest.lastHeardAt)
    return { words: `Nothing yet. ${latest.label} has not been heard.`, isSure: false };
  const heardOn = dayAt(Date.parse(latest.lastHeardAt), view.timeZone);
  const heard = momentWords(latest.lastHeardAt, view.timeZone, view.today);
  if (heardOn > day)
    return {
      words: `Nothing logged. All was sent when ${latest.label} was last heard ${heard}.`,
      isSure: true,
    };
  return { words: `Nothing yet, as last heard ${heard}.`, isSure: heardOn === day };
}
