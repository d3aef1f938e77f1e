import request from 'supertest';
import { v7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import type { PersonRow } from '#shared/identity/person.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makePerson, makeShop, PASSWORD, signIn, type SignedIn, type TestShop } from '#tests/worlds/shop.ts';

let server: TestServer;
let shop: TestShop;
let foreman: SignedIn;
let office: SignedIn;

beforeAll(async () => {
  server = await startServer();
  shop = await makeShop(server.database);
  foreman = await signIn(server, shop.people.foreman);
  office = await signIn(server, shop.people.office);
});
afterAll(() => server.close());

function add(by: SignedIn, body: object): request.Test {
  return request(server.app).post('/api/people').auth(by.accessToken, { type: 'bearer' }).send(body);
}

function change(by: SignedIn, id: string, body: object): request.Test {
  return request(server.app).patch(`/api/people/${id}`).auth(by.accessToken, { type: 'bearer' }).send(body);
}

function somebody(more: object = {}) {
  const id = v7();
  return { id, name: 'Imke Rood', email: `${id}@ribband.test`, password: PASSWORD, roles: ['crew'], ...more };
}

function columns(id: string) {
  return server.database.inShop(shop.shopId, (transaction) =>
    server.database.models.Person.findOne({ where: { id }, transaction, rejectOnEmpty: true }),
  );
}

function signInStatus(email: string, password: string): Promise<number> {
  return request(server.app)
    .post('/api/session')
    .send({ email, password, device: { id: v7(), label: 'phone' } })
    .then((response) => response.status);
}

describe('a person who is added', () => {
  test('is answered as the row of the feed, with its next number, and can sign in', async () => {
    const before = await columns(office.person.id);
    const body = somebody({ email: 'Imke.Rood@Ribband.test', roles: ['crew', 'owner'] });
    const response = await add(office, body);
    expect(response.status).toBe(201);
    const row = {
      id: body.id,
      name: 'Imke Rood',
      email: 'imke.rood@ribband.test',
      roles: ['crew', 'owner'],
      leftAt: null,
      boatIds: [],
    };
    expect(response.body).toEqual({ person: row });
    const kept = await columns(body.id);
    expect(kept.row).toEqual(row);
    expect(kept.seq).toBeGreaterThan(before.seq);
    expect(kept.passwordHash).not.toContain(PASSWORD);
    expect(await signInStatus('imke.rood@ribband.test', PASSWORD)).toBe(200);
  });

  test('by a repeated request is added once; by another with that id not at all', async () => {
    const body = somebody();
    expect((await add(foreman, body)).status).toBe(201);
    const { seq } = await columns(body.id);
    const repeated = await add(foreman, body);
    expect([repeated.status, repeated.body.person.id]).toEqual([200, body.id]);
    expect((await columns(body.id)).seq).toBe(seq);
    const other = await add(foreman, { ...body, name: 'Somebody else' });
    expect([other.status, other.body.issues[0].path]).toEqual([409, 'id']);
  });

  test('with an e-mail that the shop knows is refused; in another shop it may be', async () => {
    const body = somebody({ email: shop.people.crew.email });
    const taken = await add(foreman, body);
    expect([taken.status, taken.body.issues[0].path]).toEqual([409, 'email']);
    const elsewhere = await makeShop(server.database);
    const theirs = await signIn(server, elsewhere.people.foreman);
    expect((await add(theirs, body)).status).toBe(201);
  });

  test.each([
    ['roles', { roles: [] }],
    ['roles', { roles: ['crew', 'crew'] }],
    ['roles.0', { roles: ['admiral'] }],
    ['password', { password: 'short' }],
    ['password', { password: 'é'.repeat(37) }],
    ['email', { email: 'no address' }],
    ['name', { name: 'lone \ud800 surrogate' }],
    ['colour', { colour: 'red' }],
  ])('with something wrong is refused, naming %s', async (path, wrong) => {
    const response = await add(foreman, somebody(wrong));
    expect([response.status, response.body.issues[0].path]).toEqual([400, path]);
  });
});

describe('a change', () => {
  test('of the name gives the row a new number and leaves the feed going', async () => {
    const person = await makePerson(server.database, shop.shopId, ['crew']);
    const before = await columns(person.id);
    const response = await change(office, person.id, { name: 'Imke van Rood' });
    expect(response.status).toBe(200);
    expect(response.body.person.name).toBe('Imke van Rood');
    const after = await columns(person.id);
    expect(after.row).toEqual(response.body.person);
    expect(after.seq).toBeGreaterThan(before.seq);
    expect(after.feedEpoch).toBe(before.feedEpoch);
  });

  test('of the roles begins a new feed for the person, and holds from the next request on', async () => {
    const person = await makePerson(server.database, shop.shopId, ['crew']);
    const session = await signIn(server, person);
    const list = () => request(server.app).get('/api/people').auth(session.accessToken, { type: 'bearer' });
    expect((await list()).status).toBe(403);
    await change(foreman, person.id, { roles: ['crew', 'office'] });
    expect((await columns(person.id)).feedEpoch).toBe(1);
    expect((await list()).status).toBe(200);
    await change(foreman, person.id, { roles: ['office', 'crew'] });
    expect((await columns(person.id)).feedEpoch).toBe(1);
  });

  test('of the password ends what was signed in with the old one', async () => {
    const person = await makePerson(server.database, shop.shopId, ['crew']);
    const { cookie } = await signIn(server, person);
    await change(office, person.id, { password: 'another one' });
    expect((await request(server.app).post('/api/session/refresh').set('Cookie', cookie)).status).toBe(401);
    expect(await signInStatus(person.email, PASSWORD)).toBe(401);
    expect(await signInStatus(person.email, 'another one')).toBe(200);
  });

  test('that says a person has left shuts them out, and back in when they return', async () => {
    const person = await makePerson(server.database, shop.shopId, ['crew']);
    const left = await change(office, person.id, { hasLeft: true });
    expect(left.body.person.leftAt).toBe(new Date(server.clock.now()).toISOString());
    expect(await signInStatus(person.email, PASSWORD)).toBe(401);
    expect((await change(office, person.id, { hasLeft: false })).body.person.leftAt).toBeNull();
    expect(await signInStatus(person.email, PASSWORD)).toBe(200);
  });

  test('of nothing, or of nobody, is refused', async () => {
    expect((await change(foreman, shop.people.crew.id, {})).status).toBe(400);
    expect((await change(foreman, v7(), { name: 'x' })).status).toBe(404);
    expect((await change(foreman, 'nobody', { name: 'x' })).status).toBe(404);
  });
});

describe('foremen', () => {
  test('are made and changed by a foreman only', async () => {
    expect((await add(office, somebody({ roles: ['foreman'] }))).status).toBe(403);
    expect((await change(office, office.person.id, { roles: ['office', 'foreman'] })).status).toBe(403);
    expect((await change(office, foreman.person.id, { password: 'taken over' })).status).toBe(403);
    expect((await add(foreman, somebody({ roles: ['foreman'] }))).status).toBe(201);
  });

  test('the last one cannot leave, nor lose the role, until there is another', async () => {
    const small = await makeShop(server.database);
    const only = await signIn(server, small.people.foreman);
    for (const body of [{ hasLeft: true }, { roles: ['crew'] }]) {
      const refused = await change(only, only.person.id, body);
      expect(refused.status).toBe(409);
      expect(refused.body.detail).toContain('last foreman');
    }
    const second = await makePerson(server.database, small.shopId, ['foreman']);
    await change(only, second.id, { hasLeft: true });
    expect((await change(only, only.person.id, { roles: ['crew'] })).status).toBe(409);
    await change(only, second.id, { hasLeft: false });
    expect((await change(only, only.person.id, { roles: ['crew'] })).status).toBe(200);
  });

  test('two who step down at the same moment do not both', async () => {
    const small = await makeShop(server.database);
    const first = await signIn(server, small.people.foreman);
    const second = await signIn(server, await makePerson(server.database, small.shopId, ['foreman']));
    const answers = await Promise.all([
      change(first, first.person.id, { roles: ['crew'] }),
      change(second, second.person.id, { roles: ['crew'] }),
    ]);
    expect(answers.map((answer) => answer.status).sort()).toEqual([200, 409]);
  });
});

test('the list names everybody of the shop, those who left too, and nobody of another', async () => {
  const other = await makeShop(server.database);
  const leaver = await makePerson(server.database, other.shopId, ['crew']);
  const theirs = await signIn(server, other.people.office);
  await change(theirs, leaver.id, { hasLeft: true });
  const response = await request(server.app).get('/api/people').auth(theirs.accessToken, { type: 'bearer' });
  const { people } = response.body as { people: PersonRow[] };
  expect(people.map((person) => person.id).sort()).toEqual(
    [...Object.values(other.people).map((person) => person.id), leaver.id].sort(),
  );
});
