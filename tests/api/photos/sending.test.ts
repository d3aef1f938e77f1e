import { once } from 'node:events';
import { readdir } from 'node:fs/promises';
import { connect } from 'node:net';
import sharp from 'sharp';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { bytesOf, flatPng, formOf, nameOf, PhotoHand, pictureOf } from '#tests/worlds/pictures.ts';
import { senderFor } from '#tests/worlds/sender.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makeShop, signIn, type SignedIn, type TestShop } from '#tests/worlds/shop.ts';

const FULL_BYTES_MAX = 15 * 1024 * 1024;
const THUMB_BYTES_MAX = 100 * 1024;

let server: TestServer;
let shop: TestShop;
let session: SignedIn;
let crew: PhotoHand;

beforeAll(async () => {
  server = await startServer();
});
beforeEach(async () => {
  shop = await makeShop(server.database);
  session = await signIn(server, shop.people.crew);
  crew = new PhotoHand(server, session);
});
afterAll(() => server.close());

async function wordsOf(response: Response): Promise<string> {
  expect(response.headers.get('Content-Type')).toContain('application/problem+json');
  return ((await response.json()) as { detail: string }).detail;
}

/** The files that are kept of this shop, and those that are on their way for any. */
async function files(): Promise<string[]> {
  const all = await readdir(server.pictureFolder, { recursive: true, withFileTypes: true });
  const found = all.filter((one) => one.isFile()).map((one) => `${one.parentPath}/${one.name}`);
  return found.filter((file) => file.includes(shop.shopId) || file.includes('arriving'));
}

/** A picture that is so many bytes long: what follows its end counts as much as the rest. */
function grownTo(picture: Buffer, bytes: number): Buffer {
  return Buffer.concat([picture, Buffer.alloc(bytes - picture.length)]);
}

describe('a photo', () => {
  test('is 201 when it first comes and 200 when it is sent again, and then it is there', async () => {
    const picture = await pictureOf();
    expect((await crew.head(nameOf(picture))).status).toBe(404);
    expect((await crew.put(picture)).status).toBe(201);
    expect((await crew.head(nameOf(picture))).status).toBe(200);
    expect((await crew.put(picture)).status).toBe(200);
    expect(await files()).toHaveLength(1);
  });

  test('sent twice at once is new once, and is there', async () => {
    const picture = await pictureOf();
    const answers = await Promise.all([crew.put(picture), crew.put(picture)]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 201]);
    expect((await crew.get(nameOf(picture))).status).toBe(200);
  });

  test.each(['jpeg', 'png', 'webp'] as const)('is taken as %s, and given as such', async (format) => {
    const picture = await pictureOf({ format });
    expect((await crew.put(picture)).status).toBe(201);
    const given = await crew.get(nameOf(picture));
    expect(given.headers.get('Content-Type')).toBe(`image/${format}`);
    expect((await sharp(await bytesOf(given)).metadata()).format).toBe(format);
  });

  test.each(['crew', 'foreman', 'office'] as const)('is taken from %s', async (role) => {
    const hand = new PhotoHand(server, await signIn(server, shop.people[role]));
    expect((await hand.put(await pictureOf())).status).toBe(201);
  });

  test('whose file was lost is not said to be there, and is kept when it is sent again', async () => {
    const picture = await pictureOf();
    const sha256 = nameOf(picture);
    await crew.put(picture);
    await server.pictures.remove({ shopId: shop.shopId, sha256 });
    expect((await crew.head(sha256)).status).toBe(404);
    expect((await crew.get(sha256)).status).toBe(404);
    expect((await crew.put(picture)).ok).toBe(true);
    expect((await crew.get(sha256)).status).toBe(200);
  });
});

describe('what is refused leaves nothing, and says why', () => {
  test('bytes that are not those of their name, even where the name is known', async () => {
    const [picture, other] = [await pictureOf(), await pictureOf()];
    const refused = await crew.put(picture, nameOf(other));
    expect([refused.status, await wordsOf(refused)]).toEqual([422, expect.stringContaining('SHA-256')]);
    expect(await files()).toEqual([]);
    await crew.put(other);
    expect((await crew.put(picture, nameOf(other))).status).toBe(422);
  });

  test.each([
    ['a text file that is named .jpg', Buffer.from('Two strakes hung on the port side.\n'.repeat(40))],
    ['a page', Buffer.from('<!doctype html><script>alert(1)</script>')],
    ['a drawing', Buffer.from('<svg xmlns="http://www.w3.org/2000/svg" width="9" height="9"/>')],
    ['a beginning of a JPEG with nothing behind it', Buffer.from([0xff, 0xd8, 0xff, 0xe0, 0, 16])],
    ['an empty file', Buffer.alloc(0)],
  ])('%s', async (_what, bytes) => {
    const refused = await crew.put(bytes);
    expect([refused.status, await wordsOf(refused)]).toEqual([422, expect.stringMatching(/JPEG|jpeg/)]);
    expect((await crew.putThumb(bytes, nameOf(bytes))).status).toBe(422);
    expect(await files()).toEqual([]);
  });

  test('a GIF', async () => {
    const gif = await sharp(await pictureOf())
      .gif()
      .toBuffer();
    expect((await crew.put(gif)).status).toBe(422);
  });

  test.each([
    [20_000, 20_000],
    [16_385, 8],
    [8, 16_385],
    [10_001, 10_000],
  ])('a picture of %i x %i px, before it is decoded', async (width, height) => {
    const picture = flatPng(width, height);
    expect(picture.length).toBeLessThan(100_000);
    const before = process.memoryUsage().rss;
    const refused = await crew.put(picture);
    const words = await wordsOf(refused);
    expect([refused.status, words]).toEqual([422, expect.stringContaining(`${width} x ${height} px`)]);
    expect(words).toContain('at most 16384 px a side and 100 megapixels');
    expect((await crew.putThumb(picture, nameOf(picture))).status).toBe(422);
    expect(process.memoryUsage().rss - before).toBeLessThan(100_000_000);
    expect(await files()).toEqual([]);
  });

  test('a name that is no SHA-256', async () => {
    const picture = await pictureOf();
    for (const name of [nameOf(picture).toUpperCase(), 'photo', `${nameOf(picture)}0`, '..%2f..%2fpasswd']) {
      expect((await crew.put(picture, name)).status).toBe(422);
      expect((await crew.putThumb(picture, name)).status).toBe(422);
      expect((await crew.get(name)).status).toBe(404);
      expect((await crew.head(name)).status).toBe(404);
    }
  });

  test('a byte more than 15 MiB, and 100 KiB for a thumbnail; not what has just so many', async () => {
    const picture = await pictureOf();
    for (const [bytesMax, part] of [
      [FULL_BYTES_MAX, ''],
      [THUMB_BYTES_MAX, '/thumb'],
    ] as const) {
      const fits = grownTo(picture, bytesMax);
      const tooLarge = grownTo(picture, bytesMax + 1);
      const refused = await crew.put(tooLarge, nameOf(tooLarge), part);
      expect([refused.status, await wordsOf(refused)]).toEqual([413, `The file is over ${bytesMax} bytes.`]);
      expect((await crew.put(fits, nameOf(fits), part)).status).toBe(201);
    }
  });

  test('no file, two, or one in another field', async () => {
    const picture = await pictureOf();
    const two = formOf(picture);
    two.append('photo', new Blob(['more']), 'b.jpg');
    const bodies: RequestInit[] = [
      { body: formOf(picture, 'picture') },
      { body: two },
      { body: new FormData() },
      {},
      { body: picture.toString('base64') },
    ];
    for (const body of bodies) {
      const refused = await fetch(`${server.url}/api/photos/${nameOf(picture)}`, {
        method: 'PUT',
        headers: { Authorization: `Bearer ${session.accessToken}` },
        ...body,
      });
      expect(refused.status).toBe(400);
    }
    expect(await files()).toEqual([]);
  });
});

describe('an upload that is cut off', () => {
  /** Sends the first part of a request as a phone does that goes out of signal, and goes. */
  async function cutOff(picture: Buffer, bytesSent: number): Promise<void> {
    const { port } = new URL(server.url);
    const head = Buffer.from(
      '--cut\r\nContent-Disposition: form-data; name="photo"; filename="a.jpg"\r\nContent-Type: image/jpeg\r\n\r\n',
    );
    const length = head.length + picture.length + Buffer.byteLength('\r\n--cut--\r\n');
    const socket = connect(Number(port), '127.0.0.1');
    await once(socket, 'connect');
    socket.write(
      `PUT /api/photos/${nameOf(picture)} HTTP/1.1\r\nHost: ribband\r\nAuthorization: Bearer ${session.accessToken}\r\n` +
        `Content-Type: multipart/form-data; boundary=cut\r\nContent-Length: ${length}\r\n\r\n`,
    );
    socket.write(head);
    await new Promise((sent) => socket.write(picture.subarray(0, bytesSent), sent));
    socket.destroy();
    await once(socket, 'close');
  }

  test('leaves nothing, and the same picture is taken when it is sent again whole', async () => {
    const picture = await pictureOf({ width: 900, height: 700 });
    for (const share of [0, 0.5, 1]) await cutOff(picture, Math.floor(picture.length * share));
    expect(await files()).toEqual([]);
    expect((await crew.head(nameOf(picture))).status).toBe(404);
    expect((await crew.put(picture)).status).toBe(201);
    expect(nameOf(picture)).not.toBe(nameOf(await bytesOf(await crew.get(nameOf(picture)))));
    expect(await files()).toHaveLength(1);
  });
});

describe('who sends nothing', () => {
  test('who is not signed in', async () => {
    const picture = await pictureOf();
    const url = `${server.url}/api/photos/${nameOf(picture)}`;
    const asked: [string, RequestInit][] = [
      [url, { method: 'PUT', body: formOf(picture) }],
      [`${url}/thumb`, { method: 'PUT', body: formOf(picture) }],
      [url, { method: 'HEAD' }],
      [url, {}],
    ];
    for (const [where, init] of asked) expect((await fetch(where, init)).status).toBe(401);
    expect(await files()).toEqual([]);
  });

  test('an owner', async () => {
    const owner = new PhotoHand(server, await signIn(server, shop.people.owner));
    const picture = await pictureOf();
    expect((await owner.put(picture)).status).toBe(403);
    expect((await owner.putThumb(picture, nameOf(picture))).status).toBe(403);
    expect(await files()).toEqual([]);
  });

  test('a revoked device', async () => {
    const picture = await pictureOf();
    await crew.put(picture);
    const foreman = await senderFor(server, shop.people.foreman);
    await fetch(`${server.url}/api/devices/${session.deviceId}/revoke`, {
      method: 'POST',
      headers: { Authorization: `Bearer ${foreman.session.accessToken}` },
    });
    const other = await pictureOf();
    const answers = [
      crew.put(other),
      crew.putThumb(other, nameOf(other)),
      crew.get(nameOf(picture)),
      crew.head(nameOf(picture)),
    ];
    expect((await Promise.all(answers)).map(({ status }) => status)).toEqual([403, 403, 403, 403]);
  });
});

test('the contract has the photos among its operations', async () => {
  const document = (await (await fetch(`${server.url}/api/openapi.json`)).json()) as {
    paths: Record<string, object>;
  };
  expect(Object.keys(document.paths['/api/photos/{sha256}']!).sort()).toEqual(['get', 'head', 'put']);
  expect(document.paths['/api/photos/{sha256}/thumb']).toMatchObject({
    put: {
      requestBody: {
        content: { 'multipart/form-data': { schema: { properties: { photo: { format: 'binary' } } } } },
      },
    },
  });
});
