import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import type { EntryRow } from '#shared/entry/entry.ts';
import { hoursLines, sumHours } from '#shared/entry/sums.ts';
import { readDaySheet } from '#src/routes/day-sheet/read-day-sheet.ts';
import { originWords, readSplit } from '#src/routes/day-sheet/split/read-split.ts';
import {
  figuresOf,
  newSplit,
  sentencesOf,
  splitChange,
  splitProblem,
  type SplitDraft,
} from '#src/routes/day-sheet/split/split-draft.ts';
import type { Holding } from '#src/replica/replica.ts';
import { TestRecord, type Hand } from '#tests/worlds/record.ts';

const MONDAY = '2026-05-04';
const TEXT = 'Reefed the seams. Then an hour on the other boat.';

async function shop() {
  const record = new TestRecord();
  const orrin = record.hand('Orrin', 'foreman');
  const [rosa, wes] = ['Rosa', 'Wes'].map((name) => record.hand(name, 'crew')) as [Hand, Hand];
  const [boatId, otherId, entryId] = [record.newId(), record.newId(), record.newId()];
  await record.say(orrin, 'boat.add', { boatId, name: 'Brindle' });
  await record.say(orrin, 'boat.add', { boatId: otherId, name: 'Mallow' });
  const hours = [
    { personId: rosa.personId, minutes: 360, kind: 'agreed' },
    { personId: wes.personId, minutes: 240 },
  ];
  await record.say(rosa, 'entry.write', {
    entryId,
    boatId,
    workDate: MONDAY,
    text: TEXT,
    spoken: true,
    hours,
  });
  const entry = () => record.store.row('entry', entryId) as EntryRow;
  const lines = () => hoursLines(record.viewAs(orrin).all('entry'));
  // a phone itself says what a strike saw
  const hold = async (holdings: Holding[]) => {
    for (const { kind, data } of holdings)
      await record.say(orrin, kind, { ...(kind === 'entry.strike' ? { saw: [] } : {}), ...data });
  };
  const split = async (part: Partial<SplitDraft>) => {
    const draft: SplitDraft = { ...newSplit(entry()), why: 'two boats in one', boatId: otherId, ...part };
    const ids = { secondId: record.newId(), additionId: record.newId() };
    const said = originWords(record.viewAs(orrin), entry(), draft.why);
    const change = splitChange(entry(), draft, ids, said);
    await hold(change.holdings);
    return {
      ...ids,
      back: () => hold(change.back),
      second: () => record.store.row('entry', ids.secondId) as EntryRow,
    };
  };
  return { record, orrin, rosa, wes, boatId, otherId, entryId, entry, lines, split };
}

describe('an entry that is split in two', () => {
  test('keeps every person’s total, and the second part lies where it was put', async () => {
    const { rosa, wes, boatId, otherId, entry, lines, split } = await shop();
    const before = sumHours(lines(), 'person');
    const [firstText, secondText] = sentencesOf(TEXT) as [string, string];
    const { second } = await split({ firstText, secondText, moved: { [rosa.personId]: 60 } });
    expect(sumHours(lines(), 'person')).toEqual(before);
    expect(Object.fromEntries(sumHours(lines(), 'boat'))).toEqual({ [boatId]: 540, [otherId]: 60 });
    expect(entry().text).toBe('Reefed the seams.');
    expect(second()).toMatchObject({
      text: 'Then an hour on the other boat.',
      workDate: MONDAY,
      spoken: false,
    });
    expect(second().hours).toEqual([
      { personId: rosa.personId, minutes: 60, kind: 'agreed', proposed: false },
    ]);
    expect(entry().hours.find(({ personId }) => personId === wes.personId)!.minutes).toBe(240);
  });

  test('says why in both, and the second names the first', async () => {
    const { rosa, entry, split } = await shop();
    const { second } = await split({ secondText: 'On the other boat', moved: { [rosa.personId]: 60 } });
    expect(entry().statements.findLast(({ field }) => field.startsWith('hours/'))!.why).toBe(
      'two boats in one',
    );
    expect(second().additions.map(({ text }) => text)).toEqual([
      "Divided from Rosa's entry of Mon 4 May on Brindle · no stage: two boats in one",
    ]);
  });

  test('stands under the person and not under the foreman, and is named as logged by him', async () => {
    const { record, rosa, orrin, split } = await shop();
    await split({ secondText: 'On the other boat', moved: { [rosa.personId]: 60 } });
    const { people } = readDaySheet(record.viewAs(rosa), MONDAY);
    expect(people.map(({ name, minutes }) => [name, minutes])).toEqual([
      ['Rosa', 360],
      ['Wes', 240],
    ]);
    expect(people[0]!.entries.map(({ author }) => author)).toEqual([null, 'Orrin']);
    expect(readDaySheet(record.viewAs(orrin), MONDAY).people.map(({ name }) => name)).toEqual([
      'Rosa',
      'Wes',
    ]);
  });

  test('is whole again once it is undone', async () => {
    const { rosa, entry, lines, split } = await shop();
    const before = entry();
    const { back, second } = await split({
      firstText: 'Reefed',
      secondText: 'Other',
      moved: { [rosa.personId]: 360 },
    });
    expect(entry().hours).toHaveLength(1);
    await back();
    expect(entry()).toMatchObject({ text: before.text, boatId: before.boatId });
    expect(entry().hours.map(({ personId, minutes }) => [personId, minutes])).toEqual(
      before.hours.map(({ personId, minutes }) => [personId, minutes]),
    );
    expect(second().struck?.why).toBe('undone at once');
    expect(lines().reduce((sum, { minutes }) => sum + minutes, 0)).toBe(600);
  });

  test('has other kinds of hours in the second part where they are said', async () => {
    const { rosa, split } = await shop();
    const { second } = await split({ secondText: 'Other', kind: 'extra', moved: { [rosa.personId]: 60 } });
    expect(second().hours[0]).toMatchObject({ kind: 'extra', proposed: false });
  });
});

test('the two parts of every figure come to what was there, whatever is asked for', async () => {
  const { rosa, wes, entry } = await shop();
  fc.assert(
    fc.property(
      fc.integer({ min: -100, max: 2000 }),
      fc.integer({ min: -100, max: 2000 }),
      (first, second) => {
        const moved = { [rosa.personId]: first, [wes.personId]: second };
        for (const figure of figuresOf(entry(), { ...newSplit(entry()), moved })) {
          expect(figure.firstMinutes + figure.secondMinutes).toBe(figure.beforeMinutes);
          expect(Math.min(figure.firstMinutes, figure.secondMinutes)).toBeGreaterThanOrEqual(0);
        }
      },
    ),
  );
});

describe('nothing is divided', () => {
  test('while a part is empty or no reason is given', async () => {
    const { rosa, wes, entry } = await shop();
    const problem = (part: Partial<SplitDraft>) =>
      splitProblem(entry(), { ...newSplit(entry()), why: 'so', ...part });
    expect(problem({})).toBe('Put words or hours into the second part.');
    expect(problem({ secondText: 'More' })).toBe('Take words or hours out of the first part.');
    const all = { [rosa.personId]: 360, [wes.personId]: 240 };
    expect(problem({ firstText: '', secondText: TEXT, moved: all })).toMatch(/^Leave something/);
    expect(problem({ moved: { [rosa.personId]: 15 }, why: ' ' })).toBe('Write why it is divided.');
    expect(problem({ moved: { [rosa.personId]: 15 } })).toBeNull();
  });

  test('of what is struck, and a loose end is said to come first', async () => {
    const { record, orrin, rosa, wes, entryId, entry } = await shop();
    const made = { [`hours/${wes.personId}`]: [entry().madeBy] };
    for (const [hand, minutes] of [
      [rosa, 180],
      [wes, 270],
    ] as const) {
      const hours = [{ personId: wes.personId, minutes, kind: null }];
      await record.say(hand, 'entry.amend', { entryId, set: { hours } }, made);
    }
    expect(readSplit(record.viewAs(orrin), entryId)!.isLoose).toBe(true);
    await record.say(orrin, 'entry.strike', { entryId, why: 'no', saw: [] });
    expect(readSplit(record.viewAs(orrin), entryId)).toBeNull();
  });
});
