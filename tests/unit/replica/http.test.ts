import { gunzipSync } from 'node:zlib';
import { HttpResponse, delay, http } from 'msw';
import { setupServer } from 'msw/node';
import { afterAll, afterEach, beforeAll, describe, expect, test, vi } from 'vitest';
import type { SyncAnswer } from '#shared/sync/protocol.ts';
import { ORIGIN, openNetworked } from '#tests/worlds/networked.ts';

const PERSON_ID = '019e8000-0000-7000-8000-0000000000b1';
const SHOP_ID = '019e8000-0000-7000-8000-00000000000a';
const BOAT = { boatId: '019e8000-0000-7000-8000-0000000000c1', name: 'Petrel' };
const SIGN_IN = { email: 'ned@ribband.test', password: 'tallow', label: 'Ned’s phone' };

const network = setupServer();
beforeAll(() => network.listen({ onUnhandledRequest: 'error' }));
afterEach(() => network.resetHandlers());
afterAll(() => network.close());

function session(accessToken = 'token-1') {
  const person = { id: PERSON_ID, name: 'Ned', roles: ['foreman'], shopId: SHOP_ID };
  return HttpResponse.json({ accessToken, expiresInSeconds: 900, person, device: { id: SHOP_ID } });
}

function problem(status: number, detail: string) {
  return HttpResponse.json({ type: 'about:blank', title: 'Problem', status, detail }, { status });
}

function nothingNew(outcomes: SyncAnswer['outcomes'] = []) {
  const rest = { rows: [], more: false, reset: false, replayFrom: null, backedUpTo: null };
  return HttpResponse.json({
    outcomes,
    cursor: 'c',
    ...rest,
    serverTime: '2026-06-01T09:00:00.000Z',
  } satisfies SyncAnswer);
}

const onSignIn = (answer: () => Response | Promise<Response>) => http.post(`${ORIGIN}/api/session`, answer);
const onRefresh = (answer: () => Response | Promise<Response>) =>
  http.post(`${ORIGIN}/api/session/refresh`, answer);
const onSync = (answer: (request: Request) => Response | Promise<Response>) =>
  http.post(`${ORIGIN}/api/sync`, ({ request }) => answer(request));

async function openSignedIn(changes?: Parameters<typeof openNetworked>[0]) {
  network.use(onSignIn(() => session()));
  const opened = await openNetworked(changes);
  await opened.replica.session.signIn(SIGN_IN);
  return opened;
}

describe('signing in', () => {
  test('makes a person of this device, who is known without signal from then on', async () => {
    const { replica, world } = await openSignedIn();
    expect(replica.session.current()).toMatchObject({
      personId: PERSON_ID,
      name: 'Ned',
      roles: ['foreman'],
      shopId: SHOP_ID,
    });
    network.use(onSync(() => HttpResponse.error()));
    const again = await openNetworked({ indexedDB: world.indexedDB });
    expect(again.replica.session.current()).toEqual(replica.session.current());
    expect(again.replica.view().me.name).toBe('Ned');
  });

  test('says the label, and what it replaces', async () => {
    let asked: unknown;
    network.use(
      http.post(`${ORIGIN}/api/session`, async ({ request }) => {
        asked = await request.json();
        return session();
      }),
    );
    const { replica } = await openNetworked();
    await replica.session.signIn({ ...SIGN_IN, replaces: SHOP_ID });
    const device = { id: replica.session.current()!.deviceId, label: 'Ned’s phone', replaces: SHOP_ID };
    expect(asked).toEqual({ email: SIGN_IN.email, password: SIGN_IN.password, device });
  });

  test('asks which shop where the e-mail is in several', async () => {
    const shops = [
      { id: SHOP_ID, name: 'Alder Reach' },
      { id: PERSON_ID, name: 'Hornbeam Slip' },
    ];
    network.use(
      onSignIn(() =>
        HttpResponse.json({ type: 'about:blank', title: 'Conflict', status: 409, shops }, { status: 409 }),
      ),
    );
    const { replica } = await openNetworked();
    expect(await replica.session.signIn(SIGN_IN)).toEqual({ choose: shops });
    expect(replica.session.current()).toBeNull();
  });

  test.each([
    [401, 'That e-mail and password do not go together.'],
    [429, 'Too many tries. Wait a minute.'],
    [503, 'The database cannot be reached.'],
  ])('is refused with the server’s words at a %i', async (status, detail) => {
    network.use(onSignIn(() => problem(status, detail)));
    const { replica } = await openNetworked();
    expect(await replica.session.signIn(SIGN_IN)).toEqual({ refused: detail });
  });

  test('is told from a page that the network puts in between', async () => {
    network.use(onSignIn(() => HttpResponse.html('<h1>Welcome to the Anchor</h1>')));
    const { replica } = await openNetworked();
    expect(await replica.session.signIn(SIGN_IN)).toEqual({
      refused: 'The network answered in place of the server.',
    });
  });

  test('without signal is told as that', async () => {
    network.use(onSignIn(() => HttpResponse.error()));
    const { replica } = await openNetworked();
    expect(await replica.session.signIn(SIGN_IN)).toEqual({ offline: true });
  });
});

describe('the token', () => {
  test('is renewed when it has run out, once for all who wait', async () => {
    const { replica, clock } = await openSignedIn();
    clock.advance(16 * 60_000);
    let refreshes = 0;
    const seen: (string | null)[] = [];
    network.use(
      onRefresh(() => session(`token-${(refreshes += 1) + 1}`)),
      http.get(`${ORIGIN}/api/people`, ({ request }) => {
        seen.push(request.headers.get('Authorization'));
        return HttpResponse.json({});
      }),
    );
    await Promise.all([1, 2, 3].map(() => replica.session.fetchAsMe('/api/people')));
    expect(refreshes).toBe(1);
    expect(seen).toEqual(['Bearer token-2', 'Bearer token-2', 'Bearer token-2']);
  });

  test('is renewed where the server no longer takes it', async () => {
    const { replica } = await openSignedIn();
    network.use(
      onRefresh(() => session('token-2')),
      onSync((request) =>
        request.headers.get('Authorization') === 'Bearer token-2' ? nothingNew() : problem(401, 'Sign in.'),
      ),
    );
    expect(await replica.syncNow()).toMatchObject({ outcome: 'done' });
    expect(replica.syncState().phase).toBe('idle');
  });

  test('that cannot be renewed for want of an answer signs nobody out', async () => {
    const { replica, clock } = await openSignedIn();
    clock.advance(16 * 60_000);
    network.use(onRefresh(() => HttpResponse.error()));
    expect(await replica.syncNow()).toEqual({ outcome: 'offline' });
    network.use(onRefresh(() => problem(503, 'The database cannot be reached.')));
    expect(await replica.syncNow()).toEqual({ outcome: 'failed', words: 'The database cannot be reached.' });
    network.use(
      onRefresh(() => session('token-2')),
      onSync(() => nothingNew()),
    );
    expect(await replica.syncNow()).toMatchObject({ outcome: 'done' });
  });

  test('that the server refuses to renew leaves the queue, and asks for the password', async () => {
    const { replica } = await openSignedIn();
    await replica.hold('boat.add', BOAT);
    network.use(
      onRefresh(() => problem(401, 'Sign in again on this device.')),
      onSync(() => problem(401, 'Sign in.')),
    );
    expect(await replica.syncNow()).toEqual({ outcome: 'sign-in-needed' });
    expect(replica.syncState()).toMatchObject({ phase: 'sign-in-needed', heldOps: 1 });
    expect(replica.session.current()).toMatchObject({ name: 'Ned' });
  });
});

describe('a round that the world lets fail', () => {
  test.each([
    [
      'a problem of the server',
      () => problem(500, 'Something went wrong here.'),
      'Something went wrong here.',
    ],
    [
      'a problem without words',
      () => new HttpResponse('<html>', { status: 502 }),
      'The server answered 502.',
    ],
    [
      'a page that is not the server’s',
      () => HttpResponse.html('<h1>Welcome</h1>'),
      'The network answered in place of the server.',
    ],
    [
      'an answer to something else',
      () => nothingNew([]),
      'The server did not answer for everything that was sent.',
    ],
  ])('%s is told, and the queue is as it was', async (_name, answer, words) => {
    const { replica } = await openSignedIn();
    const op = await replica.hold('boat.add', BOAT);
    network.use(onSync(answer));
    expect(await replica.syncNow()).toEqual({ outcome: 'failed', words });
    expect(replica.syncState()).toMatchObject({ phase: 'failed', words, heldOps: 1 });
    expect(replica.view().held[0]!.op).toEqual(op);
  });

  test('an answer that does not come within 20 seconds is given up, and less is asked for next', async () => {
    const { replica, timers } = await openSignedIn();
    await replica.hold('boat.add', BOAT);
    const limits: unknown[] = [];
    network.use(
      onSync(async (request) => {
        limits.push(((await request.json()) as { limit: number }).limit);
        await delay('infinite');
        return nothingNew();
      }),
    );
    const syncing = replica.syncNow();
    await vi.waitFor(() => expect(limits).toHaveLength(1));
    expect([...timers.values()]).toEqual([20_000]);
    for (const ring of timers.keys()) ring();
    expect(await syncing).toEqual({ outcome: 'failed', words: 'No answer within 20 seconds.' });
    expect(timers.size).toBe(0);
    network.use(
      onSync(async (request) => {
        limits.push(((await request.json()) as { limit: number }).limit);
        return problem(503, 'Not ready.');
      }),
    );
    await replica.syncNow();
    expect(limits).toEqual([1000, 500]);
  });
});

test('a long request is zipped where the browser can', async () => {
  const gzip = async (text: string) =>
    new Response(new Blob([text]).stream().pipeThrough(new CompressionStream('gzip'))).blob();
  const { replica } = await openSignedIn({ gzip });
  await replica.hold('boat.add', { ...BOAT, numbering: 'from the stem aft' });
  const heard: [string | null, number][] = [];
  network.use(
    onSync(async (request) => {
      const bytes = Buffer.from(await request.arrayBuffer());
      const encoding = request.headers.get('Content-Encoding');
      const { ops } = JSON.parse((encoding ? gunzipSync(bytes) : bytes).toString()) as { ops: unknown[] };
      heard.push([encoding, ops.length]);
      return problem(503, 'Not ready.');
    }),
  );
  await replica.syncNow();
  for (let count = 0; count < 20; count += 1)
    await replica.hold('boat.add', { ...BOAT, boatId: replica.newId() });
  await replica.syncNow();
  expect(heard).toEqual([
    [null, 1],
    ['gzip', 21],
  ]);
});
