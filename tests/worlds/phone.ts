import { IDBFactory } from 'fake-indexeddb';
import { openReplica, type LiveReplica } from '#src/replica/live-replica.ts';
import type { StorageKeeping, World } from '#src/replica/world.ts';
import type { CookieJar, MemoryServer } from './memory-server.ts';
import { preparedAsItIs } from './prepared-picture.ts';
import { Power, PowerCut, poweredIndexedDB } from './power.ts';
import { Seeded } from './seeded.ts';
import { TabChannels, TabLocks } from './tabs.ts';

/** What befalls a request, each as likely as its share says. */
export interface Network {
  isUp: boolean;
  losesRequest: number;
  losesAnswer: number;
  /** the request comes twice, as when something between sends it again */
  repeats: number;
  /** neither way comes through, and nothing says so */
  hangs: number;
}

export const GOOD_NETWORK: Network = { isUp: true, losesRequest: 0, losesAnswer: 0, repeats: 0, hangs: 0 };

export interface Tab {
  replica: LiveReplica;
  power: Power;
  world: World;
  /** what waits for time to pass */
  timers: Timer[];
  /** as when signal comes back, or the person does */
  wake: () => void;
}

export interface Timer {
  ms: number;
  work: () => void;
}

/** A phone: one browser with its storage, a clock that may be wrong, and a network that may be worse. */
export class Phone {
  readonly label: string;
  readonly indexedDB = new IDBFactory();
  readonly jar: CookieJar = { deviceId: null };
  readonly lots: Seeded;
  network: Network = GOOD_NETWORK;
  /** how far its clock is ahead of the world's, in milliseconds */
  aheadMs = 0;
  hasLocks = true;
  /** null is a browser that tells nothing of its room */
  storage: StorageKeeping | null = null;
  tabs: Tab[] = [];
  /** what its code reported as its own mistake */
  readonly reports: unknown[] = [];
  private readonly server: MemoryServer;
  private readonly now: () => number;
  private readonly channels = new TabChannels();
  private readonly locks = new TabLocks();

  constructor(label: string, server: MemoryServer, now: () => number, seed: number) {
    this.label = label;
    this.server = server;
    this.now = now;
    this.lots = new Seeded(seed);
  }

  /** Opens the app; null where the power was cut before it was open, by `arm`. */
  async openTab(arm: (power: Power) => void = () => {}): Promise<Tab | null> {
    const power = new Power();
    arm(power);
    const timers: Timer[] = [];
    const wakers = new Set<() => void>();
    const world = this.world(power, timers, wakers);
    const replica = await untilCut(power, openReplica(world));
    if (!replica) return null;
    const tab = { replica, power, world, timers, wake: () => wakers.forEach((waker) => waker()) };
    this.tabs.push(tab);
    power.atCut(() => (this.tabs = this.tabs.filter((other) => other !== tab)));
    return tab;
  }

  /** Every tab ends as it stands. */
  cutPower(): void {
    for (const { power } of [...this.tabs]) power.cut();
  }

  private world(power: Power, timers: Timer[], wakers: Set<() => void>): World {
    return {
      indexedDB: poweredIndexedDB(this.indexedDB, power),
      fetch: (input, init) => this.fetch(power, timers, String(input), init ?? {}),
      now: () => this.now() + this.aheadMs,
      random: this.lots.next,
      randomBytes: this.lots.bytes,
      locks: this.hasLocks ? this.locks.join(power) : null,
      channel: this.channels.join(power),
      storage: this.storage,
      preparePicture: (file) => preparedAsItIs(file),
      after(ms, work) {
        const timer = { ms, work };
        timers.push(timer);
        return () => {
          if (timers.includes(timer)) timers.splice(timers.indexOf(timer), 1);
        };
      },
      onWake(listener) {
        wakers.add(listener);
        return () => wakers.delete(listener);
      },
      gzip: null,
      timeZone: 'UTC',
      appVersion: '0.0.0-test',
      onBlocked() {},
      report: (error) => power.isOn && !(error instanceof PowerCut) && this.reports.push(error),
    };
  }

  private async fetch(power: Power, timers: Timer[], path: string, init: RequestInit): Promise<Response> {
    const { isUp, losesRequest, losesAnswer, repeats, hangs } = this.network;
    if (!power.pass()) return never();
    await this.delay();
    if (!isUp || this.lots.chance(losesRequest)) throw new TypeError('fetch failed');
    if (this.lots.chance(hangs)) {
      setImmediate(() => ringAll(timers));
      return never();
    }
    const asked = {
      method: init.method ?? 'GET',
      path,
      authorization: new Headers(init.headers).get('Authorization'),
      body: typeof init.body === 'string' ? (JSON.parse(init.body) as unknown) : init.body,
    };
    if (this.lots.chance(repeats)) await this.server.answer(asked, this.jar);
    const response = await this.server.answer(asked, this.jar);
    await this.delay();
    if (!power.pass()) return never();
    if (this.lots.chance(losesAnswer)) throw new TypeError('fetch failed');
    return response;
  }

  private async delay(): Promise<void> {
    for (let turns = this.lots.below(4); turns > 0; turns -= 1) await nextTurn();
  }
}

/** What `work` comes to, or null where the power is cut before. */
export async function untilCut<T>(power: Power, work: Promise<T>): Promise<T | null> {
  // what the cut makes of it is nobody's to hear
  const heard = work.catch((error: unknown) => {
    if (power.isOn) throw error;
    return null;
  });
  const result = await Promise.race([heard, power.off.then(() => null)]);
  return power.isOn ? result : null;
}

export function nextTurn(): Promise<void> {
  return new Promise((resolve) => setImmediate(resolve));
}

/** Lets the time pass that things wait for. */
export function ringAll(timers: Timer[]): void {
  for (const { work } of timers.splice(0)) work();
}

function never(): Promise<never> {
  return new Promise(() => {});
}
