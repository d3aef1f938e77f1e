import { isSameJson } from '#shared/sync/canonical.ts';
import { seen } from '#shared/sync/audience.ts';
import { understand } from '#shared/sync/judge.ts';
import type { Op } from '#shared/sync/op.ts';
import { entitySchema, type Entity, type Row } from '#shared/sync/row.ts';
import type { LoggedOp } from '#shared/sync/store.ts';
import type { LiveReplica } from '#src/replica/live-replica.ts';
import type { View } from '#src/replica/view.ts';
import type { MemoryServer } from '#tests/worlds/memory-server.ts';
import type { Phone } from '#tests/worlds/phone.ts';
import { rowsReversed, wronglyOrdered } from './oracle.ts';

/** An op whose `hold` has resolved: from then on it may never be lost. */
export interface Promised {
  op: Op;
  phone: Phone;
  isBarred: boolean;
}

/** What must be true is not. */
export class Broken extends Error {}

function demand(isTrue: boolean, words: string): void {
  if (!isTrue) throw new Broken(words);
}

type Items = { opId: string }[] | undefined;

/** Whether a row shows that an op has been reduced into it. */
function isShownBy(row: object | undefined, op: Op): boolean {
  const { madeBy, statements, ...lists } = (row ?? {}) as Row & Record<string, unknown>;
  if (madeBy === op.id || statements?.some(({ opId }) => opId === op.id)) return true;
  return ['marks', 'starts', 'additions', 'takeBacks', 'decisions'].some((list) =>
    (lists[list] as Items)?.some(({ opId }) => opId === op.id),
  );
}

/** Every op that a person was told is kept is in the outbox, the sent list or the log. */
export function nothingIsLost(promised: Promised[], server: MemoryServer): void {
  const kept = new Map<Phone, Set<string>>();
  for (const { op, phone } of promised) {
    const [tab] = phone.tabs;
    if (!tab) continue;
    const ids =
      kept.get(phone) ??
      new Set([...tab.replica.view().held, ...tab.replica.sent()].map((item) => item.op.id));
    kept.set(phone, ids);
    demand(ids.has(op.id) || server.store.ops.has(op.id), `${op.kind} ${op.id} of ${phone.label} is lost`);
  }
}

/** What a person has done here is on every screen of theirs on the phone, until the server has set it aside. */
export function ownIsShown(promised: Promised[]): void {
  for (const { op, phone, isBarred } of promised) {
    for (const { replica } of isBarred ? [] : phone.tabs) showsOwn(replica, op, phone.label);
  }
}

/** What a person has done is on this screen, where it is theirs, until the server has set it aside. */
export function showsOwn(replica: LiveReplica, op: Op, label: string): void {
  const view = replica.view();
  const sent = replica.sent().find((item) => item.op.id === op.id);
  if (sent?.outcome === 'set-aside' || view.me.personId !== op.personId) return;
  const understood = understand(op);
  if (typeof understood === 'string') throw new Broken(`${op.kind} is not understood`);
  const { entity, id } = understood.changes;
  demand(isShownBy(view.find(entity, id), op), `${op.kind} ${op.id} is not to be seen on ${label}`);
}

/** What one device says of a field, one thing after another, is no loose end with itself. */
export function nobodyContradictsThemself(
  phones: Phone[],
  deviceOf: (opId: string) => string | undefined,
): void {
  for (const { tabs, label } of phones) {
    for (const { kind, values, rowId, field } of tabs.flatMap(({ replica }) =>
      replica.view().all('looseEnd'),
    )) {
      const devices = values.map(({ opId }) => deviceOf(opId)).filter((id) => id !== undefined);
      const isOwn = kind === 'field' && new Set(devices).size < devices.length;
      demand(!isOwn, `${label} shows a device at odds with itself about ${field} of ${rowId}`);
    }
  }
}

/** The log has each op once, as it came, with the facts of its first receipt. */
export class LogWatch {
  private readonly first = new Map<string, string>();

  check({ store }: MemoryServer): void {
    for (const logged of store.ops.values()) {
      const facts = JSON.stringify(factsOf(logged));
      const known = this.first.get(logged.key) ?? facts;
      this.first.set(logged.key, known);
      demand(known === facts, `the facts of ${logged.kind} ${logged.key} have changed`);
    }
    const ids = [...store.ops.values()].map(({ op }) => (op as Op).id);
    demand(new Set(ids).size === ids.length, 'an op is in the log twice');
    const wrong = wronglyOrdered(store);
    demand(wrong.length === 0, `${wrong.length} ops do not count when the law says, such as ${wrong[0]}`);
  }

  /** The record was put back to a backup: what it does not know is received anew. */
  forget(): void {
    this.first.clear();
  }
}

function factsOf({
  op,
  deviceId,
  personId,
  roles,
  orderedAt,
  orderedOn,
  receivedAt,
  receivedOn,
  outcome,
  reason,
}: LoggedOp) {
  return { op, deviceId, personId, roles, orderedAt, orderedOn, receivedAt, receivedOn, outcome, reason };
}

/** A view with nothing held shows the server's rows as its person may see them, and the same loose ends. */
export function agrees(view: View, server: MemoryServer, label: string): void {
  demand(view.held.length === 0, `${label} still holds ${view.held.length} ops`);
  const viewer = server.viewer(view.me.personId);
  const kept = server.store.feed(0);
  for (const entity of entitySchema.options) {
    const theirs = byId(
      kept
        .filter((one) => one.entity === entity)
        .flatMap(({ row }) => (row && seen(entity, row, viewer)) ?? []),
    );
    const ours = byId(view.all(entity));
    demand(
      [...theirs.keys()].sort().join() === [...ours.keys()].sort().join(),
      `${label} has other ${entity} rows than the server`,
    );
    for (const [id, row] of theirs)
      demand(isSameJson(ours.get(id), row), `${label} shows ${entity} ${id} otherwise than the server`);
  }
}

/** The server's rows are what the log says, in whatever order it came. */
export function rowsAreOfTheLog({ store }: MemoryServer): void {
  for (const [key, row] of rowsReversed(store)) {
    const [entity, id] = key.split('/') as [Entity, string];
    demand(isSameJson(store.row(entity, id), row), `${key} depends on the order in which ops came`);
  }
}

function byId(rows: object[]): Map<string, object> {
  return new Map(rows.map((row) => [(row as { id: string }).id, row]));
}
