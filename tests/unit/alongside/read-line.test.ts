import { describe, expect, test } from 'vitest';
import { readAlongside } from '#src/routes/alongside/read-alongside.ts';
import { readMonths } from '#src/routes/alongside/read-earlier.ts';
import { readOwnEntries } from '#src/routes/alongside/read-own-hours.ts';
import { entryBy, MONDAY, shopAtBench, type Bench } from '#tests/unit/alongside/bench.ts';
import type { Hand } from '#tests/worlds/record.ts';

const SHA = 'a'.repeat(64);

function lineOf(bench: Bench, hand: Hand, upTo: string | null = null) {
  return readAlongside(bench.record.viewAs(hand), { boatId: bench.boatId, stageId: bench.strip }, 14, upTo)!;
}

async function findingBy(bench: Bench, hand: Hand, given: Record<string, unknown> = {}): Promise<string> {
  const { record, boatId, strip } = bench;
  const findingId = record.newId();
  await record.say(hand, 'finding.note', {
    findingId,
    boatId,
    stageId: strip,
    kind: 'rot',
    place: { partId: 'deck_beam', number: 4, side: 'port' },
    known: 'probed',
    certainty: 'suspected',
    text: 'awl goes in',
    ...given,
  });
  return findingId;
}

async function photoBy(bench: Bench, hand: Hand, given: Record<string, unknown> = {}): Promise<string> {
  const { record, boatId, strip } = bench;
  const photoId = record.newId();
  const of = { boatId, stageId: strip, sha256: SHA, width: 40, height: 30, bytes: 1200 };
  await record.say(hand, 'photo.attach', { photoId, ...of, ...given });
  return photoId;
}

async function tickBy(bench: Bench, hand: Hand, title: string, given: Record<string, unknown> = {}) {
  const { record, boatId, strip, orrin } = bench;
  const [taskId, markId] = [record.newId(), record.newId()];
  await record.say(orrin, 'task.add', { taskId, boatId, stageId: strip, title });
  await record.say(hand, 'task.mark', { taskId, markId, workDate: MONDAY, ...given });
  return { taskId, markId };
}

describe("the day's line", () => {
  test('has what came with an entry under it, and what came alone as rows of their own, newest first', async () => {
    const bench = await shopAtBench();
    const entryId = await entryBy(bench, bench.rosa);
    await findingBy(bench, bench.rosa, { entryId });
    await photoBy(bench, bench.rosa, { entryId, caption: 'the seam' });
    await tickBy(bench, bench.rosa, 'Reef the seams', { entryId });
    await findingBy(bench, bench.wes);
    await photoBy(bench, bench.wes);
    await tickBy(bench, bench.wes, 'Draw the screws');
    const { items } = lineOf(bench, bench.rosa).days[0]!;
    expect(items.map(({ item }) => item)).toEqual(['ticks', 'photos', 'note', 'entry']);
    expect(items[3]).toMatchObject({
      notes: [{ title: 'Rot, deck beam 4 port', facts: ['suspected, probed'] }],
      photos: [{ words: 'The seam' }],
      ticked: ['Reef the seams'],
    });
    expect(items[0]).toMatchObject({ author: 'Wes', titles: ['Draw the screws'] });
  });

  test("shows a finding's photos with the finding, also those that came with its entry", async () => {
    const bench = await shopAtBench();
    const entryId = await entryBy(bench, bench.rosa);
    const findingId = await findingBy(bench, bench.rosa, { entryId });
    await photoBy(bench, bench.rosa, { entryId, findingId });
    const [entry] = lineOf(bench, bench.rosa).days[0]!.items;
    expect(entry).toMatchObject({ photos: [], notes: [{ photos: [{ sha256: SHA }] }] });
  });

  test('puts photos of one place that one person took in a row together', async () => {
    const bench = await shopAtBench();
    const place = { partId: 'deck_beam', number: 4 };
    await photoBy(bench, bench.rosa, { place });
    await photoBy(bench, bench.rosa, { place });
    await photoBy(bench, bench.rosa, { place: { partId: 'stem' } });
    const { items } = lineOf(bench, bench.rosa).days[0]!;
    expect(items.map((item) => item.item === 'photos' && [item.title, item.photos.length])).toEqual([
      ['stem', 1],
      ['deck beam 4', 2],
    ]);
  });

  test('leaves a struck photo out, and shows a struck finding as struck', async () => {
    const bench = await shopAtBench();
    const photoId = await photoBy(bench, bench.rosa);
    const findingId = await findingBy(bench, bench.rosa);
    await bench.record.say(bench.rosa, 'photo.strike', { photoId, why: 'a thumb', saw: [] });
    await bench.record.say(bench.rosa, 'finding.strike', { findingId, why: 'wrong boat', saw: [] });
    const { items } = lineOf(bench, bench.wes).days[0]!;
    expect(items).toHaveLength(1);
    expect(items[0]).toMatchObject({
      item: 'note',
      struck: expect.stringMatching(/^Struck by Rosa .*: wrong boat$/),
    });
  });

  test('shows a tick whose entry was moved to another boat on its own', async () => {
    const bench = await shopAtBench();
    const entryId = await entryBy(bench, bench.rosa);
    await tickBy(bench, bench.rosa, 'Reef the seams', { entryId });
    const set = { boatId: bench.otherBoatId, stageId: null };
    await bench.record.say(bench.rosa, 'entry.amend', { entryId, set, why: 'wrong boat' });
    const { items } = lineOf(bench, bench.rosa).days[0]!;
    expect(items.map(({ item }) => item)).toEqual(['ticks']);
  });

  test('is in figures what one did oneself today, without what was struck or taken back', async () => {
    const bench = await shopAtBench();
    const entryId = await entryBy(bench, bench.rosa);
    await entryBy(bench, bench.wes, { hours: [{ personId: bench.rosa.personId, minutes: 30 }] });
    await findingBy(bench, bench.rosa, { entryId });
    await photoBy(bench, bench.rosa, { entryId });
    await photoBy(bench, bench.wes);
    const { taskId, markId } = await tickBy(bench, bench.rosa, 'Reef the seams');
    expect(lineOf(bench, bench.rosa).own).toEqual({
      minutes: 90,
      entries: 1,
      photos: 1,
      findings: 1,
      sounds: 0,
      ticks: 1,
    });
    await bench.record.say(bench.rosa, 'task.unmark', { taskId, markIds: [markId] });
    await bench.record.say(bench.rosa, 'entry.strike', { entryId, why: 'twice', saw: [] });
    expect(lineOf(bench, bench.rosa).own).toMatchObject({ minutes: 30, entries: 0, ticks: 0 });
  });

  test('from an earlier day on leaves today out', async () => {
    const bench = await shopAtBench();
    await entryBy(bench, bench.rosa, { workDate: '2026-05-01' });
    await entryBy(bench, bench.rosa, { workDate: '2026-04-24' });
    const line = lineOf(bench, bench.rosa, '2026-04-28');
    expect(line.days.map(({ day }) => day)).toEqual(['2026-04-24']);
    expect(line.isEarlier).toBe(true);
    expect(lineOf(bench, bench.rosa, MONDAY).isEarlier).toBe(false);
  });
});

test('the months of a boat are those that have something, with how many days', async () => {
  const bench = await shopAtBench();
  for (const workDate of ['2026-05-01', '2026-04-24', '2026-04-24', '2026-04-30']) {
    await entryBy(bench, bench.rosa, { workDate });
  }
  const months = readMonths(bench.record.viewAs(bench.rosa), bench.boatId);
  expect(months.map(({ words, days, lastDay }) => [words, days, lastDay])).toEqual([
    ['May 2026', 1, '2026-05-01'],
    ['April 2026', 2, '2026-04-30'],
  ]);
});

test("one's own hours of today can go into any entry that is one's own or names one, the newest first", async () => {
  const bench = await shopAtBench();
  const own = await entryBy(bench, bench.rosa);
  const named = await entryBy(bench, bench.wes, {
    text: 'Hung the door',
    hours: [{ personId: bench.rosa.personId, minutes: 45, kind: 'extra' }],
  });
  await entryBy(bench, bench.wes);
  await entryBy(bench, bench.rosa, { workDate: '2026-05-01' });
  const entries = readOwnEntries(bench.record.viewAs(bench.rosa), { boatId: bench.boatId, stageId: null });
  expect(entries).toEqual([
    { entryId: named, words: 'Hung the door', minutes: 45, kind: 'extra' },
    { entryId: own, words: 'Reefed the seams', minutes: 60, kind: null },
  ]);
});
