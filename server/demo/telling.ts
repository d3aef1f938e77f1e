import { addDays } from '#shared/sync/day.ts';
import { DemoDays, type When } from './demo-days.ts';
import { DEMO_DEVICES, DEMO_PEOPLE, type DeviceKey, type PersonKey } from './demo-people.ts';
import { DemoIds, DemoScript } from './demo-script.ts';

const MINUTE_MS = 60_000;
const HOUR_MS = 60 * MINUTE_MS;
/** when phones pass through the yard, where there is signal */
const IN_SIGNAL = ['07:32', '12:05', '16:45'];
const HOBS_NEW_PHONE_DAY = -8;

/** The working day on which the shop began its log. */
export const FIRST_DAY = -65;

export interface SaidOp {
  kind: string;
  data: Record<string, unknown>;
  /** the row that it makes */
  makes?: string;
  /** the row and the fields that it sets */
  sets?: { rowId: string; fields: string[] };
  isUnheard?: boolean;
}

interface Event {
  atMs: number;
  happen: () => void;
}

/** What the demo's people say, gathered in any order and then said in the order of time. */
export class Telling {
  readonly days: DemoDays;
  readonly latestMs: number;
  readonly startMs: number;
  readonly ids = new DemoIds('hornbeam');
  readonly script = new DemoScript(this.ids);
  readonly people: Map<PersonKey, string>;
  readonly devices: Map<DeviceKey, string>;
  private readonly rows = new Map<string, string>();
  private readonly events: Event[] = [];

  constructor(nowMs: number, timeZone: string) {
    this.days = new DemoDays(nowMs, timeZone);
    this.latestMs = nowMs - HOUR_MS;
    this.startMs = this.at(FIRST_DAY, '16:00');
    this.people = this.idsFor(Object.keys(DEMO_PEOPLE) as PersonKey[]);
    this.devices = this.idsFor(Object.keys(DEMO_DEVICES) as DeviceKey[]);
  }

  at(when: When, time: string): number {
    return this.days.at(this.days.on(when), time);
  }

  person(key: PersonKey): string {
    return this.people.get(key)!;
  }

  /** The id of a row by its name here. */
  id(name: string): string {
    const known = this.rows.get(name) ?? this.ids.next(this.startMs);
    this.rows.set(name, known);
    return known;
  }

  /** Gives a row that has its id a name here. */
  name(name: string, id: string): void {
    this.rows.set(name, id);
  }

  /** Somebody says something, `minutes` after a time of day. What is said at one time is said in this order. */
  say(by: PersonKey, when: When, time: string, op: (atMs: number) => SaidOp, minutes = 0): void {
    const atMs = this.at(when, time) + minutes * MINUTE_MS;
    this.events.push({ atMs, happen: () => this.put(by, when, atMs, op(atMs)) });
  }

  /** Says all that was to be said until an hour ago. */
  tell(): void {
    const happened = this.events.filter((event) => event.atMs < this.latestMs);
    for (const event of happened.sort((a, b) => a.atMs - b.atMs)) event.happen();
  }

  private put(by: PersonKey, when: When, atMs: number, { makes, ...said }: SaidOp): void {
    const opId = this.script.say({
      deviceId: this.deviceOf(by, atMs),
      personId: this.person(by),
      atMs,
      sentMs: this.sentMs(by, when, atMs),
      ...said,
    });
    if (makes) this.script.made(makes, opId);
  }

  private idsFor<Key extends string>(keys: Key[]): Map<Key, string> {
    return new Map(keys.map((key) => [key, this.ids.next(this.startMs)]));
  }

  private deviceOf(person: PersonKey, atMs: number): string {
    const keys: Partial<Record<PersonKey, DeviceKey>> = {
      orrin: 'laptop',
      imelda: 'desk',
      rosa: 'rosaPhone',
      wes: 'wesPhone',
      tamsin: 'tamsinPhone',
      hob: atMs < this.at(HOBS_NEW_PHONE_DAY, '06:00') ? 'hobOldPhone' : 'hobPhone',
      lenny: 'benchTablet',
    };
    return this.devices.get(keys[person]!)!;
  }

  // desks send at once, phones when they next pass through the yard; this morning's have all just done so
  private sentMs(person: PersonKey, when: When, atMs: number): number {
    const day = this.days.on(when);
    const isAtDesk = person === 'orrin' || person === 'imelda';
    const next = IN_SIGNAL.map((time) => this.days.at(day, time)).find((ms) => ms > atMs);
    const passing = next ?? this.days.at(addDays(day, 1), IN_SIGNAL[0]!);
    return isAtDesk || passing > this.latestMs ? atMs + MINUTE_MS : passing;
  }
}
