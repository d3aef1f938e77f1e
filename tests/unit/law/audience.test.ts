import { beforeEach, describe, expect, it } from 'vitest';
import type { Role } from '#shared/identity/role.ts';
import { couldSee, seen, seesNone, seesWhole, type Viewer } from '#shared/sync/audience.ts';
import { entitySchema, type Entity } from '#shared/sync/row.ts';
import { ShopInMemory, TODAY, type Phone } from '#tests/worlds/shop-in-memory.ts';

let shop: ShopInMemory;
let desk: Phone;
let boatId: string;
let stageId: string;
let rosa: string;

beforeEach(async () => {
  shop = new ShopInMemory();
  ({ desk, boatId, stageId } = await shop.withBoat());
  rosa = shop.person('Rosa', 'crew');
});

function viewer(roles: Role[], boatIds: string[] = [], personId = shop.newId()): Viewer {
  return { personId, roles, boatIds: new Set(boatIds) };
}

/** Everything in the record as a person sees it, one text. */
const everything = (of: Viewer) =>
  JSON.stringify(shop.store.feed(0).map(({ entity, row }) => row && seen(entity, row, of)));

describe('who sees what of a row', () => {
  it('crew see the record, of people names and roles, and their own e-mail alone', () => {
    const row = {
      id: rosa,
      name: 'Rosa',
      email: 'rosa@sallow.example',
      roles: ['crew'],
      leftAt: null,
      boatIds: [boatId],
    };
    expect(seen('person', row, viewer(['crew']))).toEqual({
      id: rosa,
      name: 'Rosa',
      roles: ['crew'],
      leftAt: null,
    });
    expect(seen('person', row, viewer(['crew'], [], rosa))).toBe(row);
    expect(seen('person', row, viewer(['office']))).toBe(row);
    expect(seen('boat', shop.row('boat', boatId), viewer(['crew']))).toBeTruthy();
  });

  it('what was set aside is seen by its author, the foreman and the office', async () => {
    const phone = shop.phone(rosa);
    const op = phone.does('boat.add', { boatId: shop.newId(), name: 'Kittiwake' });
    await phone.sends();
    const row = shop.row('setAside', op.id);
    for (const of of [viewer(['crew'], [], rosa), viewer(['foreman']), viewer(['office'])])
      expect(seen('setAside', row, of)).toBe(row);
    expect(seen('setAside', row, viewer(['crew']))).toBeNull();
  });

  it('an owner sees their own boats and the progress of their stages, and of nobody else’s', () => {
    const boat = shop.row('boat', boatId);
    expect(seen('boat', boat, viewer(['owner']))).toBeNull();
    expect(seen('stage', shop.row('stage', stageId), viewer(['owner']))).toBeNull();
    expect(seen('boat', boat, viewer(['owner'], [boatId]))).toMatchObject({
      id: boatId,
      name: 'Petrel',
      heads: {},
      stamps: {},
    });
  });

  it('and never an entry, a task, a loose end, a mark or a word of the crew', async () => {
    const [entryId, taskId] = [shop.newId(), shop.newId()];
    const phone = shop.phone(rosa);
    phone.does('entry.write', {
      entryId,
      boatId,
      stageId,
      workDate: TODAY,
      text: 'SECRET',
      spoken: true,
      hours: [],
    });
    phone.does('entry.amend', { entryId, set: { text: 'SECRET too' } }, { over: {} });
    phone.does('task.add', { taskId, boatId, stageId, title: 'SECRET' });
    await phone.sends();
    desk.hears();
    desk.does('stage.mark', { stageId, markId: shop.newId(), workDate: TODAY });
    desk.does('stage.amend', { stageId, set: { name: 'Strip her' }, why: 'SECRET' });
    desk.does('boat.amend', { boatId, set: { name: 'Storm Petrel' }, why: 'SECRET' });
    await desk.sends();
    const owner = viewer(['owner'], [boatId]);
    expect(everything(viewer(['crew']))).toContain('SECRET');
    expect(everything(owner)).toContain('Storm Petrel');
    expect(everything(owner)).not.toContain('SECRET');
    expect(everything(owner)).not.toContain(rosa);
    expect(seen('stage', shop.row('stage', stageId), owner)).toMatchObject({
      done: true,
      doneOn: TODAY,
      name: 'Strip her',
    });
  });

  it('nor why a boat or a stage was struck: both go from their replica', async () => {
    await desk.says('stage.strike', { stageId, why: 'SECRET' });
    await desk.says('boat.strike', { boatId, why: 'SECRET' });
    const owner = viewer(['owner'], [boatId]);
    expect(everything(owner)).not.toContain('SECRET');
    expect(couldSee('boat', shop.row('boat', boatId), owner)).toBe(true);
    expect(couldSee('stage', shop.row('stage', stageId), owner)).toBe(true);
    expect(couldSee('boat', shop.row('boat', boatId), viewer(['owner']))).toBe(false);
  });

  it('who works here and owns a boat sees what those who work here see', () => {
    expect(seen('boat', shop.row('boat', boatId), viewer(['crew', 'owner']))).toHaveProperty('statements');
  });

  it.each<Role>(['crew', 'foreman', 'office', 'owner'])(
    'what the %s sees whole or not at all is said so',
    (role) => {
      const of = viewer([role], [boatId]);
      for (const { entity, row } of shop.store.feed(0)) {
        if (seesWhole(entity, of)) expect(seen(entity, row!, of)).toBe(row);
        if (seesNone(entity, of)) expect(seen(entity, row!, of)).toBeNull();
      }
      const both = (entity: Entity) => seesWhole(entity, of) && seesNone(entity, of);
      expect(entitySchema.options.filter(both)).toEqual([]);
    },
  );
});
