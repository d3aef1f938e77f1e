import { describe, expect, test } from 'vitest';
import { hoursLines, sumHours } from '#shared/entry/sums.ts';
import { readDaySheet } from '#src/routes/day-sheet/read-day-sheet.ts';
import { readMissing } from '#src/routes/day-sheet/read-missing.ts';
import { daysOfWeek, readWeek } from '#src/routes/day-sheet/week/read-week.ts';
import { demoWorld } from '#tests/worlds/demo.ts';
import { TestRecord, type Hand } from '#tests/worlds/record.ts';

const [MONDAY, TUESDAY, WEDNESDAY] = ['2026-05-04', '2026-05-05', '2026-05-06'];

async function shop() {
  const record = new TestRecord();
  const orrin = record.hand('Orrin', 'foreman');
  const [rosa, wes] = ['Rosa', 'Wes'].map((name) => record.hand(name, 'crew')) as [Hand, Hand];
  const boatId = record.newId();
  await record.say(orrin, 'boat.add', { boatId, name: 'Brindle' });
  const log = async (hand: Hand, workDate: string, minutes: number, along: [Hand, number][] = []) => {
    const entryId = record.newId();
    const hours = [[hand, minutes] as const, ...along].map(([{ personId }, own]) => ({
      personId,
      minutes: own,
    }));
    await record.say(hand, 'entry.write', {
      entryId,
      boatId,
      workDate,
      text: 'Planed',
      spoken: false,
      hours,
    });
    return entryId;
  };
  const goTo = (day: string) => (record.nowMs = Date.parse(`${day}T15:00:00Z`));
  return { record, orrin, rosa, wes, log, goTo, view: () => record.viewAs(orrin) };
}

test.each([MONDAY, WEDNESDAY, '2026-05-10'])('the week around %s is Monday to Sunday', (day) => {
  expect(daysOfWeek(day)).toEqual(
    ['04', '05', '06', '07', '08', '09', '10'].map((date) => `2026-05-${date}`),
  );
});

describe('a week', () => {
  test('sums to one total by every cut, and each of its days to that of its day sheet', async () => {
    const { view } = await demoWorld(Date.parse('2026-05-08T20:00:00Z'));
    for (const day of ['2026-05-08', '2026-04-29', '2026-04-22', '2026-03-18']) {
      const week = readWeek(view, day);
      const sum = (figures: number[]) => figures.reduce((all, own) => all + own, 0);
      const lines = hoursLines(view.all('entry').filter(({ workDate }) => week.days.includes(workDate)));
      expect(week.minutes).toBe(sum([...sumHours(lines, 'stage').values()]));
      expect(sum(week.people.map(({ minutes }) => minutes))).toBe(week.minutes);
      expect(sum(week.people.flatMap(({ cells }) => cells.map(({ minutes }) => minutes)))).toBe(week.minutes);
      expect(sum(week.boats.flatMap(({ byDay }) => byDay))).toBe(week.minutes);
      expect(sum(week.kinds.map(({ minutes }) => minutes))).toBe(week.minutes);
      expect(sum(week.byDay)).toBe(week.minutes);
      week.days.forEach((one, index) => expect(readDaySheet(view, one).minutes).toBe(week.byDay[index]));
    }
    expect(readWeek(view, '2026-05-08').minutes).toBeGreaterThan(0);
  });

  test('marks a day of a loose end under everybody who is named in it', async () => {
    const { record, rosa, wes, log, view } = await shop();
    const entryId = await log(rosa, MONDAY, 240, [[wes, 240]]);
    const made = {
      [`hours/${wes.personId}`]: [(record.store.row('entry', entryId) as { madeBy: string }).madeBy],
    };
    for (const [hand, minutes] of [
      [rosa, 180],
      [wes, 270],
    ] as const) {
      const hours = [{ personId: wes.personId, minutes, kind: null }];
      await record.say(hand, 'entry.amend', { entryId, set: { hours } }, made);
    }
    const marks = readWeek(view(), MONDAY).people.map(({ name, cells }) => [name, cells[0]!.mark]);
    expect(marks).toEqual([
      ['Rosa', 'loose'],
      ['Wes', 'loose'],
    ]);
  });
});

describe('hours are missing', () => {
  test('where less than the shop’s day was logged, with the days, the most first', async () => {
    const { rosa, wes, log, goTo, view } = await shop();
    goTo(TUESDAY);
    await log(rosa, MONDAY, 480);
    await log(wes, MONDAY, 330);
    await log(rosa, TUESDAY, 480);
    const missing = readMissing(view(), [MONDAY, TUESDAY]);
    expect(missing).toHaveLength(1);
    expect(missing[0]).toMatchObject({ name: 'Wes', missingMinutes: 150 });
    expect(missing[0]!.days.map(({ day, minutes }) => [day, minutes])).toEqual([
      [MONDAY, 330],
      [TUESDAY, 0],
    ]);
  });

  test('on no weekend, on no day when the shop was shut, and on no day before somebody began', async () => {
    const { rosa, wes, log, goTo, view } = await shop();
    goTo('2026-05-11');
    await log(rosa, MONDAY, 480);
    await log(rosa, WEDNESDAY, 480);
    await log(wes, WEDNESDAY, 480);
    expect(readMissing(view(), daysOfWeek(MONDAY))).toEqual([]);
  });

  test('of nobody who has left, from the day after on, and of no foreman', async () => {
    const { record, orrin, rosa, wes, log, goTo, view } = await shop();
    goTo(WEDNESDAY);
    for (const day of [MONDAY, TUESDAY, WEDNESDAY]) await log(rosa, day, 480);
    await log(wes, MONDAY, 480);
    await log(orrin, MONDAY, 60);
    const row = record.store.row('person', wes.personId) as object;
    record.store.put('person', wes.personId, { ...row, leftAt: '2026-05-04T15:00:00.000Z' });
    expect(readMissing(view(), [MONDAY, TUESDAY, WEDNESDAY])).toEqual([]);
  });

  test('by the end of a struck entry too', async () => {
    const { record, rosa, wes, log, goTo, view } = await shop();
    await log(wes, MONDAY, 480);
    const entryId = await log(rosa, MONDAY, 480);
    expect(readMissing(view(), [MONDAY])).toEqual([]);
    await record.say(rosa, 'entry.strike', { entryId, why: 'wrong day', saw: [] });
    goTo(TUESDAY);
    expect(readMissing(view(), [MONDAY]).map(({ name }) => name)).toEqual(['Rosa']);
  });
});
