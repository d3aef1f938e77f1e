import { IDBFactory } from 'fake-indexeddb';
import { openReplica } from '#src/replica/live-replica.ts';
import type { World } from '#src/replica/world.ts';
import { makeClock } from './clock.ts';
import { Power } from './power.ts';
import { preparedAsItIs } from './prepared-picture.ts';
import { Seeded } from './seeded.ts';
import { TabChannels, TabLocks } from './tabs.ts';

export const ORIGIN = 'http://ribband.test';

/** A replica over the real `fetch`, for tests that stand between it and the network; its timers are rung by hand. */
export async function openNetworked(changes: Partial<World> = {}) {
  const clock = makeClock();
  const power = new Power();
  const lots = new Seeded(1);
  const timers = new Map<() => void, number>();
  const world: World = {
    indexedDB: new IDBFactory(),
    fetch: (path, init) => fetch(new URL(String(path), ORIGIN), init),
    now: clock.now,
    random: lots.next,
    randomBytes: lots.bytes,
    locks: new TabLocks().join(power),
    channel: new TabChannels().join(power),
    storage: null,
    after(ms, work) {
      timers.set(work, ms);
      return () => timers.delete(work);
    },
    onWake: () => () => {},
    gzip: null,
    preparePicture: (file) => preparedAsItIs(file),
    timeZone: 'UTC',
    appVersion: '0.0.0-test',
    onBlocked() {},
    report(error) {
      throw error;
    },
    ...changes,
  };
  const replica = await openReplica(world);
  return { replica, clock, timers, world };
}
