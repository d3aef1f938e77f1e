import { describe, expect, test, vi } from 'vitest';
import { stampMs } from '#shared/sync/stamp.ts';
import { HoldError } from '#src/replica/hold-error.ts';
import { untilCut } from '#tests/worlds/phone.ts';
import { PEOPLE, entryData, openShop, openTab } from '#tests/worlds/signed-in-phone.ts';
import { readStore, writeStore } from './stored.ts';

describe('holding an op', () => {
  test('it is on the disk before anybody is told that it is kept', async () => {
    const shop = await openShop();
    const phone = shop.newPhone();
    const { replica, power } = await openTab(phone, 'Ned');
    const id = replica.newId();
    const op = await replica.hold('entry.write', entryData(id, shop));
    power.cut();
    const again = await openTab(phone);
    expect(again.replica.view().held.map((item) => item.op)).toEqual([op]);
    expect(again.replica.view().find('entry', id)).toMatchObject({ text: 'Scarfed the stem' });
  });

  test('it is whole or not there wherever the power is cut', async () => {
    const shop = await openShop();
    const seenCounts = new Set<number>();
    for (let points = 0; points < 6; points += 1) {
      const phone = shop.newPhone();
      const { replica, power } = await openTab(phone, 'Ned');
      power.cutAfter(points);
      const op = await untilCut(power, replica.hold('entry.write', entryData(replica.newId(), shop)));
      power.cut();
      const held = (await openTab(phone)).replica.view().held;
      if (op) expect(held).toHaveLength(1);
      seenCounts.add(held.length);
    }
    expect([...seenCounts].sort()).toEqual([0, 1]);
  });

  test('an amendment replaces what the person had before them, the unsent too', async () => {
    const shop = await openShop();
    const { replica } = await openTab(shop.newPhone(), 'Ned');
    const entryId = replica.newId();
    const written = await replica.hold('entry.write', entryData(entryId, shop));
    const first = await replica.hold('entry.amend', { entryId, set: { text: 'Scarfed the keel' } });
    const second = await replica.hold('entry.amend', {
      entryId,
      set: { text: 'Scarfed both', hours: [{ personId: PEOPLE.Ned, minutes: 60 }] },
    });
    expect(first.over).toEqual({ text: [written.id] });
    expect(second.over).toEqual({ text: [first.id, written.id], [`hours/${PEOPLE.Ned}`]: [written.id] });
    expect(replica.view().all('looseEnd')).toEqual([]);
  });

  test('a strike has seen all that stands', async () => {
    const shop = await openShop();
    const { replica } = await openTab(shop.newPhone(), 'Ned');
    const entryId = replica.newId();
    const written = await replica.hold('entry.write', entryData(entryId, shop));
    const added = await replica.hold('entry.addTo', {
      entryId,
      additionId: replica.newId(),
      text: 'And the knee',
    });
    const struck = await replica.hold('entry.strike', { entryId, why: 'the wrong boat' });
    expect(struck.over).toEqual({ struck: [written.id] });
    expect(struck.data.saw).toEqual([written.id, added.id]);
  });

  test.each([
    ['a text that is too long', { text: 'x'.repeat(20_001) }, /20,000 characters/],
    ['a character that cannot be kept', { text: 'a\u0000b' }, /cannot be kept/],
    ['a day that is none', { workDate: '2026-02-30' }, /workDate/],
  ])('%s is refused in words, and nothing is held', async (_name, wrong, words) => {
    const shop = await openShop();
    const { replica } = await openTab(shop.newPhone(), 'Ned');
    const holding = replica.hold('entry.write', { ...entryData(replica.newId(), shop), ...wrong });
    await expect(holding).rejects.toThrow(HoldError);
    await expect(holding).rejects.toThrow(words);
    expect(replica.syncState().heldOps).toBe(0);
  });

  test('what is not on this device cannot be changed from it', async () => {
    const { replica } = await openShop();
    await expect(
      replica.hold('entry.amend', { entryId: replica.newId(), set: { text: 'x' } }),
    ).rejects.toThrow(HoldError);
  });
});

describe('two tabs of one phone', () => {
  test('share one outbox, in one order, with no stamp twice', async () => {
    const shop = await openShop();
    const phone = shop.newPhone();
    const tabs = [await openTab(phone, 'Ned'), await openTab(phone)];
    const holds = Array.from({ length: 10 }, (_, index) => {
      const { replica } = tabs[index % 2]!;
      return replica.hold('entry.write', entryData(replica.newId(), shop, `entry ${index}`));
    });
    const ops = await Promise.all(holds);
    expect(new Set(ops.map(({ at }) => at)).size).toBe(10);
    await vi.waitFor(() => {
      const [first, second] = tabs.map(({ replica }) => replica.view().held.map(({ op }) => op.at));
      expect(first).toHaveLength(10);
      expect(first).toEqual([...first!].sort());
      expect(second).toEqual(first);
    });
  });

  test('never contradict each other, however little the one has heard of the other', async () => {
    const shop = await openShop();
    const phone = shop.newPhone();
    const [one, other] = [await openTab(phone, 'Ned'), await openTab(phone)];
    const entryId = one.replica.newId();
    await one.replica.hold('entry.write', entryData(entryId, shop));
    await Promise.all(
      [one, other, one, other].map(({ replica }, index) =>
        replica.hold('entry.amend', { entryId, set: { text: `as said ${index}` } }),
      ),
    );
    await one.replica.syncNow();
    expect(shop.server.store.feed(0).filter(({ entity }) => entity === 'looseEnd')).toEqual([]);
  });
});

describe('what is found in the outbox', () => {
  test('a record that cannot be read is put aside, and the others go on', async () => {
    const shop = await openShop();
    const phone = shop.newPhone();
    const { replica, power } = await openTab(phone, 'Ned');
    const op = await replica.hold('entry.write', entryData(replica.newId(), shop));
    power.cut();
    await writeStore(phone.indexedDB, 'ribband-device', 'outbox', '000000000000', { op: 'torn' });
    const again = await openTab(phone);
    expect(again.replica.view().held.map((item) => item.op.id)).toEqual([op.id]);
    expect(await again.replica.syncNow()).toMatchObject({ outcome: 'done', sent: 1 });
    expect(await readStore(phone.indexedDB, 'ribband-device', 'broken')).toEqual([
      ['outbox/000000000000', { op: 'torn' }],
    ]);
  });

  test('an op of a version that this one does not understand is listed, and sent as it is', async () => {
    const shop = await openShop();
    const phone = shop.newPhone();
    const { replica, power } = await openTab(phone, 'Ned');
    const op = await replica.hold('entry.write', entryData(replica.newId(), shop));
    power.cut();
    const foreign = { ...op, id: replica.newId(), v: 7, kind: 'entry.sing', extra: true };
    await writeStore(phone.indexedDB, 'ribband-device', 'outbox', op.at.replace(/^0/, '1'), {
      op: foreign,
      heldSince: new Date(stampMs(op.at)).toISOString(),
    });
    const again = await openTab(phone);
    expect(again.replica.view().held).toHaveLength(2);
    await again.replica.syncNow();
    expect([...shop.server.store.ops.values()].map((logged) => logged.op)).toContainEqual(foreign);
  });
});
