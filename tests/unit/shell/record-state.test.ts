import { describe, expect, test } from 'vitest';
import type { SyncState } from '#src/replica/sync-state.ts';
import { homeFor, placesFor } from '#src/shell/places.ts';
import { readRecordState } from '#src/shell/read-record-state.ts';
import { readWarnings } from '#src/shell/read-warnings.ts';

const TODAY = '2026-05-04';
const HEARD = '2026-05-04T06:40:00.000Z';
const here = {
  timeZone: 'Europe/Dublin',
  today: TODAY,
  device: 'phone',
  nowMs: Date.parse('2026-05-04T12:00:00Z'),
};
const state: SyncState = {
  phase: 'idle',
  heldOps: 0,
  heldPhotos: 0,
  isSendingPhotos: false,
  oldestHeldAt: null,
  lastHeardAt: HEARD,
  clockAheadMs: null,
  storage: 'persistent',
};

describe('the state of the record', () => {
  const bar = (changed: Partial<SyncState>) => readRecordState({ ...state, ...changed }, here);

  test('says that all is sent, and when', () => {
    expect(bar({})).toEqual({ tone: 'quiet', left: 'All sent 07:40', right: null });
  });

  test('says how much is held, and when the server was last heard', () => {
    expect(bar({ heldOps: 3, phase: 'offline' })).toEqual({
      tone: 'held',
      left: '3 held on this phone',
      right: 'last heard 07:40',
    });
  });

  test('counts photos that are not sent beside what is held', () => {
    expect(bar({ heldPhotos: 1 })).toMatchObject({ tone: 'held', left: '1 photo held on this phone' });
    expect(bar({ heldOps: 3, heldPhotos: 2, isSendingPhotos: true })).toMatchObject({
      left: '3 and 2 photos held on this phone',
      right: 'sending …',
    });
  });

  test('never says that all is sent where the server cannot be reached', () => {
    for (const phase of ['offline', 'failed'] as const) expect(bar({ phase }).left).not.toContain('All sent');
  });

  test('asks for the password where the server does, with what waits for it', () => {
    expect(bar({ phase: 'sign-in-needed', heldOps: 1 })).toMatchObject({
      tone: 'warning',
      left: 'Sign in to send',
      right: '1 held on this phone',
    });
  });

  test('says that nothing was heard yet', () => {
    expect(bar({ lastHeardAt: null }).left).toBe('Getting the record …');
  });
});

describe('what is wrong with a device', () => {
  const kinds = (changed: Partial<SyncState>) =>
    readWarnings({ ...state, ...changed }, here).map(({ kind }) => kind);

  test('is nothing where all is well', () => {
    expect(kinds({})).toEqual([]);
  });

  test('is a clock that is wrong, said by how much and which way', () => {
    const [warning] = readWarnings({ ...state, clockAheadMs: 3 * 3_600_000 }, here);
    expect(warning!.words).toMatch(/3 hours ahead/);
    expect(readWarnings({ ...state, clockAheadMs: -600_000 }, here)[0]!.words).toMatch(/10 minutes behind/);
  });

  test('is storage that may be cleared, once what is held has waited a day', () => {
    const held = { heldOps: 1, storage: 'best-effort' as const };
    expect(kinds({ ...held, oldestHeldAt: '2026-05-04T08:00:00Z' })).toEqual([]);
    expect(kinds({ ...held, oldestHeldAt: '2026-05-03T08:00:00Z' })).toEqual(['storage']);
    expect(kinds({ ...held, storage: 'persistent', oldestHeldAt: '2026-05-03T08:00:00Z' })).toEqual([]);
  });

  test('is that the foreman has shut the device out', () => {
    const [warning] = readWarnings({ ...state, isShutOut: true }, here);
    expect(warning!.words).toMatch(/^The foreman has shut this phone out/);
  });

  test('is the gap that a replaced device left', () => {
    const replacedDevice = { label: "Rosa's old phone", lastHeardAt: '2026-04-29T06:50:00.000Z' };
    const [warning] = readWarnings({ ...state, replacedDevice }, here);
    expect(warning!.words).toContain("Rosa's old phone, was last heard Wed 07:50");
  });
});

describe('the places', () => {
  test('are those of all roles that a person has', () => {
    expect(placesFor(['crew']).map(({ to }) => to)).toEqual(['/alongside', '/order', '/plan']);
    expect(placesFor(['crew', 'owner']).map(({ to }) => to)).toEqual([
      '/alongside',
      '/order',
      '/plan',
      '/own-boats',
    ]);
  });

  test('begin where the person works', () => {
    expect(homeFor(['crew'])).toBe('/alongside');
    expect(homeFor(['crew', 'foreman'])).toBe('/day');
    expect(homeFor(['office'])).toBe('/day');
    expect(homeFor(['crew', 'office'])).toBe('/alongside');
    expect(homeFor(['owner'])).toBe('/own-boats');
  });
});
