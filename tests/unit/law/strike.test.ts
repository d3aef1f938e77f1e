import { beforeEach, describe, expect, it } from 'vitest';
import { ShopInMemory, TODAY, type Phone } from '#tests/worlds/shop-in-memory.ts';

let shop: ShopInMemory;
let desk: Phone;
let rosas: Phone;
let tablet: Phone;
let boatId: string;
let stageId: string;
let entryId: string;

beforeEach(async () => {
  shop = new ShopInMemory();
  ({ desk, boatId, stageId } = await shop.withBoat());
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
const strikes = (phone: Phone, why = 'wrong boat') => phone.does('entry.strike', { entryId, why });
const restores = (phone: Phone, why = 'right boat') => phone.does('entry.restore', { entryId, why });
const changes = (phone: Phone, text: string) => phone.does('entry.amend', { entryId, set: { text } });
const unseen = () => shop.looseEnd(entryId, 'struck-and-changed')?.values.map(({ value }) => value);

describe('law 8: nothing is deleted, it is struck', () => {
  it('with who, when and why, and all its words stay', async () => {
    const op = strikes(rosas);
    await rosas.sends();
    const at = new Date(shop.clock.now()).toISOString();
    expect(entry()).toMatchObject({
      text: 'ribs',
      struck: { by: op.personId, at, why: 'wrong boat' },
      heads: { struck: [op.id] },
    });
  });

  it('and can be restored, with a reason', async () => {
    const strike = strikes(rosas);
    await rosas.sends();
    const restore = restores(rosas);
    await rosas.sends();
    expect(restore.over).toEqual({ struck: [strike.id] });
    expect(entry().struck).toBeNull();
    expect(entry().statements.map(({ why }) => why)).toEqual(['wrong boat', 'right boat']);
  });

  it('a reason must be given', async () => {
    expect(await rosas.says('entry.strike', { entryId, why: '  ' })).toMatchObject({ reason: 'malformed' });
    expect(await rosas.says('entry.restore', { entryId })).toMatchObject({ reason: 'malformed' });
  });

  it('two strikes are one value, whatever their reasons', async () => {
    const [first, second] = [strikes(rosas, 'wrong boat'), strikes(tablet, 'twice')];
    await tablet.sends();
    expect(await rosas.sends()).toMatchObject([{ outcome: 'kept' }]);
    expect(entry()).toMatchObject({ struck: { why: 'twice' }, heads: { struck: [second.id, first.id] } });
    expect(shop.looseEnds()).toEqual([]);
  });

  it('and so are two restores', async () => {
    strikes(rosas);
    await rosas.sends();
    tablet.hears();
    restores(rosas);
    restores(tablet, 'it was hers');
    await tablet.sends();
    expect(await rosas.sends()).toMatchObject([{ outcome: 'kept' }]);
    expect(entry().struck).toBeNull();
    expect(shop.looseEnds()).toEqual([]);
  });

  it('a strike against a restore that did not know of it is a loose end', async () => {
    strikes(rosas);
    await rosas.sends();
    tablet.hears();
    restores(rosas);
    strikes(tablet, 'wrong day');
    await rosas.sends();
    await tablet.sends();
    expect(entry().struck).toMatchObject({ why: 'wrong day' });
    expect(shop.looseEnd(entryId, 'struck')!.values.map(({ value }) => value)).toEqual([
      expect.objectContaining({ why: 'wrong day' }),
      null,
    ]);
    desk.hears();
    restores(desk);
    await desk.sends();
    expect(shop.looseEnds()).toEqual([]);
  });

  it('an entry is struck by its author or the foreman, not by other crew', async () => {
    const idas = shop.phone(shop.person('Ida', 'crew'));
    strikes(idas);
    expect(await idas.sends()).toMatchObject([{ reason: 'not-entitled' }]);
    strikes(desk);
    expect(await desk.sends()).toMatchObject([{ outcome: 'kept' }]);
  });
});

describe('struck and changed', () => {
  it('is no loose end where the strike saw all that stands', async () => {
    changes(rosas, 'two ribs');
    rosas.does('entry.addTo', { entryId, additionId: shop.newId(), text: 'and a knee' });
    const strike = strikes(rosas);
    expect(strike.data.saw).toHaveLength(3);
    await rosas.sends();
    expect(shop.looseEnds()).toEqual([]);
  });

  it.each(['strike', 'change'] as const)(
    'is one where it did not, whichever came first: the %s',
    async (first) => {
      strikes(tablet);
      changes(rosas, 'two ribs');
      for (const phone of first === 'strike' ? [tablet, rosas] : [rosas, tablet]) await phone.sends();
      expect(entry()).toMatchObject({ text: 'two ribs', struck: {} });
      expect(unseen()).toEqual([{ field: 'text', value: 'two ribs' }]);
    },
  );

  it('is one where something was added meanwhile', async () => {
    strikes(tablet);
    const additionId = shop.newId();
    desk.does('entry.addTo', { entryId, additionId, text: 'and a knee' });
    await tablet.sends();
    await desk.sends();
    expect(unseen()).toEqual([{ added: additionId }]);
  });

  it('is none for what was added and taken back', async () => {
    strikes(tablet);
    const additionId = shop.newId();
    rosas.does('entry.addTo', { entryId, additionId, text: 'and a knee' });
    rosas.does('entry.takeBack', { entryId, additionIds: [additionId] });
    await tablet.sends();
    await rosas.sends();
    expect(shop.looseEnds()).toEqual([]);
  });

  it('is one for a mark on a task that was struck meanwhile', async () => {
    const [taskId, markId] = [shop.newId(), shop.newId()];
    await desk.says('task.add', { taskId, boatId, stageId, title: 'Fair the keel' });
    rosas.hears();
    desk.does('task.strike', { taskId, why: 'not agreed' });
    rosas.does('task.mark', { taskId, markId, workDate: TODAY });
    await desk.sends();
    await rosas.sends();
    expect(shop.row('task', taskId)).toMatchObject({ done: true, struck: {} });
    expect(shop.looseEnd(taskId, 'struck-and-changed')!.values.map(({ value }) => value)).toEqual([
      { added: markId },
    ]);
  });

  it('is closed by restoring', async () => {
    strikes(tablet);
    changes(rosas, 'two ribs');
    await tablet.sends();
    await rosas.sends();
    restores(rosas);
    await rosas.sends();
    expect(entry()).toMatchObject({ text: 'two ribs', struck: null });
    expect(shop.looseEnds()).toEqual([]);
  });

  it('is closed by a strike that saw it', async () => {
    strikes(tablet);
    changes(rosas, 'two ribs');
    await tablet.sends();
    await rosas.sends();
    desk.hears();
    strikes(desk, 'still wrong');
    await desk.sends();
    expect(entry().struck).toMatchObject({ why: 'still wrong' });
    expect(shop.looseEnds()).toEqual([]);
  });

  it('is judged by the strike that stands', async () => {
    strikes(tablet);
    changes(rosas, 'two ribs');
    strikes(rosas, 'twice');
    await rosas.sends();
    expect(shop.looseEnds()).toEqual([]);
    await tablet.sends();
    expect(entry().struck).toMatchObject({ why: 'twice' });
    expect(shop.looseEnds()).toEqual([]);
  });
});
