import request from 'supertest';
import { v7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { hashPassword } from '#server/identity/passwords.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import {
  makePerson,
  makeShop,
  PASSWORD,
  signIn,
  type TestPerson,
  type TestShop,
} from '#tests/worlds/shop.ts';

let server: TestServer;
let shop: TestShop;

beforeAll(async () => {
  server = await startServer();
  shop = await makeShop(server.database);
});
afterAll(() => server.close());

function ask(body: object): request.Test {
  return request(server.app).post('/api/session').send(body);
}

function asking(email: string, password = PASSWORD, more: object = {}) {
  return { email, password, device: { id: v7(), label: "Orrin's phone" }, ...more };
}

function deviceRow(shopId: string, id: string) {
  return server.database.inShop(shopId, (transaction) =>
    server.database.models.Device.findOne({ where: { shopId, id }, transaction, rejectOnEmpty: true }),
  );
}

test('the right password signs in, and the refresh cookie is out of reach of scripts', async () => {
  const { crew } = shop.people;
  const body = asking(crew.email);
  const response = await ask(body);
  expect(response.status).toBe(200);
  expect(response.body).toEqual({
    accessToken: expect.any(String),
    expiresInSeconds: 900,
    person: { id: crew.id, name: crew.name, roles: ['crew'], shopId: shop.shopId },
    device: { id: body.device.id },
  });
  const [cookie] = response.get('Set-Cookie')!;
  expect(cookie).toContain('HttpOnly');
  expect(cookie).toContain('SameSite=Strict');
  expect(cookie).toContain('Path=/api/session');
  expect(response.get('Cache-Control')).toBe('no-store');
});

test('the e-mail may be typed in capitals', async () => {
  expect((await ask(asking(shop.people.crew.email.toUpperCase()))).status).toBe(200);
});

test('a field that is not known, or a label that cannot be kept, is refused by name', async () => {
  const unknown = await ask({ ...asking(shop.people.crew.email), remember: true });
  expect([unknown.status, unknown.body.issues[0].path]).toEqual([400, 'remember']);
  const nul = await ask(
    asking(shop.people.crew.email, PASSWORD, { device: { id: v7(), label: 'a\u0000b' } }),
  );
  expect([nul.status, nul.body.issues[0].path]).toEqual([400, 'device.label']);
});

describe('a sign-in that fails', () => {
  let known: TestPerson;
  beforeAll(async () => {
    known = await makePerson(server.database, shop.shopId, ['crew']);
    const passwordHash = await hashPassword(PASSWORD);
    await server.database.inShop(shop.shopId, (transaction) =>
      server.database.models.Person.update({ passwordHash }, { where: { id: known.id }, transaction }),
    );
  });

  // the processor's time, nearly all of it hashing: what else the machine is doing does not count
  async function timed(email: string) {
    const before = process.cpuUsage();
    const response = await ask(asking(email, 'not the password'));
    const { status, body } = response;
    return {
      cpuMicroseconds: process.cpuUsage(before).user,
      status,
      body: body as object,
      cookies: response.get('Set-Cookie'),
    };
  }

  test('answers the same and takes as long whether the e-mail is known or not', async () => {
    const left = await makePerson(server.database, shop.shopId, ['crew']);
    await server.database.inShop(shop.shopId, (transaction) =>
      server.database.models.Person.update({ leftAt: new Date() }, { where: { id: left.id }, transaction }),
    );
    await timed(known.email); // warm
    const answers: (Awaited<ReturnType<typeof timed>> & { email: string })[] = [];
    for (let round = 0; round < 3; round += 1) {
      for (const email of [known.email, 'nobody@ribband.test', left.email])
        answers.push({ email, ...(await timed(email)) });
    }
    for (const { status, body, cookies } of answers) {
      expect({ status, body, cookies }).toEqual({ status: 401, body: answers[0]!.body, cookies: undefined });
    }
    const least = (email: string) =>
      Math.min(...answers.filter((one) => one.email === email).map((one) => one.cpuMicroseconds));
    // without the comparison with a decoy the unknown one takes a twentieth
    expect(least('nobody@ribband.test') / least(known.email)).toBeGreaterThan(0.6);
    expect(least('nobody@ribband.test') / least(known.email)).toBeLessThan(1.6);
    expect(least(left.email) / least(known.email)).toBeGreaterThan(0.6);
  });

  test('makes no device', async () => {
    const body = asking(known.email, 'not the password');
    await ask(body);
    await expect(deviceRow(shop.shopId, body.device.id)).rejects.toThrow();
  });
});

describe('an e-mail in two shops', () => {
  const email = 'two-shops@ribband.test';
  let other: TestShop;
  beforeAll(async () => {
    other = await makeShop(server.database, 'Hythe Slip');
    await makePerson(server.database, shop.shopId, ['crew'], email);
    await makePerson(server.database, other.shopId, ['owner'], email);
  });

  test('is asked which, once the password is right', async () => {
    const response = await ask(asking(email));
    expect(response.status).toBe(409);
    expect(response.get('Content-Type')).toContain('application/problem+json');
    expect(response.body.shops).toHaveLength(2);
    expect(response.body.shops).toEqual(
      expect.arrayContaining([
        { id: shop.shopId, name: 'Sallow Creek Boats' },
        { id: other.shopId, name: 'Hythe Slip' },
      ]),
    );
    expect(response.get('Set-Cookie')).toBeUndefined();
    expect((await ask(asking(email, 'not the password'))).status).toBe(401);
  });

  test('signs in to the one that is named, and to no third', async () => {
    const response = await ask(asking(email, PASSWORD, { shopId: other.shopId }));
    expect(response.body.person).toMatchObject({ shopId: other.shopId, roles: ['owner'] });
    expect((await ask(asking(email, PASSWORD, { shopId: v7() }))).status).toBe(401);
  });

  test('signs in without being asked where the password is right in one of them', async () => {
    const passwordHash = await hashPassword('only in the other');
    await server.database.inShop(other.shopId, (transaction) =>
      server.database.models.Person.update({ passwordHash }, { where: { email }, transaction }),
    );
    expect((await ask(asking(email, 'only in the other'))).body.person.shopId).toBe(other.shopId);
    expect((await ask(asking(email))).body.person.shopId).toBe(shop.shopId);
  });
});

describe('a device', () => {
  test('is made at the first sign-in, with those who sign in on it', async () => {
    const { crew, foreman } = shop.people;
    const { deviceId } = await signIn(server, crew);
    const first = await deviceRow(shop.shopId, deviceId);
    await signIn(server, foreman, deviceId);
    const second = await deviceRow(shop.shopId, deviceId);
    expect(second.row).toEqual({
      id: deviceId,
      label: 'phone',
      personIds: [crew.id, foreman.id].sort(),
      replaces: null,
      lastHeardAt: null,
      appVersion: null,
      held: null,
      revokedAt: null,
    });
    expect(second.seq).toBeGreaterThan(first.seq);
    expect(second.personId).toBe(foreman.id);
  });

  test('that is known takes no new number when the same person signs in again', async () => {
    const { deviceId } = await signIn(server, shop.people.crew);
    const before = await deviceRow(shop.shopId, deviceId);
    await signIn(server, shop.people.crew, deviceId);
    expect((await deviceRow(shop.shopId, deviceId)).seq).toBe(before.seq);
  });

  test('says which one it replaces, if that is one of the shop', async () => {
    const { crew } = shop.people;
    const lost = await signIn(server, crew);
    const id = v7();
    const replaced = await ask({
      ...asking(crew.email),
      device: { id, label: 'new phone', replaces: lost.deviceId },
    });
    expect(replaced.status).toBe(200);
    expect((await deviceRow(shop.shopId, id)).row.replaces).toBe(lost.deviceId);
    const unknown = await ask({
      ...asking(crew.email),
      device: { id: v7(), label: 'new phone', replaces: v7() },
    });
    expect([unknown.status, unknown.body.issues[0].path]).toEqual([400, 'device.replaces']);
  });

  test('on which five people sign in at once knows all five', async () => {
    const people = await Promise.all(
      Array.from({ length: 5 }, () => makePerson(server.database, shop.shopId, ['crew'])),
    );
    const deviceId = v7();
    await Promise.all(people.map((person) => signIn(server, person, deviceId)));
    expect((await deviceRow(shop.shopId, deviceId)).row.personIds).toEqual(
      people.map((person) => person.id).sort(),
    );
  });
});
