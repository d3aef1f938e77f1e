import { DEMO_DEVICES, DEMO_PEOPLE, DEMO_SHOP, type PersonKey } from '#server/demo/demo-people.ts';
import { makeDemoRecord, type DemoRecord } from '#server/demo/demo-record.ts';
import type { Pictures } from '#server/demo/pictures/develop.ts';
import type { Role } from '#shared/identity/role.ts';
import { MemoryStore } from '#shared/sync/memory-store.ts';
import { mergeBatch, type Outcome } from '#shared/sync/merge.ts';
import type { View } from '#src/replica/view.ts';
import { viewOf } from '#tests/worlds/view.ts';

export const DEMO_ZONE = 'America/New_York';
export const DEMO_SHOP_ID = '0193a000-0000-7000-8000-00000000de30';

export interface DemoWorld {
  record: DemoRecord;
  store: MemoryStore;
  outcomes: Outcome[];
  view: View;
  personId: (key: PersonKey) => string;
}

/** The demo shop's record in memory, as the foreman's laptop shows it at `nowMs`. */
export async function demoWorld(
  nowMs: number,
  { as = 'orrin', pictures }: { as?: PersonKey; pictures?: Pictures } = {},
): Promise<DemoWorld> {
  const record = await makeDemoRecord(nowMs, DEMO_ZONE, pictures);
  const store = new MemoryStore();
  putShop(store, record);
  const outcomes: Outcome[] = [];
  for (const batch of record.batches) outcomes.push(...(await merge(store, record, batch)));
  const personId = (key: PersonKey) => record.people.get(key)!;
  const { name, roles } = DEMO_PEOPLE[as];
  const me = { personId: personId(as), name, roles, shopId: DEMO_SHOP_ID, deviceId: record.devices[0]!.id };
  return { record, store, outcomes, view: viewOf(store, { me, nowMs }), personId };
}

function putShop(store: MemoryStore, { people, devices, owners }: DemoRecord): void {
  store.put('shop', DEMO_SHOP_ID, { id: DEMO_SHOP_ID, timeZone: DEMO_ZONE, ...DEMO_SHOP });
  for (const [key, id] of people) {
    const boatIds = owners.filter((owner) => owner.personId === id).map((owner) => owner.boatId);
    store.put('person', id, { id, ...DEMO_PEOPLE[key], leftAt: null, boatIds });
  }
  for (const { lastHeardMs, ...device } of devices) {
    const row = {
      ...device,
      lastHeardAt: new Date(lastHeardMs).toISOString(),
      appVersion: '0.1.0',
      revokedAt: null,
    };
    store.put('device', device.id, row);
  }
}

function merge(
  store: MemoryStore,
  record: DemoRecord,
  batch: DemoRecord['batches'][number],
): Promise<Outcome[]> {
  const device = record.devices.find((one) => one.id === batch.deviceId)!;
  const from = {
    shop: { id: DEMO_SHOP_ID, timeZone: DEMO_ZONE },
    device: { id: device.id, isRevoked: false, lastOrderedAt: store.lastOrderedAt.get(device.id) ?? null },
    personId: batch.personId,
    people: new Map(device.personIds.map((id) => [id, rolesOf(record, id)])),
    nowMs: batch.receivedMs,
  };
  return mergeBatch(store, from, batch.ops);
}

function rolesOf({ people }: DemoRecord, id: string): Role[] {
  const [key] = [...people].find(([, personId]) => personId === id)!;
  return DEMO_PEOPLE[key].roles;
}

/** How many devices the demo has, replaced ones too. */
export const DEMO_DEVICE_COUNT = Object.keys(DEMO_DEVICES).length;
