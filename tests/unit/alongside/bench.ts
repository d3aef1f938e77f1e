import { TestRecord, type Hand } from '#tests/worlds/record.ts';

export const MONDAY = '2026-05-04';
export const ARRIVED = '2026-04-20';

/** A record with two boats, the first with two stages, and people who work on them. */
export async function shopAtBench() {
  const record = new TestRecord();
  const orrin = record.hand('Orrin', 'foreman');
  const rosa = record.hand('Rosa', 'crew');
  const wes = record.hand('Wes', 'crew');
  const [boatId, otherBoatId] = [record.newId(), record.newId()];
  const [strip, varnish] = [record.newId(), record.newId()];
  await record.say(orrin, 'boat.add', { boatId, name: 'Penny Candle', arrivedOn: ARRIVED });
  await record.say(orrin, 'boat.add', { boatId: otherBoatId, name: 'Amber Reach' });
  await record.say(orrin, 'stage.add', { stageId: strip, boatId, name: 'Strip', order: 1, after: [] });
  await record.say(orrin, 'stage.add', {
    stageId: varnish,
    boatId,
    name: 'Varnish',
    order: 2,
    after: [strip],
  });
  return { record, orrin, rosa, wes, boatId, otherBoatId, strip, varnish };
}

export type Bench = Awaited<ReturnType<typeof shopAtBench>>;

/** Writes an entry of a person's on the first boat and stage, an hour of theirs in it unless told otherwise. */
export async function entryBy(
  bench: Bench,
  hand: Hand,
  given: Record<string, unknown> = {},
): Promise<string> {
  const { record, boatId, strip } = bench;
  const entryId = record.newId();
  const hours = [{ personId: hand.personId, minutes: 60 }];
  const usual = {
    entryId,
    boatId,
    stageId: strip,
    workDate: MONDAY,
    text: 'Reefed the seams',
    spoken: false,
    hours,
  };
  await record.say(hand, 'entry.write', { ...usual, ...given });
  return entryId;
}
