import { describe, expect, test } from 'vitest';
import { readOrder } from '#src/routes/order-of-work/read-order.ts';
import { readWork } from '#src/routes/order-of-work/read-work.ts';
import { backTo, changesOf, draftOf, fieldsOf, problemsOf } from '#src/routes/order-of-work/task-draft.ts';
import type { TaskRow } from '#shared/task/task.ts';
import { TestRecord, type Hand } from '#tests/worlds/record.ts';

const MONDAY = '2026-05-04';

async function shop() {
  const record = new TestRecord();
  const orrin = record.hand('Orrin', 'foreman');
  const [rosa, wes] = ['Rosa', 'Wes'].map((name) => record.hand(name, 'crew')) as [Hand, Hand];
  const [boatId, strip, deck, taskId] = [record.newId(), record.newId(), record.newId(), record.newId()];
  await record.say(orrin, 'boat.add', { boatId, name: 'Brindle' });
  await record.say(orrin, 'stage.add', { stageId: strip, boatId, name: 'Strip', order: 1, after: [] });
  await record.say(orrin, 'stage.add', { stageId: deck, boatId, name: 'Deck', order: 2, after: [strip] });
  const task = { taskId, boatId, stageId: strip, title: 'Scrape the transom', estimateMinutes: 120 };
  await record.say(orrin, 'task.add', task);
  const order = (hand: Hand = orrin) => readOrder(record.viewAs(hand), boatId)!;
  const states = () => order().stages.map(({ row, state, waitsFor }) => [row.name, state, waitsFor]);
  const finish = (stageId: string, markId = record.newId()) =>
    record.say(orrin, 'stage.mark', { stageId, markId, workDate: MONDAY });
  return { record, orrin, rosa, wes, boatId, strip, deck, taskId, order, states, finish };
}

describe('what may start now', () => {
  test('is what comes after nothing that is open', async () => {
    const { strip, states, finish } = await shop();
    expect(states()).toEqual([
      ['Strip', 'free', null],
      ['Deck', 'waits', 'after Strip'],
    ]);
    await finish(strip);
    expect(states()).toEqual([
      ['Strip', 'finished', null],
      ['Deck', 'free', null],
    ]);
  });

  test('waits again once the stage before is taken up again', async () => {
    const { record, orrin, strip, states, finish } = await shop();
    const markId = record.newId();
    await finish(strip, markId);
    await record.say(orrin, 'stage.unmark', { stageId: strip, markIds: [markId] });
    expect(states()[1]).toEqual(['Deck', 'waits', 'after Strip']);
  });

  test('does not wait for a stage that was struck', async () => {
    const { record, orrin, strip, states } = await shop();
    await record.say(orrin, 'stage.strike', { stageId: strip, why: 'not on this boat', saw: [] });
    expect(states()).toEqual([['Deck', 'free', null]]);
  });

  test('a stage that was begun out of its order is under way, and still says what comes before it', async () => {
    const { record, rosa, boatId, deck, states } = await shop();
    const hours = [{ personId: rosa.personId, minutes: 30 }];
    const entry = {
      entryId: record.newId(),
      boatId,
      stageId: deck,
      workDate: MONDAY,
      text: 'Tried it',
      spoken: false,
    };
    await record.say(rosa, 'entry.write', { ...entry, hours });
    expect(states()[1]).toEqual(['Deck', 'under-way', 'after Strip']);
  });
});

describe('a task', () => {
  test('is open, then started by somebody, then done by whoever ticked it', async () => {
    const { record, rosa, taskId, order } = await shop();
    const task = () => [...order().stages[0]!.open, ...order().stages[0]!.done][0]!;
    expect(task()).toMatchObject({ state: 'open', words: null });
    await record.say(rosa, 'task.start', { taskId, startId: record.newId() });
    expect(task()).toMatchObject({ state: 'started' });
    expect(task().words).toMatch(/^started by Rosa \d\d:\d\d$/);
    await record.say(rosa, 'task.mark', { taskId, markId: record.newId(), workDate: MONDAY });
    expect(task()).toMatchObject({ state: 'done', words: 'done by Rosa Mon 4 May' });
  });

  test('names both who ticked it', async () => {
    const { record, rosa, wes, taskId, order } = await shop();
    for (const hand of [rosa, wes])
      await record.say(hand, 'task.mark', { taskId, markId: record.newId(), workDate: MONDAY });
    expect(order().stages[0]!.done[0]!.words).toBe('done twice, by Rosa Mon 4 May and Wes Mon 4 May');
  });

  test('says for whom, for when and where, and whose start and tick one may take back', async () => {
    const { record, orrin, rosa, wes, taskId, order } = await shop();
    const set = {
      assigneeIds: [rosa.personId],
      plannedFor: '2026-05-05',
      place: { partId: 'transom', side: 'port' },
    };
    await record.say(orrin, 'task.amend', { taskId, set });
    const startId = record.newId();
    await record.say(rosa, 'task.start', { taskId, startId });
    expect(order(rosa).stages[0]!.open[0]).toMatchObject({
      assigned: 'for you',
      planned: 'planned for Tue 5 May',
      where: 'transom port',
      myStartIds: [startId],
    });
    expect(order(wes).stages[0]!.open[0]!.myStartIds).toEqual([]);
  });

  test('that was struck is listed apart and in no sum', async () => {
    const { record, orrin, taskId, order } = await shop();
    expect(order()).toMatchObject({ openTasks: 1, estimateMinutes: 120 });
    await record.say(orrin, 'task.strike', { taskId, why: 'no need', saw: [] });
    expect(order()).toMatchObject({ openTasks: 0, estimateMinutes: null });
    expect(order().struckTasks.map(({ title }) => title)).toEqual(['Scrape the transom']);
  });
});

test('hours so far stand against the estimate, by stage and for the boat, those without a stage too', async () => {
  const { record, rosa, boatId, strip, order } = await shop();
  for (const stageId of [strip, null]) {
    const hours = [{ personId: rosa.personId, minutes: 90 }];
    const entry = {
      entryId: record.newId(),
      boatId,
      stageId,
      workDate: MONDAY,
      text: 'Scraped',
      spoken: false,
    };
    await record.say(rosa, 'entry.write', { ...entry, hours });
  }
  expect(order()).toMatchObject({ minutes: 180, estimateMinutes: 120 });
  expect(order().stages[0]).toMatchObject({ minutes: 90, estimateMinutes: 120 });
});

test('the boats tell what is under way, what may start and who is on what', async () => {
  const { record, orrin, rosa, taskId } = await shop();
  await record.say(rosa, 'task.start', { taskId, startId: record.newId() });
  const [boat] = readWork(record.viewAs(orrin));
  expect(boat).toMatchObject({ name: 'Brindle', underWay: ['Strip'], free: [], openTasks: 1, doneTasks: 0 });
  expect(boat!.started.map(({ row }) => row.title)).toEqual(['Scrape the transom']);
});

describe('the form of a task', () => {
  const row = {
    title: 'Scarf',
    stageId: 's',
    boatId: 'b',
    place: { partId: 'stringer', side: 'port' },
  } as TaskRow;

  test('says only what was changed, and leaves the part as it was', () => {
    const draft = draftOf(row, 's');
    expect(changesOf(row, draft)).toEqual({});
    expect(changesOf(row, { ...draft, estimate: '2 1/2', numbers: '6-9' })).toEqual({
      estimateMinutes: 150,
      place: { partId: 'stringer', side: 'port', number: 6, toNumber: 9 },
    });
    expect(changesOf(row, { ...draft, stageId: 't' })).toEqual({ boatId: 'b', stageId: 't' });
  });

  test('is taken back to what stood before', () => {
    const set = changesOf(row, {
      ...draftOf(row, 's'),
      title: 'Scarf it',
      plannedFor: MONDAY,
      side: 'centre',
    });
    expect(backTo(row, set)).toEqual({ title: 'Scarf', plannedFor: null, place: row.place });
  });

  test('gives a new task what was given and nothing else', () => {
    const draft = { ...draftOf(null, 's'), title: ' Sweep ' };
    expect(fieldsOf(draft)).toEqual({ title: 'Sweep', stageId: 's' });
    expect(fieldsOf({ ...draft, estimate: '40', numbers: '4', side: 'port' })).toMatchObject({
      estimateMinutes: 2400,
      place: { side: 'port', number: 4 },
    });
  });

  test('asks again where something cannot be read', () => {
    expect(problemsOf(draftOf(row, 's'))).toEqual({});
    const wrong = { ...draftOf(row, 's'), title: ' ', estimate: 'soon', numbers: 'four' };
    expect(Object.keys(problemsOf(wrong))).toEqual(['title', 'estimate', 'numbers']);
  });
});
