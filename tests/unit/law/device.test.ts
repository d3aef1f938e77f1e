import { beforeEach, describe, expect, it } from 'vitest';
import { stampMs } from '#shared/sync/stamp.ts';
import { ShopInMemory, TODAY, type Phone } from '#tests/worlds/shop-in-memory.ts';

const MINUTE_MS = 60_000;
const YEAR_MS = 365 * 86_400_000;

let shop: ShopInMemory;
let rosas: Phone;
let idas: Phone;
let entryId: string;

beforeEach(async () => {
  shop = new ShopInMemory();
  const { boatId, stageId } = await shop.withBoat();
  const [rosa, ida] = [shop.person('Rosa', 'foreman'), shop.person('Ida', 'foreman')];
  [rosas, idas] = [shop.phone(rosa), shop.phone(ida)];
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
  idas.hears();
});

const entry = () => shop.row('entry', entryId);
const changes = (phone: Phone, text: string) => phone.does('entry.amend', { entryId, set: { text } });

describe('law 11: a device’s clock is not trusted', () => {
  it('up to five minutes ahead its stamp counts as it is', async () => {
    rosas.aheadMs = 5 * MINUTE_MS;
    const op = changes(rosas, 'two ribs');
    const [outcome] = await rosas.sends();
    expect(outcome!.orderedAt).toBe(op.at);
  });

  it('further ahead the server’s time counts', async () => {
    rosas.aheadMs = 5 * MINUTE_MS + 1;
    changes(rosas, 'two ribs');
    const [outcome] = await rosas.sends();
    expect(stampMs(outcome!.orderedAt)).toBe(shop.clock.now());
  });

  it('a clock a year ahead keeps the order of its own work', async () => {
    rosas.aheadMs = YEAR_MS;
    for (const text of ['one', 'two', 'three']) changes(rosas, text);
    const outcomes = await rosas.sends();
    const ordered = outcomes.map(({ orderedAt }) => orderedAt);
    expect(ordered).toEqual([...ordered].sort());
    expect(new Set(ordered).size).toBe(3);
    expect(entry().text).toBe('three');
  });

  it('and wins nothing beyond the hour of its arrival: who amends ten seconds later stands', async () => {
    rosas.aheadMs = YEAR_MS;
    changes(rosas, 'two ribs');
    await rosas.sends();
    shop.clock.advance(10_000);
    changes(idas, 'three ribs');
    expect(await idas.sends()).toMatchObject([{ outcome: 'loose-end' }]);
    expect(entry().text).toBe('three ribs');
    expect(shop.looseEnds()).toHaveLength(1);
  });

  it('set right again, it goes on from where the server has it', async () => {
    rosas.aheadMs = YEAR_MS;
    changes(rosas, 'two ribs');
    changes(rosas, 'three ribs');
    await rosas.sends();
    rosas.aheadMs = -MINUTE_MS;
    changes(rosas, 'four ribs');
    await rosas.sends();
    expect(entry().text).toBe('four ribs');
    expect(shop.looseEnds()).toEqual([]);
  });

  it('a clock a day back can still correct what it has seen', async () => {
    await rosas.says('entry.amend', { entryId, set: { text: 'two ribs' } });
    idas.hears();
    idas.aheadMs = -86_400_000;
    changes(idas, 'three ribs');
    expect(await idas.sends()).toMatchObject([{ outcome: 'kept' }]);
    expect(entry().text).toBe('three ribs');
    expect(shop.looseEnds()).toEqual([]);
  });

  it('and where it has not seen it, it does not stand over what is newer', async () => {
    await rosas.says('entry.amend', { entryId, set: { text: 'two ribs' } });
    // made later, so that its id is the greater one
    const old = { ...changes(idas, 'three ribs'), at: `000000000001-0000-${idas.deviceId}` };
    expect(await idas.sendsOnly([old])).toMatchObject([{ outcome: 'loose-end' }]);
    expect(entry().text).toBe('two ribs');
  });

  it('sent out of its order, an op never comes before what the device has sent already', async () => {
    const [first, second] = [changes(rosas, 'two ribs'), changes(rosas, 'three ribs')];
    const [late] = await rosas.sendsOnly([second]);
    const [early] = await rosas.sendsOnly([first]);
    expect(early!.orderedAt > late!.orderedAt).toBe(true);
    // but it names no value of the second, which named it: the second stands
    expect(entry().text).toBe('three ribs');
  });
});
