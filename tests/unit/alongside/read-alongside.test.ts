import { describe, expect, test } from 'vitest';
import { readAlongside, type DayOnLine } from '#src/routes/alongside/read-alongside.ts';
import { readBoats, readWhere } from '#src/routes/alongside/read-boats.ts';
import { entryBy, MONDAY, shopAtBench, type Bench } from '#tests/unit/alongside/bench.ts';
import type { Hand } from '#tests/worlds/record.ts';

function lineOf(bench: Bench, hand: Hand, daysMax = 14) {
  const where = { boatId: bench.boatId, stageId: bench.strip };
  return readAlongside(bench.record.viewAs(hand), where, daysMax)!;
}

function entriesOf({ items }: DayOnLine) {
  return items.filter((item) => item.item === 'entry');
}

describe("a boat's days", () => {
  test('begin with today, whether or not anything is logged', async () => {
    const bench = await shopAtBench();
    const line = lineOf(bench, bench.rosa);
    expect(line.days).toHaveLength(1);
    expect(line.days[0]).toMatchObject({
      isToday: true,
      date: 'Mon 4 May',
      dayOfStay: 15,
      minutes: 0,
      items: [],
    });
  });

  test('are counted from the day of her arrival, and not before it', async () => {
    const bench = await shopAtBench();
    await entryBy(bench, bench.rosa, { workDate: '2026-04-20' });
    await entryBy(bench, bench.rosa, { workDate: '2026-04-19' });
    expect(lineOf(bench, bench.rosa).days.map(({ dayOfStay }) => dayOfStay)).toEqual([15, 1, null]);
  });

  test('have a gap between them that names each day of a short one and counts a long one', async () => {
    const bench = await shopAtBench();
    await entryBy(bench, bench.rosa, { workDate: '2026-05-01' });
    await entryBy(bench, bench.rosa, { workDate: '2026-04-24' });
    const [today, friday, week] = lineOf(bench, bench.rosa).days;
    expect(today!.gap).toEqual({
      words: 'Sat and Sun: no entry',
      days: [{ isWeekStart: false }, { isWeekStart: false }],
    });
    expect(friday!.gap!.words).toBe('6 days without an entry');
    expect(friday!.gap!.days.map(({ isWeekStart }) => isWeekStart)).toEqual([
      false,
      false,
      false,
      true,
      false,
      false,
    ]);
    expect(week!.gap).toBeNull();
  });

  test('leave out a gap between neighbours', async () => {
    const bench = await shopAtBench();
    await entryBy(bench, bench.rosa, { workDate: '2026-05-03' });
    expect(lineOf(bench, bench.rosa).days[0]!.gap).toBeNull();
  });

  test('older than the newest few are counted, not shown', async () => {
    const bench = await shopAtBench();
    for (const workDate of ['2026-05-01', '2026-04-30', '2026-04-29'])
      await entryBy(bench, bench.rosa, { workDate });
    const line = lineOf(bench, bench.rosa, 2);
    expect(line.days.map(({ day }) => day)).toEqual([MONDAY, '2026-05-01', '2026-04-30']);
    expect(line.olderDays).toBe(1);
  });

  test("sum what stands: a struck entry's hours are not in it", async () => {
    const bench = await shopAtBench();
    await entryBy(bench, bench.rosa);
    const entryId = await entryBy(bench, bench.wes);
    expect(lineOf(bench, bench.rosa).days[0]!.minutes).toBe(120);
    await bench.record.say(bench.wes, 'entry.strike', { entryId, why: 'wrong boat', saw: [] });
    expect(lineOf(bench, bench.rosa).days[0]!.minutes).toBe(60);
    expect(entriesOf(lineOf(bench, bench.rosa).days[0]!)).toHaveLength(2);
  });

  test('show nothing of another boat', async () => {
    const bench = await shopAtBench();
    await entryBy(bench, bench.rosa, { boatId: bench.otherBoatId, stageId: null });
    expect(entriesOf(lineOf(bench, bench.rosa).days[0]!)).toEqual([]);
  });
});

describe('an entry on the line', () => {
  test("is the author's, and one's own is yours", async () => {
    const bench = await shopAtBench();
    await entryBy(bench, bench.rosa);
    expect(entriesOf(lineOf(bench, bench.rosa).days[0]!)[0]!.author).toBe('you');
    expect(entriesOf(lineOf(bench, bench.wes).days[0]!)[0]!.author).toBe('Rosa');
  });

  test('names its stage only where it is another than the one looked at', async () => {
    const bench = await shopAtBench();
    await entryBy(bench, bench.rosa);
    await entryBy(bench, bench.rosa, { stageId: bench.varnish });
    expect(entriesOf(lineOf(bench, bench.rosa).days[0]!).map(({ stageName }) => stageName)).toEqual([
      'Varnish',
      null,
    ]);
  });

  test('says that it was written later, and by the weekday when', async () => {
    const bench = await shopAtBench();
    await entryBy(bench, bench.rosa, { workDate: '2026-05-01' });
    const entry = entriesOf(lineOf(bench, bench.rosa).days[1]!)[0]!;
    expect(entry.flags).toEqual(['written later, Mon 4 May']);
    expect(entry.time).toBe('Mon');
  });

  test('that was moved says from where, and is on the new boat alone', async () => {
    const bench = await shopAtBench();
    const entryId = await entryBy(bench, bench.rosa, { boatId: bench.otherBoatId, stageId: null });
    const set = { boatId: bench.boatId, stageId: bench.varnish };
    await bench.record.say(bench.rosa, 'entry.amend', { entryId, set, why: 'wrong boat' });
    expect(entriesOf(lineOf(bench, bench.rosa).days[0]!)[0]!.flags).toEqual(['moved here from Amber Reach']);
  });

  test('that was struck says by whom and why', async () => {
    const bench = await shopAtBench();
    const entryId = await entryBy(bench, bench.rosa);
    await bench.record.say(bench.rosa, 'entry.strike', { entryId, why: 'said twice', saw: [] });
    const entry = entriesOf(lineOf(bench, bench.wes).days[0]!)[0]!;
    expect(entry.mark).not.toBe('sent');
    expect(entry.struck).toMatch(/^Struck by Rosa \d\d:\d\d: said twice$/);
  });

  test('with two figures for one person is a loose end that asks which', async () => {
    const bench = await shopAtBench();
    const entryId = await entryBy(bench, bench.rosa);
    const hours = (minutes: number) => ({
      set: { hours: [{ personId: bench.rosa.personId, minutes, kind: null }] },
    });
    const made = { [`hours/${bench.rosa.personId}`]: [madeBy(bench, entryId)] };
    await bench.record.say(bench.rosa, 'entry.amend', { entryId, ...hours(180) }, made);
    await bench.record.say(bench.orrin, 'entry.amend', { entryId, ...hours(150) }, made);
    const entry = entriesOf(lineOf(bench, bench.wes).days[0]!)[0]!;
    expect(entry.mark).toBe('loose');
    expect(entry.ends).toHaveLength(1);
    expect(entry.ends[0]!.about).toBe("Rosa's hours");
    expect(entry.ends[0]!.values.map(({ minutes, who, stands }) => [minutes, who, stands])).toEqual([
      [150, 'Orrin', true],
      [180, 'Rosa', false],
    ]);
  });

  test("shows an hours' kind that the crew proposed as proposed, and one that the foreman set as set", async () => {
    const bench = await shopAtBench();
    const hours = [{ personId: bench.rosa.personId, minutes: 60, kind: 'extra' }];
    const entryId = await entryBy(bench, bench.rosa, { hours });
    const kindShown = () => entriesOf(lineOf(bench, bench.rosa).days[0]!)[0]!.hours[0]!;
    expect(kindShown()).toMatchObject({ kind: 'extra work', isProposed: true });
    await bench.record.say(bench.orrin, 'entry.amend', { entryId, set: { hours }, why: 'so it is' });
    expect(kindShown()).toMatchObject({ kind: 'extra work', isProposed: false });
  });
});

function madeBy({ record }: Bench, entryId: string): string {
  return (record.store.row('entry', entryId) as { madeBy: string }).madeBy;
}

describe('where somebody works', () => {
  test('is what was remembered', async () => {
    const { record, rosa, boatId, varnish } = await shopAtBench();
    expect(readWhere(record.viewAs(rosa), { boatId, stageId: varnish })).toEqual({
      boatId,
      stageId: varnish,
    });
  });

  test('is where they logged last if nothing is remembered', async () => {
    const bench = await shopAtBench();
    await entryBy(bench, bench.rosa, { stageId: bench.varnish });
    const where = readWhere(bench.record.viewAs(bench.rosa), {});
    expect(where).toEqual({ boatId: bench.boatId, stageId: bench.varnish });
  });

  test('is the first boat by name for somebody new, and her first open stage', async () => {
    const { record, orrin, rosa, boatId, otherBoatId, strip, varnish } = await shopAtBench();
    expect(readWhere(record.viewAs(rosa), {})).toEqual({ boatId: otherBoatId, stageId: null });
    await record.say(orrin, 'stage.mark', { stageId: strip, markId: record.newId(), workDate: MONDAY });
    expect(readWhere(record.viewAs(rosa), { boatId })).toEqual({ boatId, stageId: varnish });
  });

  test('is nowhere while there is no boat', async () => {
    const { record, orrin, rosa, boatId, otherBoatId } = await shopAtBench();
    for (const id of [boatId, otherBoatId]) {
      await record.say(orrin, 'boat.strike', { boatId: id, why: 'sold', saw: [] });
    }
    expect(readWhere(record.viewAs(rosa), { boatId })).toBeNull();
    expect(readBoats(record.viewAs(rosa))).toEqual([]);
  });
});
