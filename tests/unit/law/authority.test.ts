import { beforeEach, describe, expect, it } from 'vitest';
import type { Role } from '#shared/identity/role.ts';
import { judgeSetAside } from '#shared/sync/merge.ts';
import type { SetAsideRow } from '#shared/set-aside/set-aside.ts';
import { ShopInMemory, TODAY, type Phone } from '#tests/worlds/shop-in-memory.ts';

let shop: ShopInMemory;
let desk: Phone;
let rosas: Phone;
let idas: Phone;
let boatId: string;
let stageId: string;
let entryId: string;

beforeEach(async () => {
  shop = new ShopInMemory();
  ({ desk, boatId, stageId } = await shop.withBoat());
  [rosas, idas] = [shop.phone(shop.person('Rosa', 'crew')), shop.phone(shop.person('Ida', 'crew'))];
  entryId = shop.newId();
  await rosas.says('entry.write', writing({ entryId }));
  for (const phone of [desk, idas]) phone.hears();
});

function writing(changes: object = {}) {
  return {
    entryId: shop.newId(),
    boatId,
    stageId,
    workDate: TODAY,
    text: 'ribs',
    spoken: false,
    hours: [],
    ...changes,
  };
}

const aside = (id: string) => shop.row('setAside', id);
const admits = (setAsideId: string, why = 'she asked me first') =>
  desk.says('setAside.admit', { setAsideId, why });
const dismisses = (setAsideId: string, why = 'no') => desk.says('setAside.dismiss', { setAsideId, why });

/** Ida, who may not, rewords Rosa's entry. */
async function idaRewords(text = 'three ribs') {
  const op = idas.does('entry.amend', { entryId, set: { text } });
  await idas.sends();
  desk.hears();
  return op;
}

describe('law 10: authority is judged at receipt', () => {
  const kinds: [string, () => object, Role[]][] = [
    ['boat.add', () => ({ boatId: shop.newId(), name: 'Kittiwake' }), ['foreman']],
    ['boat.amend', () => ({ boatId, set: { name: 'Storm Petrel' } }), ['foreman']],
    ['boat.strike', () => ({ boatId, why: 'sold' }), ['foreman']],
    ['stage.add', () => ({ stageId: shop.newId(), boatId, name: 'Paint', order: 3, after: [] }), ['foreman']],
    ['stage.amend', () => ({ stageId, set: { order: 4 } }), ['foreman']],
    ['stage.mark', () => ({ stageId, markId: shop.newId(), workDate: TODAY }), ['foreman']],
    [
      'task.add',
      () => ({ taskId: shop.newId(), boatId, stageId, title: 'Fair the keel' }),
      ['crew', 'foreman'],
    ],
    ['entry.write', () => writing(), ['crew', 'foreman']],
    ['entry.addTo', () => ({ entryId, additionId: shop.newId(), text: 'and a knee' }), ['crew', 'foreman']],
    ['entry.amend', () => ({ entryId, set: { text: 'two ribs' } }), ['foreman']],
    ['entry.amend', () => ({ entryId, set: { hours: [] } }), ['foreman', 'office']],
    ['entry.strike', () => ({ entryId, why: 'twice' }), ['foreman']],
    ['entry.restore', () => ({ entryId, why: 'not twice' }), ['foreman']],
  ];
  const cases = kinds.flatMap(([kind, data, entitled]) =>
    (['crew', 'foreman', 'office', 'owner'] as const).map(
      (role) => [role, kind, entitled.includes(role), data] as const,
    ),
  );

  it.each(cases)('%s, %s of what is another’s: %s', async (role, kind, isEntitled, data) => {
    const outcome = await shop
      .phone(shop.person('Somebody', role))
      .says(kind, data() as Record<string, unknown>);
    expect(outcome.reason ?? outcome.outcome).toBe(isEntitled ? 'kept' : 'not-entitled');
  });

  it('a person of several roles may what any of them may', async () => {
    const both = shop.phone(shop.person('Nell', 'owner', 'crew'));
    expect(await both.says('entry.write', writing())).toMatchObject({ outcome: 'kept' });
  });

  it('by the roles in force then, and not by those of later', async () => {
    shop.people.get(rosas.personIds[0]!)!.roles = ['owner'];
    const op = rosas.does('entry.amend', { entryId, set: { text: 'two ribs' } });
    expect(await rosas.sends()).toMatchObject([{ reason: 'not-entitled' }]);
    shop.people.get(rosas.personIds[0]!)!.roles = ['crew'];
    expect(await rosas.sendsOnly([op])).toMatchObject([{ reason: 'not-entitled' }]);
    expect(shop.row('entry', entryId).text).toBe('ribs');
  });

  it('who is not enrolled on the device is not entitled', async () => {
    const op = { ...rosas.does('entry.write', writing()), personId: idas.personIds[0]! };
    expect(await rosas.sendsOnly([op])).toMatchObject([{ reason: 'not-entitled' }]);
    expect(aside(op.id).authorId).toBe(rosas.personIds[0]);
  });

  it('what is set aside never holds up what stands behind it', async () => {
    rosas.does('boat.add', { boatId: shop.newId(), name: 'Kittiwake' });
    rosas.does('entry.amend', { entryId, set: { text: 'two ribs' } });
    const outcomes = await rosas.sends();
    expect(outcomes.map(({ reason, outcome }) => reason ?? outcome)).toEqual(['not-entitled', 'kept']);
  });
});

describe('what is set aside is admitted or dismissed by the foreman', () => {
  it('waits meanwhile and changes nothing', async () => {
    const op = await idaRewords();
    expect(shop.row('entry', entryId).text).toBe('ribs');
    expect(aside(op.id)).toMatchObject({
      id: op.id,
      opId: op.id,
      op,
      authorId: op.personId,
      reason: 'not-entitled',
      state: 'waiting',
      by: null,
      at: null,
      why: null,
    });
  });

  it('admitted it counts with its original time, naming who admitted it', async () => {
    const op = await idaRewords();
    shop.clock.advance(3_600_000);
    expect(await admits(op.id)).toMatchObject({ outcome: 'kept' });
    const at = new Date(shop.clock.now()).toISOString();
    expect(shop.row('entry', entryId)).toMatchObject({
      text: 'three ribs',
      heads: { text: [op.id] },
      stamps: { [op.id]: op.at },
    });
    expect(aside(op.id)).toMatchObject({
      state: 'admitted',
      by: desk.personIds[0],
      at,
      why: 'she asked me first',
    });
  });

  it('so that what was said since stands over it, as a loose end where it did not know', async () => {
    const op = await idaRewords();
    await rosas.says('entry.amend', { entryId, set: { text: 'two ribs' } });
    await admits(op.id);
    expect(shop.row('entry', entryId).text).toBe('two ribs');
    expect(shop.looseEnd(entryId, 'text')!.values.map(({ value }) => value)).toEqual([
      'two ribs',
      'three ribs',
    ]);
  });

  it('its sender still gets the first answer', async () => {
    const op = await idaRewords();
    await admits(op.id);
    expect(await idas.sendsOnly([op])).toMatchObject([{ outcome: 'set-aside', reason: 'not-entitled' }]);
  });

  it('dismissed it never counts', async () => {
    const op = await idaRewords();
    await dismisses(op.id);
    expect(aside(op.id)).toMatchObject({ state: 'dismissed', by: desk.personIds[0], why: 'no' });
    expect(shop.row('entry', entryId).text).toBe('ribs');
  });

  it.each(['admit first', 'dismiss first'])(
    'an admission holds whatever dismissal there is: %s',
    async (order) => {
      const op = await idaRewords();
      const inTurn = order === 'admit first' ? [admits, dismisses] : [dismisses, admits];
      for (const decides of inTurn) await decides(op.id);
      expect(aside(op.id)).toMatchObject({ state: 'admitted', why: 'she asked me first' });
      expect(shop.row('entry', entryId).text).toBe('three ribs');
    },
  );

  it('two foremen who both admit it admit it once', async () => {
    const op = await idaRewords();
    const other = shop.phone(shop.person('Jon', 'foreman'));
    await admits(op.id);
    await other.says('setAside.admit', { setAsideId: op.id });
    expect(aside(op.id)).toMatchObject({ state: 'admitted', by: desk.personIds[0] });
    expect(shop.row('entry', entryId).statements).toHaveLength(2);
  });

  it('admits in the batch that it came in, whichever stands first', async () => {
    const both = shop.phone(desk.personIds[0]!, idas.personIds[0]!);
    const op = both.does('entry.amend', { entryId, set: { text: 'three ribs' } }, { as: idas.personIds[0]! });
    const admit = both.does('setAside.admit', { setAsideId: op.id });
    expect(await both.sendsOnly([admit, op])).toMatchObject([
      { outcome: 'kept' },
      { reason: 'not-entitled' },
    ]);
    expect(aside(op.id).state).toBe('admitted');
    expect(shop.row('entry', entryId).text).toBe('three ribs');
  });

  it('even from a phone that sends its admission before what it admits is there, as after a server was restored', async () => {
    const op = idas.does('entry.amend', { entryId, set: { text: 'three ribs' } });
    const admit = desk.does('setAside.admit', { setAsideId: op.id });
    expect(await desk.sends()).toMatchObject([{ reason: 'no-such-row' }]);
    await idas.sends();
    expect(aside(op.id).state).toBe('admitted');
    expect(aside(admit.id).state).toBe('since-kept');
    expect(shop.row('entry', entryId).text).toBe('three ribs');
  });

  it('and though what it admits must wait for its own row first', async () => {
    const laterId = shop.newId();
    const op = idas.does('boat.amend', { boatId: laterId, set: { lengthMm: 7_900 } });
    desk.does('setAside.admit', { setAsideId: op.id });
    await desk.sends();
    expect(await idas.sends()).toMatchObject([{ reason: 'no-such-row' }]);
    await desk.says('boat.add', { boatId: laterId, name: 'Kittiwake' });
    expect(aside(op.id)).toMatchObject({ state: 'admitted', reason: 'not-entitled' });
    expect(shop.row('boat', laterId).lengthMm).toBe(7_900);
  });

  it('an admission cannot be admitted past what may be admitted', async () => {
    const op = rosas.does('entry.write', writing({ entryId }));
    await rosas.sends();
    const admit = idas.does('setAside.admit', { setAsideId: op.id });
    await idas.sends();
    await admits(admit.id);
    expect(aside(op.id)).toMatchObject({ reason: 'id-reused', state: 'waiting', decisions: [] });
  });

  it.each<Role>(['crew', 'office', 'owner'])('nobody else decides: %s', async (role) => {
    const op = await idaRewords();
    const phone = shop.phone(shop.person('Somebody', role));
    expect(await phone.says('setAside.admit', { setAsideId: op.id })).toMatchObject({
      reason: 'not-entitled',
    });
    expect(await phone.says('setAside.dismiss', { setAsideId: op.id })).toMatchObject({
      reason: 'not-entitled',
    });
    expect(aside(op.id).state).toBe('waiting');
  });

  it('only what was not entitled, or came from a revoked device, can be admitted; anything can be dismissed', async () => {
    const write = writing();
    const reused = rosas.does('entry.write', { ...write, entryId });
    const missing = rosas.does('entry.write', writing({ boatId: shop.newId(), stageId: null }));
    const unknown = { ...rosas.does('entry.write', write), v: 2 };
    const malformed = { ...rosas.does('entry.write', write), data: { ...write, text: '\u0000' } };
    await rosas.sendsOnly([reused, missing, unknown, malformed]);
    expect(shop.all('setAside').map(({ reason }) => reason)).toEqual(
      expect.arrayContaining(['id-reused', 'no-such-row', 'not-understood', 'malformed']),
    );
    for (const { id } of [reused, missing, unknown, malformed]) {
      expect(await admits(id)).toMatchObject({ outcome: 'set-aside', reason: 'no-such-row' });
      expect(aside(id).state).toBe('waiting');
      expect(await dismisses(id)).toMatchObject({ outcome: 'kept' });
      expect(aside(id).state).toBe('dismissed');
    }
  });
});

describe('a revoked device', () => {
  it('has all that it sends set aside, to be admitted', async () => {
    rosas.isRevoked = true;
    const op = rosas.does('entry.amend', { entryId, set: { text: 'two ribs' } });
    expect(await rosas.sends()).toMatchObject([{ outcome: 'set-aside', reason: 'device-revoked' }]);
    expect(shop.row('entry', entryId).text).toBe('ribs');
    desk.hears();
    await admits(op.id);
    expect(shop.row('entry', entryId)).toMatchObject({ text: 'two ribs', stamps: { [op.id]: op.at } });
  });

  it('gets the answers that it had before', async () => {
    const op = rosas.does('entry.write', writing());
    const first = await rosas.sends();
    rosas.isRevoked = true;
    expect(await rosas.sendsOnly([op])).toEqual(first);
  });

  it('slips nothing in as not yet understood', async () => {
    rosas.isRevoked = true;
    const op = { ...rosas.does('entry.write', writing()), v: 2 };
    expect(await rosas.sendsOnly([op])).toMatchObject([{ reason: 'device-revoked' }]);
    desk.hears();
    await admits(op.id);
    expect(aside(op.id)).toMatchObject({ state: 'admitted', reason: 'not-understood' });
  });

  it('nor a second op under an id that is taken', async () => {
    const op = rosas.does('entry.write', writing());
    await rosas.sends();
    rosas.isRevoked = true;
    expect(await rosas.sendsOnly([{ ...op, kind: 'boat.add' }])).toMatchObject([{ reason: 'id-reused' }]);
  });
});

describe('what the server failed at', () => {
  it('is set aside as its fault and judged again by a server that does not', async () => {
    const op = rosas.does('entry.amend', { entryId, set: { text: 'two ribs' } });
    expect(await rosas.sendsOnly([op], new Set([0]))).toMatchObject([
      { outcome: 'set-aside', reason: 'server-fault' },
    ]);
    expect(shop.row('entry', entryId).text).toBe('ribs');
    await judgeSetAside(shop.store, shop.id, [aside(op.id)]);
    expect(aside(op.id).state).toBe('since-kept');
    expect(shop.row('entry', entryId)).toMatchObject({ text: 'two ribs', stamps: { [op.id]: op.at } });
    expect(await rosas.sendsOnly([op])).toMatchObject([{ reason: 'server-fault' }]);
  });

  it('is then still judged for who made it', async () => {
    const op = idas.does('entry.amend', { entryId, set: { text: 'two ribs' } });
    await idas.sendsOnly([op], new Set([0]));
    await judgeSetAside(shop.store, shop.id, [aside(op.id)]);
    expect(aside(op.id)).toMatchObject({ state: 'waiting', reason: 'not-entitled' });
  });

  it('what is not understood by this server either waits on, and one judged already is left', async () => {
    const op = { ...rosas.does('entry.write', writing()), v: 2 };
    await rosas.sendsOnly([op]);
    await judgeSetAside(shop.store, shop.id, [aside(op.id)]);
    expect(aside(op.id)).toMatchObject({ state: 'waiting', reason: 'not-understood' });
  });
});

describe('a row that is not there', () => {
  const missing = (id: string): SetAsideRow => aside(id);

  it('sets the op aside until it comes; the repeat still gets its first answer', async () => {
    const laterId = shop.newId();
    const op = rosas.does('entry.write', writing({ boatId: laterId, stageId: null }));
    expect(await rosas.sends()).toMatchObject([{ outcome: 'set-aside', reason: 'no-such-row' }]);
    await desk.says('boat.add', { boatId: laterId, name: 'Kittiwake' });
    expect(missing(op.id).state).toBe('since-kept');
    expect(shop.row('entry', op.data.entryId as string)).toMatchObject({
      boatId: laterId,
      stamps: { [op.id]: op.at },
    });
    expect(await rosas.sendsOnly([op])).toMatchObject([{ outcome: 'set-aside', reason: 'no-such-row' }]);
  });

  it.each<[string, () => object]>([
    ['a boat', () => ({ boatId: shop.newId(), stageId: null })],
    ['a stage', () => ({ stageId: shop.newId() })],
    ['somebody in the hours', () => ({ hours: [{ personId: shop.newId(), minutes: 60 }] })],
  ])('may be %s', async (_name, changes) => {
    expect(await rosas.says('entry.write', writing(changes()))).toMatchObject({ reason: 'no-such-row' });
  });

  it('one that needs several waits for the last of them', async () => {
    const [laterId, laterStageId] = [shop.newId(), shop.newId()];
    const op = rosas.does('entry.write', writing({ boatId: laterId, stageId: laterStageId }));
    await rosas.sends();
    await desk.says('boat.add', { boatId: laterId, name: 'Kittiwake' });
    expect(missing(op.id)).toMatchObject({ state: 'waiting', reason: 'no-such-row' });
    await desk.says('stage.add', {
      stageId: laterStageId,
      boatId: laterId,
      name: 'Strip',
      order: 1,
      after: [],
    });
    expect(missing(op.id).state).toBe('since-kept');
  });

  it('what waits for what waits comes with it', async () => {
    const write = rosas.does('entry.write', writing({ boatId: shop.newId(), stageId: null }));
    const amend = rosas.does(
      'entry.amend',
      { entryId: write.data.entryId, set: { text: 'two ribs' } },
      { over: { text: [write.id] } },
    );
    await rosas.sendsOnly([amend]);
    await rosas.sendsOnly([write]);
    await desk.says('boat.add', { boatId: write.data.boatId, name: 'Kittiwake' });
    expect([write, amend].map(({ id }) => missing(id).state)).toEqual(['since-kept', 'since-kept']);
    expect(shop.row('entry', write.data.entryId as string).text).toBe('two ribs');
  });

  it('ops of one batch may come out of order', async () => {
    const entry = writing({ text: 'knees' });
    const write = rosas.does('entry.write', entry);
    const amend = rosas.does('entry.amend', { entryId: entry.entryId, set: { text: 'two knees' } });
    const strike = rosas.does('entry.strike', { entryId: entry.entryId, why: 'twice' });
    const outcomes = await rosas.sendsOnly([strike, amend, write]);
    expect(outcomes.map(({ outcome }) => outcome)).toEqual(['kept', 'kept', 'kept']);
    expect(shop.row('entry', entry.entryId)).toMatchObject({ text: 'two knees', struck: { why: 'twice' } });
    expect(shop.all('setAside')).toEqual([]);
  });

  it('an op whose row comes with what waited from an earlier batch is not set aside', async () => {
    const [laterId, laterStageId] = [shop.newId(), shop.newId()];
    await desk.says('stage.add', {
      stageId: laterStageId,
      boatId: laterId,
      name: 'Strip',
      order: 1,
      after: [],
    });
    desk.does('entry.write', writing({ boatId: laterId, stageId: laterStageId }));
    desk.does('boat.add', { boatId: laterId, name: 'Kittiwake' });
    expect(await desk.sends()).toMatchObject([{ outcome: 'kept' }, { outcome: 'kept' }]);
  });

  it('who may not make it is told so when the row is there', async () => {
    const [op, later] = [
      idas.does('boat.amend', { boatId: shop.newId(), set: { name: 'Tern' } }),
      shop.newId(),
    ];
    await idas.sendsOnly([{ ...op, data: { ...op.data, boatId: later } }]);
    await desk.says('boat.add', { boatId: later, name: 'Kittiwake' });
    expect(missing(op.id)).toMatchObject({ state: 'waiting', reason: 'not-entitled' });
    await admits(op.id);
    expect(shop.looseEnd(later, 'name')!.values.map(({ value }) => value)).toEqual(['Kittiwake', 'Tern']);
  });

  it('an owner is told at once, since they may change no row of these', async () => {
    const owners = shop.phone(shop.person('Nell', 'owner'));
    expect(await owners.says('entry.write', writing({ boatId: shop.newId() }))).toMatchObject({
      reason: 'not-entitled',
    });
  });

  it('what was admitted before its row came counts when it comes', async () => {
    const owners = shop.phone(shop.person('Nell', 'owner'));
    const op = owners.does('entry.write', writing({ boatId: shop.newId(), stageId: null }));
    await owners.sends();
    desk.hears();
    await admits(op.id);
    expect(missing(op.id)).toMatchObject({ state: 'admitted', reason: 'not-entitled' });
    await desk.says('boat.add', { boatId: op.data.boatId, name: 'Kittiwake' });
    expect(shop.has('entry', op.data.entryId as string)).toBe(true);
  });

  it('a person who is not of the shop waits to be, though what they wrote is admitted', async () => {
    const stranger = shop.newId();
    const op = { ...rosas.does('entry.write', writing()), personId: stranger };
    await rosas.sendsOnly([op]);
    desk.hears();
    await admits(op.id);
    expect(shop.has('entry', op.data.entryId as string)).toBe(false);
    shop.store.put('person', stranger, {
      id: stranger,
      name: 'Per',
      roles: ['crew'],
      leftAt: null,
      boatIds: [],
    });
    await judgeSetAside(
      shop.store,
      shop.id,
      await shop.store.readAwaiting([{ entity: 'person', id: stranger }]),
    );
    expect(shop.row('entry', op.data.entryId as string).authorId).toBe(stranger);
  });
});
