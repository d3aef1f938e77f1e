import { expect, test } from 'vitest';
import { HoldError } from '#src/replica/hold-error.ts';
import { untilCut } from '#tests/worlds/phone.ts';
import { entryData, openShop, openTab } from '#tests/worlds/signed-in-phone.ts';

async function openNed() {
  const shop = await openShop();
  const phone = shop.newPhone();
  const tab = await openTab(phone, 'Ned');
  const { replica } = tab;
  const write = (entryId = replica.newId()) => ({ kind: 'entry.write', data: entryData(entryId, shop) });
  return { shop, phone, tab, replica, write };
}

test('several ops keep their order, each with a stamp of its own, and are sent', async () => {
  const { replica, write } = await openNed();
  const ops = await replica.holdAll([write(), write(), write()]);
  expect(ops.map(({ at }) => at)).toEqual([...new Set(ops.map(({ at }) => at))].sort());
  expect(replica.view().held.map(({ op }) => op)).toEqual(ops);
  expect(await replica.syncNow()).toMatchObject({ sent: 3 });
});

test('wherever the power is cut, all of them are there or none', async () => {
  const seen = new Set<number>();
  for (let points = 0; points < 6; points += 1) {
    const { phone, tab, replica, write } = await openNed();
    tab.power.cutAfter(points);
    await untilCut(tab.power, replica.holdAll([write(), write(), write()]));
    tab.power.cut();
    seen.add((await openTab(phone)).replica.view().held.length);
  }
  expect([...seen].sort()).toEqual([0, 3]);
});

test('one that cannot be held leaves none of them', async () => {
  const { replica, write } = await openNed();
  const gone = { kind: 'entry.amend', data: { entryId: replica.newId(), set: { text: 'Scarfed' } } };
  await expect(replica.holdAll([write(), gone])).rejects.toThrow(HoldError);
  expect(replica.view().held).toEqual([]);
});

test('a later one amends what an earlier one makes, and replaces what it set', async () => {
  const { replica, write } = await openNed();
  const entryId = replica.newId();
  const amend = (text: string) => ({ kind: 'entry.amend', data: { entryId, set: { text } } });
  const [made, first, second] = await replica.holdAll([
    write(entryId),
    amend('Scarfed the keel'),
    amend('Scarfed both'),
  ]);
  expect(first!.over).toEqual({ text: [made!.id] });
  expect(second!.over).toEqual({ text: [first!.id, made!.id] });
  expect(replica.view().find('entry', entryId)).toMatchObject({ text: 'Scarfed both' });
  await replica.syncNow();
  expect(replica.view().all('looseEnd')).toEqual([]);
});
