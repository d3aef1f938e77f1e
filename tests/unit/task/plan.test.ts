import { describe, expect, test } from 'vitest';
import { nextWorkDay, readLeftOver, readPlanFor } from '#shared/task/plan.ts';
import { TestRecord, type Hand } from '#tests/worlds/record.ts';

const [MONDAY, TUESDAY, FRIDAY] = ['2026-05-04', '2026-05-05', '2026-05-08'];

async function shop() {
  const record = new TestRecord();
  const orrin = record.hand('Orrin', 'foreman');
  const [rosa, wes] = ['Rosa', 'Wes'].map((name) => record.hand(name, 'crew')) as [Hand, Hand];
  const [boatId, stageId] = [record.newId(), record.newId()];
  await record.say(orrin, 'boat.add', { boatId, name: 'Brindle' });
  await record.say(orrin, 'stage.add', { stageId, boatId, name: 'Deck', order: 1, after: [] });
  const add = async (title: string, hands: Hand[], more: object = {}) => {
    const taskId = record.newId();
    const assigneeIds = hands.map(({ personId }) => personId);
    const data = { taskId, boatId, stageId, title, assigneeIds, plannedFor: TUESDAY, ...more };
    await record.say(orrin, 'task.add', data);
    return taskId;
  };
  const plan = (hand: Hand, day = TUESDAY) => readPlanFor(record.viewAs(hand), hand.personId, day);
  return { record, orrin, rosa, wes, add, plan };
}

describe('what somebody has for a day', () => {
  test('is what is for them and planned for it, nothing else', async () => {
    const { rosa, wes, add, plan } = await shop();
    await add('Reef the seams', [rosa]);
    await add('Fit the breasthook', [wes]);
    await add('Draw the screws', [rosa], { plannedFor: FRIDAY });
    expect(plan(rosa).tasks.map(({ title }) => title)).toEqual(['Reef the seams']);
    expect(plan(rosa, MONDAY).tasks).toEqual([]);
  });

  test('shares an estimate among those it is for, and no task is longer than a day', async () => {
    const { rosa, wes, add, plan } = await shop();
    await add('Steam two ribs', [rosa, wes], { estimateMinutes: 420 });
    await add('Sweep', [rosa]);
    expect(plan(rosa)).toMatchObject({ minutes: 210, withoutEstimate: 1 });
    await add('Refasten the bottom', [wes], { estimateMinutes: 40 * 60 });
    expect(plan(wes).minutes).toBe(210 + 480);
  });

  test('has the started ones of a boat first, keeps what is done, and leaves out what is struck', async () => {
    const { record, orrin, rosa, add, plan } = await shop();
    const [first, second, third] = [
      await add('One', [rosa]),
      await add('Two', [rosa]),
      await add('Three', [rosa]),
    ];
    await record.say(rosa, 'task.start', { taskId: second, startId: record.newId() });
    await record.say(rosa, 'task.mark', { taskId: first, markId: record.newId(), workDate: TUESDAY });
    await record.say(orrin, 'task.strike', { taskId: third, why: 'no need', saw: [] });
    expect(plan(rosa).tasks.map(({ title, done }) => [title, done])).toEqual([
      ['Two', false],
      ['One', true],
    ]);
  });
});

test('what was planned before and nobody ticked off is left over, the latest first', async () => {
  const { record, rosa, wes, add } = await shop();
  await add('Prime the bilge', [rosa], { plannedFor: MONDAY });
  await add('Reef the seams', [rosa]);
  const done = await add('Sweep', [rosa]);
  await add('Fit the breasthook', [wes]);
  await record.say(rosa, 'task.mark', { taskId: done, markId: record.newId(), workDate: TUESDAY });
  const left = readLeftOver(record.viewAs(rosa), rosa.personId, FRIDAY);
  expect(left.map(({ title }) => title)).toEqual(['Reef the seams', 'Prime the bilge']);
  expect(readLeftOver(record.viewAs(rosa), rosa.personId, MONDAY)).toEqual([]);
});

test.each([
  ['2026-05-04', '2026-05-05'],
  ['2026-05-08', '2026-05-11'],
  ['2026-05-09', '2026-05-11'],
  ['2026-12-31', '2027-01-01'],
])('the working day after %s is %s', (day, next) => {
  expect(nextWorkDay(day)).toBe(next);
});
