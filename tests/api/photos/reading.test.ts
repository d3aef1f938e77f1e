import sharp from 'sharp';
import { v7 } from 'uuid';
import { afterAll, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import { bytesOf, nameOf, PhotoHand, pictureOf } from '#tests/worlds/pictures.ts';
import { layDown, senderFor, type Sender } from '#tests/worlds/sender.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makePerson, makeShop, signIn, type TestPerson, type TestShop } from '#tests/worlds/shop.ts';

const SIZES = ['thumb', 'view', 'full'] as const;

let server: TestServer;
let shop: TestShop;
let crew: Sender;
let hand: PhotoHand;

beforeAll(async () => {
  server = await startServer();
});
beforeEach(async () => {
  shop = await makeShop(server.database);
  crew = await senderFor(server, shop.people.crew);
  hand = new PhotoHand(server, crew.session);
});
afterAll(() => server.close());

async function handOf(person: TestPerson): Promise<PhotoHand> {
  return new PhotoHand(server, await signIn(server, person));
}

/** Has a row show a picture. */
async function attach(picture: Buffer): Promise<void> {
  const { boatId } = await layDown(await senderFor(server, shop.people.foreman));
  const data = {
    photoId: v7(),
    sha256: nameOf(picture),
    boatId,
    width: 64,
    height: 48,
    bytes: picture.length,
  };
  const [outcome] = await crew.send(crew.op('photo.attach', data));
  expect(outcome!.outcome).toBe('kept');
}

async function sizeOf(response: Response) {
  expect(response.status).toBe(200);
  const { width, height, format, orientation } = await sharp(await bytesOf(response)).metadata();
  return { width, height, format, orientation };
}

async function statuses(who: PhotoHand, sha256: string): Promise<number[]> {
  const asked = [who.head(sha256), ...SIZES.map((size) => who.get(sha256, size))];
  return (await Promise.all(asked)).map(({ status }) => status);
}

describe('who may see a photo', () => {
  test('once a row shows it: crew, foreman and office, and who is an owner beside', async () => {
    const picture = await pictureOf();
    await hand.put(picture);
    await attach(picture);
    const both = await makePerson(server.database, shop.shopId, ['crew', 'owner']);
    const { foreman, office } = shop.people;
    for (const person of [foreman, office, both]) {
      expect(await statuses(await handOf(person), nameOf(picture))).toEqual([200, 200, 200, 200]);
    }
  });

  test('until then: who sent it, and others only learn that it is there', async () => {
    const picture = await pictureOf();
    await hand.put(picture);
    expect(await statuses(hand, nameOf(picture))).toEqual([200, 200, 200, 200]);
    expect(await statuses(await handOf(shop.people.foreman), nameOf(picture))).toEqual([200, 404, 404, 404]);
  });

  test('an owner sees nothing of it, not even that it is there', async () => {
    const picture = await pictureOf();
    await hand.put(picture);
    await attach(picture);
    expect(await statuses(await handOf(shop.people.owner), nameOf(picture))).toEqual([404, 404, 404, 404]);
  });

  test('another shop sees nothing of it, and what it sends itself is its own and new to it', async () => {
    const picture = await pictureOf();
    const sha256 = nameOf(picture);
    await hand.put(picture);
    await attach(picture);
    const elsewhere = await makeShop(server.database);
    const theirs = await handOf(elsewhere.people.crew);
    expect(await statuses(theirs, sha256)).toEqual([404, 404, 404, 404]);
    expect((await theirs.putThumb(await pictureOf(), sha256)).status).toBe(201);
    expect(await statuses(theirs, sha256)).toEqual([404, 200, 404, 404]);
    expect((await theirs.put(picture)).status).toBe(201);
    expect(await statuses(theirs, sha256)).toEqual([200, 200, 200, 200]);
  });
});

describe('the sizes of a photo', () => {
  test('the thumbnail is given as it was sent, while nothing else has come', async () => {
    const [picture, thumb] = [await pictureOf(), await pictureOf({ width: 20, height: 10, format: 'webp' })];
    expect((await hand.putThumb(thumb, nameOf(picture))).status).toBe(201);
    expect(await statuses(hand, nameOf(picture))).toEqual([404, 200, 404, 404]);
    const given = await hand.get(nameOf(picture), 'thumb');
    expect(given.headers.get('Content-Type')).toBe('image/webp');
    expect(await sizeOf(given)).toMatchObject({ width: 20, height: 10, format: 'webp' });
  });

  test('a thumbnail is made where none was sent, and gives way to one that is', async () => {
    const picture = await pictureOf({ width: 900, height: 600 });
    await hand.put(picture);
    expect(await sizeOf(await hand.get(nameOf(picture), 'thumb'))).toMatchObject({
      width: 320,
      height: 213,
      format: 'jpeg',
    });
    await hand.putThumb(await pictureOf({ width: 20, height: 10, format: 'png' }), nameOf(picture));
    expect(await sizeOf(await hand.get(nameOf(picture), 'thumb'))).toMatchObject({
      width: 20,
      height: 10,
      format: 'png',
    });
  });

  test('the view is a JPEG of 1600 px on its longest side, upright, made once and kept', async () => {
    const picture = await pictureOf({ width: 2000, height: 1000, orientation: 6, format: 'webp' });
    const sha256 = nameOf(picture);
    await hand.put(picture);
    expect(await server.pictures.has({ shopId: shop.shopId, sha256 }, 'view')).toBe(false);
    const views = await Promise.all([hand.get(sha256, 'view'), hand.get(sha256, 'view')]);
    const [first, second] = await Promise.all(views.map(bytesOf));
    expect(await sharp(first).metadata()).toMatchObject({ width: 800, height: 1600, format: 'jpeg' });
    expect((await sharp(first).metadata()).orientation).toBeUndefined();
    expect(second!.equals(first!)).toBe(true);
    expect(await server.pictures.has({ shopId: shop.shopId, sha256 }, 'view')).toBe(true);
  });

  test('the view of a small picture is no larger than the picture', async () => {
    const picture = await pictureOf();
    await hand.put(picture);
    expect(await sizeOf(await hand.get(nameOf(picture), 'view'))).toMatchObject({ width: 64, height: 48 });
  });

  test('a size that there is not is refused, and whole is what is given unasked', async () => {
    const picture = await pictureOf();
    await hand.put(picture);
    const headers = { Authorization: `Bearer ${crew.session.accessToken}` };
    const url = `${server.url}/api/photos/${nameOf(picture)}`;
    expect((await fetch(`${url}?size=huge`, { headers })).status).toBe(400);
    const whole = await bytesOf(await fetch(url, { headers }));
    expect(whole.equals(await bytesOf(await hand.get(nameOf(picture), 'full')))).toBe(true);
  });

  test('of a picture that breaks off, what is there is shown', async () => {
    const whole = await pictureOf({ width: 800, height: 600 });
    const picture = whole.subarray(0, Math.floor(whole.length * 0.7));
    expect((await hand.put(picture)).status).toBe(201);
    expect(await sizeOf(await hand.get(nameOf(picture), 'view'))).toMatchObject({ width: 800, height: 600 });
  });

  test.each([
    ['png', 200],
    ['webp', 32],
  ] as const)(
    'of a %s whose pixels cannot be read, nothing is made: it can be had whole',
    async (format, from) => {
      const picture = await sharp({ create: { width: 64, height: 48, channels: 3, background: 'red' } })
        .toFormat(format)
        .toBuffer();
      picture.fill(0xee, Math.min(from, picture.length - 30)); // behind what says how large it is
      expect((await hand.put(picture)).status).toBe(201);
      const view = await hand.get(nameOf(picture), 'view');
      expect(view.status).toBe(422);
      expect(await view.json()).toMatchObject({ detail: expect.stringContaining('decoded') });
      expect((await hand.get(nameOf(picture), 'full')).status).toBe(200);
    },
  );
});

test('a picture is kept by nobody on the way, and is taken for nothing else', async () => {
  const picture = await pictureOf({ format: 'png' });
  await hand.put(picture);
  for (const size of SIZES) {
    const { headers } = await hand.get(nameOf(picture), size);
    expect(headers.get('Cache-Control')).toBe('no-store');
    expect(headers.get('X-Content-Type-Options')).toBe('nosniff');
    expect(headers.get('Content-Type')).toBe(size === 'full' ? 'image/png' : 'image/jpeg');
  }
  expect((await hand.get(nameOf(await pictureOf()))).headers.get('Content-Type')).toContain('problem+json');
});
