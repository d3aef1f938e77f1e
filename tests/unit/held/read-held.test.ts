import { describe, expect, test } from 'vitest';
import type { Op } from '#shared/sync/op.ts';
import { formatStamp } from '#shared/sync/stamp.ts';
import type { SyncState } from '#src/replica/sync-state.ts';
import { readHeld, readHeldPhotos, readSent, readSetAside } from '#src/routes/held/read-held.ts';
import { sendWords } from '#src/routes/held/send-words.ts';
import { entryBy, MONDAY, shopAtBench, type Bench } from '#tests/unit/alongside/bench.ts';
import type { Hand } from '#tests/worlds/record.ts';
import { SHOP_ID } from '#tests/worlds/record.ts';
import { viewOf } from '#tests/worlds/view.ts';

const HOUR_MS = 3_600_000;

function opOf({ record }: Bench, hand: Hand, kind: string, data: Record<string, unknown>): Op {
  const at = formatStamp({ ms: record.nowMs, counter: 0 }, hand.deviceId);
  return { id: record.newId(), v: 1, kind, at, personId: hand.personId, over: {}, data };
}

function heldView(bench: Bench, hand: Hand, ops: Op[]) {
  const { record } = bench;
  const held = ops.map((op) => ({
    op,
    personId: op.personId,
    heldSince: new Date(record.nowMs).toISOString(),
  }));
  const me = {
    personId: hand.personId,
    name: 'Rosa',
    roles: hand.roles,
    shopId: SHOP_ID,
    deviceId: hand.deviceId,
  };
  return viewOf(record.store, { me, nowMs: record.nowMs + 3 * HOUR_MS, held });
}

describe('what a device holds', () => {
  test('is told in words: what, on which boat, since when, how old', async () => {
    const bench = await shopAtBench();
    const { rosa, boatId, strip, record } = bench;
    const hours = [{ personId: rosa.personId, minutes: 150 }];
    const written = {
      entryId: record.newId(),
      boatId,
      stageId: strip,
      workDate: MONDAY,
      text: 'Took up the king plank',
      spoken: false,
      hours,
    };
    const [line] = readHeld(heldView(bench, rosa, [opOf(bench, rosa, 'entry.write', written)]));
    expect(line).toMatchObject({
      what: 'Entry',
      words: 'Took up the king plank · you 2\u00a01/2\u00a0h',
      where: 'Penny Candle · Strip',
      age: '3 hours',
      whose: null,
    });
  });

  test("names the person where it is another one's of this device", async () => {
    const bench = await shopAtBench();
    const entryId = await entryBy(bench, bench.rosa);
    const op = opOf(bench, bench.wes, 'entry.addTo', {
      entryId,
      additionId: bench.record.newId(),
      text: 'Bag 14',
    });
    const [line] = readHeld(heldView(bench, bench.rosa, [op]));
    expect(line).toMatchObject({
      what: 'Addition to an entry',
      words: 'Bag 14',
      where: 'Penny Candle · Strip',
      whose: 'Wes',
    });
  });

  test('has words for every kind there is, and for one that this version does not know', async () => {
    const { opKinds } = await import('#shared/sync/registry.ts');
    const bench = await shopAtBench();
    const words = (kind: string) =>
      readHeld(heldView(bench, bench.rosa, [opOf(bench, bench.rosa, kind, {})]))[0]!.what;
    expect([...opKinds.keys()].filter((kind) => words(kind).startsWith('Something this version'))).toEqual(
      [],
    );
    expect(words('tide.turn')).toBe('Something this version does not know (tide.turn)');
  });
});

describe('what was set aside', () => {
  test("is the person's own, with the reason in words and what became of it", async () => {
    const bench = await shopAtBench();
    const { record, rosa, wes, orrin } = bench;
    const entryId = await entryBy(bench, rosa);
    await record.say(wes, 'entry.amend', { entryId, set: { text: 'Not mine to say' } });
    expect(readSetAside(record.viewAs(rosa))).toEqual([]);
    const [waiting] = readSetAside(record.viewAs(wes));
    expect(waiting).toMatchObject({
      what: 'Change of an entry',
      reason: 'It is not yours to change. The foreman can admit it or dismiss it.',
      state: 'It does not count yet.',
      isWaiting: true,
    });
    await record.say(orrin, 'setAside.dismiss', { setAsideId: waiting!.id, why: 'Rosa had it right' });
    const [dismissed] = readSetAside(record.viewAs(wes));
    expect(dismissed!.state).toMatch(/^Dismissed by Orrin \d\d:\d\d: Rosa had it right\.$/);
  });
});

test('what was sent tells what became of it, newest answer first, of this person alone', async () => {
  const bench = await shopAtBench();
  const op = opOf(bench, bench.rosa, 'boat.add', { name: 'Teal' });
  const answeredAt = new Date(bench.record.nowMs).toISOString();
  const sent = [
    { op, personId: bench.rosa.personId, outcome: 'loose-end' as const, answeredAt },
    { op, personId: bench.wes.personId, outcome: 'kept' as const, answeredAt },
  ];
  const lines = readSent(bench.record.viewAs(bench.rosa), sent);
  expect(lines).toHaveLength(1);
  expect(lines[0]).toMatchObject({ isLoose: true });
  expect(lines[0]!.became).toContain('loose end');
});

test('photos on their way are told by their boat, with how far they have come', async () => {
  const bench = await shopAtBench();
  const since = new Date(bench.record.nowMs).toISOString();
  const [named, nameless] = ['a'.repeat(64), 'b'.repeat(64)];
  const attach = {
    photoId: bench.record.newId(),
    sha256: named,
    boatId: bench.boatId,
    width: 4,
    height: 3,
    bytes: 9,
  };
  const view = heldView(bench, bench.rosa, [opOf(bench, bench.rosa, 'photo.attach', attach)]);
  const lines = readHeldPhotos(view, [
    { sha256: named, name: 'img_1.jpg', since, state: 'thumb' },
    { sha256: nameless, name: 'img_2.jpg', since, state: 'refused', words: 'This is no picture.' },
  ]);
  expect(lines).toMatchObject([
    { where: 'Penny Candle', became: 'The small picture is sent, the whole one waits.', isRefused: false },
    { where: 'img_2.jpg', isRefused: true },
  ]);
  expect(lines[1]!.became).toContain('This is no picture.');
});

describe('how sending stands', () => {
  const state: SyncState = {
    phase: 'idle',
    heldOps: 0,
    heldPhotos: 0,
    isSendingPhotos: false,
    oldestHeldAt: null,
    lastHeardAt: '2026-05-04T06:40:00.000Z',
    clockAheadMs: null,
    storage: 'unknown',
  };
  const words = (changed: Partial<SyncState>) => sendWords({ ...state, ...changed }, 'Europe/Dublin', MONDAY);

  test('is said with what happens next', () => {
    expect(words({})).toBe('All sent. Last heard 07:40.');
    expect(words({ heldPhotos: 1 })).toBe('It goes by itself. Last heard 07:40.');
    expect(words({ heldOps: 2 })).toBe('It goes by itself. Last heard 07:40.');
    expect(words({ phase: 'offline' })).toBe(
      'No way to the server just now. It is tried again by itself. Last heard 07:40.',
    );
    expect(words({ phase: 'failed', words: 'The server is at work on itself.' })).toContain(
      'The server is at work on itself.',
    );
    expect(words({ phase: 'sign-in-needed' })).toContain('asks for your password again');
  });
});
