import { describe, expect, test } from 'vitest';
import { give, moveToDay, moveToPerson, takeOff, type PlanChange } from '#src/routes/plan/plan-changes.ts';
import { readBoard } from '#src/routes/plan/read-board.ts';
import { readOwnPlan } from '#src/routes/plan/read-own-plan.ts';
import { readBoatsToPick, readPick } from '#src/routes/plan/read-pick.ts';
import { TestRecord, type Hand } from '#tests/worlds/record.ts';

const [MONDAY, TUESDAY, FRIDAY] = ['2026-05-04', '2026-05-05', '2026-05-08'];

async function shop() {
  const record = new TestRecord();
  const orrin = record.hand('Orrin', 'foreman');
  const [rosa, wes] = ['Rosa', 'Wes'].map((name) => record.hand(name, 'crew')) as [Hand, Hand];
  const [boatId, strip, deck] = [record.newId(), record.newId(), record.newId()];
  await record.say(orrin, 'boat.add', { boatId, name: 'Brindle' });
  await record.say(orrin, 'stage.add', { stageId: strip, boatId, name: 'Strip', order: 1, after: [] });
  await record.say(orrin, 'stage.add', { stageId: deck, boatId, name: 'Deck', order: 2, after: [strip] });
  const add = async (title: string, more: object = {}) => {
    const taskId = record.newId();
    await record.say(orrin, 'task.add', { taskId, boatId, stageId: strip, title, ...more });
    return taskId;
  };
  const task = (id: string) => record.viewAs(orrin).find('task', id)!;
  const board = (day = TUESDAY) => readBoard(record.viewAs(orrin), day);
  const onBoard = (day = TUESDAY) =>
    Object.fromEntries(board(day).people.map(({ name, tasks }) => [name, tasks.map(({ row }) => row.title)]));
  const hold = async (holdings: PlanChange['holdings']) => {
    for (const { kind, data } of holdings) await record.say(orrin, kind, data as Record<string, unknown>);
  };
  return { record, orrin, rosa, wes, boatId, strip, deck, add, task, board, onBoard, hold };
}

describe('a change of the plan', () => {
  test('gives a person work for a day, and whoever it is for besides stays', async () => {
    const { rosa, wes, add, task, onBoard, hold } = await shop();
    const ids = [await add('Reef the seams'), await add('Steam two ribs', { assigneeIds: [wes.personId] })];
    const change = give(ids.map(task), rosa.personId, TUESDAY);
    await hold(change.holdings);
    expect(onBoard()).toEqual({ Rosa: ['Reef the seams', 'Steam two ribs'], Wes: ['Steam two ribs'] });
    await hold(change.back);
    expect(onBoard()).toEqual({ Rosa: [], Wes: [] });
    expect(task(ids[1]!).assigneeIds).toEqual([wes.personId]);
  });

  test.each(['person', 'day', 'off'] as const)('moves it (%s), and back again', async (to) => {
    const { rosa, wes, add, task, onBoard, hold } = await shop();
    const id = await add('Reef the seams', { assigneeIds: [rosa.personId], plannedFor: TUESDAY });
    const change = {
      person: () => moveToPerson(task(id), rosa.personId, wes.personId),
      day: () => moveToDay([task(id)], FRIDAY),
      off: () => takeOff(task(id), rosa.personId),
    }[to]();
    await hold(change.holdings);
    expect(onBoard()).toEqual({ Rosa: [], Wes: to === 'person' ? ['Reef the seams'] : [] });
    expect(onBoard(FRIDAY)).toEqual({ Rosa: to === 'day' ? ['Reef the seams'] : [], Wes: [] });
    await hold(change.back);
    expect(onBoard()).toEqual({ Rosa: ['Reef the seams'], Wes: [] });
  });

  test('that takes one of two off leaves the other', async () => {
    const { rosa, wes, add, task, onBoard, hold } = await shop();
    const both = [rosa.personId, wes.personId];
    const id = await add('Steam two ribs', { assigneeIds: both, plannedFor: TUESDAY });
    await hold(takeOff(task(id), rosa.personId).holdings);
    expect(onBoard()).toEqual({ Rosa: [], Wes: ['Steam two ribs'] });
  });
});

test('what was not done is left over on every later board until somebody ticks it off', async () => {
  const { record, rosa, add, board } = await shop();
  const id = await add('Prime the bilge', { assigneeIds: [rosa.personId], plannedFor: MONDAY });
  const leftOver = () => board().people[0]!.leftOver.map(({ row, plannedFor }) => [row.title, plannedFor]);
  expect(leftOver()).toEqual([['Prime the bilge', 'today']]);
  await record.say(rosa, 'task.mark', { taskId: id, markId: record.newId(), workDate: MONDAY });
  expect(leftOver()).toEqual([]);
});

test('what is planned for a day that has not come is not left over from it', async () => {
  const { rosa, add, board } = await shop();
  await add('Reef the seams', { assigneeIds: [rosa.personId], plannedFor: TUESDAY });
  expect(board(FRIDAY).people[0]).toMatchObject({ tasks: [], leftOver: [] });
});

test('a task that is longer than a day fills it, and the whole estimate is told', async () => {
  const { rosa, add, board } = await shop();
  const assigneeIds = [rosa.personId];
  await add('Refasten the bottom', { assigneeIds, plannedFor: TUESDAY, estimateMinutes: 1200 });
  await add('Sweep', { assigneeIds, plannedFor: TUESDAY, estimateMinutes: 30 });
  const lines = board().people[0]!.tasks.map(({ share, longerMinutes }) => [share, longerMinutes]);
  expect(lines).toEqual([
    [480, 1200],
    [30, null],
  ]);
});

test('a task of two counts once on the board, and half of its estimate in each day', async () => {
  const { rosa, wes, add, board } = await shop();
  const assigneeIds = [rosa.personId, wes.personId];
  await add('Steam two ribs', { assigneeIds, plannedFor: TUESDAY, estimateMinutes: 420 });
  expect(board().taskCount).toBe(1);
  expect(board().people.map(({ minutes }) => minutes)).toEqual([210, 210]);
});

describe('what is offered', () => {
  test('is the open tasks, theirs first, and what waits for another stage last', async () => {
    const { record, rosa, boatId, deck, add, orrin } = await shop();
    await add('Lay the king plank', { stageId: deck });
    await add('Draw the screws');
    await add('Scrape the transom', { assigneeIds: [rosa.personId] });
    const done = await add('Sweep');
    await record.say(rosa, 'task.mark', { taskId: done, markId: record.newId(), workDate: MONDAY });
    const stages = readPick(record.viewAs(orrin), boatId, rosa.personId, TUESDAY);
    expect(
      stages.map(({ name, notNow, tasks }) => [name, notNow, tasks.map(({ row }) => row.title)]),
    ).toEqual([
      ['Strip', null, ['Scrape the transom', 'Draw the screws']],
      ['Deck', 'comes after Strip, not finished', ['Lay the king plank']],
    ]);
  });

  test('begins with the boat that the person worked on last', async () => {
    const { record, orrin, rosa, boatId, add } = await shop();
    await add('Draw the screws');
    const [other, stageId] = [record.newId(), record.newId()];
    await record.say(orrin, 'boat.add', { boatId: other, name: 'Alder' });
    await record.say(orrin, 'stage.add', { stageId, boatId: other, name: 'Deck', order: 1, after: [] });
    await add('Caulk', { boatId: other, stageId });
    const names = () => readBoatsToPick(record.viewAs(orrin), rosa.personId).map(({ name }) => name);
    expect(names()).toEqual(['Alder', 'Brindle']);
    const entry = {
      entryId: record.newId(),
      boatId,
      workDate: MONDAY,
      text: 'Scraped',
      spoken: false,
      hours: [],
    };
    await record.say(rosa, 'entry.write', entry);
    expect(names()).toEqual(['Brindle', 'Alder']);
  });
});

test("the crew's own plan has today, the next working day and every later one with something", async () => {
  const { record, rosa, wes, add } = await shop();
  await add('Reef the seams', { assigneeIds: [rosa.personId], plannedFor: FRIDAY });
  await add('Prime the bilge', { assigneeIds: [rosa.personId], plannedFor: '2026-05-01' });
  await add('Caulk', { assigneeIds: [wes.personId], plannedFor: TUESDAY });
  const { days, leftOver } = readOwnPlan(record.viewAs(rosa));
  expect(days.map(({ day, tasks }) => [day, tasks.length])).toEqual([
    [MONDAY, 0],
    [TUESDAY, 0],
    [FRIDAY, 1],
  ]);
  expect(leftOver.map(({ row }) => row.title)).toEqual(['Prime the bilge']);
});
