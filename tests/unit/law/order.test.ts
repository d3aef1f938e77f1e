import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { isAdmitted, type SetAsideRow } from '#shared/set-aside/set-aside.ts';
import { canonicalJson } from '#shared/sync/canonical.ts';
import { idFromSha256, isUuid } from '#shared/sync/ids.ts';
import { MemoryStore } from '#shared/sync/memory-store.ts';
import { applyLogged } from '#shared/sync/merge.ts';
import type { Reason } from '#shared/sync/op.ts';
import type { LoggedOp } from '#shared/sync/store.ts';
import { historyOf, live } from '#tests/worlds/random-history.ts';
import type { ShopInMemory } from '#tests/worlds/shop-in-memory.ts';

// Goal: rows are a pure function of ops and receipt facts, whatever the order of arrival (law 4).
// Method: histories drawn by lot are lived through with real phones; then only the logged ops with their facts are
// kept, shuffled, cut into batches of any size, and applied to an empty record, which must come out the same.

const HISTORIES = 2_000;
const STEPS_MAX = 60;
const SEED = 20260601;
const ORDERS_PER_HISTORY = 3;

function setAsideOf(shop: ShopInMemory, { key }: LoggedOp): SetAsideRow | undefined {
  return shop.store.row('setAside', isUuid(key) ? key : idFromSha256(key)) as SetAsideRow | undefined;
}

/** The verdict on an op as it stands in the end; null where it counts without anybody's admission. */
function verdictOf(shop: ShopInMemory, logged: LoggedOp): Reason | null {
  const row = setAsideOf(shop, logged);
  if (!row || (row.sinceKept && !isAdmitted(row))) return null;
  return row.reason;
}

function factsOf(shop: ShopInMemory): LoggedOp[] {
  return [...shop.store.ops.values()].map((logged) => ({
    ...logged,
    reason: verdictOf(shop, logged),
    outcome: 'kept',
  }));
}

/** Set aside for a while only: until a row came, or as a dismissal of what was set aside for a while. */
function isPassing(row: SetAsideRow): boolean {
  if (row.sinceKept && !isAdmitted(row)) return true;
  return row.reason === 'no-such-row' && (row.op as { kind: string }).kind === 'setAside.dismiss';
}

function lasting(store: MemoryStore): Record<string, string> {
  const rows = Object.entries(store.snapshot()).filter(([key, row]) => {
    return row !== null && !(key.startsWith('setAside/') && isPassing(row as SetAsideRow));
  });
  return Object.fromEntries(rows.map(([key, row]) => [key, canonicalJson(row)]));
}

async function applied(shop: ShopInMemory, batches: LoggedOp[][]): Promise<MemoryStore> {
  const store = new MemoryStore();
  for (const person of shop.all('person')) store.put('person', person.id, person);
  for (const batch of batches) await applyLogged(store, shop.id, batch);
  return store;
}

function inBatches(facts: LoggedOp[], sizes: number[]): LoggedOp[][] {
  const batches: LoggedOp[][] = [];
  for (let from = 0, turn = 0; from < facts.length; turn += 1) {
    const size = sizes[turn % sizes.length]!;
    batches.push(facts.slice(from, from + size));
    from += size;
  }
  return batches;
}

// what lots say of an order: a key to sort each op by, and the sizes of the batches
const order = fc.record({
  keys: fc.array(fc.nat(), { minLength: STEPS_MAX + 10, maxLength: STEPS_MAX + 10, size: 'max' }),
  sizes: fc.array(fc.integer({ min: 1, max: 12 }), { minLength: 1, maxLength: 5 }),
});

function shuffled(facts: LoggedOp[], keys: number[]): LoggedOp[] {
  const keyed = facts.map((logged, index) => ({ logged, key: keys[index % keys.length]! }));
  return keyed.sort((a, b) => a.key - b.key).map(({ logged }) => logged);
}

describe('every order of arrival', () => {
  const met = {
    ops: 0,
    looseEnds: 0,
    struckAndChanged: 0,
    admitted: 0,
    sinceKept: 0,
    twice: 0,
    notEntitled: 0,
    idReused: 0,
    revoked: 0,
  };

  function count(shop: ShopInMemory): void {
    const [ends, aside] = [shop.looseEnds(), shop.all('setAside')];
    met.ops += shop.store.ops.size;
    met.looseEnds += ends.filter(({ kind }) => kind === 'field').length;
    met.struckAndChanged += ends.filter(({ kind }) => kind === 'struck-and-changed').length;
    met.admitted += aside.filter((row) => row.sinceKept && isAdmitted(row)).length;
    met.sinceKept += aside.filter(({ state }) => state === 'since-kept').length;
    met.twice += shop.all('task').filter(({ twice }) => twice).length;
    met.notEntitled += aside.filter(({ reason }) => reason === 'not-entitled').length;
    met.idReused += aside.filter(({ reason }) => reason === 'id-reused').length;
    met.revoked += aside.filter(({ reason }) => reason === 'device-revoked').length;
  }

  it('gives the same rows, with the receipt facts held', async () => {
    const orders = fc.array(order, { minLength: ORDERS_PER_HISTORY, maxLength: ORDERS_PER_HISTORY });
    await fc.assert(
      fc.asyncProperty(historyOf(STEPS_MAX), orders, async (steps, permutations) => {
        const shop = await live(steps);
        count(shop);
        const facts = factsOf(shop);
        const rows = lasting(shop.store);
        expect(lasting(await applied(shop, [facts]))).toEqual(rows);
        for (const { keys, sizes } of permutations) {
          const store = await applied(shop, inBatches(shuffled(facts, keys), sizes));
          expect(lasting(store)).toEqual(rows);
        }
      }),
      { numRuns: HISTORIES, seed: SEED },
    );
  }, 400_000);

  it('and the histories held what can go wrong', () => {
    expect(met.ops).toBeGreaterThan(10 * HISTORIES);
    for (const [what, times] of Object.entries(met)) expect(times, what).toBeGreaterThan(100);
  });
});
