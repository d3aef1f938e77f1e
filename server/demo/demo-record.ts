import { loadTemplate } from '#shared/trade/load.ts';
import { DEMO_BOATS } from './demo-boats.ts';
import { deviceLines, type DemoDeviceLine } from './demo-heard.ts';
import type { PersonKey } from './demo-people.ts';
import type { DemoBatch } from './demo-script.ts';
import type { BoatKey } from './demo-work.ts';
import type { Pictures } from './pictures/develop.ts';
import { tellEntries } from './tell-entries.ts';
import { tellNotes } from './tell-notes.ts';
import { tellBoat } from './tell-work.ts';
import { Telling } from './telling.ts';

/** A shop's months as ops in the order in which the server hears them, and what stands beside the record. */
export interface DemoRecord<Key extends string = PersonKey> {
  people: Map<Key, string>;
  devices: DemoDeviceLine[];
  owners: { boatId: string; personId: string }[];
  batches: DemoBatch[];
}

/**
 * The demo shop's record up to an hour before `nowMs`; the same for the same day, zone and pictures. A photo is in it
 * where its picture is given.
 */
export async function makeDemoRecord(
  nowMs: number,
  timeZone: string,
  pictures: Pictures = new Map(),
): Promise<DemoRecord> {
  const telling = new Telling(nowMs, timeZone);
  const boats = Object.entries(DEMO_BOATS) as [BoatKey, (typeof DEMO_BOATS)[BoatKey]][];
  for (const [key, boat] of boats) tellBoat(telling, key, boat, await loadTemplate(boat.template));
  tellEntries(telling);
  tellNotes(telling, pictures);
  lennyFinishesAStage(telling);
  telling.tell();
  const batches = telling.script.heard();
  const { days, latestMs, startMs, people } = telling;
  const heard = { days, latestMs, startMs, batches, deviceIds: telling.devices, personIds: people };
  const owners = boats.map(([key, { owner }]) => ({
    boatId: telling.id(key),
    personId: telling.person(owner),
  }));
  return { people, devices: deviceLines(heard), owners, batches };
}

/** A stage is the foreman's to mark: what Lenny marks is set aside. */
function lennyFinishesAStage(telling: Telling): void {
  const data = { stageId: telling.id('hickory/lap_bed'), workDate: telling.days.workday(-1) };
  telling.say('lenny', -1, '15:42', (atMs) => ({
    kind: 'stage.mark',
    data: { ...data, markId: telling.ids.next(atMs) },
  }));
}
