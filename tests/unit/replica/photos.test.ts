import { IDBObjectStore } from 'fake-indexeddb';
import { describe, expect, test } from 'vitest';
import { HoldError } from '#src/replica/hold-error.ts';
import type { KeptPicture } from '#src/replica/photos/picture.ts';
import { GOOD_NETWORK, untilCut, type Phone, type Tab } from '#tests/worlds/phone.ts';
import { preparedAsItIs, pictureFile } from '#tests/worlds/prepared-picture.ts';
import { entryData, openShop, openTab } from '#tests/worlds/signed-in-phone.ts';
import { readStore } from './stored.ts';

const OFFLINE = { ...GOOD_NETWORK, isUp: false };
const files = (...names: string[]) => names.map((name) => pictureFile(name));

async function openPhone() {
  const shop = await openShop();
  const phone = shop.newPhone();
  const tab = await openTab(phone, 'Ned');
  return { shop, phone, tab, replica: tab.replica, about: { boatId: shop.boatId, stageId: shop.stageId } };
}

const shaOf = async (name: string) => (await preparedAsItIs(pictureFile(name))).sha256;
const textOf = async (blob: Blob | null) => blob && (await blob.text());

/** Has what the phone holds sent once it is on again, by a tab that is opened then. */
async function reopenAndSend(phone: Phone): Promise<Tab> {
  phone.cutPower();
  phone.network = GOOD_NETWORK;
  const tab = await openTab(phone);
  await tab.replica.sendNow();
  return tab;
}

describe('attaching photos', () => {
  test('without signal they are on this device, shown, and counted as held, through its death', async () => {
    const { phone, replica, tab, about } = await openPhone();
    phone.network = OFFLINE;
    const { attached, failed } = await replica.attachPhotos(files('a.jpg', 'b.jpg'), about);
    expect(failed).toEqual([]);
    tab.power.cut();
    const again = (await openTab(phone)).replica;
    expect(
      again
        .view()
        .all('photo')
        .map(({ id }) => id),
    ).toEqual(attached);
    expect(again.syncState()).toMatchObject({ heldOps: 2, heldPhotos: 2 });
    expect(again.heldPictures()).toMatchObject([
      { name: 'a.jpg', state: 'waiting' },
      { name: 'b.jpg', state: 'waiting' },
    ]);
    expect(await textOf(await again.picture(await shaOf('a.jpg'), 'view'))).toBe('a.jpg');
  });

  test('one that is no picture is named, and holds up none of the others', async () => {
    const { replica, about } = await openPhone();
    const seen: number[] = [];
    const { attached, failed } = await replica.attachPhotos(
      files('a.jpg', 'b.txt', 'c.jpg'),
      about,
      ({ done }) => seen.push(done),
    );
    expect(attached).toHaveLength(2);
    expect(failed).toEqual([{ name: 'b.txt', words: '‘b.txt’ is no picture.' }]);
    expect(seen).toEqual([0, 1, 2, 3]);
  });

  test('one that cannot be held leaves no bytes behind', async () => {
    const { phone, replica, shop } = await openPhone();
    phone.network = OFFLINE;
    const { attached, failed } = await replica.attachPhotos(files('a.jpg'), {
      boatId: shop.boatId,
      caption: 'x'.repeat(30_000),
    });
    expect({ attached, names: failed.map(({ name }) => name) }).toEqual({ attached: [], names: ['a.jpg'] });
    expect(replica.heldPictures()).toEqual([]);
    expect(await replica.picture(await shaOf('a.jpg'), 'full')).toBeNull();
  });

  test('no op names bytes that are not there, wherever the power is cut', async () => {
    const seen = new Set<string>();
    for (let points = 0; points < 12; points += 1) {
      const { phone, tab, replica, about } = await openPhone();
      phone.network = OFFLINE;
      tab.power.cutAfter(points);
      await untilCut(tab.power, replica.attachPhotos(files('a.jpg'), about));
      tab.power.cut();
      const again = (await openTab(phone)).replica;
      const photos = again.view().all('photo');
      const bytes = await again.picture(await shaOf('a.jpg'), 'full');
      if (photos.length > 0) expect(await textOf(bytes)).toBe('a.jpg');
      seen.add(`${photos.length} photos, ${bytes ? 'bytes' : 'no bytes'}`);
    }
    expect([...seen].sort()).toEqual(['0 photos, bytes', '0 photos, no bytes', '1 photos, bytes']);
  });

  test('what does not fit is refused in words before anything of it is taken', async () => {
    const { phone, shop } = await openPhone();
    const crowded = { quota: 50_000_000, usage: 45_000_000 };
    phone.storage = { persist: async () => true, persisted: async () => true, estimate: async () => crowded };
    const { replica } = await openTab(phone);
    const { attached, failed } = await replica.attachPhotos(files('a.jpg', 'b.jpg'), { boatId: shop.boatId });
    expect(attached).toEqual([]);
    expect(failed).toEqual(
      ['a.jpg', 'b.jpg'].map((name) => ({
        name,
        words: 'This device has no room for these 2 pictures. Free some room, or take fewer.',
      })),
    );
    expect(replica.view().held).toEqual([]);
    expect(
      await readStore(phone.indexedDB, `ribband-person-${replica.view().me.personId}`, 'pictures'),
    ).toEqual([]);
  });

  test('room is made of what the server has, never of what it has not', async () => {
    const { phone, shop } = await openPhone();
    const room = { quota: 100_000_000, usage: 0 };
    phone.storage = { persist: async () => true, persisted: async () => true, estimate: async () => room };
    const { replica } = await openTab(phone);
    const about = { boatId: shop.boatId };
    await replica.attachPhotos(files('a.jpg'), about);
    await replica.sendNow();
    phone.network = OFFLINE;
    await replica.attachPhotos(files('b.jpg'), about);
    room.usage = room.quota;
    expect((await replica.attachPhotos(files('c.jpg'), about)).failed).toHaveLength(1);
    expect(await replica.picture(await shaOf('a.jpg'), 'full')).toBeNull();
    expect(await textOf(await replica.picture(await shaOf('b.jpg'), 'full'))).toBe('b.jpg');
  });

  test('a disk that is full after all is told of in words, with nothing half there', async () => {
    const { phone, replica, about } = await openPhone();
    phone.network = OFFLINE;
    const put = IDBObjectStore.prototype.put;
    IDBObjectStore.prototype.put = function (this: IDBObjectStore, value: unknown, key?: IDBValidKey) {
      if (this.name === 'pictures' && String(key).endsWith('/full'))
        throw new DOMException('The disk is full.', 'QuotaExceededError');
      return put.call(this, value, key);
    };
    const { failed } = await replica.attachPhotos(files('a.jpg'), about);
    IDBObjectStore.prototype.put = put;
    expect(failed[0]!.words).toBe('This device has no room for this picture. Free some room, or take fewer.');
    expect(replica.heldPictures()).toEqual([]);
    expect(await replica.picture(await shaOf('a.jpg'), 'thumb')).toBeNull();
  });
});

describe('pictures of a form that is not logged yet', () => {
  test('survive the device with its draft, are sent only once they are attached, and only once', async () => {
    const { phone, shop, replica, tab, about } = await openPhone();
    const { kept } = await replica.keepPictures(files('a.jpg', 'b.jpg'));
    await replica.draft.write('entry', { kept });
    tab.power.cut();
    const again = (await openTab(phone)).replica;
    await again.sendNow();
    expect(again.syncState().heldPhotos).toBe(0);
    const draft = again.draft.read<{ kept: KeptPicture[] }>('entry')!;
    const entryId = again.newId();
    const entry = { kind: 'entry.write', data: entryData(entryId, shop) };
    const ops = await again.attachKept(draft.kept, { ...about, entryId }, [entry]);
    expect(ops.map(({ kind }) => kind)).toEqual(['entry.write', 'photo.attach', 'photo.attach']);
    expect(await again.attachKept(draft.kept, { ...about, entryId })).toEqual([]);
    await again.sendNow();
    expect(shop.server.pictures.asked).toEqual([
      `PUT ${await shaOf('a.jpg')}/thumb`,
      `PUT ${await shaOf('b.jpg')}/thumb`,
      `PUT ${await shaOf('a.jpg')}/full`,
      `PUT ${await shaOf('b.jpg')}/full`,
    ]);
    expect(again.syncState().heldPhotos).toBe(0);
  });

  test('are let go of where they are dropped, but not what the record has of them', async () => {
    const { phone, replica, about } = await openPhone();
    phone.network = OFFLINE;
    await replica.attachPhotos(files('a.jpg'), about);
    const { kept } = await replica.keepPictures(files('a.jpg', 'b.jpg'));
    await replica.dropKept(kept);
    expect(await textOf(await replica.picture(await shaOf('a.jpg'), 'full'))).toBe('a.jpg');
    expect(await replica.picture(await shaOf('b.jpg'), 'full')).toBeNull();
    expect(replica.syncState().heldPhotos).toBe(1);
    await expect(replica.attachKept(kept.slice(1), about)).rejects.toThrow(HoldError);
  });

  test('stay with the form where what is held along with them is refused', async () => {
    const { phone, shop, replica, about } = await openPhone();
    phone.network = OFFLINE;
    const { kept } = await replica.keepPictures(files('a.jpg'));
    const unreadable = { kind: 'entry.write', data: { ...entryData(replica.newId(), shop), text: 7 } };
    await expect(replica.attachKept(kept, about, [unreadable])).rejects.toThrow(HoldError);
    expect([replica.syncState().heldPhotos, replica.view().all('photo').length]).toEqual([0, 0]);
    await replica.attachKept(kept, about);
    expect([replica.syncState().heldPhotos, replica.view().all('photo').length]).toEqual([1, 1]);
  });
});

describe('sending pictures', () => {
  test('all the small ones go before the first whole one, and everyone hears that they came', async () => {
    const { shop, phone, replica, about } = await openPhone();
    phone.network = OFFLINE;
    await replica.attachPhotos(files('a.jpg', 'b.jpg'), about);
    phone.network = GOOD_NETWORK;
    expect(await replica.sendNow()).toMatchObject({ outcome: 'done' });
    const [a, b] = [await shaOf('a.jpg'), await shaOf('b.jpg')];
    expect(shop.server.pictures.asked).toEqual([
      `PUT ${a}/thumb`,
      `PUT ${b}/thumb`,
      `PUT ${a}/full`,
      `PUT ${b}/full`,
    ]);
    await replica.syncNow();
    expect(
      replica
        .view()
        .all('photo')
        .map(({ arrived }) => arrived),
    ).toEqual(['full', 'full']);
    expect(replica.syncState()).toMatchObject({ heldPhotos: 0, isSendingPhotos: false });
  });

  test('the same picture of two things is sent once', async () => {
    const { shop, phone, replica, about } = await openPhone();
    phone.network = OFFLINE;
    await replica.attachPhotos(files('a.jpg'), about);
    await replica.attachPhotos(files('a.jpg'), { ...about, set: 'before' });
    phone.network = GOOD_NETWORK;
    await replica.sendNow();
    expect(shop.server.pictures.asked).toHaveLength(2);
    expect(replica.view().all('photo')).toHaveLength(2);
  });

  test('whatever the power is cut at, all of it arrives, and at most one of it twice', async () => {
    const asked = new Set<number>();
    for (let points = 0; points < 40; points += 1) {
      const { shop, phone, tab, replica, about } = await openPhone();
      phone.network = OFFLINE;
      await replica.attachPhotos(files('a.jpg', 'b.jpg'), about);
      phone.network = GOOD_NETWORK;
      tab.power.cutAfter(points);
      await untilCut(tab.power, replica.sendNow());
      const again = await reopenAndSend(phone);
      expect(shop.server.pictures.kept.size).toBe(4);
      expect(again.replica.syncState()).toMatchObject({ heldOps: 0, heldPhotos: 0 });
      asked.add(shop.server.pictures.asked.filter((line) => line.startsWith('PUT')).length);
    }
    expect([...asked].sort()).toEqual([4, 5]);
  });

  test('after an answer that was lost the server is asked whether it came, and the bytes do not go again', async () => {
    const { shop, phone, replica, about } = await openPhone();
    phone.network = OFFLINE;
    await replica.attachPhotos(files('a.jpg'), about);
    phone.network = GOOD_NETWORK;
    // once the thumbnail has gone: the answer to the whole picture is lost
    shop.server.pictures.refuse = (name) => {
      if (name.endsWith('/thumb')) phone.network = { ...GOOD_NETWORK, losesAnswer: 1 };
      return null;
    };
    expect(await replica.sendNow()).toEqual({ outcome: 'offline' });
    phone.network = GOOD_NETWORK;
    expect(await replica.sendNow()).toMatchObject({ outcome: 'done' });
    const sha256 = await shaOf('a.jpg');
    expect(shop.server.pictures.asked).toEqual([
      `PUT ${sha256}/thumb`,
      `PUT ${sha256}/full`,
      `HEAD ${sha256}/full`,
    ]);
    expect(replica.syncState().heldPhotos).toBe(0);
  });

  test('what the server refuses is kept and named with its words, holds up nothing, and can be tried again', async () => {
    const { shop, phone, replica, about } = await openPhone();
    phone.network = OFFLINE;
    await replica.attachPhotos(files('a.jpg', 'b.jpg'), about);
    phone.network = GOOD_NETWORK;
    const a = await shaOf('a.jpg');
    const detail = 'This is no JPEG, PNG or WebP picture.';
    shop.server.pictures.refuse = (name) => (name.startsWith(a) ? { status: 422, detail } : null);
    expect(await replica.sendNow()).toMatchObject({ outcome: 'done' });
    expect(replica.heldPictures()).toMatchObject([{ name: 'a.jpg', state: 'refused', words: detail }]);
    expect([...shop.server.pictures.kept.keys()]).toEqual([
      `${await shaOf('b.jpg')}/thumb`,
      `${await shaOf('b.jpg')}/full`,
    ]);
    expect(await textOf(await replica.picture(a, 'full'))).toBe('a.jpg');
    shop.server.pictures.refuse = null;
    await replica.syncNow();
    expect(replica.syncState().heldPhotos).toBe(1);
    await replica.sendNow();
    expect(replica.syncState().heldPhotos).toBe(0);
  });

  test('one that the server fails at holds up none of the others', async () => {
    const { shop, phone, replica, about } = await openPhone();
    phone.network = OFFLINE;
    await replica.attachPhotos(files('a.jpg', 'b.jpg'), about);
    phone.network = GOOD_NETWORK;
    const a = await shaOf('a.jpg');
    shop.server.pictures.refuse = (name) => (name.startsWith(a) ? { status: 500, detail: 'Not now.' } : null);
    expect(await replica.sendNow()).toEqual({ outcome: 'failed', words: 'Not now.' });
    expect(replica.heldPictures()).toMatchObject([{ name: 'a.jpg', state: 'waiting' }]);
  });

  test('two tabs send each picture once', async () => {
    const { shop, phone, replica, about } = await openPhone();
    phone.network = OFFLINE;
    await replica.attachPhotos(files('a.jpg', 'b.jpg', 'c.jpg', 'd.jpg'), about);
    const other = await openTab(phone);
    phone.network = GOOD_NETWORK;
    await Promise.all([replica.sendNow(), other.replica.sendNow()]);
    await Promise.all([replica.sendNow(), other.replica.sendNow()]);
    expect(shop.server.pictures.asked).toHaveLength(8);
    expect(other.replica.syncState().heldPhotos).toBe(0);
  });

  test('a restored server that has lost pictures is given them again, and those that it has not do not go twice', async () => {
    const { shop, replica, about } = await openPhone();
    await replica.attachPhotos(files('a.jpg'), about);
    await replica.sendNow();
    const backup = shop.server.backUp();
    await replica.attachPhotos(files('b.jpg'), about);
    await replica.sendNow();
    const [a, b] = [await shaOf('a.jpg'), await shaOf('b.jpg')];
    shop.server.restore(backup);
    for (const size of ['thumb', 'full']) shop.server.pictures.kept.delete(`${b}/${size}`);
    shop.server.pictures.asked.length = 0;
    await replica.sendNow();
    expect([...shop.server.pictures.kept.keys()].sort()).toEqual(
      [`${a}/thumb`, `${a}/full`, `${b}/thumb`, `${b}/full`].sort(),
    );
    expect(shop.server.pictures.asked.filter((asked) => asked.endsWith('/full'))).toEqual([
      `HEAD ${a}/full`,
      `HEAD ${b}/full`,
      `PUT ${b}/full`,
    ]);
    expect(replica.syncState()).toMatchObject({ heldOps: 0, heldPhotos: 0 });
  });

  test('what a device holds of pictures is told to the server', async () => {
    const { phone, shop, replica, about } = await openPhone();
    shop.server.pictures.refuse = () => ({ status: 413, detail: 'Too large.' });
    await replica.attachPhotos(files('a.jpg'), about);
    await replica.sendNow();
    await replica.syncNow();
    expect(shop.server.lastHeld).toMatchObject({ ops: 0, photos: 1 });
    expect(phone.reports).toEqual([]);
  });

  test('a person who leaves is told of pictures that stay behind', async () => {
    const { phone, replica, about } = await openPhone();
    phone.network = OFFLINE;
    await replica.attachPhotos(files('a.jpg', 'b.jpg'), about);
    expect(await replica.session.signOut()).toEqual({
      refused:
        '2 things and 2 photos are not sent yet. Send first, or leave it on this device. Photos go when you sign in here again.',
    });
    await replica.session.signOut({ evenWithHeldOps: true });
    expect(replica.syncState().heldPhotos).toBe(0);
    phone.network = GOOD_NETWORK;
    const again = await openTab(phone, 'Ned');
    await again.replica.sendNow();
    expect(again.replica.syncState().heldPhotos).toBe(0);
  });
});

describe('finding pictures', () => {
  test('one of another device comes from the server once it is there, once, and is kept', async () => {
    const { shop, phone, replica, about } = await openPhone();
    phone.network = OFFLINE;
    await replica.attachPhotos(files('a.jpg'), about);
    const sha256 = await shaOf('a.jpg');
    const other = shop.newPhone();
    const orla = (await openTab(other, 'Orla')).replica;
    phone.network = GOOD_NETWORK;
    shop.server.pictures.refuse = () => ({ status: 500, detail: 'Not now.' });
    await replica.sendNow();
    await orla.syncNow();
    shop.server.pictures.asked.length = 0;
    expect(await orla.picture(sha256, 'view')).toBeNull();
    expect(shop.server.pictures.asked).toEqual([]);
    shop.server.pictures.refuse = null;
    await replica.sendNow();
    await orla.syncNow();
    shop.server.pictures.asked.length = 0;
    const both = await Promise.all([orla.picture(sha256, 'view'), orla.picture(sha256, 'view')]);
    expect(await Promise.all(both.map(textOf))).toEqual(['a.jpg', 'a.jpg']);
    other.network = OFFLINE;
    expect(await textOf(await orla.picture(sha256, 'view'))).toBe('a.jpg');
    expect(await orla.picture(sha256, 'thumb')).toBeNull();
    expect(shop.server.pictures.asked).toEqual([`GET ${sha256}/view`]);
  });

  test('on signing out what the server has is let go of, and nothing else', async () => {
    const { phone, replica, about } = await openPhone();
    await replica.attachPhotos(files('a.jpg'), about);
    await replica.sendNow();
    phone.network = OFFLINE;
    await replica.attachPhotos(files('b.jpg'), about);
    const { personId } = replica.view().me;
    await replica.session.signOut({ evenWithHeldOps: true });
    const left = await readStore(phone.indexedDB, `ribband-person-${personId}`, 'pictures');
    const b = await shaOf('b.jpg');
    expect(left.map(([key]) => key)).toEqual([`${b}/full`, `${b}/thumb`]);
  });
});
