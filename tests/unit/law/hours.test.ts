import { beforeEach, describe, expect, it } from 'vitest';
import { ShopInMemory, TODAY, type Phone } from '#tests/worlds/shop-in-memory.ts';

let shop: ShopInMemory;
let desk: Phone;
let rosas: Phone;
let idas: Phone;
let office: Phone;
let boatId: string;
let stageId: string;
let entryId: string;
let rosa: string;
let ida: string;

// Rosa wrote an entry: four hours of her own, two of Ida's, with a kind that is only hers to propose
beforeEach(async () => {
  shop = new ShopInMemory();
  ({ desk, boatId, stageId } = await shop.withBoat());
  [rosa, ida] = [shop.person('Rosa', 'crew'), shop.person('Ida', 'crew')];
  [rosas, idas, office] = [shop.phone(rosa), shop.phone(ida), shop.phone(shop.person('Tom', 'office'))];
  entryId = shop.newId();
  const hours = [
    { personId: rosa, minutes: 240 },
    { personId: ida, minutes: 120, kind: 'agreed' },
  ];
  await rosas.says('entry.write', {
    entryId,
    boatId,
    stageId,
    workDate: TODAY,
    text: 'ribs',
    spoken: true,
    hours,
  });
  for (const phone of [desk, idas, office]) phone.hears();
});

const hoursOf = (personId: string) =>
  shop.row('entry', entryId).hours.find((figure) => figure.personId === personId);
const setsHours = (phone: Phone, ...hours: object[]) =>
  phone.says('entry.amend', { entryId, set: { hours } });

describe('hours are one field a person', () => {
  it('as written, a kind by crew is proposed and none is none', () => {
    expect(hoursOf(rosa)).toEqual({ personId: rosa, minutes: 240, kind: null, proposed: true });
    expect(hoursOf(ida)).toEqual({ personId: ida, minutes: 120, kind: 'agreed', proposed: true });
  });

  it('written by a foreman it is set', async () => {
    const otherId = shop.newId();
    const hours = [{ personId: rosa, minutes: 60, kind: 'teaching' }];
    const other = { entryId: otherId, boatId, workDate: TODAY, text: 'showed', spoken: false, hours };
    await desk.says('entry.write', other);
    expect(shop.row('entry', otherId).hours).toEqual([
      { personId: rosa, minutes: 60, kind: 'teaching', proposed: false },
    ]);
    rosas.hears();
    await rosas.says('entry.amend', {
      entryId: otherId,
      set: { hours: [{ personId: rosa, minutes: 90, kind: 'teaching' }] },
    });
    expect(shop.row('entry', otherId).hours).toEqual([
      { personId: rosa, minutes: 90, kind: 'teaching', proposed: false },
    ]);
  });

  it('changing one person’s leaves the other’s, and no two people conflict', async () => {
    rosas.does('entry.amend', { entryId, set: { hours: [{ personId: rosa, minutes: 180 }] } });
    idas.does('entry.amend', { entryId, set: { hours: [{ personId: ida, minutes: 150, kind: 'agreed' }] } });
    await rosas.sends();
    await idas.sends();
    expect([hoursOf(rosa)!.minutes, hoursOf(ida)!.minutes]).toEqual([180, 150]);
    expect(shop.looseEnds()).toEqual([]);
  });

  it('two figures for one person are a loose end of that person’s hours', async () => {
    rosas.does('entry.amend', { entryId, set: { hours: [{ personId: ida, minutes: 90, kind: 'agreed' }] } });
    idas.does('entry.amend', { entryId, set: { hours: [{ personId: ida, minutes: 150, kind: 'agreed' }] } });
    await rosas.sends();
    await idas.sends();
    const end = shop.looseEnd(entryId, `hours/${ida}`)!;
    expect(end.values.map(({ value }) => value)).toEqual([
      { minutes: 150, kind: 'agreed' },
      { minutes: 90, kind: 'agreed' },
    ]);
    expect(hoursOf(ida)!.minutes).toBe(150);
    desk.hears();
    await setsHours(desk, { personId: ida, minutes: 120, kind: 'agreed' });
    expect(shop.looseEnds()).toEqual([]);
    expect(hoursOf(ida)).toEqual({ personId: ida, minutes: 120, kind: 'agreed', proposed: false });
  });

  it('no minutes leave the row’s list, and what was said stays', async () => {
    await setsHours(rosas, { personId: ida, minutes: 0 });
    const { hours, statements } = shop.row('entry', entryId);
    expect(hours.map(({ personId }) => personId)).toEqual([rosa]);
    expect(statements.map(({ value }) => value)).toEqual([
      { minutes: 120, kind: 'agreed' },
      { minutes: 0, kind: null },
    ]);
    await setsHours(rosas, { personId: ida, minutes: 30 });
    expect(hoursOf(ida)).toEqual({ personId: ida, minutes: 30, kind: null, proposed: true });
  });

  it('minutes again against none are a loose end, for hours never vanish', async () => {
    rosas.does('entry.amend', { entryId, set: { hours: [{ personId: ida, minutes: 0 }] } });
    idas.does('entry.amend', { entryId, set: { hours: [{ personId: ida, minutes: 60 }] } });
    await idas.sends();
    await rosas.sends();
    expect(shop.looseEnd(entryId, `hours/${ida}`)!.values).toHaveLength(2);
  });

  it('people are added to an entry’s hours', async () => {
    const per = shop.person('Per', 'crew');
    await setsHours(rosas, { personId: per, minutes: 45, kind: 'yard' });
    expect(hoursOf(per)).toEqual({ personId: per, minutes: 45, kind: 'yard', proposed: true });
    expect(shop.row('entry', entryId).hours.map(({ personId }) => personId)).toEqual([rosa, ida, per]);
  });

  it('nobody has two figures in one op', async () => {
    const outcome = await setsHours(rosas, { personId: ida, minutes: 10 }, { personId: ida, minutes: 20 });
    expect(outcome).toMatchObject({ reason: 'malformed' });
  });
});

describe('a kind is proposed until foreman or office state it', () => {
  it.each([
    ['foreman', () => desk],
    ['office', () => office],
  ])('the %s sets it', async (_role, phone) => {
    await setsHours(phone(), { personId: ida, minutes: 120, kind: 'extra' });
    expect(hoursOf(ida)).toEqual({ personId: ida, minutes: 120, kind: 'extra', proposed: false });
  });

  it('crew who then change the minutes and keep the kind leave it set', async () => {
    await setsHours(office, { personId: ida, minutes: 120, kind: 'extra' });
    idas.hears();
    await setsHours(idas, { personId: ida, minutes: 150, kind: 'extra' });
    expect(hoursOf(ida)).toEqual({ personId: ida, minutes: 150, kind: 'extra', proposed: false });
  });

  it('crew who change the kind propose', async () => {
    await setsHours(office, { personId: ida, minutes: 120, kind: 'extra' });
    idas.hears();
    await setsHours(idas, { personId: ida, minutes: 120, kind: 'waiting' });
    expect(hoursOf(ida)).toEqual({ personId: ida, minutes: 120, kind: 'waiting', proposed: true });
  });

  it('a kind that the foreman has since set otherwise is a proposal again', async () => {
    await setsHours(office, { personId: ida, minutes: 120, kind: 'extra' });
    desk.hears();
    await setsHours(desk, { personId: ida, minutes: 120, kind: 'own-fault' });
    idas.hears();
    await setsHours(idas, { personId: ida, minutes: 120, kind: 'extra' });
    expect(hoursOf(ida)).toMatchObject({ kind: 'extra', proposed: true });
  });
});

describe('who may say what of hours', () => {
  it('who is named changes their own figure, and nothing else', async () => {
    expect(await setsHours(idas, { personId: ida, minutes: 60 })).toMatchObject({ outcome: 'kept' });
    expect(await setsHours(idas, { personId: rosa, minutes: 60 })).toMatchObject({ reason: 'not-entitled' });
    const both = { text: 'ribs, mostly mine', hours: [{ personId: ida, minutes: 60 }] };
    expect(await idas.says('entry.amend', { entryId, set: both })).toMatchObject({ reason: 'not-entitled' });
    expect(shop.row('entry', entryId)).toMatchObject({
      text: 'ribs',
      hours: [{ minutes: 240 }, { minutes: 60 }],
    });
  });

  it('who is not named changes none', async () => {
    const per = shop.person('Per', 'crew');
    expect(await setsHours(shop.phone(per), { personId: per, minutes: 60 })).toMatchObject({
      reason: 'not-entitled',
    });
  });

  it('office changes any hours and no words', async () => {
    expect(await setsHours(office, { personId: rosa, minutes: 200 })).toMatchObject({ outcome: 'kept' });
    expect(await office.says('entry.amend', { entryId, set: { text: 'Ribs.' } })).toMatchObject({
      reason: 'not-entitled',
    });
    const both = { workDate: TODAY, hours: [{ personId: rosa, minutes: 100 }] };
    expect(await office.says('entry.amend', { entryId, set: both })).toMatchObject({
      reason: 'not-entitled',
    });
    expect(hoursOf(rosa)!.minutes).toBe(200);
  });
});
