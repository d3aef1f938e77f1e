import bcrypt from 'bcryptjs';
import request from 'supertest';
import { v7 } from 'uuid';
import type { SessionAnswer } from '#shared/identity/session.ts';
import { roleSchema, type Role } from '#shared/identity/role.ts';
import { addPerson } from '#server/identity/add-person.ts';
import { addShop } from '#server/identity/first-run.ts';
import type { Database } from '#server/models/database.ts';
import type { TestServer } from './server.ts';

/** Everybody's in the tests' shops. */
export const PASSWORD = 'tallow and red lead';

// a cheap hash, since tests sign in often
const PASSWORD_HASH = bcrypt.hashSync(PASSWORD, 4);

export interface TestPerson {
  id: string;
  shopId: string;
  email: string;
  name: string;
}

export interface TestShop {
  shopId: string;
  /** one person for each role */
  people: Record<Role, TestPerson>;
}

/** A shop with one person of each role. */
export async function makeShop(database: Database, name = 'Sallow Creek Boats'): Promise<TestShop> {
  const shopId = v7();
  await database.inShop(shopId, (transaction) =>
    addShop(database, transaction, shopId, {
      name,
      timeZone: 'Europe/Dublin',
      currency: 'EUR',
      units: 'imperial',
    }),
  );
  const people = {} as Record<Role, TestPerson>;
  for (const role of roleSchema.options) people[role] = await makePerson(database, shopId, [role]);
  return { shopId, people };
}

export async function makePerson(
  database: Database,
  shopId: string,
  roles: Role[],
  email?: string,
): Promise<TestPerson> {
  const id = v7();
  const name = `${roles.join(' and ')} ${id.slice(-4)}`;
  const person = { id, name, email: email ?? `${id}@ribband.test`, roles, passwordHash: PASSWORD_HASH };
  await database.inShop(shopId, (transaction) => addPerson(database, transaction, shopId, person));
  return { id, shopId, email: person.email, name };
}

/** A row of boats, as a test that is not about boats needs one. */
export async function makeBoat(database: Database, shopId: string): Promise<string> {
  const id = v7();
  await database.inShop(shopId, async (transaction) => {
    const seq = Number(await database.models.Boat.max('seq', { where: { shopId }, transaction })) + 1;
    await database.models.Boat.create(
      { shopId, id, seq, name: 'Dunlin', row: { id, name: 'Dunlin' } },
      { transaction },
    );
  });
  return id;
}

export interface SignedIn {
  person: TestPerson;
  deviceId: string;
  accessToken: string;
  /** the refresh cookie as `name=value` */
  cookie: string;
}

/** Signs a person in, on a device of their own unless one is named. */
export async function signIn(
  server: TestServer,
  person: TestPerson,
  deviceId: string = v7(),
): Promise<SignedIn> {
  const response = await request(server.app)
    .post('/api/session')
    .send({
      email: person.email,
      password: PASSWORD,
      shopId: person.shopId,
      device: { id: deviceId, label: 'phone' },
    });
  if (response.status !== 200) throw new Error(`Sign-in answered ${response.status}: ${response.text}`);
  const { accessToken } = response.body as SessionAnswer;
  return { person, deviceId, accessToken, cookie: cookieOf(response) };
}

/** The cookie that an answer sets, as `name=value`. */
export function cookieOf(response: request.Response): string {
  const [cookie] = response.get('Set-Cookie') ?? [];
  if (!cookie) throw new Error('The answer sets no cookie.');
  return cookie.split(';')[0]!;
}
