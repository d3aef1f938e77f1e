import { beforeEach, describe, expect, it } from 'vitest';
import { ShopInMemory, TODAY, looseEndId, type Phone } from '#tests/worlds/shop-in-memory.ts';

let shop: ShopInMemory;
let desk: Phone;
let rosas: Phone;
let tablet: Phone;
let boatId: string;
let stageId: string;
let laterStageId: string;
let entryId: string;

// Rosa's phone and the bench tablet, on which she is enrolled too, have both heard of one entry of hers
beforeEach(async () => {
  shop = new ShopInMemory();
  ({ desk, boatId, stageId, laterStageId } = await shop.withBoat());
  const rosa = shop.person('Rosa', 'crew');
  [rosas, tablet] = [shop.phone(rosa), shop.phone(rosa)];
  entryId = shop.newId();
  await rosas.says('entry.write', {
    entryId,
    boatId,
    stageId,
    workDate: TODAY,
    text: 'ribs',
    spoken: true,
    hours: [],
  });
  for (const phone of [tablet, desk]) phone.hears();
});

const entry = () => shop.row('entry', entryId);
const amends = (phone: Phone, set: Record<string, unknown>, over?: Record<string, string[]>) =>
  phone.does('entry.amend', { entryId, set }, over ? { over } : {});

describe('law 5: what a change replaces', () => {
  it('an amend over what it has seen replaces it', async () => {
    const op = amends(rosas, { text: 'two ribs' });
    await rosas.sends();
    expect(entry()).toMatchObject({ text: 'two ribs', heads: { text: [op.id] } });
    expect(entry().stamps).toEqual({ [entry().madeBy]: expect.any(String), [op.id]: op.at });
    expect(shop.looseEnds()).toEqual([]);
  });

  it('two amends that did not know of one another are both kept; the later stands and there is a loose end', async () => {
    const first = amends(rosas, { text: 'two ribs' });
    const second = amends(tablet, { text: 'three ribs' });
    // the later arrives first
    expect(await tablet.sends()).toMatchObject([{ outcome: 'kept' }]);
    expect(await rosas.sends()).toMatchObject([{ outcome: 'loose-end' }]);
    expect(entry()).toMatchObject({ text: 'three ribs', heads: { text: [second.id, first.id] } });
    expect(shop.looseEnds()).toEqual([
      {
        id: looseEndId(shop, 'entry', entryId, 'text'),
        boatId,
        kind: 'field',
        entity: 'entry',
        rowId: entryId,
        field: 'text',
        values: [
          expect.objectContaining({ value: 'three ribs', opId: second.id, stands: true }),
          expect.objectContaining({ value: 'two ribs', opId: first.id, stands: false }),
        ],
      },
    ]);
  });

  it('both saying the same is no loose end', async () => {
    for (const phone of [rosas, tablet]) amends(phone, { place: { side: 'port', number: 4 } });
    await rosas.sends();
    expect(await tablet.sends()).toMatchObject([{ outcome: 'kept' }]);
    expect(entry().heads.place).toHaveLength(2);
    expect(shop.looseEnds()).toEqual([]);
  });

  it('different fields never meet', async () => {
    amends(rosas, { text: 'two ribs' });
    amends(tablet, { workDate: '2026-05-31' });
    await rosas.sends();
    await tablet.sends();
    expect(entry()).toMatchObject({ text: 'two ribs', workDate: '2026-05-31' });
    expect(shop.looseEnds()).toEqual([]);
  });

  it('several unsent ops of one device never conflict', async () => {
    for (const text of ['two', 'three', 'four']) amends(rosas, { text });
    expect(await rosas.sends()).toMatchObject([
      { outcome: 'kept' },
      { outcome: 'kept' },
      { outcome: 'kept' },
    ]);
    expect(entry().text).toBe('four');
    expect(shop.looseEnds()).toEqual([]);
  });

  it('nor where one of them is set aside: the next names what that one named', async () => {
    amends(rosas, { text: 'two ribs' });
    await rosas.sends();
    tablet.hears();
    const refused = { ...amends(tablet, { text: 'three ribs' }), v: 9 };
    const next = amends(tablet, { text: 'four ribs' });
    expect(await tablet.sendsOnly([refused, next])).toMatchObject([
      { reason: 'not-understood' },
      { outcome: 'kept' },
    ]);
    expect(entry()).toMatchObject({ text: 'four ribs', heads: { text: [next.id] } });
    expect(shop.looseEnds()).toEqual([]);
  });

  it('an amend that names all the values settles them', async () => {
    amends(rosas, { text: 'two ribs' });
    amends(tablet, { text: 'three ribs' });
    await rosas.sends();
    await tablet.sends();
    desk.hears();
    const settles = amends(desk, { text: 'two or three ribs' });
    expect(settles.over.text).toHaveLength(2);
    await desk.sends();
    expect(entry()).toMatchObject({ text: 'two or three ribs', heads: { text: [settles.id] } });
    expect(shop.looseEnds()).toEqual([]);
    expect(shop.store.row('looseEnd', looseEndId(shop, 'entry', entryId, 'text'))).toBeUndefined();
  });

  it('one that names only some of them leaves the others', async () => {
    const first = amends(rosas, { text: 'two ribs' });
    const second = amends(tablet, { text: 'three ribs' });
    await rosas.sends();
    await tablet.sends();
    amends(desk, { text: 'four ribs' }, { text: [first.id] });
    await desk.sends();
    const values = shop.looseEnd(entryId, 'text')!.values;
    expect(values.map(({ opId }) => opId)).toEqual([expect.any(String), second.id]);
  });

  it('a field without its entry in over replaces nothing', async () => {
    amends(rosas, { text: 'two ribs' }, {});
    await rosas.sends();
    expect(shop.looseEnd(entryId, 'text')!.values.map(({ value }) => value)).toEqual(['two ribs', 'ribs']);
  });

  it('a value given where the making op gave none meets no rival', async () => {
    amends(rosas, { place: { side: 'port' } }, {});
    await rosas.sends();
    expect(entry().place).toEqual({ side: 'port' });
    expect(shop.looseEnds()).toEqual([]);
  });

  it('of two that stand in the same moment the op with the greater id stands', async () => {
    const first = amends(rosas, { text: 'two ribs' });
    const second = { ...amends(rosas, { text: 'three ribs' }), over: first.over };
    const twin = { ...first, at: second.at, id: shop.newId() };
    await rosas.sendsOnly([second, twin]);
    const [a, b] = shop.looseEnd(entryId, 'text')!.values;
    expect([a!.stands, b!.stands]).toEqual([true, false]);
    expect(entry().heads.text).toEqual([a!.opId, b!.opId]);
  });

  it('boat and stage are one field', async () => {
    const [otherBoatId, otherStageId] = [shop.newId(), shop.newId()];
    desk.does('boat.add', { boatId: otherBoatId, name: 'Kittiwake' });
    desk.does('stage.add', {
      stageId: otherStageId,
      boatId: otherBoatId,
      name: 'Strip',
      order: 1,
      after: [],
    });
    await desk.sends();
    rosas.hears();
    const moved = amends(rosas, { boatId: otherBoatId, stageId: otherStageId });
    const staged = amends(tablet, { stageId: laterStageId });
    await rosas.sends();
    await tablet.sends();
    expect([moved, staged].map(({ over }) => Object.keys(over))).toEqual([['stageId'], ['stageId']]);
    expect(entry()).toMatchObject({
      boatId,
      stageId: laterStageId,
      heads: { stageId: [staged.id, moved.id] },
    });
    expect(shop.looseEnd(entryId, 'stageId')!.values.map(({ value }) => value)).toEqual([
      { boatId, stageId: laterStageId },
      { boatId: otherBoatId, stageId: otherStageId },
    ]);
  });

  it('a boat without a stage leaves the stage', async () => {
    const otherBoatId = shop.newId();
    await desk.says('boat.add', { boatId: otherBoatId, name: 'Kittiwake' });
    rosas.hears();
    amends(rosas, { boatId: otherBoatId });
    await rosas.sends();
    expect(entry()).toMatchObject({ boatId: otherBoatId, stageId: null });
  });
});

describe('law 6: no sentence stands that no person wrote', () => {
  it('two rewordings are never blended', async () => {
    amends(rosas, { text: 'two ribs steamed, one split' });
    amends(tablet, { text: 'ribs steamed to port' });
    await rosas.sends();
    await tablet.sends();
    expect(['two ribs steamed, one split', 'ribs steamed to port']).toContain(entry().text);
    expect(shop.looseEnd(entryId, 'text')!.values).toHaveLength(2);
  });

  it('what is added always adds', async () => {
    for (const phone of [rosas, tablet, desk]) {
      phone.does('entry.addTo', { entryId, additionId: shop.newId(), text: `by ${phone.deviceId}` });
    }
    for (const phone of [desk, tablet, rosas]) await phone.sends();
    expect(entry().additions.map(({ text }) => text)).toEqual(
      [rosas, tablet, desk].map(({ deviceId }) => `by ${deviceId}`),
    );
    expect(shop.looseEnds()).toEqual([]);
  });
});

describe('law 12: a loose end is derived', () => {
  it('with the same id on every device', async () => {
    amends(rosas, { text: 'two ribs' });
    amends(tablet, { text: 'three ribs' });
    await rosas.sends();
    await tablet.sends();
    expect(shop.looseEnds().map(({ id }) => id)).toEqual([looseEndId(shop, 'entry', entryId, 'text')]);
    expect(looseEndId(shop, 'entry', entryId, 'text')).not.toBe(
      looseEndId(shop, 'entry', entryId, 'workDate'),
    );
  });

  it('its answer is judged on the rows as they stand after the whole batch', async () => {
    amends(tablet, { text: 'three ribs' });
    await tablet.sends();
    amends(rosas, { text: 'two ribs' });
    amends(
      rosas,
      { text: 'two and three ribs' },
      { text: [entry().madeBy, entry().heads.text![0]!, rosas.held[0]!.id] },
    );
    expect(await rosas.sends()).toMatchObject([{ outcome: 'kept' }, { outcome: 'kept' }]);
    expect(shop.looseEnds()).toEqual([]);
  });
});
