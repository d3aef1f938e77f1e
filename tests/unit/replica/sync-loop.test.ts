import { afterEach, describe, expect, test, vi } from 'vitest';
import { backOffMs, hearHails } from '#src/replica/hails.ts';
import { startSyncLoop } from '#src/replica/sync-loop.ts';
import { GOOD_NETWORK, ringAll, type Tab } from '#tests/worlds/phone.ts';
import { PEOPLE, entryData, openShop, openTab, signIn } from '#tests/worlds/signed-in-phone.ts';

const OFFLINE = { ...GOOD_NETWORK, isUp: false };
/** How long a request may take. */
const ANSWER_MAX_MS = 20_000;
const stops: (() => void)[] = [];
afterEach(() => stops.splice(0).forEach((stop) => stop()));

function start(tab: Tab) {
  stops.push(startSyncLoop(tab.replica, tab.world));
}

async function openLooping() {
  const shop = await openShop();
  const phone = shop.newPhone();
  const tab = await openTab(phone, 'Ned');
  start(tab);
  await vi.waitFor(() => expect(tab.replica.syncState().phase).toBe('idle'));
  const hold = () => tab.replica.hold('entry.write', entryData(tab.replica.newId(), shop));
  return { shop, phone, tab, hold };
}

describe('the loop', () => {
  test('sends what is held without being asked', async () => {
    const { tab, hold } = await openLooping();
    await hold();
    await vi.waitFor(() => expect(tab.replica.syncState()).toMatchObject({ phase: 'idle', heldOps: 0 }));
  });

  test('tries again by its own timer, whatever the browser thinks of the network', async () => {
    const { phone, tab, hold } = await openLooping();
    phone.network = OFFLINE;
    await hold();
    await vi.waitFor(() => expect(tab.replica.syncState().phase).toBe('offline'));
    phone.network = GOOD_NETWORK;
    await vi.waitFor(() => {
      ringAll(tab.timers);
      expect(tab.replica.syncState()).toMatchObject({ phase: 'idle', heldOps: 0 });
    });
  });

  test('tries at once when signal or the person comes back', async () => {
    const { phone, tab, hold } = await openLooping();
    phone.network = OFFLINE;
    await hold();
    await vi.waitFor(() => expect(tab.replica.syncState().phase).toBe('offline'));
    phone.network = GOOD_NETWORK;
    tab.wake();
    await vi.waitFor(() => expect(tab.replica.syncState()).toMatchObject({ phase: 'idle', heldOps: 0 }));
  });

  test('waits longer after each failure', async () => {
    const { phone } = await openLooping();
    // the first tab listens for hails, so what waits in this one are rounds
    const other = await openTab(phone);
    start(other);
    await vi.waitFor(() => expect(other.timers).toHaveLength(1));
    phone.network = OFFLINE;
    const waits: number[] = [];
    for (let tries = 1; tries <= 3; tries += 1) {
      ringAll(other.timers);
      await vi.waitFor(() => expect(other.timers.filter(({ ms }) => ms !== ANSWER_MAX_MS)).toHaveLength(1));
      waits.push(other.timers[0]!.ms);
    }
    waits.forEach((ms, index) => {
      expect(ms).toBeGreaterThanOrEqual(1000 * 2 ** index);
      expect(ms).toBeLessThan(2000 * 2 ** index);
    });
  });

  test('rests while a sign-in is needed, and begins again with it', async () => {
    const { shop, tab, hold } = await openLooping();
    shop.server.isEveryoneSignedOut = true;
    await hold();
    await vi.waitFor(() => expect(tab.replica.syncState().phase).toBe('sign-in-needed'));
    await signIn(tab, 'Ned');
    await vi.waitFor(() => expect(tab.replica.syncState()).toMatchObject({ phase: 'idle', heldOps: 0 }));
  });

  test('shows a new day when it begins', async () => {
    const { shop, tab } = await openLooping();
    expect(tab.replica.view().today).toBe('2026-06-01');
    let told = 0;
    tab.replica.subscribe(() => (told += 1));
    shop.clock.advance(86_400_000);
    tab.replica.noticeDay();
    expect(told).toBe(1);
    expect(tab.replica.view().today).toBe('2026-06-02');
  });

  test('hears the others at a hail', async () => {
    const { shop, phone, tab } = await openLooping();
    let hail = (_text: string) => {};
    const answer = shop.server.answer.bind(shop.server);
    shop.server.answer = async (asked, jar) => {
      if (asked.path !== '/api/events') return answer(asked, jar);
      const encoder = new TextEncoder();
      const body = new ReadableStream<Uint8Array>({
        start: (controller) => void (hail = (text) => controller.enqueue(encoder.encode(text))),
      });
      return new Response(body);
    };
    phone.network = GOOD_NETWORK;
    ringAll(tab.timers);
    await vi.waitFor(() => expect(tab.replica.syncState().phase).toBe('idle'));
    await shop.replica.hold('entry.write', entryData(shop.replica.newId(), shop));
    await shop.replica.syncNow();
    await vi.waitFor(() => {
      hail('event: changed\ndata: {"seq": 9}\n\n');
      expect(tab.replica.view().all('entry')).toHaveLength(1);
    });
    expect(tab.replica.session.current()!.personId).toBe(PEOPLE.Ned);
  });
});

describe('hails', () => {
  function streamOf(...parts: string[]): Response {
    return new Response(new Blob(parts).stream());
  }

  test('only an event that something changed is one', async () => {
    const onHail = vi.fn();
    const text =
      ': still here\n\nevent: changed\ndata: {"seq": 4}\n\nevent: other\ndata: {}\n\nevent: changed\r\ndata: {}\r\n\r\n';
    expect(await hearHails(async () => streamOf(text), onHail, new AbortController().signal)).toBe('ended');
    expect(onHail).toHaveBeenCalled();
  });

  test('one that comes in pieces is heard once it is whole', async () => {
    const onHail = vi.fn();
    const pieces = ['event: cha', 'nged\nda', 'ta: {"seq": 4}\n', '\n'];
    const body = new ReadableStream<Uint8Array>({
      start(controller) {
        for (const piece of pieces) controller.enqueue(new TextEncoder().encode(piece));
        controller.close();
      },
    });
    await hearHails(async () => new Response(body), onHail, new AbortController().signal);
    expect(onHail).toHaveBeenCalledTimes(1);
  });

  test('a refusal and a broken way are told apart', async () => {
    const { signal } = new AbortController();
    expect(
      await hearHails(
        async () => new Response(null, { status: 503 }),
        () => {},
        signal,
      ),
    ).toBe('refused');
    expect(
      await hearHails(
        () => Promise.reject(new TypeError('gone')),
        () => {},
        signal,
      ),
    ).toBe('unreachable');
  });

  test('waits are doubled up to five minutes, and differ between devices', () => {
    expect([1, 2, 3].map((tries) => backOffMs(tries, { random: () => 0 }))).toEqual([1000, 2000, 4000]);
    expect(backOffMs(99, { random: () => 0 })).toBe(150_000);
    expect(backOffMs(99, { random: () => 0.999 })).toBeLessThan(300_000);
  });
});
