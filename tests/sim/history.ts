import type { MemoryStore } from '#shared/sync/memory-store.ts';
import { makeClock } from '#tests/worlds/clock.ts';
import { MemoryServer } from '#tests/worlds/memory-server.ts';
import { GOOD_NETWORK, Phone, nextTurn, untilCut, type Tab } from '#tests/worlds/phone.ts';
import { Seeded } from '#tests/worlds/seeded.ts';
import { pickAct, type Act } from './acts.ts';
import {
  Broken,
  LogWatch,
  agrees,
  nobodyContradictsThemself,
  nothingIsLost,
  ownIsShown,
  rowsAreOfTheLog,
  showsOwn,
  type Promised,
} from './invariants.ts';

const MINUTE_MS = 60_000;
const DAY_MS = 24 * 60 * MINUTE_MS;
const SHOP_ID = '019e8000-0000-7000-8000-00000000000a';
const POINTS_MAX = 14;
const ROUNDS_MAX = 12;

export interface Tally {
  held: number;
  logged: number;
  setAside: number;
  looseEnds: number;
  cuts: number;
  restores: number;
}

/**
 * One seeded history of a shop: a foreman's phone, a crew member's, and a tablet that two share, with the real phone
 * code on IndexedDB and the real merge. Everything that can go wrong does, and the invariants are demanded after each
 * step; in the end all goes well again and everybody must agree.
 */
export class History {
  readonly tally: Tally = { held: 0, logged: 0, setAside: 0, looseEnds: 0, cuts: 0, restores: 0 };
  readonly steps: string[] = [];
  private readonly lots: Seeded;
  private readonly time = makeClock(Date.parse('2026-06-01T06:00:00Z'));
  private readonly server = new MemoryServer(SHOP_ID, this.time.now);
  private readonly promised: Promised[] = [];
  private readonly watch = new LogWatch();
  private readonly phones: Phone[] = [];
  private readonly names = new Map<Phone, string[]>();
  private readonly hasRestore: boolean;
  private backup: MemoryStore | null = null;
  // ops may have lost the rows or the rights that they were made with
  private isUnsettled = false;

  constructor(seed: number) {
    this.lots = new Seeded(seed);
    this.hasRestore = this.lots.chance(0.2);
    this.server.pageRowsMax = this.lots.pick([3, 10, 1000]);
    const people = { Maud: 'foreman', Ned: 'crew', Orla: 'crew', Piet: 'crew' } as const;
    Object.entries(people).forEach(([name, role], index) => {
      this.server.addPerson(`019e8000-0000-7000-8000-0000000000b${index}`, name, [role]);
    });
    this.addPhone('desk', ['Maud'], seed);
    this.addPhone('phone', ['Ned'], seed + 1);
    this.addPhone('tablet', ['Orla', 'Piet'], seed + 2);
  }

  private addPhone(label: string, names: string[], seed: number): void {
    const phone = new Phone(label, this.server, this.time.now, seed * 7919);
    phone.hasLocks = this.lots.chance(0.8);
    this.phones.push(phone);
    this.names.set(phone, names);
  }

  async run(stepCount: number): Promise<Tally> {
    await this.begin();
    for (let step = 0; step < stepCount; step += 1) {
      await this.step();
      await this.check();
    }
    await this.makeGood();
    const { ops } = this.server.store;
    const ends = this.server.store.feed(0).filter(({ entity, row }) => entity === 'looseEnd' && row);
    const aside = [...ops.values()].filter(({ outcome }) => outcome === 'set-aside');
    return Object.assign(this.tally, { logged: ops.size, setAside: aside.length, looseEnds: ends.length });
  }

  private async begin(): Promise<void> {
    for (const phone of this.phones) {
      const { replica } = (await phone.openTab())!;
      for (const name of this.names.get(phone)!) {
        await this.signIn(replica, name);
        await replica.syncNow();
      }
    }
    const [desk] = this.phones as [Phone];
    const { newId } = desk.tabs[0]!.replica;
    for (const order of [1, 2]) {
      const [boatId, stageId, taskId] = [newId(), newId(), newId()];
      await this.hold(desk, desk.tabs[0]!, { kind: 'boat.add', data: { boatId, name: `Boat ${order}` } });
      const stage = { stageId, boatId, name: 'Strip', order, after: [] };
      await this.hold(desk, desk.tabs[0]!, { kind: 'stage.add', data: stage });
      await this.hold(desk, desk.tabs[0]!, {
        kind: 'task.add',
        data: { taskId, boatId, stageId, title: 'Number the ribs' },
      });
    }
    for (const { tabs } of this.phones) await tabs[0]!.replica.syncNow();
  }

  private async signIn(replica: Tab['replica'], name: string): Promise<void> {
    const request = { email: `${name}@ribband.test`, password: 'tallow', label: 'a device' };
    const result = await replica.session.signIn(request);
    if (!('ok' in result) && !('offline' in result))
      throw new Broken(`${name} could not sign in: ${JSON.stringify(result)}`);
  }

  private async step(): Promise<void> {
    const phone = this.lots.pick(this.phones);
    const happenings: Record<string, [number, () => Promise<unknown> | void]> = {
      act: [30, () => this.act(phone)],
      sync: [16, () => this.sync(this.lots.pick(phone.tabs))],
      actAndCut: [6, () => this.cutDuring(phone, () => this.act(phone))],
      syncAndCut: [8, () => this.cutDuring(phone, () => this.sync(this.lots.pick(phone.tabs)))],
      cut: [2, () => phone.cutPower()],
      wait: [6, () => this.time.advance(this.lots.pick([MINUTE_MS, 10 * MINUTE_MS, 60 * MINUTE_MS, DAY_MS]))],
      setClock: [2, () => void (phone.aheadMs = this.lots.pick([0, -DAY_MS, 365 * DAY_MS, 1.5 * MINUTE_MS]))],
      changeNetwork: [7, () => this.changeNetwork(phone)],
      everybody: [6, () => Promise.all(this.phones.flatMap((each) => this.actAndSync(each)))],
      openTab: [phone.tabs.length < 2 ? 4 : 0, () => phone.openTab()],
      tabsTogether: [
        phone.tabs.length > 1 ? 20 : 0,
        () => Promise.all(phone.tabs.flatMap((tab) => [this.act(phone, tab), this.sync(tab)])),
      ],
      changePerson: [3, () => this.changePerson(phone)],
      endTokens: [1, () => this.server.endTokens()],
      changeRoles: [0.3, () => this.changeRoles()],
      backUp: [this.hasRestore ? 4 : 0, () => void (this.backup = this.server.backUp())],
      restore: [this.backup ? 3 : 0, () => this.restore()],
    };
    const name = this.lots.weighted(
      Object.fromEntries(Object.entries(happenings).map(([key, [weight]]) => [key, weight])),
    );
    this.steps.push(`${name} ${phone.label}`);
    this.time.advance(this.lots.below(3000));
    await happenings[name]![1]();
    for (const each of this.phones) if (each.tabs.length === 0) await this.reopen(each);
  }

  private async act(phone: Phone, tab = this.lots.pick(phone.tabs)): Promise<void> {
    const act = pickAct({ view: tab.replica.view(), lots: this.lots, newId: tab.replica.newId });
    if (act) await this.hold(phone, tab, act);
  }

  private async hold(
    phone: Phone,
    { replica, power }: Tab,
    { kind, data, isBarred = false }: Act,
  ): Promise<void> {
    const op = await untilCut(power, replica.hold(kind, data));
    if (!op) return;
    this.tally.held += 1;
    this.promised.push({ op, phone, isBarred });
    if (!isBarred && !this.isUnsettled) showsOwn(replica, op, phone.label);
  }

  private async sync({ replica, power }: Tab): Promise<void> {
    await untilCut(power, replica.syncNow());
  }

  private actAndSync(phone: Phone): Promise<void>[] {
    const tab = this.lots.pick(phone.tabs);
    return [this.act(phone, tab), this.sync(tab)];
  }

  private async cutDuring(phone: Phone, work: () => Promise<void>): Promise<void> {
    const points = this.lots.below(POINTS_MAX);
    for (const { power } of phone.tabs) power.cutAfter(points);
    await work();
    for (const { power } of phone.tabs) power.disarm();
  }

  // a phone that died is opened again on what it had stored, and may die while it opens
  private async reopen(phone: Phone): Promise<void> {
    this.tally.cuts += 1;
    if (this.lots.chance(0.2)) await phone.openTab((power) => power.cutAfter(this.lots.below(8)));
    while (phone.tabs.length === 0) await phone.openTab();
    for (const { power } of phone.tabs) power.disarm();
  }

  private changeNetwork(phone: Phone): void {
    const bad = { losesRequest: 0.2, losesAnswer: 0.3, repeats: 0.2, hangs: 0.1 };
    phone.network = this.lots.pick([
      GOOD_NETWORK,
      { ...GOOD_NETWORK, isUp: false },
      { ...GOOD_NETWORK, ...bad },
    ]);
  }

  private async changePerson(phone: Phone): Promise<void> {
    const { replica, power } = this.lots.pick(phone.tabs);
    await untilCut(power, this.signIn(replica, this.lots.pick(this.names.get(phone)!)));
  }

  private changeRoles(): void {
    const [id] = [...this.server.people.values()]
      .filter(({ name }) => name === 'Ned')
      .map((person) => person.id);
    this.server.changePerson(id!, { roles: this.lots.pick([['crew'], ['crew', 'foreman'], ['office']]) });
    this.isUnsettled = true;
  }

  private restore(): void {
    this.server.restore(this.backup!);
    this.backup = null;
    this.watch.forget();
    this.isUnsettled = true;
    this.tally.restores += 1;
  }

  private async check(): Promise<void> {
    // tabs hear of each other in turns of their own
    const isShared = this.phones.some(({ tabs }) => tabs.length > 1);
    for (let turns = isShared ? 60 : 0; turns > 0; turns -= 1) await nextTurn();
    nothingIsLost(this.promised, this.server);
    if (!this.isUnsettled) ownIsShown(this.promised);
    const deviceOf = new Map(this.promised.map(({ op }) => [op.id, op.at.slice(-36)]));
    nobodyContradictsThemself(this.phones, (opId) => deviceOf.get(opId));
    this.watch.check(this.server);
    for (const { label, reports } of this.phones) {
      if (reports.length > 0) throw new Broken(`${label} reports ${String(reports[0])}`);
    }
  }

  /** Signal for all, until nobody has anything new to say or to hear; then everybody must agree. */
  private async makeGood(): Promise<void> {
    for (const phone of this.phones) phone.network = GOOD_NETWORK;
    for (let round = 0, seq = -1; seq !== this.server.store.seq; round += 1) {
      if (round === ROUNDS_MAX) throw new Broken('the phones and the server do not come to rest');
      seq = this.server.store.seq;
      await this.everybodySyncs(() => {});
    }
    await this.everybodySyncs((phone, { replica }) => agrees(replica.view(), this.server, phone.label));
    await this.check();
    rowsAreOfTheLog(this.server);
    const missing = this.promised.filter(({ op }) => !this.server.store.ops.has(op.id));
    if (missing.length > 0)
      throw new Broken(`${missing.length} ops never reached the log, such as ${missing[0]!.op.kind}`);
  }

  private async everybodySyncs(then: (phone: Phone, tab: Tab) => void): Promise<void> {
    for (const phone of this.phones) {
      for (const name of this.names.get(phone)!) {
        await this.signIn(phone.tabs[0]!.replica, name);
        for (const tab of phone.tabs) {
          await tab.replica.session.load();
          const { outcome } = await tab.replica.syncNow();
          if (outcome !== 'done') throw new Broken(`${phone.label} cannot sync: ${outcome}`);
          then(phone, tab);
        }
      }
    }
  }
}
