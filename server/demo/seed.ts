import type { Transaction } from 'sequelize';
import type { Role } from '#shared/identity/role.ts';
import { mergeBatch } from '#shared/sync/merge.ts';
import { addPerson } from '#server/identity/add-person.ts';
import { setBoatOwners } from '#server/identity/boat-owners.ts';
import { enrol } from '#server/identity/enrol.ts';
import { addShop } from '#server/identity/first-run.ts';
import { hashPassword } from '#server/identity/passwords.ts';
import type { Database } from '#server/models/database.ts';
import { query } from '#server/models/query.ts';
import { readBatchFrom, readDevice, type Sender } from '#server/sync/batch-from.ts';
import { hearDevice } from '#server/sync/hear-device.ts';
import type { PictureStore } from '#server/photos/store.ts';
import { PostgresStore } from '#server/sync/postgres-store.ts';
import { version } from '#server/version.ts';
import {
  DEMO_PASSWORD,
  DEMO_PEOPLE,
  DEMO_SHOP,
  SECOND_PEOPLE,
  SECOND_SHOP,
  type DemoPerson,
  type ShopWords,
} from './demo-people.ts';
import type { DemoDeviceLine } from './demo-heard.ts';
import { makeDemoRecord, type DemoRecord } from './demo-record.ts';
import type { DemoBatch } from './demo-script.ts';
import type { Pictures } from './pictures/develop.ts';
import { keepPictures, noteArrivals, type KeptPictures } from './put-pictures.ts';
import { makeSecondRecord } from './second-record.ts';

export interface DemoAccount {
  role: Role;
  email: string;
  password: string;
}

interface ShopToSeed {
  shopId: string;
  words: ShopWords;
  people: Record<string, DemoPerson>;
  record: DemoRecord<string>;
  pictures: KeptPictures;
}

/** The demo's pictures and where they are to be kept. */
export interface DemoAlbum {
  pictures: Pictures;
  store: PictureStore;
}

/** The demo's shops: the same in every database, so that a later start knows them again. */
export const DEMO_SHOP_ID = '019b0000-0000-7000-8000-68726e626d01';
const SECOND_SHOP_ID = '019b0000-0000-7000-8000-74656173656c';

/**
 * Makes the demo's two shops, their people and their months of work up to an hour before `now`, in one transaction.
 * What the devices said goes through the real merge, with the clock at the time it was heard. Without an album there are no photos.
 */
export async function seedDemo(
  database: Database,
  now: number,
  timeZone: string,
  album?: DemoAlbum,
): Promise<DemoAccount[]> {
  // the bytes first: rows must not tell of what is not there
  const pictures = album
    ? await keepPictures(album.store, DEMO_SHOP_ID, album.pictures)
    : new Map<string, never>();
  const passwordHash = await hashPassword(DEMO_PASSWORD);
  const shops: ShopToSeed[] = [
    {
      shopId: DEMO_SHOP_ID,
      words: DEMO_SHOP,
      people: DEMO_PEOPLE,
      record: await makeDemoRecord(now, timeZone, album?.pictures),
      pictures,
    },
    {
      shopId: SECOND_SHOP_ID,
      words: SECOND_SHOP,
      people: SECOND_PEOPLE,
      record: makeSecondRecord(now, timeZone),
      pictures: new Map(),
    },
  ];
  await database.inShop(DEMO_SHOP_ID, async (transaction) => {
    for (const shop of shops) {
      await query(transaction, `SELECT set_config('ribband.shop_id', $1, true)`, [shop.shopId]);
      await seedShop(database, transaction, shop, timeZone, passwordHash);
    }
  });
  return demoAccounts();
}

/** The demo's accounts, one for each role that somebody has there. */
export function demoAccounts(): DemoAccount[] {
  return Object.values(DEMO_PEOPLE).flatMap(({ email, roles }) =>
    roles.map((role) => ({ role, email, password: DEMO_PASSWORD })),
  );
}

async function seedShop(
  database: Database,
  transaction: Transaction,
  { shopId, words, people, record, pictures }: ShopToSeed,
  timeZone: string,
  passwordHash: string,
): Promise<void> {
  await addShop(database, transaction, shopId, { ...words, timeZone });
  for (const [key, id] of record.people) {
    await addPerson(database, transaction, shopId, { ...people[key]!, id, passwordHash });
  }
  for (const device of record.devices) await addDevice(database, transaction, shopId, device);
  for (const batch of record.batches) {
    await noteArrivals(transaction, shopId, batch, pictures);
    await takeIn(transaction, shopId, batch, timeZone);
  }
  for (const { boatId, personId } of record.owners)
    await setBoatOwners(database, transaction, shopId, boatId, [personId]);
  for (const device of record.devices) await hearLast(transaction, shopId, device);
}

async function addDevice(
  database: Database,
  transaction: Transaction,
  shopId: string,
  { id, label, replaces, personIds }: DemoDeviceLine,
): Promise<void> {
  for (const personId of personIds)
    await enrol(database, transaction, { shopId, personId, deviceId: id }, { id, label, replaces });
}

async function takeIn(
  transaction: Transaction,
  shopId: string,
  { deviceId, personId, receivedMs, ops }: DemoBatch,
  timeZone: string,
): Promise<void> {
  const sender: Sender = { shopId, deviceId, personId };
  const device = await readDevice(transaction, sender);
  const from = await readBatchFrom(transaction, sender, device, timeZone, receivedMs);
  await mergeBatch(new PostgresStore(transaction, shopId), from, ops);
  await hearDevice(transaction, sender, device, { nowMs: receivedMs });
}

async function hearLast(
  transaction: Transaction,
  shopId: string,
  { id, personIds, lastHeardMs, held }: DemoDeviceLine,
): Promise<void> {
  const sender: Sender = { shopId, deviceId: id, personId: personIds[0]! };
  const device = await readDevice(transaction, sender);
  await hearDevice(transaction, sender, device, { nowMs: lastHeardMs, held, appVersion: version });
}
