import { expect, test } from 'vitest';
import { emptyDraft, entryText, draftProblems } from '#src/routes/alongside/log/entry-draft.ts';
import { readLastDay } from '#src/routes/alongside/log/read-last-day.ts';
import { entryBy, MONDAY, shopAtBench } from '#tests/unit/alongside/bench.ts';

test('the last day on a boat gives its stage, its people and the tasks that are open still, never its words', async () => {
  const bench = await shopAtBench();
  const { record, rosa, wes, orrin, boatId, strip, varnish } = bench;
  const hours = [rosa, wes].map(({ personId }) => ({ personId, minutes: 60 }));
  await entryBy(bench, rosa, { workDate: '2026-05-01', stageId: varnish, hours });
  await entryBy(bench, rosa, { workDate: '2026-04-30' });
  await entryBy(bench, rosa, { workDate: MONDAY, stageId: strip });
  const [open, done, others] = [record.newId(), record.newId(), record.newId()];
  for (const taskId of [open, done, others]) {
    await record.say(orrin, 'task.add', { taskId, boatId, stageId: varnish, title: 'Coat three' });
  }
  for (const [hand, taskId] of [
    [rosa, open],
    [rosa, done],
    [wes, others],
  ] as const) {
    await record.say(hand, 'task.start', { taskId, startId: record.newId() });
  }
  await record.say(rosa, 'task.mark', { taskId: done, markId: record.newId(), workDate: '2026-05-01' });
  expect(readLastDay(record.viewAs(rosa), boatId)).toEqual({
    day: '2026-05-01',
    title: 'Same as Fri 1 May',
    words: 'Varnish, with Wes, a task still open',
    take: { stageId: varnish, along: [{ personId: wes.personId, minutes: null }] },
    taskIds: [open],
  });
  expect(readLastDay(record.viewAs(wes), boatId)).toBeNull();
});

const empty = emptyDraft({ boatId: 'boat', stageId: null }, MONDAY, '0193a000-0000-7000-8000-000000000009');

test.each([
  ['varnish coat three', '74 percent', 'Not done: varnish coat three. Why: 74 percent.'],
  ['varnish!', ' called it off. ', 'Not done: varnish! Why: called it off.'],
  ['', '', ''],
])('what was not done, %o, and why, %o, reads %o', (what, why, words) => {
  expect(entryText({ ...empty, notDone: { what, why } })).toBe(words);
});

test('what was not done wants its reason', () => {
  const notDone = { what: 'varnish', why: ' ' };
  expect(draftProblems({ ...empty, notDone }, 'me')).toEqual({ text: 'Say what was not done, and why.' });
  expect(draftProblems({ ...empty, notDone: { ...notDone, why: '74 percent' } }, 'me')).toEqual({});
});
