import { describe, expect, test } from 'vitest';
import { readBoat } from '#src/routes/boats/read-boat.ts';
import { readBoats } from '#src/routes/boats/read-boats.ts';
import { TestRecord } from '#tests/worlds/record.ts';

const MONDAY = '2026-05-04';

async function shop() {
  const record = new TestRecord();
  const orrin = record.hand('Orrin', 'foreman');
  const rosa = record.hand('Rosa', 'crew');
  const [boatId, first, second, taskId] = [record.newId(), record.newId(), record.newId(), record.newId()];
  await record.say(orrin, 'boat.add', { boatId, name: 'Brindle', arrivedOn: '2026-05-01', lengthMm: 5791 });
  await record.say(orrin, 'stage.add', {
    stageId: second,
    boatId,
    name: 'Varnish',
    order: 2,
    after: [first],
  });
  await record.say(orrin, 'stage.add', { stageId: first, boatId, name: 'Strip', order: 1, after: [] });
  await record.say(orrin, 'task.add', { taskId, boatId, stageId: first, title: 'Scrape the transom' });
  const page = (hand = orrin) => readBoat(record.viewAs(hand), boatId)!;
  return {
    record,
    orrin,
    rosa,
    boatId,
    first,
    second,
    taskId,
    page,
    list: () => readBoats(record.viewAs(orrin)),
  };
}

test('a boat nobody has added is not known', async () => {
  const { record, orrin } = await shop();
  expect(readBoat(record.viewAs(orrin), record.newId())).toBeNull();
});

describe('a boat', () => {
  test('has her stages in order, with their hours and how many tasks are done', async () => {
    const { record, rosa, boatId, second, page } = await shop();
    const hours = [{ personId: rosa.personId, minutes: 90 }];
    const entry = {
      entryId: record.newId(),
      boatId,
      stageId: second,
      workDate: MONDAY,
      text: 'Coat one',
      spoken: false,
    };
    await record.say(rosa, 'entry.write', { ...entry, hours });
    const { stages, minutes } = page();
    expect(stages.map(({ name, minutes: own, tasks }) => [name, own, tasks])).toEqual([
      ['Strip', 0, '0 of 1 task done'],
      ['Varnish', 90, null],
    ]);
    expect(minutes).toBe(90);
  });

  test('counts progress out of what there is, without what is struck', async () => {
    const { record, orrin, first, taskId, page, list } = await shop();
    await record.say(orrin, 'stage.mark', { stageId: first, markId: record.newId(), workDate: MONDAY });
    expect(list().here[0]).toMatchObject({
      stages: '1 of 2 stages finished',
      tasks: '0 of 1 task done',
      dayOfStay: 4,
    });
    await record.say(orrin, 'task.strike', { taskId, why: 'no need', saw: [] });
    expect(list().here[0]!.tasks).toBe('no tasks yet');
    expect(page().stages[0]!.tasks).toBeNull();
  });

  test('tells a stage that is finished, by whom and when, and one that was taken up again', async () => {
    const { record, orrin, first, page } = await shop();
    const markId = record.newId();
    await record.say(orrin, 'stage.mark', { stageId: first, markId, workDate: MONDAY });
    expect(page().stages[0]!.finished).toBe('finished Mon 4 May by you');
    await record.say(orrin, 'stage.unmark', { stageId: first, markIds: [markId] });
    expect(page().stages[0]!.finished).toBeNull();
  });

  test("is the foreman's to change, and shows her length in the shop's units", async () => {
    const { rosa, page } = await shop();
    expect(page().mayChange).toBe(true);
    expect(page(rosa).mayChange).toBe(false);
    expect(page().particulars).toContainEqual({ label: 'Length', words: '19 ft' });
  });

  test('stands apart once she is struck', async () => {
    const { record, orrin, boatId, list } = await shop();
    await record.say(orrin, 'boat.strike', { boatId, why: 'added twice', saw: [] });
    expect(list()).toMatchObject({ here: [], struck: [{ name: 'Brindle', why: 'added twice' }] });
  });
});
