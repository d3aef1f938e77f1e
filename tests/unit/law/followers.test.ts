import { beforeEach, describe, expect, it } from 'vitest';
import type { FollowerRow } from '#shared/entry/follow.ts';
import { replay, type HeldOp } from '#shared/sync/replay.ts';
import type { Row } from '#shared/sync/row.ts';
import { ShopInMemory, TODAY, type Phone } from '#tests/worlds/shop-in-memory.ts';

// What is noted with an entry lies where the entry lies, whichever of them is heard first.

let shop: ShopInMemory;
let desk: Phone;
let boatId: string;
let stageId: string;
let otherId: string;
let entryId: string;

beforeEach(async () => {
  shop = new ShopInMemory();
  ({ desk, boatId, stageId } = await shop.withBoat());
  otherId = shop.newId();
  entryId = shop.newId();
  desk.does('boat.add', { boatId: otherId, name: 'Turnstone' });
  const entry = { entryId, boatId, stageId, workDate: TODAY, text: 'sole up', spoken: false, hours: [] };
  desk.does('entry.write', entry);
  await desk.sends();
});

const photo = () => ({
  photoId: shop.newId(),
  sha256: 'ab'.repeat(32),
  boatId,
  stageId,
  entryId,
  width: 4,
  height: 3,
  bytes: 12,
});
const move = () => ({ entryId, set: { boatId: otherId, stageId: null } });

describe('an entry that is moved', () => {
  it('takes its photos, findings and sound notes with it', async () => {
    const [one, findingId, soundId] = [photo(), shop.newId(), shop.newId()];
    const found = {
      kind: 'rot',
      place: { number: 7, side: 'port' },
      known: 'probed',
      certainty: 'suspected',
    };
    await desk.says('photo.attach', one);
    await desk.says('finding.note', { findingId, boatId, entryId, ...found, text: 'soft' });
    await desk.says('sound.note', { soundId, boatId, entryId, place: { number: 8 }, known: 'probed' });
    expect(shop.row('finding', findingId)).toMatchObject({ boatId, stageId });
    await desk.says('entry.amend', move());
    for (const row of [
      shop.row('photo', one.photoId),
      shop.row('finding', findingId),
      shop.row('sound', soundId),
    ]) {
      expect(row).toMatchObject({ boatId: otherId, stageId: null });
    }
  });

  it('has a photo that comes after the move, or in the same batch before it, lie where it lies', async () => {
    const [before, after] = [photo(), photo()];
    desk.does('photo.attach', before);
    desk.does('entry.amend', move());
    await desk.sends();
    await desk.says('photo.attach', after);
    for (const { photoId } of [before, after])
      expect(shop.row('photo', photoId)).toMatchObject({ boatId: otherId });
  });

  it('leaves what was noted by itself where it is', async () => {
    const { entryId: _entryId, ...alone } = photo();
    await desk.says('photo.attach', alone);
    await desk.says('entry.amend', move());
    expect(shop.row('photo', alone.photoId)).toMatchObject({ boatId, stageId });
  });

  it('takes them along on its own phone before anything is sent', async () => {
    const [sent, held] = [photo(), photo()];
    await desk.says('photo.attach', sent);
    const ops = [desk.does('photo.attach', held), desk.does('entry.amend', move())];
    const facts = (at: string) => ({
      orderedAt: at,
      orderedOn: TODAY,
      receivedAt: null,
      receivedOn: null,
      roles: ['foreman' as const],
    });
    const heldOps: HeldOp[] = ops.map((op) => ({ op, facts: facts(op.at) }));
    const row = shop.row('photo', sent.photoId) as FollowerRow;
    const shown = replay(
      heldOps,
      (ref) => shop.store.row(ref.entity, ref.id),
      () => [{ entity: 'photo', row }],
    );
    const boats = [sent, held].map(({ photoId }) => (shown.get(`photo/${photoId}`)?.row as Row).boatId);
    expect(boats).toEqual([otherId, otherId]);
  });
});

describe('what is noted with an entry', () => {
  it('is amended without a word of the entry', async () => {
    const one = photo();
    await desk.says('photo.attach', one);
    const set = { caption: 'port side', boatId: otherId };
    expect(await desk.says('photo.amend', { photoId: one.photoId, set })).toMatchObject({ outcome: 'kept' });
    expect(shop.row('photo', one.photoId)).toMatchObject({ caption: 'port side', boatId, stageId });
    expect(await desk.says('photo.strike', { photoId: one.photoId, why: 'blurred' })).toMatchObject({
      outcome: 'kept',
    });
  });

  it('lies where the entry lies whichever is said first, that it moves or that its entry does', async () => {
    const photos = [photo(), photo()];
    for (const one of photos) desk.does('photo.attach', one);
    await desk.sends();
    const moves = ({ photoId }: { photoId: string }) =>
      desk.does('photo.amend', { photoId, set: { boatId, stageId } });
    moves(photos[0]!);
    desk.does('entry.amend', move());
    moves(photos[1]!);
    await desk.sends();
    for (const { photoId } of photos)
      expect(shop.row('photo', photoId)).toMatchObject({ boatId: otherId, stageId: null });
    expect(shop.looseEnds()).toEqual([]);
  });
});

it('a photo of an entry that is not here waits for it', async () => {
  const early = { ...photo(), entryId: shop.newId() };
  expect(await desk.says('photo.attach', early)).toMatchObject({ reason: 'no-such-row' });
  const entry = {
    entryId: early.entryId,
    boatId: otherId,
    workDate: TODAY,
    text: 'late',
    spoken: false,
    hours: [],
  };
  await desk.says('entry.write', entry);
  expect(shop.row('photo', early.photoId)).toMatchObject({ boatId: otherId, stageId: null, arrived: null });
});
