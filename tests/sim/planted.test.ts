import { afterEach, describe, expect, test, vi } from 'vitest';
import { MemoryStore } from '#shared/sync/memory-store.ts';
import type { Row } from '#shared/sync/row.ts';
import { formatStamp } from '#shared/sync/stamp.ts';
import { DeviceStore } from '#src/replica/device-store.ts';
import { PersonStore } from '#src/replica/person-store.ts';
import { Syncer } from '#src/replica/sync-once.ts';
import { runHistory } from './histories.ts';

// Faults planted in the law and in the phone, one at a time: the simulator's invariants must catch each of them.
const HISTORIES_MAX = 120;
const planted = vi.hoisted(() => ({ fault: '' }));

vi.mock('#shared/sync/over.ts', async (original) => {
  const real = await original<typeof import('#shared/sync/over.ts')>();
  const overFor: typeof real.overFor = (...args) => (planted.fault === 'over' ? {} : real.overFor(...args));
  return { ...real, overFor };
});

vi.mock('#shared/sync/stamp.ts', async (original) => {
  const real = await original<typeof import('#shared/sync/stamp.ts')>();
  const orderAt: typeof real.orderAt = (stamp, deviceId, last, nowMs) => {
    if (planted.fault === 'unclamped' && stamp) return stamp;
    const arrived = planted.fault === 'arrival' ? formatStamp({ ms: nowMs, counter: 0 }, deviceId) : stamp;
    return real.orderAt(arrived, deviceId, last, nowMs);
  };
  return { ...real, orderAt };
});

vi.mock('#shared/sync/items.ts', async (original) => {
  const real = await original<typeof import('#shared/sync/items.ts')>();
  const takeBackItems = <R extends Row>(row: R, ...args: [string[], ...never[]]): R => {
    const isEarly = !real.itemsOf(row).some(({ id }) => args[0].includes(id));
    const isDropped = planted.fault === 'take-back' || (planted.fault === 'early take-back' && isEarly);
    return isDropped ? row : (real.takeBackItems as (...all: unknown[]) => R)(row, ...args);
  };
  return { ...real, takeBackItems };
});

afterEach(() => {
  planted.fault = '';
  vi.restoreAllMocks();
});

/** What the first history that breaks says; null where none does. */
async function caught(): Promise<string | null> {
  for (let seed = 1; seed <= HISTORIES_MAX; seed += 1) {
    try {
      await runHistory(seed);
    } catch (error) {
      console.info(`${planted.fault || 'fault'}: ${(error as Error).message}`);
      return (error as Error).message;
    }
  }
  return null;
}

test('without a fault nothing is caught', async () => {
  for (let seed = 1; seed <= 20; seed += 1) await runHistory(seed);
});

describe('faults in the law', () => {
  test('a change that names nothing it replaces', async () => {
    planted.fault = 'over';
    expect(await caught()).toMatch(/at odds with itself/);
  });

  test('a clock ahead that wins by it', async () => {
    planted.fault = 'unclamped';
    expect(await caught()).toMatch(/do not count when the law says/);
  });

  test('the last to arrive taken for the last to speak', async () => {
    planted.fault = 'arrival';
    expect(await caught()).toMatch(/do not count when the law says/);
  });

  test('a taking back that does nothing', async () => {
    planted.fault = 'take-back';
    expect(await caught()).toMatch(/not to be seen/);
  });

  test('a taking back that holds only where what it takes back has come before', async () => {
    planted.fault = 'early take-back';
    expect(await caught()).toMatch(/depends on the order/);
  });

  test('a repeated op that is received as a new one', async () => {
    vi.spyOn(MemoryStore.prototype, 'readOps').mockResolvedValue(new Map());
    expect(await caught()).toMatch(/have changed|when the law says|depends on the order/);
  });
});

describe('faults in the phone', () => {
  test('ops that leave the outbox before the rows are kept', async () => {
    const { apply } = PersonStore.prototype;
    const { accept } = DeviceStore.prototype;
    let applyLate = async () => {};
    vi.spyOn(PersonStore.prototype, 'apply').mockImplementation(async function (this: PersonStore, pulled) {
      applyLate = async () => void (await apply.call(this, pulled));
      return true;
    });
    vi.spyOn(DeviceStore.prototype, 'accept').mockImplementation(async function (
      this: DeviceStore,
      answered,
    ) {
      const late = applyLate;
      await accept.call(this, answered);
      await late();
    });
    expect(await caught()).toMatch(/not to be seen/);
  });

  test('ops that count as sent once they have gone, whatever the answer', async () => {
    const { sync } = Syncer.prototype;
    vi.spyOn(Syncer.prototype, 'sync').mockImplementation(async function (this: Syncer, person) {
      const result = await sync.call(this, person);
      if (result.outcome === 'offline') await forgetOutbox(this);
      return result;
    });
    expect(await caught()).toMatch(/lost|not to be seen|never reached the log/);
  });

  test('a restored server that is sent nothing again', async () => {
    vi.spyOn(DeviceStore.prototype, 'sendAgain').mockResolvedValue();
    expect(await caught()).toMatch(/lost|never reached the log|not to be seen/);
  });
});

async function forgetOutbox(syncer: Syncer): Promise<void> {
  const { device } = (syncer as unknown as { syncing: { device: DeviceStore } }).syncing;
  const nowIso = new Date(device.nowMs()).toISOString();
  await device.accept({
    personId: '',
    ops: device.outbox.map(({ key, op, heldSince }) => ({
      key,
      sent: { op, heldSince, outcome: 'kept', orderedAt: op.at, answeredAt: nowIso },
    })),
    heard: [],
    hasNewRows: false,
    latest: null,
    offsetMs: null,
    backedUpTo: nowIso,
    serverTime: nowIso,
  });
}
