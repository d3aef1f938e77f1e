import { describe, expect, test } from 'vitest';
import { readEntryPage } from '#src/routes/alongside/entry/read-entry-page.ts';
import { settlingOp } from '#src/routes/alongside/entry/settle.ts';
import { changedHours, readFigures } from '#src/routes/alongside/entry/read-hours-form.ts';
import { entryBy, shopAtBench, type Bench } from '#tests/unit/alongside/bench.ts';
import type { Hand } from '#tests/worlds/record.ts';

const pageOf = ({ record }: Bench, hand: Hand, entryId: string) =>
  readEntryPage(record.viewAs(hand), entryId)!;

describe('the history of an entry', () => {
  test('keeps every earlier value with who, when and why', async () => {
    const bench = await shopAtBench();
    const entryId = await entryBy(bench, bench.rosa);
    const amend = (hand: Hand, set: object, why: string) =>
      bench.record.say(hand, 'entry.amend', { entryId, set, why });
    await amend(bench.rosa, { text: 'Reefed the port seams' }, 'side was missing');
    await amend(bench.orrin, { text: 'Reefed the garboard seams' }, 'seen for myself');
    await amend(bench.rosa, { hours: [{ personId: bench.rosa.personId, minutes: 45, kind: null }] }, 'tea');
    const { history } = pageOf(bench, bench.wes, entryId);
    expect(history.map(({ who, did, why }) => [who, did, why])).toEqual([
      ['Rosa', "changed Rosa's hours", 'tea'],
      ['Orrin', 'changed the words', 'seen for myself'],
      ['Rosa', 'changed the words', 'side was missing'],
      ['Rosa', 'wrote it', null],
    ]);
    expect(history[0]!.before[0]!.minutes).toBe(60);
    expect(history[0]!.value!.minutes).toBe(45);
    expect(history[1]!.before).toEqual([{ words: 'Reefed the port seams' }]);
    expect(history[3]!.value).toEqual({ words: 'Reefed the seams' });
  });

  test('tells of strikes and restores, and of additions taken back', async () => {
    const bench = await shopAtBench();
    const entryId = await entryBy(bench, bench.rosa);
    const additionId = bench.record.newId();
    await bench.record.say(bench.wes, 'entry.addTo', { entryId, additionId, text: 'Bag 14 has the screws' });
    await bench.record.say(bench.wes, 'entry.takeBack', { entryId, additionIds: [additionId] });
    await bench.record.say(bench.rosa, 'entry.strike', { entryId, why: 'wrong day', saw: [] });
    await bench.record.say(bench.rosa, 'entry.restore', { entryId, why: 'was right' });
    const { history } = pageOf(bench, bench.wes, entryId);
    expect(history.map(({ did, mark }) => [did, mark])).toEqual([
      ['restored it', 'sent'],
      ['struck it', 'struck'],
      ['took back what was added', 'sent'],
      ['added', 'struck'],
      ['wrote it', 'sent'],
    ]);
  });
});

describe('what a person may do with an entry', () => {
  test('is everything for its author and the foreman', async () => {
    const bench = await shopAtBench();
    const entryId = await entryBy(bench, bench.rosa);
    for (const hand of [bench.rosa, bench.orrin]) {
      const { actions, refusal } = pageOf(bench, hand, entryId);
      expect(actions).toMatchObject({
        words: true,
        move: true,
        day: true,
        addTo: true,
        strike: true,
        restore: false,
      });
      expect(refusal).toBeNull();
    }
  });

  test('is adding for the others, who are told so', async () => {
    const bench = await shopAtBench();
    const entryId = await entryBy(bench, bench.rosa);
    const { actions, refusal } = pageOf(bench, bench.wes, entryId);
    expect(actions).toMatchObject({
      words: false,
      move: false,
      day: false,
      hoursOf: [],
      addTo: true,
      strike: false,
    });
    expect(refusal).toBe('Only Rosa or the foreman can change it or strike it. You can add to it.');
  });

  test('is their own figure for those who are named in its hours', async () => {
    const bench = await shopAtBench();
    const { rosa, wes } = bench;
    const hours = [rosa, wes].map(({ personId }) => ({ personId, minutes: 120 }));
    const entryId = await entryBy(bench, rosa, { hours });
    const { actions, refusal } = pageOf(bench, wes, entryId);
    expect(actions.hoursOf).toEqual([wes.personId]);
    expect(actions.hoursOfAnybody).toBe(false);
    expect(refusal).toContain('Your own hours are yours to change.');
  });

  test('is bringing it back once it is struck, for those who may', async () => {
    const bench = await shopAtBench();
    const entryId = await entryBy(bench, bench.rosa);
    await bench.record.say(bench.rosa, 'entry.strike', { entryId, why: 'twice', saw: [] });
    await bench.record.say(bench.rosa, 'entry.strike', {
      entryId,
      why: 'twice',
      saw: [opOf(bench, entryId)],
    });
    expect(pageOf(bench, bench.rosa, entryId).actions).toMatchObject({
      restore: true,
      strike: false,
      words: false,
    });
    expect(pageOf(bench, bench.wes, entryId).refusal).toBe('Only Rosa or the foreman can bring it back.');
  });

  test('is nothing where the entry is not on the device', async () => {
    const { record, rosa } = await shopAtBench();
    expect(readEntryPage(record.viewAs(rosa), record.newId())).toBeNull();
  });
});

describe('hours that are changed', () => {
  test('go as the figures that are no longer what stands, and only those', async () => {
    const bench = await shopAtBench();
    const { rosa, wes } = bench;
    const hours = [rosa, wes].map(({ personId }) => ({ personId, minutes: 120 }));
    const entryId = await entryBy(bench, rosa, { hours });
    const { row, actions } = pageOf(bench, rosa, entryId);
    const figures = readFigures(bench.record.viewAs(rosa), row, actions);
    expect(figures.map(({ label }) => label)).toEqual(['Your hours', "Wes's hours"]);
    expect(changedHours(row, figures)).toEqual([]);
    const changed = figures.map((figure) =>
      figure.personId === wes.personId ? { ...figure, minutes: null } : figure,
    );
    expect(changedHours(row, changed)).toEqual([{ personId: wes.personId, minutes: 0, kind: null }]);
  });
});

describe('a loose end', () => {
  test('is settled by saying one of its values over all of them', async () => {
    const bench = await shopAtBench();
    const entryId = await entryBy(bench, bench.rosa);
    const over = { text: [opOf(bench, entryId)] };
    await bench.record.say(bench.rosa, 'entry.amend', { entryId, set: { text: 'Port seams' } }, over);
    await bench.record.say(bench.orrin, 'entry.amend', { entryId, set: { text: 'Garboards' } }, over);
    const page = pageOf(bench, bench.rosa, entryId);
    const [end] = page.line.ends;
    const port = end!.values.find(({ words }) => words === 'Port seams')!;
    const op = settlingOp(page, end!, port.opId)!;
    expect(op).toMatchObject({ kind: 'entry.amend', data: { entryId, set: { text: 'Port seams' } } });
    await bench.record.say(bench.rosa, op.kind, op.data as Record<string, unknown>);
    expect(pageOf(bench, bench.rosa, entryId).line).toMatchObject({ words: 'Port seams', ends: [] });
  });

  test('is not settled by somebody who may not set the field', async () => {
    const bench = await shopAtBench();
    const entryId = await entryBy(bench, bench.rosa);
    const over = { text: [opOf(bench, entryId)] };
    await bench.record.say(bench.rosa, 'entry.amend', { entryId, set: { text: 'Port seams' } }, over);
    await bench.record.say(bench.orrin, 'entry.amend', { entryId, set: { text: 'Garboards' } }, over);
    const page = pageOf(bench, bench.wes, entryId);
    const [end] = page.line.ends;
    expect(end!.values.map(({ opId }) => settlingOp(page, end!, opId))).toEqual([null, null]);
  });

  test('of a strike that did not see what came is closed by restoring, or by striking again', async () => {
    const bench = await shopAtBench();
    const entryId = await entryBy(bench, bench.rosa);
    const saw = [opOf(bench, entryId)];
    await bench.record.say(bench.wes, 'entry.addTo', {
      entryId,
      additionId: bench.record.newId(),
      text: 'Bag 14',
    });
    await bench.record.say(bench.rosa, 'entry.strike', { entryId, why: 'twice', saw });
    const { actions, line } = pageOf(bench, bench.rosa, entryId);
    expect(line.ends[0]!.values.map(({ words }) => words)).toEqual(['Bag 14']);
    expect(actions).toMatchObject({ strike: true, restore: true });
  });
});

function opOf({ record }: Bench, entryId: string): string {
  return (record.store.row('entry', entryId) as { madeBy: string }).madeBy;
}
