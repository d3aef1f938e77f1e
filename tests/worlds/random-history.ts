import fc from 'fast-check';
import type { Role } from '#shared/identity/role.ts';
import { opKinds } from '#shared/sync/registry.ts';
import { ShopInMemory, type Phone } from './shop-in-memory.ts';

// Histories drawn by lot: what five devices do, hear and send, in any order, knowing only what each has heard. Ids are
// picked from all that were ever given out, so that ops also arrive before the rows that they are about.

export interface Step {
  device: number;
  act: keyof typeof ACTS;
  a: number;
  b: number;
  c: number;
}

const DAYS = ['2026-05-30', '2026-05-31', '2026-06-01'];
const KINDS = [undefined, null, 'agreed', 'extra', 'waiting'];
const ROLES: Role[][] = [['crew'], ['foreman'], ['office'], ['owner'], ['crew', 'owner']];
const AHEAD_MS = [0, 0, -86_400_000, 200_000, 31_536_000_000];

class History {
  readonly shop = new ShopInMemory();
  readonly people = ROLES.map((roles, index) => this.shop.person(`Person ${index}`, ...roles));
  readonly phones: Phone[];
  readonly ids = {
    boat: [] as string[],
    stage: [] as string[],
    task: [] as string[],
    entry: [] as string[],
    sound: [] as string[],
    item: [] as string[],
  };
  readonly opIds: string[] = [];
  /** what ops have made, and how often: which of two stands is a receipt fact, so nobody decides about either */
  readonly madeBy = new Map<string, string>();
  private readonly uses = new Map<string, number>();
  private readonly decided = new Set<string>();

  constructor() {
    const { shop, people } = this;
    // the last is a tablet that two share
    const enrolled = [[0], [1], [2], [3], [4, 0]];
    this.phones = enrolled.map((indexes) => shop.phone(...indexes.map((index) => people[index]!)));
    for (const kind of ['boat', 'stage', 'task', 'entry', 'sound', 'item'] as const)
      this.ids[kind].push(shop.newId(), shop.newId());
  }

  pick<T>(all: readonly T[], lot: number): T {
    return all[Math.floor(lot) % all.length]!;
  }

  /** The id of something new; now and then one that has been given out, which is its first use or a second. */
  fresh(kind: keyof History['ids'], lot: number): string {
    const known = this.pick(this.ids[kind], lot / 3);
    if (lot % 3 === 0 && !this.decided.has(known)) return known;
    const id = this.shop.newId();
    this.ids[kind].push(id);
    return id;
  }

  does(step: Omit<Step, 'act'>, kind: string, data: Record<string, unknown>): void {
    const phone = this.phones[step.device]!;
    const as = this.pick(phone.personIds, step.c);
    const isBlind = step.c % 11 === 0;
    const over = isBlind
      ? Object.fromEntries(['text', 'struck', 'title', 'stageId'].map((field) => [field, this.someOps(step)]))
      : undefined;
    const op = phone.does(kind, data, { as, ...(over ? { over } : {}) });
    this.opIds.push(op.id);
    const made = madeId(kind, data);
    if (made) this.madeBy.set(op.id, made);
    if (made) this.uses.set(made, (this.uses.get(made) ?? 0) + 1);
  }

  mayDecide(opId: string): boolean {
    const made = this.madeBy.get(opId);
    if (made) this.decided.add(made);
    return !made || this.uses.get(made) === 1;
  }

  private someOps({ a, b }: Omit<Step, 'act'>): string[] {
    return this.opIds.length > 0 ? [...new Set([a, b, a + b].map((lot) => this.pick(this.opIds, lot)))] : [];
  }
}

/** The id of the row or item that an op makes. */
function madeId(kind: string, data: Record<string, unknown>): string | undefined {
  const found = opKinds.get(kind)!;
  return found.makes ? found.rowId(data) : found.itemId?.(data);
}

type Act = (history: History, step: Step) => void | Promise<unknown>;

const hours = ({ people }: History, { a, b, c }: Step) => [
  { personId: people[a % people.length]!, minutes: (b % 4) * 30, kind: KINDS[c % KINDS.length] },
];

const ENTRY_SETS: ((history: History, step: Step) => object)[] = [
  (_history, { b }) => ({ text: `words ${b}` }),
  (_history, { b }) => ({ text: `words ${b % 2}`, workDate: DAYS[b % DAYS.length] }),
  (_history, { b }) => ({ place: b % 3 === 0 ? null : { side: 'port', number: b % 5 } }),
  (history, step) => ({ hours: hours(history, step) }),
  (history, { b }) => ({ stageId: history.pick(history.ids.stage, b) }),
  (history, { b }) => ({ boatId: history.pick(history.ids.boat, b) }),
];

const ACTS = {
  boat: (history, step) =>
    history.does(step, 'boat.add', { boatId: history.fresh('boat', step.a), name: `Boat ${step.b}` }),
  nameBoat: (history, step) =>
    history.does(step, 'boat.amend', {
      boatId: history.pick(history.ids.boat, step.a),
      set: { name: `Boat ${step.b}` },
    }),
  stage: (history, step) => {
    const [boatId, after] = [
      history.pick(history.ids.boat, step.b),
      step.c % 3 ? [] : [history.pick(history.ids.stage, step.b)],
    ];
    history.does(step, 'stage.add', {
      stageId: history.fresh('stage', step.a),
      boatId,
      name: 'Strip',
      order: step.b,
      after,
    });
  },
  task: (history, step) => {
    const [boatId, stageId] = [
      history.pick(history.ids.boat, step.b),
      history.pick(history.ids.stage, step.c),
    ];
    history.does(step, 'task.add', {
      taskId: history.fresh('task', step.a),
      boatId,
      stageId,
      title: `Task ${step.b}`,
    });
  },
  nameTask: (history, step) =>
    history.does(step, 'task.amend', {
      taskId: history.pick(history.ids.task, step.a),
      set: { title: `Task ${step.b}` },
    }),
  write: (history, step) => {
    const boatId = history.pick(history.ids.boat, step.b);
    const stageId = step.c % 2 ? null : history.pick(history.ids.stage, step.c);
    const said = {
      workDate: DAYS[step.b % 3],
      text: `words ${step.b}`,
      spoken: false,
      hours: hours(history, step),
    };
    history.does(step, 'entry.write', { entryId: history.fresh('entry', step.a), boatId, stageId, ...said });
  },
  amend: (history, step) => {
    const set = history.pick(ENTRY_SETS, step.c)(history, step);
    history.does(step, 'entry.amend', { entryId: history.pick(history.ids.entry, step.a), set, why: 'so' });
  },
  note: (history, step) => {
    const [boatId, entryId] = [
      history.pick(history.ids.boat, step.b),
      history.pick(history.ids.entry, step.c),
    ];
    const said = { place: { side: 'port' }, known: 'probed', text: `sound ${step.b}` };
    const soundId = history.fresh('sound', step.a);
    history.does(step, 'sound.note', { soundId, boatId, ...said, ...(step.c % 4 ? { entryId } : {}) });
  },
  amendNote: (history, step) => {
    const moved =
      step.c % 3
        ? { stageId: history.pick(history.ids.stage, step.b) }
        : { boatId: history.pick(history.ids.boat, step.b) };
    const set = step.c % 2 ? { text: `sound ${step.b}` } : moved;
    history.does(step, 'sound.amend', { soundId: history.pick(history.ids.sound, step.a), set });
  },
  strike: (history, step) =>
    history.does(step, 'entry.strike', {
      entryId: history.pick(history.ids.entry, step.a),
      why: `because ${step.b}`,
    }),
  restore: (history, step) =>
    history.does(step, 'entry.restore', {
      entryId: history.pick(history.ids.entry, step.a),
      why: `after all ${step.b}`,
    }),
  strikeTask: (history, step) =>
    history.does(step, 'task.strike', { taskId: history.pick(history.ids.task, step.a), why: 'so' }),
  addTo: (history, step) => {
    const [entryId, additionId] = [history.pick(history.ids.entry, step.a), history.fresh('item', step.b)];
    history.does(step, 'entry.addTo', { entryId, additionId, text: `more ${step.b}` });
  },
  takeBack: (history, step) => {
    const [entryId, additionId] = [
      history.pick(history.ids.entry, step.a),
      history.pick(history.ids.item, step.b),
    ];
    history.does(step, 'entry.takeBack', { entryId, additionIds: [additionId] });
  },
  mark: (history, step) => {
    const [taskId, markId] = [history.pick(history.ids.task, step.a), history.fresh('item', step.b)];
    history.does(step, 'task.mark', { taskId, markId, workDate: DAYS[step.c % 3] });
  },
  unmark: (history, step) => {
    const [taskId, markId] = [history.pick(history.ids.task, step.a), history.pick(history.ids.item, step.b)];
    history.does(step, 'task.unmark', { taskId, markIds: [markId] });
  },
  start: (history, step) =>
    history.does(step, 'task.start', {
      taskId: history.pick(history.ids.task, step.a),
      startId: history.fresh('item', step.b),
    }),
  decide: (history, step) => {
    const setAsideId = history.pick(history.opIds, step.a);
    if (!setAsideId || !history.mayDecide(setAsideId)) return;
    const kind = step.c % 3 ? 'setAside.admit' : 'setAside.dismiss';
    history.does({ ...step, device: 1 }, kind, { setAsideId, why: `${step.b}` });
  },
  send: (history, step) => history.phones[step.device]!.sends(),
  sendBackwards: (history, step) => {
    history.phones[step.device]!.held.reverse();
    return history.phones[step.device]!.sends();
  },
  hear: (history, step) => history.phones[step.device]!.hears(),
  wait: (history, step) => history.shop.clock.advance((step.a % 50) * 1_000_000),
  setClock: (history, step) => {
    history.phones[step.device]!.aheadMs = AHEAD_MS[step.a % AHEAD_MS.length]!;
  },
  changeRoles: (history, step) => {
    history.shop.people.get(history.people[step.a % history.people.length]!)!.roles =
      ROLES[step.b % ROLES.length]!;
  },
  revoke: (history, step) => {
    history.phones[step.device]!.isRevoked = step.a % 2 === 0;
  },
} satisfies Record<string, Act>;

const WEIGHTS: Partial<Record<keyof typeof ACTS, number>> = {
  amend: 8,
  write: 4,
  note: 2,
  amendNote: 2,
  send: 6,
  hear: 2,
  mark: 3,
  decide: 3,
  strike: 2,
};
const lots = fc.nat(10_000);

/** A history of up to `stepsMax` steps, after which everybody sends what they hold. */
export function historyOf(stepsMax: number): fc.Arbitrary<Step[]> {
  const acts = Object.keys(ACTS) as (keyof typeof ACTS)[];
  const weighted = acts.map((act) => ({ weight: WEIGHTS[act] ?? 1, arbitrary: fc.constant(act) }));
  const step = fc.record({ device: fc.nat(4), act: fc.oneof(...weighted), a: lots, b: lots, c: lots });
  return fc.array(step, { maxLength: stepsMax, size: 'max' });
}

/** The shop as it is once a history has been lived through. */
export async function live(steps: Step[]): Promise<ShopInMemory> {
  const history = new History();
  // something to work on, known to nobody else yet
  const first = (device: number) => ({ device, a: 1, b: 1, c: 1 });
  const [boatId, stageId, taskId, entryId] = (['boat', 'stage', 'task', 'entry'] as const).map(
    (kind) => history.ids[kind][0]!,
  );
  history.does(first(1), 'boat.add', { boatId, name: 'Petrel' });
  history.does(first(1), 'stage.add', { stageId, boatId, name: 'Strip', order: 1, after: [] });
  history.does(first(1), 'task.add', { taskId, boatId, stageId, title: 'Fair the keel' });
  const said = {
    workDate: DAYS[2],
    text: 'ribs',
    spoken: false,
    hours: [{ personId: history.people[4], minutes: 60 }],
  };
  history.does(first(0), 'entry.write', { entryId, boatId, stageId, ...said });
  for (const step of steps) await (ACTS[step.act] as Act)(history, step);
  for (const phone of history.phones) await phone.sends();
  return history.shop;
}
