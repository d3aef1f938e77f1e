import { describe, expect, test, vi } from 'vitest';
import { DeviceStore } from '#src/replica/device-store.ts';
import { GOOD_NETWORK, untilCut } from '#tests/worlds/phone.ts';
import { PEOPLE, entryData, openShop, openTab, signIn } from '#tests/worlds/signed-in-phone.ts';
import { readStore, writeStore } from './stored.ts';

const OFFLINE = { ...GOOD_NETWORK, isUp: false };

describe('sending', () => {
  test('what was held is logged once, shown as the server has it, and kept on the sent list', async () => {
    const shop = await openShop();
    const { replica } = await openTab(shop.newPhone(), 'Ned');
    const entryId = replica.newId();
    const op = await replica.hold('entry.write', entryData(entryId, shop));
    expect(await replica.syncNow()).toMatchObject({ outcome: 'done', sent: 1 });
    expect(replica.view().find('entry', entryId)).toEqual(shop.server.store.row('entry', entryId));
    expect(replica.syncState()).toMatchObject({ phase: 'idle', heldOps: 0, oldestHeldAt: null });
    expect(replica.sent()[0]).toMatchObject({ op, personId: PEOPLE.Ned, outcome: 'kept' });
  });

  test('without signal all of it stays, in order, with its age', async () => {
    const shop = await openShop();
    const phone = shop.newPhone();
    const { replica } = await openTab(phone, 'Ned');
    phone.network = OFFLINE;
    const since = new Date(shop.clock.now()).toISOString();
    await replica.hold('entry.write', entryData(replica.newId(), shop));
    shop.clock.advance(60_000);
    await replica.hold('entry.write', entryData(replica.newId(), shop));
    expect(await replica.syncNow()).toEqual({ outcome: 'offline' });
    expect(replica.syncState()).toMatchObject({ phase: 'offline', heldOps: 2, oldestHeldAt: since });
  });

  test('a lost answer is asked for again and changes nothing', async () => {
    const shop = await openShop();
    const phone = shop.newPhone();
    const { replica } = await openTab(phone, 'Ned');
    await replica.hold('entry.write', entryData(replica.newId(), shop));
    phone.network = { ...GOOD_NETWORK, losesAnswer: 1 };
    expect(await replica.syncNow()).toEqual({ outcome: 'offline' });
    const logged = structuredClone([...shop.server.store.ops.values()]);
    phone.network = GOOD_NETWORK;
    shop.clock.advance(60_000);
    expect(await replica.syncNow()).toMatchObject({ outcome: 'done', sent: 1 });
    expect([...shop.server.store.ops.values()]).toEqual(logged);
  });

  test('power cut between keeping the rows and the outbox leaves a harmless repeat', async () => {
    const shop = await openShop();
    const phone = shop.newPhone();
    const { replica, power } = await openTab(phone, 'Ned');
    const entryId = replica.newId();
    const op = await replica.hold('entry.write', entryData(entryId, shop));
    const accept = vi.spyOn(DeviceStore.prototype, 'accept').mockImplementation(async () => power.cut());
    await untilCut(power, replica.syncNow());
    accept.mockRestore();
    const again = await openTab(phone);
    expect(again.replica.view().held.map((item) => item.op)).toEqual([op]);
    expect(again.replica.view().find('entry', entryId)).toEqual(shop.server.store.row('entry', entryId));
    await again.replica.syncNow();
    expect(again.replica.syncState().heldOps).toBe(0);
    expect([...shop.server.store.ops.keys()].filter((id) => id === op.id)).toHaveLength(1);
  });

  test('a set-aside op leaves the outbox, is told as such, and holds nothing up', async () => {
    const shop = await openShop();
    const { replica } = await openTab(shop.newPhone(), 'Ned');
    const barred = await replica.hold('boat.amend', { boatId: shop.boatId, set: { name: 'Auk' } });
    const entryId = replica.newId();
    await replica.hold('entry.write', entryData(entryId, shop));
    await replica.syncNow();
    expect(replica.syncState().heldOps).toBe(0);
    expect(replica.sent().find(({ op }) => op.id === barred.id)).toMatchObject({
      outcome: 'set-aside',
      reason: 'not-entitled',
    });
    expect(replica.view().find('setAside', barred.id)).toMatchObject({ state: 'waiting' });
    expect(replica.view().find('entry', entryId)).toBeDefined();
    expect(replica.view().find('boat', shop.boatId)).toMatchObject({ name: 'Petrel' });
  });

  test('more than one request holds goes in several, in order', async () => {
    const shop = await openShop();
    const { replica } = await openTab(shop.newPhone(), 'Ned');
    const long = 'x'.repeat(19_000);
    const ops = [];
    for (let count = 0; count < 60; count += 1)
      ops.push(await replica.hold('entry.write', entryData(replica.newId(), shop, long)));
    expect(await replica.syncNow()).toMatchObject({ outcome: 'done', sent: 60 });
    expect([...shop.server.store.ops.keys()].slice(-60)).toEqual(ops.map(({ id }) => id));
  });

  test('a refused sign-in leaves the queue as it is, and says so until somebody signs in', async () => {
    const shop = await openShop();
    const phone = shop.newPhone();
    const tab = await openTab(phone, 'Ned');
    await tab.replica.hold('entry.write', entryData(tab.replica.newId(), shop));
    shop.server.isEveryoneSignedOut = true;
    expect(await tab.replica.syncNow()).toEqual({ outcome: 'sign-in-needed' });
    expect(tab.replica.syncState()).toMatchObject({ phase: 'sign-in-needed', heldOps: 1 });
    tab.power.cut();
    const again = await openTab(phone);
    expect(again.replica.session.current()).toMatchObject({ name: 'Ned' });
    expect(again.replica.syncState()).toMatchObject({ phase: 'sign-in-needed', heldOps: 1 });
    await signIn(again, 'Ned');
    expect(await again.replica.syncNow()).toMatchObject({ outcome: 'done', sent: 1 });
    expect(again.replica.syncState().phase).toBe('idle');
  });
});

describe('hearing', () => {
  test('the pages of a pull are shown together: one that breaks off shows nothing', async () => {
    const shop = await openShop();
    const phone = shop.newPhone();
    const { replica } = await openTab(phone, 'Ned');
    for (const text of ['one', 'two', 'three', 'four']) {
      await shop.replica.hold('entry.write', entryData(shop.replica.newId(), shop, text));
    }
    await shop.replica.syncNow();
    shop.server.pageRowsMax = 2;
    let asked = 0;
    const answer = shop.server.answer.bind(shop.server);
    shop.server.answer = (...request) => {
      asked += 1;
      if (asked === 2) return Promise.reject(new TypeError('fetch failed'));
      return answer(...request);
    };
    expect(await replica.syncNow()).toEqual({ outcome: 'offline' });
    expect(replica.view().all('entry')).toEqual([]);
    expect(await replica.syncNow()).toMatchObject({ outcome: 'done' });
    expect(replica.view().all('entry')).toHaveLength(4);
  });

  test('a reset swaps the rows at its end and leaves the outbox alone', async () => {
    const shop = await openShop();
    const phone = shop.newPhone();
    const { replica } = await openTab(phone, 'Ned');
    phone.network = OFFLINE;
    const op = await replica.hold('entry.write', entryData(replica.newId(), shop));
    shop.server.changePerson(PEOPLE.Ned, { roles: ['owner'] });
    shop.server.pageRowsMax = 2;
    phone.network = GOOD_NETWORK;
    const answer = shop.server.answer.bind(shop.server);
    let pages = 0;
    shop.server.answer = async (...request) => {
      pages += 1;
      if (pages === 2) throw new TypeError('fetch failed');
      return answer(...request);
    };
    expect(await replica.syncNow()).toEqual({ outcome: 'offline' });
    expect(replica.view().find('boat', shop.boatId)).toBeDefined();
    expect(replica.view().held.map((item) => item.op)).toEqual([op]);
    expect(await replica.syncNow()).toMatchObject({ outcome: 'done', sent: 1 });
    expect(replica.view().me.roles).toEqual(['owner']);
    expect(replica.view().all('boat')).toEqual([]);
    expect(shop.server.store.ops.get(op.id)).toMatchObject({ outcome: 'set-aside' });
  });

  test('a restored server is sent again what it has lost, in the old order', async () => {
    const shop = await openShop();
    const { replica } = await openTab(shop.newPhone(), 'Ned');
    const backup = shop.server.backUp();
    const ops = [];
    for (const text of ['one', 'two', 'three']) {
      shop.clock.advance(1000);
      ops.push(await replica.hold('entry.write', entryData(replica.newId(), shop, text)));
      await replica.syncNow();
    }
    shop.server.restore(backup);
    expect(await replica.syncNow()).toMatchObject({ outcome: 'done' });
    expect([...shop.server.store.ops.keys()].slice(-3)).toEqual(ops.map(({ id }) => id));
    expect(
      replica
        .view()
        .all('entry')
        .map(({ text }) => text)
        .sort(),
    ).toEqual(['one', 'three', 'two']);
  });

  test('rows of entities that this version does not know are kept for one that does', async () => {
    const shop = await openShop();
    const phone = shop.newPhone();
    const { replica } = await openTab(phone, 'Ned');
    const wait = { id: replica.newId(), boatId: shop.boatId, endsOn: 'dry' };
    const answer = shop.server.answer.bind(shop.server);
    shop.server.answer = async (...request) => {
      const body = (await (await answer(...request)).json()) as { rows: object[] };
      body.rows.push({ entity: 'wait', id: wait.id, seq: 999, row: wait, gone: false });
      return new Response(JSON.stringify(body));
    };
    expect(await replica.syncNow()).toMatchObject({ outcome: 'done' });
    const stored = await readStore(phone.indexedDB, `ribband-person-${PEOPLE.Ned}`, 'rows');
    expect(stored).toContainEqual([`wait/${wait.id}`, { entity: 'wait', row: wait }]);
  });

  test('a stored row that cannot be read is put aside, and all are asked for again', async () => {
    const shop = await openShop();
    const phone = shop.newPhone();
    const { power } = await openTab(phone, 'Ned');
    power.cut();
    const name = `ribband-person-${PEOPLE.Ned}`;
    await writeStore(phone.indexedDB, name, 'rows', `boat/${shop.boatId}`, 'torn');
    const { replica } = await openTab(phone);
    expect(replica.view().find('boat', shop.boatId)).toBeUndefined();
    await replica.syncNow();
    expect(replica.view().find('boat', shop.boatId)).toMatchObject({ name: 'Petrel' });
    expect(await readStore(phone.indexedDB, name, 'broken')).toEqual(
      [[`boat/${shop.boatId}`, 'torn']].map(([key, value]) => [`rows/${key}`, value]),
    );
  });

  test('another tab shows what one has heard', async () => {
    const shop = await openShop();
    const phone = shop.newPhone();
    const [one, other] = [await openTab(phone, 'Ned'), await openTab(phone)];
    await shop.replica.hold('entry.write', entryData(shop.replica.newId(), shop));
    await shop.replica.syncNow();
    await one.replica.syncNow();
    await vi.waitFor(() => expect(other.replica.view().all('entry')).toHaveLength(1));
  });
});

describe('a device that several share', () => {
  test('shows each what the other has sent from it, before they have heard it themselves', async () => {
    const shop = await openShop();
    const phone = shop.newPhone();
    const tab = await openTab(phone, 'Orla');
    await signIn(tab, 'Ned');
    await tab.replica.syncNow();
    const entryId = tab.replica.newId();
    await tab.replica.hold('entry.write', entryData(entryId, shop));
    await tab.replica.syncNow();
    await signIn(tab, 'Orla');
    expect(tab.replica.view().find('entry', entryId)).toMatchObject({
      authorId: PEOPLE.Ned,
      receivedAt: expect.any(String) as string,
    });
    await tab.replica.syncNow();
    expect(tab.replica.view().find('entry', entryId)).toEqual(shop.server.store.row('entry', entryId));
  });

  test('sends what one of them held with the request of the next', async () => {
    const shop = await openShop();
    const tab = await openTab(shop.newPhone(), 'Ned');
    const op = await tab.replica.hold('entry.write', entryData(tab.replica.newId(), shop));
    expect(await tab.replica.session.signOut()).toHaveProperty('refused');
    expect(await tab.replica.session.signOut({ evenWithHeldOps: true })).toEqual({ ok: true });
    expect(tab.replica.session.current()).toBeNull();
    await signIn(tab, 'Orla');
    expect(tab.replica.view().held[0]).toMatchObject({ personId: PEOPLE.Ned });
    await tab.replica.syncNow();
    expect(shop.server.store.ops.get(op.id)).toMatchObject({ outcome: 'kept', personId: PEOPLE.Ned });
  });

  test('keeps nobody’s rows once they have signed out', async () => {
    const shop = await openShop();
    const phone = shop.newPhone();
    const { replica } = await openTab(phone, 'Ned');
    const stored = () => readStore(phone.indexedDB, `ribband-person-${PEOPLE.Ned}`, 'rows');
    expect(await stored()).not.toEqual([]);
    await replica.session.signOut();
    expect(await stored()).toEqual([]);
  });
});
