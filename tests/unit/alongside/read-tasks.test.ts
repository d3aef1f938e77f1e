import { describe, expect, test } from 'vitest';
import { readTasks } from '#src/routes/alongside/tasks/read-tasks.ts';
import { readLog } from '#src/routes/alongside/log/read-log.ts';
import { MONDAY, shopAtBench, type Bench } from '#tests/unit/alongside/bench.ts';
import type { Hand } from '#tests/worlds/record.ts';

async function taskOn({ record, orrin, boatId }: Bench, stageId: string, title: string): Promise<string> {
  const taskId = record.newId();
  await record.say(orrin, 'task.add', { taskId, boatId, stageId, title });
  return taskId;
}

function groupsOf({ record, boatId, strip }: Bench, hand: Hand) {
  return readTasks(record.viewAs(hand), { boatId, stageId: strip });
}

function mark({ record }: Bench, hand: Hand, taskId: string) {
  return record.say(hand, 'task.mark', { taskId, markId: record.newId(), workDate: MONDAY });
}

describe("a boat's tasks", () => {
  test('come by stage, the one that is worked on first and there even if it is empty', async () => {
    const bench = await shopAtBench();
    await taskOn(bench, bench.varnish, 'Coat one');
    expect(groupsOf(bench, bench.rosa).map(({ stageName, open }) => [stageName, open.length])).toEqual([
      ['Strip', 0],
      ['Varnish', 1],
    ]);
  });

  test('tell who started them and when, and only those standing', async () => {
    const bench = await shopAtBench();
    const taskId = await taskOn(bench, bench.strip, 'Draw the screws');
    const startId = bench.record.newId();
    await bench.record.say(bench.rosa, 'task.start', { taskId, startId });
    const shown = (hand: Hand) => groupsOf(bench, hand)[0]!.open[0]!;
    expect(shown(bench.wes).started).toMatch(/^Started by Rosa \d\d:\d\d$/);
    expect(shown(bench.wes).myStartIds).toEqual([]);
    expect(shown(bench.rosa).myStartIds).toEqual([startId]);
    await bench.record.say(bench.rosa, 'task.stop', { taskId, startIds: [startId] });
    expect(shown(bench.wes).started).toBeNull();
  });

  test('that two ticked are done once, name both and say twice', async () => {
    const bench = await shopAtBench();
    const taskId = await taskOn(bench, bench.strip, 'Draw the screws');
    await mark(bench, bench.rosa, taskId);
    await mark(bench, bench.wes, taskId);
    const [task] = groupsOf(bench, bench.rosa)[0]!.done;
    expect(task).toMatchObject({ isTwice: true, done: 'Done by you today and Wes today' });
    expect(task!.myMarkIds).toHaveLength(1);
  });

  test('may be unticked by the foreman whoever ticked them, by the crew only their own', async () => {
    const bench = await shopAtBench();
    const taskId = await taskOn(bench, bench.strip, 'Draw the screws');
    await mark(bench, bench.rosa, taskId);
    const mine = (hand: Hand) => groupsOf(bench, hand)[0]!.done[0]!.myMarkIds.length;
    expect([bench.orrin, bench.rosa, bench.wes].map(mine)).toEqual([1, 1, 0]);
  });

  test('offered on the form are the open ones, of this stage and of the others', async () => {
    const bench = await shopAtBench();
    await taskOn(bench, bench.strip, 'Draw the screws');
    await mark(bench, bench.rosa, await taskOn(bench, bench.strip, 'Lift the deck'));
    await taskOn(bench, bench.varnish, 'Coat one');
    const form = readLog(bench.record.viewAs(bench.rosa), { boatId: bench.boatId, stageId: bench.strip });
    expect(form.tasks.map(({ title }) => title)).toEqual(['Draw the screws']);
    expect(form.otherTasks.map(({ title, stageName }) => [title, stageName])).toEqual([
      ['Coat one', 'Varnish'],
    ]);
    expect(form.people.map(({ name }) => name)).toEqual(['Orrin', 'Wes']);
  });
});
