import type { Role } from '#shared/identity/role.ts';
import { dayAt } from '#shared/sync/day.ts';
import { computedId } from '#shared/sync/ids.ts';
import type { LooseEnd } from '#shared/sync/loose-ends.ts';
import { MemoryStore } from '#shared/sync/memory-store.ts';
import { mergeBatch, type Outcome } from '#shared/sync/merge.ts';
import type { Op } from '#shared/sync/op.ts';
import { fieldsOfSet, overFor } from '#shared/sync/over.ts';
import { opKinds } from '#shared/sync/registry.ts';
import { replay } from '#shared/sync/replay.ts';
import { refKey, type Entity, type Ref, type Row } from '#shared/sync/row.ts';
import type { RowOf } from '#shared/sync/rows.ts';
import {
  formatStamp,
  hear,
  parseStamp,
  stampMs,
  tick,
  type Clock as StampClock,
} from '#shared/sync/stamp.ts';
import { standingOps } from '#shared/sync/strike.ts';
import { makeClock } from './clock.ts';

export const TIME_ZONE = 'Europe/Dublin';
/** Every shop in memory starts on this day at nine. */
export const TODAY = '2026-06-01';

interface Person {
  id: string;
  roles: Role[];
}

/** A shop whose record is in memory, with the real merge over it; people and phones come as a test names them. */
export class ShopInMemory {
  readonly store = new MemoryStore();
  readonly clock = makeClock(Date.parse(`${TODAY}T08:00:00Z`));
  readonly people = new Map<string, Person>();
  private idsGiven = 0;
  readonly id = this.newId();

  /** UUIDv7s that only count up: what tests compare must not depend on lots. */
  newId(): string {
    this.idsGiven += 1;
    return `019e8000-0000-7000-8000-${this.idsGiven.toString(16).padStart(12, '0')}`;
  }

  person(name: string, ...roles: Role[]): string {
    const id = this.newId();
    this.people.set(id, { id, roles });
    this.store.put('person', id, { id, name, roles, leftAt: null, boatIds: [] });
    return id;
  }

  /** A phone on which `personIds` are enrolled, the first of them signed in. */
  phone(...personIds: string[]): Phone {
    return new Phone(this, personIds);
  }

  row<E extends Entity>(entity: E, id: string): RowOf[E] {
    const row = this.store.row(entity, id);
    if (!row) throw new Error(`no ${entity} ${id}`);
    return row as RowOf[E];
  }

  has(entity: Entity, id: string): boolean {
    return this.store.row(entity, id) !== undefined;
  }

  all<E extends Entity>(entity: E): RowOf[E][] {
    return this.store
      .feed(0)
      .flatMap((kept) => (kept.entity === entity && kept.row ? [kept.row as RowOf[E]] : []));
  }

  looseEnds(): LooseEnd[] {
    return this.all('looseEnd');
  }

  looseEnd(rowId: string, about: string): LooseEnd | undefined {
    return this.looseEnds().find((end) => end.rowId === rowId && (end.field ?? end.kind) === about);
  }

  /** A foreman's phone that has added and sent a boat with two stages. */
  async withBoat() {
    const foreman = this.person('Maud', 'foreman');
    const desk = this.phone(foreman);
    const [boatId, stageId, laterStageId] = [this.newId(), this.newId(), this.newId()];
    desk.does('boat.add', { boatId, name: 'Petrel' });
    desk.does('stage.add', { stageId, boatId, name: 'Strip', order: 1, after: [] });
    desk.does('stage.add', { stageId: laterStageId, boatId, name: 'Refasten', order: 2, after: [stageId] });
    await desk.sends();
    return { foreman, desk, boatId, stageId, laterStageId };
  }
}

interface Doing {
  /** who does it, of those enrolled; the one signed in if not said */
  as?: string;
  /** in place of what the phone would name from what it knows */
  over?: Record<string, string[]>;
  saw?: string[];
}

/** A phone as the law sees it: what it has heard, what it holds, and a clock that may be wrong. */
export class Phone {
  readonly deviceId: string;
  readonly shop: ShopInMemory;
  readonly personIds: string[];
  held: Op[] = [];
  isRevoked = false;
  /** how far its clock is ahead of the world's, in milliseconds */
  aheadMs = 0;
  private last: StampClock | null = null;
  private heardSeq = 0;
  private readonly heard = new Map<string, object | null>();

  constructor(shop: ShopInMemory, personIds: string[]) {
    this.shop = shop;
    this.personIds = personIds;
    this.deviceId = shop.newId();
    this.hears();
  }

  /** A row as this phone shows it: what it has heard with what it holds over it. */
  sees<E extends Entity>(entity: E, id: string): RowOf[E] | undefined {
    const ref: Ref = { entity, id };
    return (this.replayed().get(refKey(ref))?.row ?? this.look(ref)) as RowOf[E] | undefined;
  }

  /** Holds an op, a second after whatever came before. */
  does(kind: string, data: Record<string, unknown>, doing: Doing = {}): Op {
    this.shop.clock.advance(1000);
    this.last = tick(this.last, this.shop.clock.now() + this.aheadMs);
    const row = this.rowOf(kind, data);
    const op: Op = {
      id: this.shop.newId(),
      v: 1,
      kind,
      at: formatStamp(this.last, this.deviceId),
      personId: doing.as ?? this.personIds[0]!,
      over: doing.over ?? (row ? overFor(row, fieldsOf(kind, data), this.held) : {}),
      data: kind.endsWith('.strike') ? { saw: doing.saw ?? (row ? standingOps(row) : []), ...data } : data,
    };
    this.held.push(op);
    return op;
  }

  /** Sends everything held, then hears what is new; answers the outcomes. */
  async sends(): Promise<Outcome[]> {
    const outcomes = await this.sendsOnly(this.held);
    this.held = [];
    this.hears();
    return outcomes;
  }

  /** Does one thing and sends it with all that is held; answers its own outcome. */
  async says(kind: string, data: Record<string, unknown>, doing?: Doing): Promise<Outcome> {
    this.does(kind, data, doing);
    return (await this.sends()).at(-1)!;
  }

  /** Has these taken in by the server as they are, whatever is held; it fails at those of `faulty`. */
  sendsOnly(raws: unknown[], faulty?: ReadonlySet<number>): Promise<Outcome[]> {
    const { shop, deviceId, isRevoked, personIds } = this;
    return mergeBatch(
      shop.store,
      {
        shop: { id: shop.id, timeZone: TIME_ZONE },
        device: { id: deviceId, isRevoked, lastOrderedAt: shop.store.lastOrderedAt.get(deviceId) ?? null },
        personId: personIds[0]!,
        people: new Map(personIds.map((id) => [id, shop.people.get(id)!.roles])),
        nowMs: shop.clock.now(),
      },
      // what arrives has been through JSON
      JSON.parse(JSON.stringify(raws)) as unknown[],
      faulty,
    );
  }

  hears(): void {
    for (const { entity, id, row, seq } of this.shop.store.feed(this.heardSeq)) {
      this.heard.set(refKey({ entity, id }), row);
      this.heardSeq = seq;
      for (const stamp of Object.values((row as Row | null)?.stamps ?? {})) {
        this.last = hear(this.last, parseStamp(stamp)!, this.shop.clock.now() + this.aheadMs);
      }
    }
  }

  private rowOf(kind: string, data: Record<string, unknown>): Row | undefined {
    const found = opKinds.get(kind);
    return found && (this.sees(found.entity, found.rowId(data)) as Row | undefined);
  }

  private readonly look = (ref: Ref): object | undefined => this.heard.get(refKey(ref)) ?? undefined;

  private replayed() {
    const held = this.held.map((op) => {
      const orderedOn = dayAt(stampMs(op.at), TIME_ZONE);
      const { roles } = this.shop.people.get(op.personId)!;
      return { op, facts: { orderedAt: op.at, orderedOn, receivedAt: null, receivedOn: null, roles } };
    });
    return replay(held, this.look, () => []);
  }
}

function fieldsOf(kind: string, data: Record<string, unknown>): string[] {
  if (/\.(strike|restore)$/.test(kind)) return ['struck'];
  return kind.endsWith('.amend') ? fieldsOfSet(data.set as Record<string, unknown>) : [];
}

/** The id of a loose end, as every device computes it. */
export function looseEndId(shop: ShopInMemory, entity: Entity, rowId: string, about: string): string {
  return computedId(shop.id, `${entity}/${rowId}/${about}`);
}
