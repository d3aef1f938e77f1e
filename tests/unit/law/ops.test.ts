import { describe, expect, it } from 'vitest';
import { isUuidV7 } from '#shared/sync/ids.ts';
import { parseStamp } from '#shared/sync/stamp.ts';
import { ShopInMemory, TODAY } from '#tests/worlds/shop-in-memory.ts';

async function shopWithEntry() {
  const shop = new ShopInMemory();
  const { boatId, stageId, desk, foreman } = await shop.withBoat();
  const rosa = shop.person('Rosa', 'crew');
  const phone = shop.phone(rosa);
  const entryId = shop.newId();
  const entry = {
    entryId,
    boatId,
    stageId,
    workDate: TODAY,
    text: 'Steamed two ribs',
    spoken: true,
    hours: [],
  };
  return { shop, boatId, stageId, desk, foreman, rosa, phone, entryId, entry };
}

describe('law 1: everything a person does is an op', () => {
  it('with an id of its own, a stamp of its device, and its person', async () => {
    const { phone, entry, rosa } = await shopWithEntry();
    const op = phone.does('entry.write', entry);
    expect(isUuidV7(op.id)).toBe(true);
    expect(parseStamp(op.at)!.deviceId).toBe(phone.deviceId);
    expect(op.personId).toBe(rosa);
  });

  it('and the row that it makes tells of it', async () => {
    const { shop, phone, entry, entryId, rosa } = await shopWithEntry();
    const op = phone.does('entry.write', entry);
    const [outcome] = await phone.sends();
    expect(outcome).toEqual({ id: op.id, outcome: 'kept', orderedAt: op.at });
    expect(shop.row('entry', entryId)).toMatchObject({
      authorId: rosa,
      madeBy: op.id,
      heads: {},
      stamps: { [op.id]: op.at },
      struck: null,
      text: 'Steamed two ribs',
    });
  });
});

describe('law 2: what a screen shows is server rows with held ops replayed', () => {
  it('so that what is not sent yet stands there as it will stand', async () => {
    const { shop, phone, entry, entryId } = await shopWithEntry();
    phone.does('entry.write', entry);
    phone.does('entry.amend', { entryId, set: { text: 'Steamed three ribs' } });
    const before = phone.sees('entry', entryId)!;
    expect(before.text).toBe('Steamed three ribs');
    expect(before.receivedAt).toBeNull();
    await phone.sends();
    const { receivedAt, receivedOn, ...after } = shop.row('entry', entryId);
    expect({ ...after, receivedAt: null, receivedOn: null }).toEqual(before);
    expect([receivedAt, receivedOn]).toEqual([new Date(shop.clock.now()).toISOString(), TODAY]);
  });

  it('and an op held beside the rows that already have it changes nothing', async () => {
    const { shop, phone, entry, entryId } = await shopWithEntry();
    phone.does('entry.write', entry);
    phone.does('entry.addTo', { entryId, additionId: shop.newId(), text: 'and a knee' });
    phone.does('entry.amend', { entryId, set: { text: 'Steamed three ribs' } });
    phone.does('entry.strike', { entryId, why: 'wrong boat' });
    const ops = phone.held;
    await phone.sends();
    const heard = phone.sees('entry', entryId);
    phone.held = ops;
    expect(phone.sees('entry', entryId)).toEqual(heard);
  });
});

describe('law 3: the server keeps every op as it came, and a repeat gets its first answer', () => {
  it('a lost answer is asked for again and changes nothing', async () => {
    const { shop, phone, entry, entryId } = await shopWithEntry();
    phone.does('entry.write', entry);
    phone.does('entry.amend', { entryId, set: { text: 'Steamed three ribs' } });
    phone.does('boat.add', { boatId: shop.newId(), name: 'Kittiwake' });
    const first = await phone.sendsOnly(phone.held);
    expect(first.map(({ outcome }) => outcome)).toEqual(['kept', 'kept', 'set-aside']);
    const [record, seq] = [shop.store.snapshot(), shop.store.seq];
    shop.clock.advance(3_600_000);
    expect(await phone.sends()).toEqual(first);
    expect(shop.store.snapshot()).toEqual(record);
    expect(shop.store.seq).toBe(seq);
  });

  it('though the keys of its JSON come in another order', async () => {
    const { shop, phone, entry } = await shopWithEntry();
    const op = phone.does('entry.write', entry);
    const first = await phone.sends();
    const { seq } = shop.store;
    const reordered = Object.fromEntries(Object.entries(op).reverse());
    expect(await phone.sendsOnly([reordered])).toEqual(first);
    expect(shop.store.seq).toBe(seq);
  });

  it('an op twice in one batch is one op with one answer', async () => {
    const { shop, phone, entry, entryId } = await shopWithEntry();
    const write = phone.does('entry.write', entry);
    const add = phone.does('entry.addTo', { entryId, additionId: shop.newId(), text: 'and a knee' });
    const outcomes = await phone.sendsOnly([write, add, write, add]);
    expect(outcomes.slice(2)).toEqual(outcomes.slice(0, 2));
    expect(shop.row('entry', entryId).additions).toHaveLength(1);
    expect(shop.store.ops.size).toBe(shop.all('stage').length + shop.all('boat').length + 2);
  });

  it('what first stood alone keeps that answer though it has a rival later', async () => {
    const { shop, phone, entry, entryId, desk } = await shopWithEntry();
    await phone.says('entry.write', entry);
    desk.hears();
    const amend = phone.does('entry.amend', { entryId, set: { text: 'three ribs' } });
    expect(await phone.sends()).toMatchObject([{ outcome: 'kept' }]);
    expect(await desk.says('entry.amend', { entryId, set: { text: 'four ribs' } })).toMatchObject({
      outcome: 'loose-end',
    });
    expect(await phone.sendsOnly([amend])).toMatchObject([{ outcome: 'kept' }]);
    expect(shop.looseEnds()).toHaveLength(1);
  });

  it('keeps refused ops in full', async () => {
    const { shop, phone } = await shopWithEntry();
    const op = phone.does('entry.shout', { loudly: [true] });
    await phone.sends();
    expect(shop.store.ops.get(op.id)).toMatchObject({ op, outcome: 'set-aside', reason: 'not-understood' });
    expect(shop.row('setAside', op.id)).toMatchObject({ id: op.id, opId: op.id, op, state: 'waiting' });
  });
});

describe('law 4: receipt facts are fixed once', () => {
  it('when it was received, when it counts as made, and the roles then in force', async () => {
    const { shop, phone, entry, rosa } = await shopWithEntry();
    const op = phone.does('entry.write', entry);
    await phone.sends();
    const receivedAt = new Date(shop.clock.now()).toISOString();
    shop.people.get(rosa)!.roles = ['office'];
    shop.clock.advance(86_400_000);
    await phone.sendsOnly([op]);
    expect(shop.store.ops.get(op.id)).toMatchObject({
      receivedAt,
      receivedOn: TODAY,
      orderedAt: op.at,
      orderedOn: TODAY,
      roles: ['crew'],
      deviceId: phone.deviceId,
      personId: rosa,
    });
  });

  it('written later and heard later are two flags', async () => {
    const { shop, phone, entry, boatId } = await shopWithEntry();
    const ids = [shop.newId(), shop.newId(), shop.newId()] as const;
    const about = (entryId: string, workDate: string) => ({ ...entry, entryId, boatId, workDate });
    phone.does('entry.write', about(ids[0], TODAY));
    phone.does('entry.write', about(ids[1], '2026-05-31'));
    shop.clock.advance(86_400_000);
    phone.does('entry.write', about(ids[2], TODAY));
    await phone.sends();
    const flags = ids
      .map((id) => shop.row('entry', id))
      .map(({ writtenLater, heardLater }) => [writtenLater, heardLater]);
    expect(flags).toEqual([
      [false, true],
      [true, true],
      [true, false],
    ]);
    await phone.says('entry.amend', { entryId: ids[2], set: { workDate: '2026-06-02' } });
    expect(shop.row('entry', ids[2]).writtenLater).toBe(false);
  });
});
