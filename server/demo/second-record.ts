import { addDays } from '#shared/sync/day.ts';
import { DemoDays } from './demo-days.ts';
import { SECOND_PEOPLE } from './demo-people.ts';
import type { DemoRecord } from './demo-record.ts';
import { DemoIds, DemoScript } from './demo-script.ts';

type SecondPerson = keyof typeof SECOND_PEOPLE;

const LINES: [day: number, time: string, minutes: number, text: string][] = [
  [
    -6,
    '15:40',
    300,
    'Small Hours is on the trailer frame, level. Photographs all round before anything comes off.',
  ],
  [-5, '15:30', 420, 'Thwarts and the floor out, numbered with chalk and in pencil underneath.'],
  [-3, '15:50', 390, 'Scraped the inside port. Two ribs with old splits, glued by somebody, holding.'],
  [-1, '15:20', 360, 'Inside starboard scraped to the third plank.'],
];

/** A week of a small shop with one boat, written by one hand. */
export function makeSecondRecord(nowMs: number, timeZone: string): DemoRecord<SecondPerson> {
  const days = new DemoDays(nowMs, timeZone);
  const ids = new DemoIds('teasel');
  const script = new DemoScript(ids);
  const startMs = days.at(days.workday(-7), '16:00');
  const people = new Map(
    (Object.keys(SECOND_PEOPLE) as SecondPerson[]).map((key) => [key, ids.next(startMs)]),
  );
  const [ingrid, kit, castor] = (['ingrid', 'kit', 'castor'] as const).map((key) => people.get(key)!) as [
    string,
    string,
    string,
  ];
  const [laptop, phone, boatId, stageId] = [
    ids.next(startMs),
    ids.next(startMs),
    ids.next(startMs),
    ids.next(startMs),
  ];
  const byIngrid = { deviceId: laptop, personId: ingrid, atMs: startMs, sentMs: startMs + 1000 };
  const arrivedOn = addDays(days.today, -12);
  script.say({
    ...byIngrid,
    kind: 'boat.add',
    data: { boatId, name: 'Small Hours', type: 'skiff', arrivedOn },
  });
  script.say({
    ...byIngrid,
    kind: 'stage.add',
    data: { stageId, boatId, name: 'Strip out', order: 1, after: [] },
  });
  for (const [day, time, minutes, text] of LINES) {
    const workDate = days.workday(day);
    const atMs = days.at(workDate, time);
    const hours = [{ personId: kit, minutes }];
    const data = { entryId: ids.next(atMs), boatId, stageId, workDate, text, spoken: false, hours };
    script.say({ deviceId: phone, personId: kit, atMs, sentMs: atMs + 60_000, kind: 'entry.write', data });
  }
  const batches = script.heard();
  const lastHeardMs = batches.at(-1)!.receivedMs;
  const held = { ops: 0, photos: 0, oldest: null };
  const devices = [
    {
      id: laptop,
      label: "Ingrid's laptop",
      replaces: null,
      personIds: [ingrid],
      lastHeardMs: startMs + 1000,
      held,
    },
    { id: phone, label: "Kit's phone", replaces: null, personIds: [kit], lastHeardMs, held },
  ];
  return { people, devices, owners: [{ boatId, personId: castor }], batches };
}
