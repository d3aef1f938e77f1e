import { describe, expect, it } from 'vitest';
import { idFromSha256, sha256Hex } from '#shared/sync/ids.ts';
import { canonicalJson } from '#shared/sync/canonical.ts';
import { formatStamp, stampMs } from '#shared/sync/stamp.ts';
import { ShopInMemory, TODAY } from '#tests/worlds/shop-in-memory.ts';

async function shopWithPhone() {
  const shop = new ShopInMemory();
  const { boatId, stageId } = await shop.withBoat();
  const phone = shop.phone(shop.person('Rosa', 'crew'));
  const write = (changes: object = {}) => {
    const data = {
      entryId: shop.newId(),
      boatId,
      stageId,
      workDate: TODAY,
      text: 'Ribs',
      spoken: false,
      hours: [],
    };
    return phone.does('entry.write', { ...data, ...changes });
  };
  return { shop, boatId, stageId, phone, write };
}

describe('what cannot be read as an op is malformed, and what stands beside it goes on', () => {
  const others = '017f22e2-79b0-7cc3-98c4-dc0c0c07398f';
  it.each<[string, (op: Record<string, unknown>) => unknown]>([
    ['a text with U+0000', (op) => ({ ...op, data: { ...(op.data as object), text: 'a\u0000b' } })],
    ['a lone surrogate', (op) => ({ ...op, data: { ...(op.data as object), text: 'a\ud800b' } })],
    ['a lone surrogate in a name', (op) => ({ ...op, data: { ...(op.data as object), '\udc00': 1 } })],
    [
      'a text of 20,001 units',
      (op) => ({ ...op, data: { ...(op.data as object), text: 'a'.repeat(20_001) } }),
    ],
    [
      'a text of 10,001 smiles',
      (op) => ({ ...op, data: { ...(op.data as object), text: '😀'.repeat(10_001) } }),
    ],
    ['the stamp of another device', (op) => ({ ...op, at: formatStamp({ ms: 5, counter: 0 }, others) })],
    ['a UUIDv4 id', (op) => ({ ...op, id: '919108f7-52d1-4320-9bac-f847db4148a8' })],
    ['an id in capitals', (op) => ({ ...op, id: (op.id as string).toUpperCase().replace('7000', '700A') })],
    ['no id', ({ id: _id, ...op }) => op],
    ['a stamp that is none', (op) => ({ ...op, at: 'this morning' })],
    ['no data', ({ data: _data, ...op }) => op],
    ['an over that is a list', (op) => ({ ...op, over: [] })],
    ['a version 0', (op) => ({ ...op, v: 0 })],
    ['a day that is none', (op) => ({ ...op, data: { ...(op.data as object), workDate: '2026-02-30' } })],
    [
      'a row id in version 4',
      (op) => ({ ...op, data: { ...(op.data as object), entryId: '919108f7-52d1-4320-9bac-f847db4148a8' } }),
    ],
    [
      'hours beyond a day',
      (op) => ({ ...op, data: { ...(op.data as object), hours: [{ personId: others, minutes: 1441 }] } }),
    ],
    ['nothing', () => null],
    ['a number', () => 7],
    ['a list', () => []],
    ['a text', () => 'entry.write'],
  ])('%s', async (_name, spoil) => {
    const { shop, phone, write } = await shopWithPhone();
    const [before, between, after] = [write(), write(), write()];
    const outcomes = await phone.sendsOnly([before, spoil({ ...between }), after]);
    expect(outcomes.map(({ outcome, reason }) => reason ?? outcome)).toEqual(['kept', 'malformed', 'kept']);
    expect(shop.all('entry')).toHaveLength(2);
    expect(shop.all('setAside')).toMatchObject([{ reason: 'malformed', state: 'waiting' }]);
  });

  it('20,000 units can be kept, smiles and all', async () => {
    const { shop, phone, write } = await shopWithPhone();
    write({ text: '😀'.repeat(10_000) });
    expect(await phone.sends()).toMatchObject([{ outcome: 'kept' }]);
    expect(shop.all('entry')[0]!.text).toHaveLength(20_000);
  });

  it('is kept under the hash of its content where it has no usable id, and a repeat is known by it', async () => {
    const { shop, phone, write } = await shopWithPhone();
    const spoilt = { ...write(), id: '919108f7-52d1-4320-9bac-f847db4148a8' };
    const first = await phone.sendsOnly([spoilt]);
    const key = sha256Hex(canonicalJson(spoilt));
    expect(first).toMatchObject([{ id: spoilt.id, outcome: 'set-aside', reason: 'malformed' }]);
    expect(shop.row('setAside', idFromSha256(key))).toMatchObject({ opId: null, op: spoilt });
    shop.clock.advance(60_000);
    expect(await phone.sendsOnly([spoilt, spoilt])).toEqual([first[0], first[0]]);
    expect(shop.all('setAside')).toHaveLength(1);
  });

  it('an id that does not read as a UUID is not answered', async () => {
    const { phone, write } = await shopWithPhone();
    const outcomes = await phone.sendsOnly([{ ...write(), id: 'seven' }, { ...write(), id: 7 }, undefined]);
    expect(outcomes.map(({ id }) => id)).toEqual([null, null, null]);
  });

  it('an unreadable stamp gets the server’s time, and what the device did before that keeps its own', async () => {
    const { shop, phone, write } = await shopWithPhone();
    const [spoilt, op] = [{ ...write(), at: 'this morning' }, write()];
    shop.clock.advance(3_600_000);
    const [first, second] = await phone.sendsOnly([spoilt, op]);
    expect(stampMs(first!.orderedAt)).toBe(shop.clock.now());
    expect(second!.orderedAt).toBe(op.at);
  });
});

describe('what is not known here is not understood', () => {
  it.each<[string, object]>([
    ['a kind', { kind: 'entry.sing' }],
    ['a kind named like what every object has', { kind: 'constructor' }],
    ['a later version', { v: 2 }],
    ['a field beside its data', { mood: 'good' }],
  ])('%s', async (_name, change) => {
    const { shop, phone, write } = await shopWithPhone();
    expect(await phone.sendsOnly([{ ...write(), ...change }])).toMatchObject([{ reason: 'not-understood' }]);
    expect(shop.all('entry')).toEqual([]);
  });

  it('a field, at any depth', async () => {
    const { phone, write } = await shopWithPhone();
    write({ mood: 'good' });
    write({ place: { side: 'port', depthMm: 4 } });
    write({ hours: [{ personId: phone.personIds[0], minutes: 60, rate: 4 }] });
    const outcomes = await phone.sends();
    expect(outcomes.map(({ reason }) => reason)).toEqual([
      'not-understood',
      'not-understood',
      'not-understood',
    ]);
  });

  it('an op without a version is of version 1', async () => {
    const { phone, write } = await shopWithPhone();
    const { v: _v, ...op } = write();
    expect(await phone.sendsOnly([op])).toMatchObject([{ outcome: 'kept' }]);
  });
});

describe('an id that is taken is not taken twice', () => {
  it('an op id with other content is set aside under its content', async () => {
    const { shop, phone, write } = await shopWithPhone();
    const op = write();
    await phone.sends();
    const other = { ...write(), id: op.id };
    expect(await phone.sendsOnly([other])).toMatchObject([
      { id: op.id, outcome: 'set-aside', reason: 'id-reused' },
    ]);
    expect(shop.all('setAside')).toMatchObject([
      { id: idFromSha256(sha256Hex(canonicalJson(other))), opId: null, op: other },
    ]);
    expect(shop.all('entry')).toHaveLength(1);
    expect(await phone.sendsOnly([other, op])).toMatchObject([{ reason: 'id-reused' }, { outcome: 'kept' }]);
  });

  it('nor within one batch', async () => {
    const { shop, phone, write } = await shopWithPhone();
    const [op, other] = [write(), write()];
    const outcomes = await phone.sendsOnly([op, { ...other, id: op.id }]);
    expect(outcomes).toMatchObject([{ outcome: 'kept' }, { reason: 'id-reused' }]);
    expect(shop.all('entry')).toHaveLength(1);
  });

  it('a second op making a row that exists is set aside', async () => {
    const { shop, phone, write } = await shopWithPhone();
    const entryId = shop.newId();
    write({ entryId, text: 'first' });
    write({ entryId, text: 'second' });
    expect(await phone.sends()).toMatchObject([
      { outcome: 'kept' },
      { outcome: 'set-aside', reason: 'id-reused' },
    ]);
    expect(shop.row('entry', entryId).text).toBe('first');
  });

  it('nor a second op making a mark, a start or an addition that exists', async () => {
    const { shop, phone, boatId, stageId } = await shopWithPhone();
    const [taskId, markId] = [shop.newId(), shop.newId()];
    await phone.says('task.add', { taskId, boatId, stageId, title: 'Fair the keel' });
    phone.does('task.mark', { taskId, markId, workDate: TODAY });
    phone.does('task.mark', { taskId, markId, workDate: '2026-05-30' });
    phone.does('task.start', { taskId, startId: markId });
    const outcomes = await phone.sends();
    expect(outcomes.map(({ outcome, reason }) => reason ?? outcome)).toEqual([
      'kept',
      'id-reused',
      'id-reused',
    ]);
    expect(shop.row('task', taskId).marks).toMatchObject([{ id: markId, workDate: TODAY }]);
  });

  it('the same mark id on another task is another mark, since marks are named with their task', async () => {
    const { shop, phone, boatId, stageId } = await shopWithPhone();
    const [one, other, markId] = [shop.newId(), shop.newId(), shop.newId()];
    for (const taskId of [one, other]) {
      phone.does('task.add', { taskId, boatId, stageId, title: 'Fair the keel' });
      phone.does('task.mark', { taskId, markId, workDate: TODAY });
    }
    phone.does('task.unmark', { taskId: one, markIds: [markId] });
    await phone.sends();
    expect([one, other].map((id) => shop.row('task', id).done)).toEqual([false, true]);
  });
});
