import { describe, expect, test } from 'vitest';
import { readDaySheet } from '#src/routes/day-sheet/read-day-sheet.ts';
import { TestRecord, type Hand } from '#tests/worlds/record.ts';

const MONDAY = '2026-05-04';

async function shop() {
  const record = new TestRecord();
  const orrin = record.hand('Orrin', 'foreman');
  const [rosa, wes, tamsin, hob] = ['Rosa', 'Wes', 'Tamsin', 'Hob'].map((name) =>
    record.hand(name, 'crew'),
  ) as [Hand, Hand, Hand, Hand];
  const boats: Record<string, { boatId: string; stageId: string }> = {};
  for (const name of ['Penny Candle', 'Brindle', 'Mallow']) {
    const [boatId, stageId] = [record.newId(), record.newId()];
    await record.say(orrin, 'boat.add', { boatId, name, arrivedOn: '2026-05-01' });
    await record.say(orrin, 'stage.add', { stageId, boatId, name: 'Deck', order: 1, after: [] });
    boats[name] = { boatId, stageId };
  }
  const log = async (
    hand: Hand,
    boat: string,
    minutes: number,
    text = 'Reefed seams',
    others: [Hand, number][] = [],
  ) => {
    const entryId = record.newId();
    const hours = [[hand, minutes] as const, ...others].map(([{ personId }, own]) => ({
      personId,
      minutes: own,
    }));
    await record.say(hand, 'entry.write', {
      entryId,
      ...boats[boat],
      workDate: MONDAY,
      text,
      spoken: false,
      hours,
    });
    return entryId;
  };
  return {
    record,
    orrin,
    rosa,
    wes,
    tamsin,
    hob,
    boats,
    log,
    sheet: (day = MONDAY) => readDaySheet(record.viewAs(orrin), day),
  };
}

describe('who did what, by boat', () => {
  test('ten entries by four people stand under the right boats, and under the right people', async () => {
    const { rosa, wes, tamsin, hob, log, sheet } = await shop();
    const plan: [Hand, string, number][] = [
      [rosa, 'Penny Candle', 60],
      [rosa, 'Penny Candle', 90],
      [rosa, 'Brindle', 30],
      [wes, 'Penny Candle', 120],
      [wes, 'Mallow', 45],
      [wes, 'Brindle', 15],
      [tamsin, 'Mallow', 200],
      [tamsin, 'Mallow', 100],
      [hob, 'Brindle', 240],
      [hob, 'Penny Candle', 60],
    ];
    const written = new Map<string, string[]>();
    for (const [hand, boat, minutes] of plan)
      written.set(boat, [...(written.get(boat) ?? []), await log(hand, boat, minutes)]);
    const { boats, people, minutes } = sheet();
    const shown = new Map(
      boats.map((boat) => [
        boat.name,
        boat.stages.flatMap((stage) => stage.entries.map((entry) => entry.id)),
      ]),
    );
    expect(shown.size).toBe(3);
    for (const [boat, ids] of written) expect(new Set(shown.get(boat))).toEqual(new Set(ids));
    expect(people.map((person) => [person.name, person.entries.length, person.minutes])).toEqual([
      ['Hob', 2, 300],
      ['Rosa', 3, 180],
      ['Tamsin', 2, 300],
      ['Wes', 3, 180],
    ]);
    expect(minutes).toBe(960);
    expect(boats.map((boat) => boat.minutes).reduce((sum, own) => sum + own)).toBe(960);
    expect(boats.map((boat) => boat.dayOfStay)).toEqual([4, 4, 4]);
  });

  test('hours that one gives for another stand under the other, once', async () => {
    const { rosa, wes, log, sheet } = await shop();
    await log(rosa, 'Penny Candle', 240, 'Took up the king plank', [[wes, 120]]);
    const { people, minutes } = sheet();
    const [first, second] = people;
    expect([first!.name, first!.minutes, second!.name, second!.minutes]).toEqual(['Rosa', 240, 'Wes', 120]);
    expect(second!.entries[0]).toMatchObject({ author: 'Rosa', figure: { minutes: 120 } });
    expect(minutes).toBe(360);
  });

  test('a struck entry is still read, with who and why, and counts nothing', async () => {
    const { record, rosa, log, sheet } = await shop();
    const entryId = await log(rosa, 'Penny Candle', 240);
    await record.say(rosa, 'entry.strike', { entryId, why: 'said it twice', saw: [] });
    const [person] = sheet().people;
    expect(person).toMatchObject({
      minutes: 0,
      entries: [{ mark: 'struck', struck: 'struck by Rosa: said it twice' }],
    });
  });

  test('a moved entry stands under its new boat and says where it came from and why', async () => {
    const { record, rosa, boats, log, sheet } = await shop();
    const entryId = await log(rosa, 'Penny Candle', 60);
    await record.say(rosa, 'entry.amend', { entryId, set: { ...boats.Brindle }, why: 'wrong boat' });
    expect(sheet().boats.map((boat) => boat.name)).toEqual(['Brindle']);
    expect(sheet().people[0]!.entries[0]!.flags).toEqual(['moved from Penny Candle by Rosa: wrong boat']);
  });

  test('another day shows nothing of this one', async () => {
    const { rosa, log, sheet } = await shop();
    await log(rosa, 'Penny Candle', 60);
    expect(sheet('2026-05-05')).toMatchObject({ minutes: 0, boats: [], loggedCount: 0 });
  });
});

describe('corrected hours', () => {
  test('keep the old figure, the reason and who', async () => {
    const { record, rosa, wes, log, sheet } = await shop();
    const entryId = await log(rosa, 'Penny Candle', 60, 'Sole up', [[wes, 240]]);
    await record.say(wes, 'entry.amend', {
      entryId,
      set: { hours: [{ personId: wes.personId, minutes: 180, kind: null }] },
      why: 'one hour was on Brindle',
    });
    const figure = sheet().people.find((person) => person.name === 'Wes')!.entries[0]!.figure!;
    expect(figure).toMatchObject({
      minutes: 180,
      corrections: [{ beforeMinutes: 240, who: 'Wes', why: 'one hour was on Brindle' }],
    });
  });

  test('a kind that is set changes no figure and is no correction', async () => {
    const { record, orrin, rosa, log, sheet } = await shop();
    const entryId = await log(rosa, 'Penny Candle', 60);
    await record.say(orrin, 'entry.amend', {
      entryId,
      set: { hours: [{ personId: rosa.personId, minutes: 60, kind: 'extra' }] },
    });
    const figure = sheet().people[0]!.entries[0]!.figure!;
    expect(figure).toMatchObject({ kind: 'extra', proposed: false, corrections: [] });
  });

  test('two figures that nobody has settled are both told', async () => {
    const { record, rosa, wes, log, sheet } = await shop();
    const entryId = await log(rosa, 'Penny Candle', 60, 'Sole up', [[wes, 240]]);
    const made = {
      [`hours/${wes.personId}`]: [(record.store.row('entry', entryId) as { madeBy: string }).madeBy],
    };
    const say = (hand: Hand, minutes: number) =>
      record.say(
        hand,
        'entry.amend',
        { entryId, set: { hours: [{ personId: wes.personId, minutes, kind: null }] } },
        made,
      );
    await say(rosa, 180);
    await say(wes, 270);
    const entry = sheet().people.find((person) => person.name === 'Wes')!.entries[0]!;
    expect(entry).toMatchObject({ mark: 'loose', figure: { minutes: 270, others: [180] } });
  });
});

describe('ticked tasks', () => {
  test('a task that two ticked shows as twice, under both', async () => {
    const { record, orrin, rosa, wes, boats, sheet } = await shop();
    const taskId = record.newId();
    await record.say(orrin, 'task.add', { taskId, ...boats.Brindle, title: 'Graving piece' });
    for (const hand of [wes, rosa])
      await record.say(hand, 'task.mark', { taskId, markId: record.newId(), workDate: MONDAY });
    const ticked = sheet().people.filter((person) => person.ticks.length > 0);
    expect(ticked.map((person) => [person.name, person.ticks[0]!.twice])).toEqual([
      ['Rosa', 'twice: Wes and Rosa'],
      ['Wes', 'twice: Wes and Rosa'],
    ]);
    expect(sheet().boats[0]).toMatchObject({ name: 'Brindle', ticks: ['Graving piece (Wes, Rosa, twice)'] });
  });
});

describe('who has nothing', () => {
  test('is never said to have nothing while a device may hold it', async () => {
    const { record, rosa, hob, log, sheet } = await shop();
    await log(rosa, 'Penny Candle', 60);
    record.device({
      id: hob.deviceId,
      label: "Hob's phone",
      personIds: [hob.personId],
      lastHeardAt: '2026-05-04T06:35:00.000Z',
      held: { ops: 4, photos: 0, oldest: '2026-05-04T06:00:00.000Z' },
    });
    const person = sheet().people.find((one) => one.name === 'Hob')!;
    expect(person.nothing).toEqual({
      words: "Nothing yet. Hob's phone was last heard 07:35 and held four.",
      isSure: false,
    });
    expect(person.heard.holding).toEqual(['4 held, heard 07:35']);
  });

  test('is told as last heard where the device held nothing', async () => {
    const { record, hob, sheet } = await shop();
    record.device({
      id: hob.deviceId,
      label: "Hob's phone",
      personIds: [hob.personId],
      lastHeardAt: '2026-05-04T06:35:00.000Z',
    });
    expect(sheet().people.find((one) => one.name === 'Hob')!.nothing).toEqual({
      words: 'Nothing yet, as last heard 07:35.',
      isSure: true,
    });
    expect(sheet('2026-05-01').people.find((one) => one.name === 'Hob')!.nothing!.words).toBe(
      "Nothing logged. All was sent when Hob's phone was last heard 07:35.",
    );
  });

  test('the crew are all listed, others only where they logged', async () => {
    const { orrin, log, sheet } = await shop();
    expect(sheet().people.map((person) => person.name)).toEqual(['Hob', 'Rosa', 'Tamsin', 'Wes']);
    await log(orrin, 'Brindle', 30);
    expect(sheet().people[0]).toMatchObject({ name: 'Orrin', minutes: 30 });
  });
});

describe('a phone that died', () => {
  const died = async () => {
    const made = await shop();
    const { record, hob, log } = made;
    const oldId = record.newId();
    record.device({
      id: oldId,
      label: "Hob's first phone",
      personIds: [hob.personId],
      lastHeardAt: '2026-05-02T07:50:00.000Z',
      held: { ops: 2, photos: 0, oldest: '2026-05-01T15:10:00.000Z' },
    });
    record.device({ id: hob.deviceId, label: "Hob's phone", personIds: [hob.personId], replaces: oldId });
    await log(hob, 'Brindle', 60);
    return { ...made, oldId };
  };

  test('has its gap named by count and day on each day it may have known of', async () => {
    const { sheet } = await died();
    const gapsOn = (day: string) => sheet(day).people.find((person) => person.name === 'Hob')!.gaps;
    expect(gapsOn('2026-05-02')).toEqual([
      "Hob's first phone was last heard Sat 08:50 with 2 things not sent, the oldest of Fri 16:10, and was replaced. They are not here, nor is what was logged on it later.",
    ]);
    expect(gapsOn('2026-05-01')).toHaveLength(1);
    expect(gapsOn('2026-05-04')).toHaveLength(1);
    expect(gapsOn('2026-04-30')).toEqual([]);
    expect(gapsOn('2026-05-05')).toEqual([]);
  });

  test('has no gap once it was heard again with nothing held', async () => {
    const { record, hob, oldId, sheet } = await died();
    record.device({
      id: oldId,
      label: "Hob's first phone",
      personIds: [hob.personId],
      lastHeardAt: '2026-05-06T07:50:00.000Z',
      held: { ops: 0, photos: 0, oldest: null },
    });
    expect(sheet('2026-05-02').people.find((person) => person.name === 'Hob')!.gaps).toEqual([]);
  });
});
