import { beforeEach, describe, expect, it } from 'vitest';
import { ShopInMemory, TODAY, type Phone } from '#tests/worlds/shop-in-memory.ts';

// Goal: nothing that a device can say throws, leaves a field without a value, or reaches what it does not name.

let shop: ShopInMemory;
let desk: Phone;
let boatId: string;
let stageId: string;
let entryId: string;

beforeEach(async () => {
  shop = new ShopInMemory();
  ({ desk, boatId, stageId } = await shop.withBoat());
  entryId = shop.newId();
  await desk.says('entry.write', {
    entryId,
    boatId,
    stageId,
    workDate: TODAY,
    text: 'ribs',
    spoken: true,
    hours: [],
  });
});

const entry = () => shop.row('entry', entryId);
const changes = (text: string, over?: Record<string, string[]>) =>
  desk.does('entry.amend', { entryId, set: { text } }, over ? { over } : {});
const sent = (raws: unknown[]) =>
  desk.sendsOnly(raws).then((all) => all.map(({ outcome, reason }) => reason ?? outcome));

describe('over', () => {
  it('that names its own op leaves its value standing', async () => {
    const op = changes('two ribs');
    op.over.text!.push(op.id);
    expect(await sent([op])).toEqual(['kept']);
    expect(entry()).toMatchObject({ text: 'two ribs', heads: { text: [op.id] } });
  });

  it('that names its own op does not give way to a rival', async () => {
    const first = changes('two ribs');
    const rival = changes('three ribs', { ...first.over });
    first.over.text = [...first.over.text!, first.id];
    await sent([first, rival]);
    expect(entry().heads.text).toEqual([rival.id, first.id]);
  });

  it('that goes in a circle leaves the latest standing, whichever comes first', async () => {
    const [first, second] = [changes('two ribs'), changes('three ribs')];
    first.over.text!.push(second.id);
    expect(await sent([second, first])).toEqual(['kept', 'kept']);
    expect(entry().heads.text).toHaveLength(1);
    expect(['two ribs', 'three ribs']).toContain(entry().text);
  });

  it('that names what nobody made, or other fields, replaces nothing', async () => {
    const op = changes('two ribs', {
      text: [shop.newId()],
      workDate: [entry().madeBy],
      struck: [entry().madeBy],
    });
    await sent([op]);
    expect(shop.looseEnds().map(({ field }) => field)).toEqual(['text']);
    expect(entry().statements.map(({ field }) => field)).toEqual(['text', 'text']);
  });

  it('in names that every object has says nothing', async () => {
    const op = changes('two ribs');
    const raw = JSON.stringify(op).replace(
      '"over":{',
      `"over":{"__proto__":["${op.id}"],"constructor":["${op.id}"],`,
    );
    expect(await sent([JSON.parse(raw)])).toEqual(['kept']);
    expect(Object.keys(entry().heads)).toEqual(['text']);
  });

  it('in thousands is not read', async () => {
    const op = changes('two ribs', { text: Array.from({ length: 1001 }, () => shop.newId()) });
    expect(await sent([op])).toEqual(['malformed']);
  });
});

describe('names that every object has', () => {
  it.each(['__proto__', 'constructor', 'toString', 'hasOwnProperty'])(
    '%s is no field of an entry',
    async (name) => {
      const raw = JSON.stringify(changes('two ribs')).replace(
        '"set":{',
        `"set":{"${name}":{"polluted":true},`,
      );
      const [outcome] = await sent([JSON.parse(raw)]);
      expect(['not-understood', 'kept']).toContain(outcome);
      expect(({} as Record<string, unknown>).polluted).toBeUndefined();
      expect(Object.keys(entry())).not.toContain(name);
      expect((entry() as unknown as Record<string, unknown>).polluted).toBeUndefined();
    },
  );

  it('as an op’s own fields are fields that are not known', async () => {
    const raw = JSON.stringify(changes('two ribs')).replace('{', '{"constructor":1,');
    expect(await sent([JSON.parse(raw)])).toEqual(['not-understood']);
  });
});

describe('rows', () => {
  it('an op may change a struck row, and name one', async () => {
    await desk.says('boat.strike', { boatId, why: 'sold' });
    const otherId = shop.newId();
    const other = {
      entryId: otherId,
      boatId,
      stageId,
      workDate: TODAY,
      text: 'knees',
      spoken: false,
      hours: [],
    };
    expect(await desk.says('entry.write', other)).toMatchObject({ outcome: 'kept' });
    expect(await desk.says('boat.amend', { boatId, set: { name: 'Storm Petrel' } })).toMatchObject({
      outcome: 'kept',
    });
    expect(shop.row('boat', boatId)).toMatchObject({ name: 'Storm Petrel', struck: { why: 'sold' } });
  });

  it('an id of one entity is none of another', async () => {
    expect(await sent([desk.does('boat.amend', { boatId: entryId, set: { name: 'Tern' } })])).toEqual([
      'no-such-row',
    ]);
  });

  it('a stage that comes after itself never comes', async () => {
    const selfId = shop.newId();
    const op = desk.does('stage.add', { stageId: selfId, boatId, name: 'Paint', order: 3, after: [selfId] });
    expect(await sent([op])).toEqual(['no-such-row']);
  });

  it('rows that wait for one another wait, and hold up nothing', async () => {
    const [one, other] = [shop.newId(), shop.newId()];
    const add = (id: string, after: string) =>
      desk.does('stage.add', { stageId: id, boatId, name: 'Paint', order: 3, after: [after] });
    expect(await sent([add(one, other), add(other, one), changes('two ribs')])).toEqual([
      'no-such-row',
      'no-such-row',
      'kept',
    ]);
  });

  it('an amendment that sets nothing is malformed', async () => {
    expect(await sent([desk.does('entry.amend', { entryId, set: {} })])).toEqual(['malformed']);
    expect(await sent([desk.does('entry.amend', { entryId, set: { stageId: null } })])).toEqual([
      'malformed',
    ]);
  });

  it('a stage named with another boat than hers is kept as it was said: words are never locked away for it', async () => {
    const otherId = shop.newId();
    await desk.says('boat.add', { boatId: otherId, name: 'Kittiwake' });
    const other = {
      entryId: shop.newId(),
      boatId: otherId,
      stageId,
      workDate: TODAY,
      text: 'knees',
      spoken: false,
      hours: [],
    };
    expect(await desk.says('entry.write', other)).toMatchObject({ outcome: 'kept' });
    const move = { entryId, set: { boatId: otherId, stageId } };
    expect(await desk.says('entry.amend', move)).toMatchObject({ outcome: 'kept' });
    expect(entry()).toMatchObject({ boatId: otherId, stageId });
  });
});

describe('a strike', () => {
  it('that saw nothing leaves what was said since the making as a loose end', async () => {
    await desk.says('entry.amend', { entryId, set: { text: 'two ribs' } });
    await desk.says('entry.strike', { entryId, why: 'twice' }, { saw: [] });
    expect(shop.looseEnd(entryId, 'struck-and-changed')!.values).toHaveLength(1);
  });
});

describe('taking back', () => {
  it('names of nothing is kept and does nothing', async () => {
    const taskId = shop.newId();
    desk.does('task.add', { taskId, boatId, stageId, title: 'Fair the keel' });
    desk.does('task.unmark', { taskId, markIds: [shop.newId(), taskId] });
    expect(await desk.sends()).toMatchObject([{ outcome: 'kept' }, { outcome: 'kept' }]);
    expect(shop.row('task', taskId)).toMatchObject({ done: false, marks: [], starts: [] });
  });
});
