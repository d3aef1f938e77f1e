import { MemoryStore } from '#shared/sync/memory-store.ts';
import { mergeBatch, type Outcome } from '#shared/sync/merge.ts';
import type { DeviceRow } from '#shared/identity/device.ts';
import { fieldsOfSet, overFor } from '#shared/sync/over.ts';
import type { Role } from '#shared/identity/role.ts';
import { opKinds } from '#shared/sync/registry.ts';
import type { Row } from '#shared/sync/row.ts';
import { formatStamp } from '#shared/sync/stamp.ts';
import { v7 } from 'uuid';
import type { View } from '#src/replica/view.ts';
import { viewOf } from '#tests/worlds/view.ts';

export const SHOP_ID = '0193a000-0000-7000-8000-000000000001';

const START_MS = Date.parse('2026-05-04T06:00:00Z');
const MINUTE_MS = 60_000;

/** Somebody with a phone of their own, who says things to the record below. */
export interface Hand {
  personId: string;
  deviceId: string;
  roles: Role[];
}

/** A shop's record in memory with the real merge over it: what each hand says is merged at once, a minute after the last. */
export class TestRecord {
  readonly store = new MemoryStore();
  nowMs = START_MS;

  constructor() {
    const shop = {
      id: SHOP_ID,
      name: 'Hornbeam Slip',
      timeZone: 'Europe/Dublin',
      currency: 'EUR',
      units: 'imperial',
    };
    this.store.put('shop', SHOP_ID, shop);
  }

  /** What this hand's device shows once it has heard everything. */
  viewAs(hand: Hand): View {
    const { name } = this.store.row('person', hand.personId) as { name: string };
    const me = { personId: hand.personId, name, roles: hand.roles, shopId: SHOP_ID, deviceId: hand.deviceId };
    return viewOf(this.store, { me, nowMs: this.nowMs });
  }

  /** A device of a person's, as the server last heard it. */
  device(device: Partial<DeviceRow> & Pick<DeviceRow, 'id' | 'label' | 'personIds'>): void {
    const known = { replaces: null, lastHeardAt: null, appVersion: '0.1.0', held: null, revokedAt: null };
    this.store.put('device', device.id, { ...known, ...device });
  }

  newId(): string {
    return v7({ msecs: this.nowMs });
  }

  hand(name: string, ...roles: Role[]): Hand {
    const personId = this.newId();
    this.store.put('person', personId, { id: personId, name, roles, leftAt: null, boatIds: [] });
    return { personId, deviceId: this.newId(), roles };
  }

  /** Says one thing, over what stands; `over` names what its author had before them where they had not heard the latest. */
  async say(
    hand: Hand,
    kind: string,
    data: Record<string, unknown>,
    over?: Record<string, string[]>,
  ): Promise<Outcome> {
    this.nowMs += MINUTE_MS;
    const op = {
      id: this.newId(),
      v: 1,
      kind,
      at: formatStamp({ ms: this.nowMs, counter: 0 }, hand.deviceId),
      personId: hand.personId,
      over: over ?? this.overOf(kind, data),
      data,
    };
    const [outcome] = await mergeBatch(this.store, this.from(hand), [op]);
    return outcome!;
  }

  private from(hand: Hand) {
    const lastOrderedAt = this.store.lastOrderedAt.get(hand.deviceId) ?? null;
    return {
      shop: { id: SHOP_ID, timeZone: 'Europe/Dublin' },
      device: { id: hand.deviceId, isRevoked: false, lastOrderedAt },
      personId: hand.personId,
      people: new Map([[hand.personId, hand.roles]]),
      nowMs: this.nowMs,
    };
  }

  private overOf(kind: string, data: Record<string, unknown>): Record<string, string[]> {
    const found = opKinds.get(kind);
    const row = found && (this.store.row(found.entity, found.rowId(data)) as Row | undefined);
    const fields = fieldsOf(kind, data);
    return row && fields.length > 0 ? overFor(row, fields, []) : {};
  }
}

function fieldsOf(kind: string, data: Record<string, unknown>): string[] {
  if (/\.(strike|restore)$/.test(kind)) return ['struck'];
  return kind.endsWith('.amend') ? fieldsOfSet(data.set as Record<string, unknown>) : [];
}
