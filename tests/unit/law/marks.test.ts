import { beforeEach, describe, expect, it } from 'vitest';
import { ShopInMemory, TODAY, type Phone } from '#tests/worlds/shop-in-memory.ts';

let shop: ShopInMemory;
let desk: Phone;
let rosas: Phone;
let idas: Phone;
let boatId: string;
let stageId: string;
let taskId: string;

beforeEach(async () => {
  shop = new ShopInMemory();
  ({ desk, boatId, stageId } = await shop.withBoat());
  taskId = shop.newId();
  await desk.says('task.add', { taskId, boatId, stageId, title: 'Fair the keel' });
  [rosas, idas] = [shop.phone(shop.person('Rosa', 'crew')), shop.phone(shop.person('Ida', 'crew'))];
});

const task = () => shop.row('task', taskId);

function marks(phone: Phone, as?: string): string {
  const markId = shop.newId();
  phone.does('task.mark', { taskId, markId, workDate: TODAY }, as ? { as } : {});
  return markId;
}

const unmarks = (phone: Phone, ...markIds: string[]) => phone.does('task.unmark', { taskId, markIds });

describe('law 7: a mark is a statement by a person', () => {
  it('two who ticked one task offline both did: done once, both named, twice shown, no loose end', async () => {
    const ids = [marks(rosas), marks(idas)];
    await idas.sends();
    await rosas.sends();
    expect(task()).toMatchObject({ done: true, twice: true });
    expect(task().marks.map(({ id, personId }) => [id, personId])).toEqual([
      [ids[0], rosas.personIds[0]],
      [ids[1], idas.personIds[0]],
    ]);
    expect(shop.looseEnds()).toEqual([]);
  });

  it('one person twice is not twice', async () => {
    marks(rosas);
    marks(rosas);
    await rosas.sends();
    expect(task()).toMatchObject({ done: true, twice: false, marks: [{}, {}] });
  });

  it('unmarking names marks, and what was taken back stays readable', async () => {
    const markId = marks(rosas);
    await rosas.sends();
    const op = unmarks(rosas, markId);
    await rosas.sends();
    const at = new Date(shop.clock.now()).toISOString();
    expect(task()).toMatchObject({ done: false, twice: false });
    expect(task().marks).toMatchObject([{ id: markId, workDate: TODAY, takenBack: { by: op.personId, at } }]);
  });

  it('taking back one of two leaves the other', async () => {
    const [rosasMark] = [marks(rosas), marks(idas)];
    await rosas.sends();
    await idas.sends();
    unmarks(rosas, rosasMark);
    await rosas.sends();
    expect(task()).toMatchObject({ done: true, twice: false });
  });

  it('an unmark holds even if the mark comes later', async () => {
    const markId = marks(rosas);
    const mark = rosas.held.pop()!;
    unmarks(rosas, markId);
    await rosas.sends();
    expect(await rosas.sendsOnly([mark])).toMatchObject([{ outcome: 'kept' }]);
    expect(task()).toMatchObject({ done: false, marks: [{ id: markId, takenBack: { by: mark.personId } }] });
  });

  it('what was taken back is done again by a new mark', async () => {
    const markId = marks(rosas);
    unmarks(rosas, markId);
    marks(rosas);
    await rosas.sends();
    expect(task()).toMatchObject({ done: true, twice: false });
  });

  it('crew take back only their own', async () => {
    const idasMark = marks(idas);
    await idas.sends();
    rosas.hears();
    unmarks(rosas, idasMark);
    expect(await rosas.sends()).toMatchObject([{ outcome: 'set-aside', reason: 'not-entitled' }]);
    expect(task().done).toBe(true);
  });

  it('nor anybody else’s by taking it back before it comes', async () => {
    const idasMark = marks(idas);
    unmarks(rosas, idasMark);
    await rosas.sends();
    await idas.sends();
    expect(task()).toMatchObject({ done: true, marks: [{ takenBack: null }] });
  });

  it('the foreman takes back anybody’s, even before it comes', async () => {
    const idasMark = marks(idas);
    unmarks(desk, idasMark);
    await desk.sends();
    await idas.sends();
    expect(task()).toMatchObject({ done: false, marks: [{ takenBack: { by: desk.personIds[0] } }] });
  });

  it('what the foreman admits takes back anybody’s too', async () => {
    const idasMark = marks(idas);
    await idas.sends();
    const op = unmarks(rosas, idasMark);
    await rosas.sends();
    await desk.says('setAside.admit', { setAsideId: op.id });
    expect(task()).toMatchObject({ done: false, marks: [{ takenBack: { by: op.personId } }] });
  });

  it('each on a shared tablet speaks as who they are', async () => {
    const [rosa, ida] = [rosas.personIds[0]!, idas.personIds[0]!];
    const tablet = shop.phone(rosa, ida);
    marks(tablet);
    marks(tablet, ida);
    await tablet.sends();
    expect(task()).toMatchObject({ twice: true, marks: [{ personId: rosa }, { personId: ida }] });
  });

  it('starts stand beside marks and are stopped by name', async () => {
    const startId = shop.newId();
    rosas.does('task.start', { taskId, startId });
    marks(rosas);
    rosas.does('task.stop', { taskId, startIds: [startId], why: 'no clamps' });
    await rosas.sends();
    expect(task()).toMatchObject({
      done: true,
      starts: [{ id: startId, takenBack: {} }],
      marks: [{ takenBack: null }],
    });
  });

  it('a stage is done and undone by the foreman alone', async () => {
    const markId = shop.newId();
    expect(await rosas.says('stage.mark', { stageId, markId, workDate: TODAY })).toMatchObject({
      reason: 'not-entitled',
    });
    await desk.says('stage.mark', { stageId, markId, workDate: TODAY });
    expect(shop.row('stage', stageId)).toMatchObject({
      done: true,
      marks: [{ id: markId, workDate: TODAY }],
    });
    await desk.says('stage.unmark', { stageId, markIds: [markId] });
    expect(shop.row('stage', stageId).done).toBe(false);
  });

  it('an addition is taken back by who made it, or by the foreman', async () => {
    const [entryId, additionId] = [shop.newId(), shop.newId()];
    const entry = { entryId, boatId, stageId, workDate: TODAY, text: 'ribs', spoken: false, hours: [] };
    await rosas.says('entry.write', entry);
    idas.hears();
    await idas.says('entry.addTo', { entryId, additionId, text: 'and a knee' });
    rosas.hears();
    expect(await rosas.says('entry.takeBack', { entryId, additionIds: [additionId] })).toMatchObject({
      reason: 'not-entitled',
    });
    await idas.says('entry.takeBack', { entryId, additionIds: [additionId] });
    const { additions } = shop.row('entry', entryId);
    expect(additions).toMatchObject([{ text: 'and a knee', takenBack: { by: idas.personIds[0] } }]);
  });
});
