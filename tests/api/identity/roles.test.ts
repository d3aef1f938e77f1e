import request from 'supertest';
import { v7 } from 'uuid';
import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { roleSchema, type Role } from '#shared/identity/role.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makeBoat, makeShop, PASSWORD, signIn, type SignedIn, type TestShop } from '#tests/worlds/shop.ts';

// Every route of this part by each role, on what belongs to their own shop and to another.
interface Target {
  personId: string;
  deviceId: string;
  boatId: string;
  ownerId: string;
}

type Method = 'get' | 'post' | 'patch' | 'put';
type Expected = Record<Role, number>;

interface Line {
  name: string;
  method: Method;
  path: (target: Target) => string;
  body?: (target: Target) => object;
  own: Expected;
  /** absent where the route names nothing that could be another shop's */
  foreign?: Expected;
}

const FOREMAN_ONLY = { crew: 403, office: 403, owner: 403 };

const lines: Line[] = [
  {
    name: 'list people',
    method: 'get',
    path: () => '/api/people',
    own: { crew: 403, foreman: 200, office: 200, owner: 403 },
  },
  {
    name: 'add a person',
    method: 'post',
    path: () => '/api/people',
    body: () => ({
      id: v7(),
      name: 'New',
      email: `${v7()}@ribband.test`,
      password: PASSWORD,
      roles: ['crew'],
    }),
    own: { crew: 403, foreman: 201, office: 201, owner: 403 },
  },
  {
    name: 'change a person',
    method: 'patch',
    path: ({ personId }) => `/api/people/${personId}`,
    body: () => ({ name: 'Renamed' }),
    own: { crew: 403, foreman: 200, office: 200, owner: 403 },
    foreign: { crew: 403, foreman: 404, office: 404, owner: 403 },
  },
  {
    name: 'list devices',
    method: 'get',
    path: () => '/api/devices',
    own: { crew: 200, foreman: 200, office: 200, owner: 403 },
  },
  {
    name: 'revoke a device',
    method: 'post',
    path: ({ deviceId }) => `/api/devices/${deviceId}/revoke`,
    own: { ...FOREMAN_ONLY, foreman: 200 },
    foreign: { ...FOREMAN_ONLY, foreman: 404 },
  },
  {
    name: "set a boat's owners",
    method: 'put',
    path: ({ boatId }) => `/api/boats/${boatId}/owners`,
    body: ({ ownerId }) => ({ personIds: [ownerId] }),
    own: { ...FOREMAN_ONLY, foreman: 200 },
    foreign: { ...FOREMAN_ONLY, foreman: 404 },
  },
];

let server: TestServer;
let shop: TestShop;
const sessions = {} as Record<Role, SignedIn>;
let own: Target;
let foreign: Target;

beforeAll(async () => {
  server = await startServer();
  shop = await makeShop(server.database);
  for (const role of roleSchema.options) sessions[role] = await signIn(server, shop.people[role]);
  own = await targetIn(shop);
  foreign = await targetIn(await makeShop(server.database));
});
afterAll(() => server.close());

async function targetIn({ shopId, people }: TestShop): Promise<Target> {
  const { deviceId } = await signIn(server, people.crew);
  return {
    personId: people.crew.id,
    deviceId,
    boatId: await makeBoat(server.database, shopId),
    ownerId: people.owner.id,
  };
}

function send({ method, path, body }: Line, target: Target, token?: string): request.Test {
  const sent = request(server.app)[method](path(target));
  if (token) sent.auth(token, { type: 'bearer' });
  return body ? sent.send(body(target)) : sent;
}

describe.each(lines)('$name', (line) => {
  test.each(roleSchema.options)('by %s', async (role) => {
    const { accessToken } = sessions[role];
    expect((await send(line, own, accessToken)).status).toBe(line.own[role]);
    if (line.foreign) expect((await send(line, foreign, accessToken)).status).toBe(line.foreign[role]);
  });

  test('by nobody, or with a token that is none', async () => {
    for (const token of [undefined, 'nonsense', `${sessions.foreman.accessToken}x`]) {
      expect((await send(line, own, token)).status).toBe(401);
    }
  });
});
