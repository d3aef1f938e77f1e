import { describe, expect, test } from 'vitest';
import { readLooseEnds, type EndOnSheet } from '#src/routes/day-sheet/read-loose-ends.ts';
import { readSetAsides } from '#src/routes/day-sheet/read-set-aside.ts';
import { TestRecord, type Hand } from '#tests/worlds/record.ts';

const MONDAY = '2026-05-04';

async function shopWithEntry() {
  const record = new TestRecord();
  const [orrin, imelda] = [record.hand('Orrin', 'foreman'), record.hand('Imelda', 'office')];
  const [rosa, wes, kit] = ['Rosa', 'Wes', 'Kit'].map((name) => record.hand(name, 'crew')) as [
    Hand,
    Hand,
    Hand,
  ];
  const [boatId, entryId] = [record.newId(), record.newId()];
  await record.say(orrin, 'boat.add', { boatId, name: 'Penny Candle' });
  const hours = [
    { personId: rosa.personId, minutes: 240 },
    { personId: wes.personId, minutes: 240 },
  ];
  await record.say(rosa, 'entry.write', {
    entryId,
    boatId,
    workDate: MONDAY,
    text: 'King plank up',
    spoken: false,
    hours,
  });
  const { madeBy } = record.store.row('entry', entryId) as { madeBy: string };
  const ends = (hand = orrin) => readLooseEnds(record.viewAs(hand), MONDAY);
  return { record, orrin, imelda, rosa, wes, kit, boatId, entryId, madeBy, ends };
}

type Shop = Awaited<ReturnType<typeof shopWithEntry>>;

function wesHours({ wes, entryId }: Shop, minutes: number) {
  return {
    entryId,
    set: { hours: [{ personId: wes.personId, minutes, kind: null }] },
    why: 'as I remember it',
  };
}

async function twoFigures(shop: Shop) {
  const made = { [`hours/${shop.wes.personId}`]: [shop.madeBy] };
  await shop.record.say(shop.rosa, 'entry.amend', wesHours(shop, 180), made);
  await shop.record.say(shop.wes, 'entry.amend', wesHours(shop, 270), made);
}

/** Says what a key on the sheet would hold. */
async function press({ record, orrin }: Shop, settlement: NonNullable<EndOnSheet['restore']>, why?: string) {
  return record.say(orrin, settlement.kind, { ...settlement.data, ...(why ? { why } : {}) });
}

describe('only what two people said differently is listed', () => {
  test('a hundred changes by three phones that cross nowhere leave no loose end', async () => {
    const shop = await shopWithEntry();
    const hands = [shop.rosa, shop.wes, shop.kit];
    for (let count = 0; count < 100; count += 1) {
      const hand = hands[count % 3]!;
      const entryId = shop.record.newId();
      const hours = [{ personId: hand.personId, minutes: 15 + count }];
      await shop.record.say(hand, 'entry.write', {
        entryId,
        boatId: shop.boatId,
        workDate: MONDAY,
        text: `Plank ${count}`,
        spoken: false,
        hours,
      });
      if (count % 4 === 0)
        await shop.record.say(hand, 'entry.amend', { entryId, set: { text: `Plank ${count}, port` } });
      if (count % 5 === 0)
        await shop.record.say(shop.kit, 'entry.addTo', {
          entryId: shop.entryId,
          additionId: shop.record.newId(),
          text: `and ${count}`,
        });
    }
    expect(shop.ends()).toEqual([]);
    await twoFigures(shop);
    expect(shop.ends()).toHaveLength(1);
  });
});

describe('two figures of hours', () => {
  test('are listed in words with who, when and why, the standing one first', async () => {
    const shop = await shopWithEntry();
    await twoFigures(shop);
    const [end] = shop.ends();
    expect(end).toMatchObject({
      about: "Wes's hours",
      of: 'King plank up',
      where: 'Penny Candle, Mon 4 May',
    });
    expect(end!.values.map(({ words, who, when, why, stands }) => [words, who, when, why, stands])).toEqual([
      ['4 1/2 h', 'Wes', '07:04', 'as I remember it', true],
      ['3 h', 'Rosa', '07:03', 'as I remember it', false],
    ]);
  });

  test('are settled by taking either: both values are replaced', async () => {
    const shop = await shopWithEntry();
    await twoFigures(shop);
    const [end] = shop.ends();
    const outcome = await press(shop, end!.values[1]!.take!);
    expect(outcome.outcome).toBe('kept');
    expect(shop.ends()).toEqual([]);
    const { hours } = shop.record.store.row('entry', shop.entryId) as {
      hours: { personId: string; minutes: number }[];
    };
    expect(hours.find((figure) => figure.personId === shop.wes.personId)!.minutes).toBe(180);
  });

  test('may be settled by the office, and not by crew whose hours they are not', async () => {
    const shop = await shopWithEntry();
    await twoFigures(shop);
    expect(shop.ends(shop.imelda)[0]!.values.every((value) => value.take !== null)).toBe(true);
    expect(shop.ends(shop.kit)[0]!.values.every((value) => value.take === null)).toBe(true);
  });
});

describe('other fields', () => {
  test('two wordings are both read whole, and one is taken', async () => {
    const shop = await shopWithEntry();
    const made = { text: [shop.madeBy] };
    await shop.record.say(
      shop.rosa,
      'entry.amend',
      { entryId: shop.entryId, set: { text: 'King plank up, two screws left' } },
      made,
    );
    await shop.record.say(
      shop.orrin,
      'entry.amend',
      { entryId: shop.entryId, set: { text: 'King plank up whole' } },
      made,
    );
    const [end] = shop.ends();
    expect(end!.values.map(({ words }) => words)).toEqual([
      'King plank up whole',
      'King plank up, two screws left',
    ]);
    await press(shop, end!.values[1]!.take!);
    expect(shop.ends()).toEqual([]);
  });

  test('a move to two boats names both boats, and taking one moves it there', async () => {
    const shop = await shopWithEntry();
    const [boatB, boatC] = [shop.record.newId(), shop.record.newId()];
    await shop.record.say(shop.orrin, 'boat.add', { boatId: boatB, name: 'Brindle' });
    await shop.record.say(shop.orrin, 'boat.add', { boatId: boatC, name: 'Mallow' });
    const made = { stageId: [shop.madeBy] };
    await shop.record.say(
      shop.rosa,
      'entry.amend',
      { entryId: shop.entryId, set: { boatId: boatB, stageId: null } },
      made,
    );
    await shop.record.say(
      shop.orrin,
      'entry.amend',
      { entryId: shop.entryId, set: { boatId: boatC, stageId: null } },
      made,
    );
    const [end] = shop.ends();
    expect(end!.values.map(({ words }) => words)).toEqual(['Mallow · no stage', 'Brindle · no stage']);
    await press(shop, end!.values[1]!.take!);
    expect(shop.ends()).toEqual([]);
    expect(shop.record.store.row('entry', shop.entryId)).toMatchObject({ boatId: boatB });
  });

  test('struck by one and restored by another is settled by a strike or a restore with its reason', async () => {
    const shop = await shopWithEntry();
    await shop.record.say(shop.rosa, 'entry.strike', { entryId: shop.entryId, why: 'twice', saw: [] });
    const { heads } = shop.record.store.row('entry', shop.entryId) as { heads: Record<string, string[]> };
    await shop.record.say(
      shop.rosa,
      'entry.restore',
      { entryId: shop.entryId, why: 'it was not' },
      { struck: heads.struck! },
    );
    await shop.record.say(
      shop.orrin,
      'entry.strike',
      { entryId: shop.entryId, why: 'it was twice', saw: [] },
      { struck: heads.struck! },
    );
    const [end] = shop.ends();
    expect(end!.values.map(({ words }) => words)).toEqual(['struck: it was twice', 'keep it']);
    expect(end!.values[1]!.take).toMatchObject({ kind: 'entry.restore', asksWhy: true });
    await press(shop, end!.values[1]!.take!, 'asked Rosa');
    expect(shop.ends()).toEqual([]);
  });
});

describe('struck, and changed by one who did not know', () => {
  const struckAndChanged = async () => {
    const shop = await shopWithEntry();
    await shop.record.say(shop.rosa, 'entry.strike', {
      entryId: shop.entryId,
      why: 'wrong day',
      saw: [shop.madeBy],
    });
    await shop.record.say(shop.wes, 'entry.amend', wesHours(shop, 180));
    return shop;
  };

  test('tells what the strike did not see', async () => {
    const shop = await struckAndChanged();
    const [end] = shop.ends();
    expect(end!.values.map(({ words, who }) => [words, who])).toEqual([["Wes's hours: 3 h", 'Wes']]);
  });

  test('is closed by a restore, or by a strike that saw it', async () => {
    const restored = await struckAndChanged();
    await press(restored, restored.ends()[0]!.restore!, 'it was right');
    expect(restored.ends()).toEqual([]);

    const struck = await struckAndChanged();
    const { values, strike } = struck.ends()[0]!;
    const saw = [struck.madeBy, ...values.map((value) => value.opId)];
    await press(struck, { ...strike!, data: { ...strike!.data, saw } }, 'seen, still wrong');
    expect(struck.ends()).toEqual([]);
  });
});

describe('what was set aside', () => {
  test('is said in words with its reason, and only what may be is admitted', async () => {
    const shop = await shopWithEntry();
    await shop.record.say(shop.kit, 'entry.amend', {
      entryId: shop.entryId,
      set: { text: 'King plank is mine' },
    });
    await shop.record.say(shop.kit, 'winch.polish', { times: 2 });
    const [unknown, foreign] = readSetAsides(shop.record.viewAs(shop.orrin));
    expect(foreign).toMatchObject({
      what: 'Change of an entry',
      words: 'King plank is mine',
      where: 'Penny Candle · no stage',
      who: 'Kit',
      reason: 'Kit may not do this; you can let it count.',
      mayAdmit: true,
      mayDismiss: true,
    });
    expect(unknown).toMatchObject({
      what: 'Something this version does not know (winch.polish)',
      mayAdmit: false,
      mayDismiss: true,
    });
    expect(unknown!.raw).toContain('winch.polish');
  });

  test('is gone from the list once it is admitted, and then counts', async () => {
    const shop = await shopWithEntry();
    await shop.record.say(
      shop.kit,
      'entry.amend',
      { entryId: shop.entryId, set: { text: 'King plank is mine' } },
      { text: [shop.madeBy] },
    );
    const [line] = readSetAsides(shop.record.viewAs(shop.orrin));
    await shop.record.say(shop.orrin, 'setAside.admit', { setAsideId: line!.id, why: 'he was there' });
    expect(readSetAsides(shop.record.viewAs(shop.orrin))).toEqual([]);
    expect(shop.record.store.row('entry', shop.entryId)).toMatchObject({ text: 'King plank is mine' });
  });

  test("is the office's to read and not to decide", async () => {
    const shop = await shopWithEntry();
    await shop.record.say(shop.kit, 'entry.amend', { entryId: shop.entryId, set: { text: 'mine' } });
    expect(readSetAsides(shop.record.viewAs(shop.imelda))[0]).toMatchObject({
      reason: 'Kit may not do this; the foreman can let it count.',
      mayAdmit: false,
      mayDismiss: false,
    });
  });
});
