import { createHash } from 'node:crypto';
import { v7 } from 'uuid';
import type { Op } from '#shared/sync/op.ts';
import { formatStamp, tick, type Clock } from '#shared/sync/stamp.ts';

/** Ops of one device that reach the server together. */
export interface DemoBatch {
  deviceId: string;
  /** who sends */
  personId: string;
  receivedMs: number;
  ops: Op[];
}

interface Said {
  deviceId: string;
  personId: string;
  atMs: number;
  sentMs: number;
  kind: string;
  data: Record<string, unknown>;
  /** the row and the fields that an amend, strike or restore sets */
  sets?: { rowId: string; fields: string[] };
  /** its author had not heard of what was said since the row was made */
  isUnheard?: boolean;
}

/** Ids that are the same for the same seed: UUIDv7s whose random part is drawn from it. */
export class DemoIds {
  private count = 0;
  private readonly seed: string;

  constructor(seed: string) {
    this.seed = seed;
  }

  next(ms: number): string {
    this.count += 1;
    const random = createHash('sha256').update(`${this.seed}/${this.count}`).digest();
    return v7({ msecs: ms, random: random.subarray(0, 16), seq: this.count });
  }
}

/** Writes down what people of the demo say, as the ops that their devices would make, in the order in which it is said. */
export class DemoScript {
  readonly ids: DemoIds;
  private readonly clocks = new Map<string, Clock>();
  private readonly heads = new Map<string, string[]>();
  private readonly makers = new Map<string, string>();
  private readonly batches = new Map<string, DemoBatch>();

  constructor(ids: DemoIds) {
    this.ids = ids;
  }

  /** Returns the op's id. What is said must be given in the order of time. */
  say({ deviceId, personId, atMs, sentMs, kind, data, sets, isUnheard = false }: Said): string {
    const clock = tick(this.clocks.get(deviceId) ?? null, atMs);
    this.clocks.set(deviceId, clock);
    const id = this.ids.next(atMs);
    const over = sets ? this.over(sets.rowId, sets.fields, isUnheard) : {};
    this.put(deviceId, personId, sentMs, {
      id,
      v: 1,
      kind,
      at: formatStamp(clock, deviceId),
      personId,
      over,
      data,
    });
    if (sets) for (const field of sets.fields) this.replace(`${sets.rowId}/${field}`, id, isUnheard);
    return id;
  }

  /** Remembers which op made a row, for what is said about it later. */
  made(rowId: string, opId: string): void {
    this.makers.set(rowId, opId);
  }

  makerOf(rowId: string): string {
    return this.makers.get(rowId)!;
  }

  /** All that was said, in the order in which the server hears it. */
  heard(): DemoBatch[] {
    return [...this.batches.values()].sort((a, b) => a.receivedMs - b.receivedMs);
  }

  private over(rowId: string, fields: string[], isUnheard: boolean): Op['over'] {
    const made = this.makerOf(rowId);
    return Object.fromEntries(
      fields.map((field) => [field, isUnheard ? [made] : (this.heads.get(`${rowId}/${field}`) ?? [made])]),
    );
  }

  private replace(key: string, id: string, isUnheard: boolean): void {
    this.heads.set(key, isUnheard ? [...(this.heads.get(key) ?? []), id] : [id]);
  }

  private put(deviceId: string, personId: string, receivedMs: number, op: Op): void {
    const key = `${receivedMs}/${deviceId}/${personId}`;
    const batch = this.batches.get(key) ?? { deviceId, personId, receivedMs, ops: [] };
    batch.ops.push(op);
    this.batches.set(key, batch);
  }
}
