import { describe, expect, test } from 'vitest';
import { makeDemoRecord } from '#server/demo/demo-record.ts';
import { hoursLines, sumHours, totalMinutes, type Cut } from '#shared/entry/sums.ts';
import { dayAt } from '#shared/sync/day.ts';
import { stampMs } from '#shared/sync/stamp.ts';
import { DEMO_ZONE, demoWorld } from '#tests/worlds/demo.ts';

const TUESDAY_NOON = Date.parse('2026-05-05T16:00:00Z');
const HOUR_MS = 3_600_000;

describe('the demo shop', () => {
  test("obeys the law: nothing is set aside but the stage that was not Lenny's to mark", async () => {
    const { outcomes, store, personId } = await demoWorld(TUESDAY_NOON);
    expect(outcomes.filter(({ outcome }) => outcome === 'set-aside')).toHaveLength(1);
    const [row] = store
      .feed(0)
      .filter(({ entity }) => entity === 'setAside')
      .map((one) => one.row);
    expect(row).toMatchObject({ reason: 'not-entitled', state: 'waiting', authorId: personId('lenny') });
  });

  test('has one open loose end, about hours', async () => {
    const { view } = await demoWorld(TUESDAY_NOON);
    const ends = view.all('looseEnd');
    expect(ends).toHaveLength(1);
    expect(ends[0]!.values.map(({ value }) => (value as { minutes: number }).minutes).sort()).toEqual([
      210, 270,
    ]);
  });

  test('has tasks open, started, done, and done twice; an entry struck, one moved, one added to', async () => {
    const { view } = await demoWorld(TUESDAY_NOON);
    const tasks = view.all('task');
    expect(tasks.filter((task) => task.twice).map((task) => task.title)).toHaveLength(2);
    expect(tasks.some((task) => task.done && !task.twice)).toBe(true);
    expect(tasks.some((task) => !task.done && task.starts.length > 0)).toBe(true);
    expect(tasks.some((task) => !task.done && task.starts.length === 0)).toBe(true);
    const entries = view.all('entry');
    expect(entries.filter((entry) => entry.struck)).toHaveLength(1);
    expect(entries.filter((entry) => entry.heads.stageId)).toHaveLength(1);
    expect(entries.filter((entry) => entry.additions.length > 0)).toHaveLength(3);
  });

  test('sums to the same minutes by person, boat, stage, day and kind', async () => {
    const { view } = await demoWorld(TUESDAY_NOON);
    const lines = hoursLines(view.all('entry'));
    const total = totalMinutes(lines);
    expect(total).toBeGreaterThan(500 * 60);
    for (const cut of ['person', 'boat', 'stage', 'day', 'kind'] as Cut[]) {
      expect([...sumHours(lines, cut).values()].reduce((sum, minutes) => sum + minutes, 0)).toBe(total);
    }
  });

  test('nobody works more than nine hours, on a Sunday, or more than a morning on a Saturday', async () => {
    const { view } = await demoWorld(TUESDAY_NOON);
    for (const [day, minutes] of sumHours(hoursLines(view.all('entry')), 'day')) {
      const weekday = new Date(day).getUTCDay();
      expect(weekday, day).not.toBe(0);
      expect(minutes, day).toBeLessThanOrEqual(weekday === 6 ? 5 * 60 : 5 * 9 * 60);
    }
    const days = new Set(view.all('entry').map((entry) => entry.workDate));
    for (const day of days) {
      const lines = hoursLines(view.all('entry').filter((entry) => entry.workDate === day));
      for (const [personId, minutes] of sumHours(lines, 'person'))
        expect(minutes, `${view.find('person', personId)!.name} on ${day}`).toBeLessThanOrEqual(9 * 60);
    }
  });

  test('runs to yesterday and this morning, and leaves the last hour empty', async () => {
    const { batches } = await makeDemoRecord(TUESDAY_NOON, DEMO_ZONE);
    const saidMs = batches.flatMap((batch) => batch.ops).map((op) => stampMs(op.at));
    const latest = Math.max(...saidMs, ...batches.map((batch) => batch.receivedMs));
    expect(dayAt(latest, DEMO_ZONE)).toBe('2026-05-05');
    expect(latest).toBeLessThanOrEqual(TUESDAY_NOON - HOUR_MS + 60_000);
    expect(saidMs.some((ms) => dayAt(ms, DEMO_ZONE) === '2026-05-04')).toBe(true);
  });

  test('is the same to the letter for the same moment', async () => {
    const [one, other] = [
      await makeDemoRecord(TUESDAY_NOON, DEMO_ZONE),
      await makeDemoRecord(TUESDAY_NOON, DEMO_ZONE),
    ];
    expect(JSON.stringify(one.batches)).toBe(JSON.stringify(other.batches));
  });

  test('holds at any hour and on any day of the week, in any zone', async () => {
    for (let hours = 0; hours < 7 * 24; hours += 17) {
      const nowMs = TUESDAY_NOON + hours * HOUR_MS;
      for (const zone of ['Pacific/Auckland', 'America/Los_Angeles']) {
        const { batches } = await makeDemoRecord(nowMs, zone);
        for (const batch of batches) {
          expect(batch.receivedMs).toBeLessThan(nowMs);
          for (const op of batch.ops) expect(stampMs(op.at)).toBeLessThanOrEqual(batch.receivedMs);
        }
      }
    }
  });
});
