import type { Role } from '#shared/identity/role.ts';
import { seen, type Viewer } from '#shared/sync/audience.ts';
import { dayAt, type Day } from '#shared/sync/day.ts';
import { understand } from '#shared/sync/judge.ts';
import { looseEndsOf, type LooseEnd } from '#shared/sync/loose-ends.ts';
import type { Op } from '#shared/sync/op.ts';
import { replay, type HeldOp } from '#shared/sync/replay.ts';
import type { RowLookup } from '#shared/sync/op-kind.ts';
import { FOLLOWER_ENTITIES, type Follower, type FollowerRow } from '#shared/entry/follow.ts';
import { recordEntitySchema, refKey, type Entity, type RecordEntity, type Ref, type Row } from '#shared/sync/row.ts';
import type { RowOf } from '#shared/sync/rows.ts';
import { stampMs } from '#shared/sync/stamp.ts';

/** Who is signed in on this device. */
export interface Me {
  personId: string;
  name: string;
  roles: Role[];
  shopId: string;
  deviceId: string;
}

/** An op that this device has not sent yet; `heldSince` is an ISO time. */
export interface HeldItem {
  op: Op;
  personId: string;
  heldSince: string;
}

/** A sent op that counts, but is not yet in the rows that this person has pulled. */
export interface UnheardItem {
  op: Op;
  orderedAt: string;
  receivedAt: string;
}

/** The server's rows as this person may see them, by `refKey`; replaced as a whole when something changes. */
export type Rows = ReadonlyMap<string, { entity: string; row: object }>;

/** Everything that a view is made of. */
export interface Known {
  me: Me;
  rows: Rows;
  held: HeldItem[];
  unheard: UnheardItem[];
  /** roles of the people who have signed in on this device, for whom no row is here */
  rolesOnDevice: ReadonlyMap<string, Role[]>;
  nowMs: number;
  /** serves until the shop's own is known */
  deviceTimeZone: string;
}

/** An immutable picture of what this person's device knows: the server's rows with held ops replayed over them. */
export interface View {
  me: Me;
  /** Every row of an entity, struck ones too. Loose ends are derived here. */
  all<E extends Entity>(entity: E): RowOf[E][];
  find<E extends Entity>(entity: E, id: string): RowOf[E] | undefined;
  /** The loose ends of one row, without looking at all the others. */
  endsOf(entity: EndedEntity, row: Row): LooseEnd[];
  /** This device's unsent ops, of all its people, oldest first. */
  held: HeldItem[];
  /** Whether a held op made or changes the row. */
  isHeld(entity: Entity, id: string): boolean;
  /** In the shop's time zone, by corrected time. */
  today: Day;
  timeZone: string;
  /** Corrected time when this picture was made, in milliseconds since 1970. */
  nowMs: number;
}

/** Rows of these can have loose ends. */
type EndedEntity = Exclude<RecordEntity, 'setAside'>;

type ById = ReadonlyMap<string, object>;

const grouped = new WeakMap<Rows, Map<string, ById>>();
const endsOfRow = new WeakMap<object, LooseEnd[]>();

function byEntity(rows: Rows): Map<string, ById> {
  const known = grouped.get(rows);
  if (known) return known;
  const groups = new Map<string, Map<string, object>>();
  for (const { entity, row } of rows.values()) {
    const group = groups.get(entity) ?? new Map<string, object>();
    groups.set(entity, group.set((row as { id: string }).id, row));
  }
  grouped.set(rows, groups);
  return groups;
}

/** The view of what is known. */
export function makeView(known: Known): View {
  return new KnownView(known);
}

class KnownView implements View {
  readonly me: Me;
  readonly held: HeldItem[];
  readonly today: Day;
  readonly timeZone: string;
  readonly nowMs: number;
  private readonly known: Known;
  private readonly groups: Map<string, ById>;
  private readonly lists = new Map<Entity, object[]>();
  private readonly heldRefs: ReadonlySet<string>;

  constructor(known: Known) {
    this.known = known;
    this.held = known.held;
    this.groups = new Map(byEntity(known.rows));
    this.me = { ...known.me, roles: this.rolesOf(known.me.personId) };
    const [shop] = (this.groups.get('shop')?.values() ?? []) as Iterable<RowOf['shop']>;
    this.timeZone = shop?.timeZone ?? known.deviceTimeZone;
    this.nowMs = known.nowMs;
    this.today = dayAt(known.nowMs, this.timeZone);
    this.heldRefs = new Set(known.held.flatMap(({ op }) => changedRef(op)).map(refKey));
    const look: RowLookup = (ref) => this.groups.get(ref.entity)?.get(ref.id);
    this.lay(replay(this.pending(), look, (entryId) => this.followersOf(entryId)));
  }

  all<E extends Entity>(entity: E): RowOf[E][] {
    const list =
      this.lists.get(entity) ??
      (entity === 'looseEnd' ? this.looseEnds() : [...(this.groups.get(entity)?.values() ?? [])]);
    this.lists.set(entity, list);
    return list as RowOf[E][];
  }

  find<E extends Entity>(entity: E, id: string): RowOf[E] | undefined {
    if (entity === 'looseEnd') return this.all(entity).find((end) => end.id === id);
    return this.groups.get(entity)?.get(id) as RowOf[E] | undefined;
  }

  isHeld(entity: Entity, id: string): boolean {
    return this.heldRefs.has(refKey({ entity, id }));
  }

  private followersOf(entryId: string): Follower[] {
    return FOLLOWER_ENTITIES.flatMap((entity) => {
      const rows = [...(this.groups.get(entity)?.values() ?? [])] as FollowerRow[];
      return rows.filter((row) => row.entryId === entryId).map((row) => ({ entity, row }));
    });
  }

  private rolesOf(personId: string): Role[] {
    const row = this.groups.get('person')?.get(personId) as RowOf['person'] | undefined;
    const own = personId === this.known.me.personId ? this.known.me.roles : [];
    return row?.roles ?? this.known.rolesOnDevice.get(personId) ?? own;
  }

  private pending(): HeldOp[] {
    const facts = (op: Op, orderedAt: string, receivedAt: string | null) => ({
      orderedAt,
      orderedOn: dayAt(stampMs(orderedAt), this.timeZone),
      receivedAt,
      receivedOn: receivedAt && dayAt(Date.parse(receivedAt), this.timeZone),
      roles: this.rolesOf(op.personId),
    });
    return [
      ...this.known.unheard.map(({ op, orderedAt, receivedAt }) => ({
        op,
        facts: facts(op, orderedAt, receivedAt),
      })),
      ...this.known.held.map(({ op }) => ({ op, facts: facts(op, op.at, null) })),
    ];
  }

  // others of the same device may have changed what this person does not see
  private lay(changed: Map<string, { ref: Ref; row: Row }>): void {
    const mine = this.groups.get('person')?.get(this.me.personId) as RowOf['person'] | undefined;
    const viewer: Viewer = {
      personId: this.me.personId,
      roles: this.me.roles,
      boatIds: new Set(mine?.boatIds),
    };
    const laid = new Map<string, Map<string, object>>();
    for (const { ref, row } of changed.values()) {
      const visible = seen(ref.entity, row, viewer);
      if (!visible) continue;
      // copied once, not once a held op: a group may hold thousands
      const group = laid.get(ref.entity) ?? new Map(this.groups.get(ref.entity));
      laid.set(ref.entity, group.set(ref.id, visible));
    }
    for (const [entity, group] of laid) this.groups.set(entity, group);
  }

  private looseEnds(): LooseEnd[] {
    return recordEntitySchema.options.flatMap((entity) =>
      entity === 'setAside' ? [] : this.all(entity).flatMap((row) => this.endsOf(entity, row)),
    );
  }

  endsOf(entity: EndedEntity, row: Row): LooseEnd[] {
    // an owner's rows come without their statements
    if (!row.statements || row.statements.length === 0) return [];
    const ends = endsOfRow.get(row) ?? looseEndsOf(this.me.shopId, entity, row);
    endsOfRow.set(row, ends);
    return ends;
  }
}

function changedRef(op: Op): Ref[] {
  const understood = understand(op);
  return typeof understood === 'string' ? [] : [understood.changes];
}
