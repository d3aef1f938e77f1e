import fc from 'fast-check';
import { expect, test } from 'vitest';
import type { EntryRow } from '#shared/entry/entry.ts';
import { hoursLines, sumHours, totalMinutes, type Cut } from '#shared/entry/sums.ts';
import { TestRecord, type Hand } from '#tests/worlds/record.ts';

const CUTS: Cut[] = ['person', 'boat', 'stage', 'day', 'kind'];

async function shopWithTwoBoats() {
  const record = new TestRecord();
  const orrin = record.hand('Orrin', 'foreman');
  const rosa = record.hand('Rosa', 'crew');
  const wes = record.hand('Wes', 'crew');
  const [boatA, boatB, stageA] = [record.newId(), record.newId(), record.newId()];
  await record.say(orrin, 'boat.add', { boatId: boatA, name: 'Penny Candle' });
  await record.say(orrin, 'boat.add', { boatId: boatB, name: 'Brindle' });
  await record.say(orrin, 'stage.add', { stageId: stageA, boatId: boatA, name: 'Deck', order: 1, after: [] });
  return { record, orrin, rosa, wes, boatA, boatB, stageA };
}

type Shop = Awaited<ReturnType<typeof shopWithTwoBoats>>;

async function log(
  { record, boatA, stageA }: Shop,
  hand: Hand,
  hours: { personId: string; minutes: number }[],
) {
  const entryId = record.newId();
  const entry = {
    entryId,
    boatId: boatA,
    stageId: stageA,
    workDate: '2026-05-04',
    text: 'Reefed seams',
    spoken: false,
  };
  await record.say(hand, 'entry.write', { ...entry, hours });
  return entryId;
}

function entriesOf({ record }: Shop): EntryRow[] {
  return record.store
    .feed(0)
    .filter(({ entity }) => entity === 'entry')
    .map(({ row }) => row as EntryRow);
}

function linesOf(shop: Shop) {
  return hoursLines(entriesOf(shop));
}

test('an entry that is given twice counts once', async () => {
  const shop = await shopWithTwoBoats();
  await log(shop, shop.rosa, [{ personId: shop.rosa.personId, minutes: 90 }]);
  const entries = entriesOf(shop);
  expect(totalMinutes(hoursLines([...entries, ...entries]))).toBe(90);
});

test('a struck entry counts nothing, and a restored one counts again', async () => {
  const shop = await shopWithTwoBoats();
  const entryId = await log(shop, shop.rosa, [{ personId: shop.rosa.personId, minutes: 90 }]);
  await shop.record.say(shop.rosa, 'entry.strike', { entryId, why: 'wrong day', saw: [] });
  expect(totalMinutes(linesOf(shop))).toBe(0);
  await shop.record.say(shop.rosa, 'entry.restore', { entryId, why: 'it was right' });
  expect(totalMinutes(linesOf(shop))).toBe(90);
});

test('hours put to 0 leave every sum', async () => {
  const shop = await shopWithTwoBoats();
  const entryId = await log(shop, shop.rosa, [
    { personId: shop.rosa.personId, minutes: 240 },
    { personId: shop.wes.personId, minutes: 210 },
  ]);
  await shop.record.say(shop.wes, 'entry.amend', {
    entryId,
    set: { hours: [{ personId: shop.wes.personId, minutes: 0, kind: null }] },
  });
  expect(sumHours(linesOf(shop), 'person')).toEqual(new Map([[shop.rosa.personId, 240]]));
});

test('a moved entry counts under its new boat alone', async () => {
  const shop = await shopWithTwoBoats();
  const entryId = await log(shop, shop.rosa, [{ personId: shop.rosa.personId, minutes: 60 }]);
  await shop.record.say(shop.rosa, 'entry.amend', { entryId, set: { boatId: shop.boatB, stageId: null } });
  expect(sumHours(linesOf(shop), 'boat')).toEqual(new Map([[shop.boatB, 60]]));
  expect(sumHours(linesOf(shop), 'stage')).toEqual(new Map([['', 60]]));
});

const figure = fc.record({
  personId: fc.constantFrom('rosa', 'wes', 'hob', 'kit'),
  minutes: fc.integer({ min: 1, max: 24 * 60 }),
  kind: fc.constantFrom('agreed', 'extra', 'waiting', 'own-fault', 'teaching', 'yard', null),
  proposed: fc.boolean(),
});
const entry = fc.record({
  id: fc.constantFrom('e1', 'e2', 'e3', 'e4', 'e5', 'e6', 'e7', 'e8'),
  boatId: fc.constantFrom('b1', 'b2', 'b3'),
  stageId: fc.constantFrom('s1', 's2', null),
  workDate: fc.constantFrom('2026-05-04', '2026-05-05'),
  struck: fc.constantFrom(null, null, null, { by: 'rosa', at: '2026-05-04T10:00:00.000Z', why: 'twice' }),
  hours: fc.uniqueArray(figure, { selector: (own) => own.personId, maxLength: 4 }),
}) as unknown as fc.Arbitrary<EntryRow>;

test('whatever the entries, every cut comes to the sum of the entries that stand, each once', () => {
  fc.assert(
    fc.property(fc.array(entry, { maxLength: 40 }), (entries) => {
      const standing = new Map(entries.map((row) => [row.id, row]));
      let expected = 0;
      for (const row of standing.values())
        for (const own of row.struck ? [] : row.hours) expected += own.minutes;
      const lines = hoursLines(entries);
      for (const cut of CUTS) {
        expect([...sumHours(lines, cut).values()].reduce((sum, minutes) => sum + minutes, 0)).toBe(expected);
      }
      expect(totalMinutes(lines)).toBe(expected);
    }),
    { numRuns: 500 },
  );
});
