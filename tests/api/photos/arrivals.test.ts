import pg from 'pg';
import { v7 } from 'uuid';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, test } from 'vitest';
import type { PhotoRow } from '#shared/photo/photo.ts';
import { HailEar } from '#tests/worlds/hail-ear.ts';
import { nameOf, PhotoHand, pictureOf } from '#tests/worlds/pictures.ts';
import { entryBy, layDown, senderFor, type MadeOp, type Sender, type Yard } from '#tests/worlds/sender.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';
import { makeShop, type TestShop } from '#tests/worlds/shop.ts';
import { asOwner } from '#tests/worlds/tables.ts';

// Goal: that bytes have come is told to whoever has a row of the photo, whichever of op and bytes is first.
let server: TestServer;
let shop: TestShop;
let foreman: Sender;
let crew: Sender;
let hand: PhotoHand;
let yard: Yard;
let picture: Buffer;
let sha256: string;
let ear: HailEar | undefined;

beforeAll(async () => {
  server = await startServer();
});
beforeEach(async () => {
  shop = await makeShop(server.database);
  foreman = await senderFor(server, shop.people.foreman);
  crew = await senderFor(server, shop.people.crew);
  hand = new PhotoHand(server, crew.session);
  yard = await layDown(foreman);
  picture = await pictureOf();
  sha256 = nameOf(picture);
});
afterEach(() => ear?.leave());
afterAll(() => server.close());

function attach(changes: Record<string, unknown> = {}): MadeOp {
  const { boatId, stageId } = yard;
  const measures = { width: 64, height: 48, bytes: picture.length };
  return crew.op('photo.attach', { photoId: v7(), sha256, boatId, stageId, ...measures, ...changes });
}

async function rowOf(op: MadeOp): Promise<{ seq: number; row: PhotoRow }> {
  const { rows } = await foreman.pullAll();
  return rows.find(({ id }) => id === op.data.photoId) as unknown as { seq: number; row: PhotoRow };
}

/** Has whoever writes a row of a photo wait until what is returned is called. */
async function holdUpPhotos(): Promise<() => Promise<void>> {
  await asOwner(
    server,
    `CREATE FUNCTION wait() RETURNS trigger LANGUAGE plpgsql AS $$ BEGIN PERFORM pg_advisory_xact_lock(1); RETURN NEW; END $$;
     CREATE TRIGGER wait BEFORE INSERT ON photos FOR EACH ROW EXECUTE FUNCTION wait()`,
  );
  const holder = new pg.Client({ connectionString: server.databaseUrl });
  await holder.connect();
  await holder.query('SELECT pg_advisory_lock(1)');
  return async () => {
    await holder.end();
    await asOwner(server, 'DROP FUNCTION wait CASCADE');
  };
}

/** Resolves once so many in the test's database wait for a lock, or once `isOver`. */
async function whenWaiting(count: number, isOver = () => false): Promise<void> {
  const waiting = `SELECT FROM pg_stat_activity WHERE datname = current_database() AND wait_event_type = 'Lock'`;
  while (!isOver() && (await asOwner(server, waiting)).length < count);
}

async function arrivedOf(op: MadeOp): Promise<PhotoRow['arrived']> {
  return (await rowOf(op)).row.arrived;
}

describe('the op before its bytes', () => {
  test('says that none have come, then the thumbnail, then all: each with a new number and a hail', async () => {
    const op = attach();
    await crew.send(op);
    const first = await rowOf(op);
    expect(first.row.arrived).toBeNull();
    ear = await HailEar.open(server.url, foreman.session.accessToken);

    expect((await hand.putThumb(await pictureOf({ width: 16, height: 12 }), sha256)).status).toBe(201);
    const second = await rowOf(op);
    expect([second.row.arrived, second.seq > first.seq]).toEqual(['thumb', true]);
    await ear.hears(second.seq);

    expect((await hand.put(picture)).status).toBe(201);
    const third = await rowOf(op);
    expect([third.row.arrived, third.seq > second.seq]).toEqual(['full', true]);
    await ear.hears(third.seq);

    const { arrived: _first, ...before } = first.row;
    const { arrived: _third, ...after } = third.row;
    expect(after).toEqual(before);
  });

  test('is told of them to a device that has pulled already', async () => {
    const op = attach();
    await crew.send(op);
    const { cursor } = await foreman.pullAll();
    await hand.put(picture);
    const { rows } = await foreman.pullAll(cursor);
    expect(rows.map(({ id, row }) => [id, (row as unknown as PhotoRow).arrived])).toEqual([
      [op.data.photoId, 'full'],
    ]);
  });

  test('is not told twice: what is sent again, or a thumbnail behind the whole, is no news', async () => {
    const op = attach();
    await crew.send(op);
    await hand.put(picture);
    const { seq } = await rowOf(op);
    expect((await hand.put(picture)).status).toBe(200);
    expect((await hand.putThumb(await pictureOf(), sha256)).status).toBe(201);
    expect((await hand.putThumb(await pictureOf(), sha256)).status).toBe(200);
    expect(await rowOf(op)).toMatchObject({ seq, row: { arrived: 'full' } });
  });
});

describe('the bytes before the op', () => {
  test('are said to have come as soon as the op has', async () => {
    await hand.putThumb(await pictureOf(), sha256);
    const early = attach();
    await crew.send(early);
    expect(await arrivedOf(early)).toBe('thumb');
    await hand.put(picture);
    const late = attach();
    await crew.send(late);
    expect([await arrivedOf(early), await arrivedOf(late)]).toEqual(['full', 'full']);
  });

  test('are said so even where they come while the op is being written', async () => {
    const op = attach();
    const release = await holdUpPhotos();
    const sent = crew.send(op);
    await whenWaiting(1);
    let isAnswered = false;
    const put = hand.put(picture).then(() => (isAnswered = true));
    await whenWaiting(2, () => isAnswered);
    await release();
    await Promise.all([sent, put]);
    expect(await arrivedOf(op)).toBe('full');
  });

  test('of a batch are each said of their own photo', async () => {
    const [other, third] = [await pictureOf(), await pictureOf()];
    await hand.put(picture);
    await hand.putThumb(await pictureOf(), nameOf(other));
    const ops = [attach(), attach({ sha256: nameOf(other) }), attach({ sha256: nameOf(third) }), attach()];
    await crew.send(...ops);
    expect(await Promise.all(ops.map(arrivedOf))).toEqual(['full', 'thumb', null, 'full']);
  });
});

describe('a row that says that its bytes have come', () => {
  test('still does when it is changed, struck, or moved with its entry', async () => {
    const entry = entryBy(crew, yard);
    const op = attach({ entryId: entry.data.entryId });
    await crew.send(entry, op);
    await hand.put(picture);
    const photoId = op.data.photoId;
    const caption = crew.op(
      'photo.amend',
      { photoId, set: { caption: 'The garboard' } },
      { over: { caption: [op.id] } },
    );
    await crew.send(caption);
    expect((await rowOf(op)).row).toMatchObject({ caption: 'The garboard', arrived: 'full' });

    const there = await layDown(foreman);
    const { boatId, stageId } = there;
    const move = { entryId: entry.data.entryId, set: { boatId, stageId } };
    await crew.send(crew.op('entry.amend', move, { over: { stageId: [entry.id] } }));
    expect((await rowOf(op)).row).toMatchObject({ boatId, stageId, arrived: 'full' });

    const strike = { photoId, why: 'Of another boat', saw: [caption.id] };
    await crew.send(crew.op('photo.strike', strike, { over: { struck: [op.id] } }));
    expect((await rowOf(op)).row).toMatchObject({ struck: { why: 'Of another boat' }, arrived: 'full' });
  });

  test('does in every row of the same picture, and in no other shop', async () => {
    const ops = [attach(), attach()];
    await crew.send(...ops);
    const elsewhere = await makeShop(server.database);
    const theirForeman = await senderFor(server, elsewhere.people.foreman);
    const theirYard = await layDown(theirForeman);
    const measures = { width: 64, height: 48, bytes: picture.length };
    const theirs = theirForeman.op('photo.attach', {
      photoId: v7(),
      sha256,
      boatId: theirYard.boatId,
      ...measures,
    });
    await theirForeman.send(theirs);

    await hand.put(picture);
    const seqs = await Promise.all(ops.map(async (op) => (await rowOf(op)).seq));
    expect(new Set(seqs).size).toBe(2);
    expect(await Promise.all(ops.map(arrivedOf))).toEqual(['full', 'full']);
    const { rows } = await theirForeman.pullAll();
    expect(rows.find(({ id }) => id === theirs.data.photoId)!.row).toMatchObject({ arrived: null });
  });
});
