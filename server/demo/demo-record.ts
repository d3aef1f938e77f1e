import { addDays, type Day } from '#shared/sync/day.ts';
import { DEMO_BOATS, type BoatKey, type DemoStage, type DemoTask } from './demo-boats.ts';
import { DemoDays } from './demo-days.ts';
import { DEMO_CHANGES, DEMO_ENTRIES, FIRST_LOGGED, type DemoChange } from './demo-entries.ts';
import type { DemoEntry, Figure } from './demo-entry.ts';
import { deviceLines, type DemoDeviceLine } from './demo-heard.ts';
import { DEMO_DEVICES, DEMO_PEOPLE, type DeviceKey, type PersonKey } from './demo-people.ts';
import { DemoIds, DemoScript, type DemoBatch } from './demo-script.ts';

const MINUTE_MS = 60_000;
const HOUR_MS = 60 * MINUTE_MS;
/** when phones pass through the yard, where there is signal */
const IN_SIGNAL = ['07:32', '12:05', '16:45'];
const FIRST_DAY = -21;
const KINDS_SET_AFTER_DAYS = 2;
const NEWEST_DAY_WITH_KINDS = -4;
const HOBS_NEW_PHONE_DAY = -8;

/** A shop's four weeks as ops in the order in which the server hears them, and what stands beside the record. */
export interface DemoRecord<Key extends string = PersonKey> {
  people: Map<Key, string>;
  devices: DemoDeviceLine[];
  owners: { boatId: string; personId: string }[];
  batches: DemoBatch[];
}

interface Event {
  atMs: number;
  happen: () => void;
}

/** The demo shop's record up to an hour before `nowMs`; the same for the same day and zone. */
export function makeDemoRecord(nowMs: number, timeZone: string): DemoRecord {
  return new Telling(nowMs, timeZone).record();
}

class Telling {
  private readonly days: DemoDays;
  private readonly latestMs: number;
  private readonly startMs: number;
  private readonly ids = new DemoIds('hornbeam');
  private readonly script = new DemoScript(this.ids);
  private readonly people: Map<PersonKey, string>;
  private readonly devices: Map<DeviceKey, string>;
  private readonly rows = new Map<string, string>();
  private readonly events: Event[] = [];

  constructor(nowMs: number, timeZone: string) {
    this.days = new DemoDays(nowMs, timeZone);
    this.latestMs = nowMs - HOUR_MS;
    this.startMs = this.at(FIRST_DAY, '16:00');
    this.people = this.idsFor(Object.keys(DEMO_PEOPLE) as PersonKey[]);
    this.devices = this.idsFor(Object.keys(DEMO_DEVICES) as DeviceKey[]);
  }

  record(): DemoRecord {
    for (const boat of Object.keys(DEMO_BOATS) as BoatKey[]) this.boat(boat);
    for (const entry of DEMO_ENTRIES) this.entry(entry);
    for (const change of DEMO_CHANGES) this.change(change);
    this.lennyFinishesAStage();
    const happened = this.events
      .filter((event) => event.atMs < this.latestMs)
      .sort((a, b) => a.atMs - b.atMs);
    for (const event of happened) event.happen();
    const batches = this.script.heard();
    const { days, latestMs, startMs } = this;
    const devices = deviceLines({
      days,
      latestMs,
      startMs,
      batches,
      deviceIds: this.devices,
      personIds: this.people,
    });
    return { people: this.people, devices, owners: this.owners(), batches };
  }

  private idsFor<Key extends string>(keys: Key[]): Map<Key, string> {
    return new Map(keys.map((key) => [key, this.ids.next(this.startMs)]));
  }

  private at(day: number, time: string): number {
    return this.days.at(this.days.workday(day), time);
  }

  private person(key: PersonKey): string {
    return this.people.get(key)!;
  }

  private id(name: string): string {
    const known = this.rows.get(name) ?? this.ids.next(this.startMs);
    this.rows.set(name, known);
    return known;
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
  private sentMs(person: PersonKey, day: Day, atMs: number): number {
    const isAtDesk = person === 'orrin' || person === 'imelda';
    const next = IN_SIGNAL.map((time) => this.days.at(day, time)).find((ms) => ms > atMs);
    const passing = next ?? this.days.at(addDays(day, 1), IN_SIGNAL[0]!);
    return isAtDesk || passing > this.latestMs ? atMs + MINUTE_MS : passing;
  }

  private say(
    by: PersonKey,
    day: number,
    time: string,
    op: (atMs: number) => Parameters<Telling['put']>[3],
  ): void {
    const atMs = this.at(day, time);
    this.events.push({ atMs, happen: () => this.put(by, this.days.workday(day), atMs, op(atMs)) });
  }

  private put(
    by: PersonKey,
    day: Day,
    atMs: number,
    op: {
      kind: string;
      data: Record<string, unknown>;
      makes?: string;
      sets?: { rowId: string; fields: string[] };
      isUnheard?: boolean;
    },
  ): void {
    const { makes, ...said } = op;
    const where = {
      deviceId: this.deviceOf(by, atMs),
      personId: this.person(by),
      atMs,
      sentMs: this.sentMs(by, day, atMs),
    };
    const opId = this.script.say({ ...where, ...said });
    if (makes) this.script.made(makes, opId);
  }

  private boat(key: BoatKey): void {
    const { particulars, arrivedDaysAgo, stages } = DEMO_BOATS[key];
    const boatId = this.id(key);
    const arrivedOn = addDays(this.days.today, -arrivedDaysAgo);
    this.say('orrin', FIRST_DAY, '16:30', () => ({
      kind: 'boat.add',
      makes: boatId,
      data: { boatId, ...particulars, arrivedOn },
    }));
    for (const [index, stage] of stages.entries()) this.stage(key, stage, index + 1);
  }

  private stage(boat: BoatKey, { key, name, after, finished, tasks }: DemoStage, order: number): void {
    const [boatId, stageId] = [this.id(boat), this.id(`${boat}/${key}`)];
    const data = { stageId, boatId, name, order, after: after.map((other) => this.id(`${boat}/${other}`)) };
    this.say('orrin', FIRST_DAY, '16:31', () => ({ kind: 'stage.add', makes: stageId, data }));
    for (const task of tasks) this.task(boatId, stageId, task);
    if (finished === undefined) return;
    this.say('orrin', finished, '16:50', (atMs) => ({
      kind: 'stage.mark',
      data: { stageId, markId: this.ids.next(atMs), workDate: this.days.workday(finished) },
    }));
  }

  private task(
    boatId: string,
    stageId: string,
    { title, estimateHours, assignees, started, ticked = [] }: DemoTask,
  ): void {
    const taskId = this.id(`task/${stageId}/${title}`);
    const data = {
      taskId,
      boatId,
      stageId,
      title,
      ...(estimateHours ? { estimateMinutes: estimateHours * 60 } : {}),
      ...(assignees ? { assigneeIds: assignees.map((key) => this.person(key)) } : {}),
    };
    this.say('orrin', FIRST_DAY, '16:32', () => ({ kind: 'task.add', makes: taskId, data }));
    if (started) {
      const [by, day, time] = started;
      this.say(by, day, time, (atMs) => ({
        kind: 'task.start',
        data: { taskId, startId: this.ids.next(atMs) },
      }));
    }
    for (const [by, day, time] of ticked) {
      const workDate = this.days.workday(day);
      this.say(by, day, time, (atMs) => ({
        kind: 'task.mark',
        data: { taskId, markId: this.ids.next(atMs), workDate },
      }));
    }
  }

  private entry(entry: DemoEntry): void {
    const entryId = this.id(`entry/${entry.key ?? `${entry.author}/${entry.day}/${entry.time}`}`);
    const { boat, stage } = (entry.key && FIRST_LOGGED[entry.key]) || entry;
    const data = {
      entryId,
      boatId: this.id(boat),
      stageId: this.id(`${boat}/${stage}`),
      workDate: this.days.workday(entry.day),
      text: entry.text,
      spoken: false,
      hours: this.figures(entry.hours),
    };
    this.say(entry.author, entry.day, entry.time, () => ({ kind: 'entry.write', makes: entryId, data }));
    if (entry.day <= NEWEST_DAY_WITH_KINDS) this.kinds(entryId, entry);
  }

  private figures(hours: Partial<Record<PersonKey, Figure>>) {
    return (Object.entries(hours) as [PersonKey, Figure][]).map(([key, figure]) => {
      const [count, kind] = typeof figure === 'number' ? [figure, undefined] : figure;
      return { personId: this.person(key), minutes: count * 60, ...(kind ? { kind } : {}) };
    });
  }

  /** The office sets the kinds of hours two days later, as they then stand. */
  private kinds(entryId: string, entry: DemoEntry): void {
    const corrected = DEMO_CHANGES.find((change) => change.key === entry.key && 'hours' in change.does);
    const latest = corrected && 'hours' in corrected.does ? corrected.does.hours : {};
    const hours = this.figures({ ...entry.hours, ...latest }).map((figure) => ({
      ...figure,
      kind: figure.kind ?? 'agreed',
    }));
    this.say('imelda', entry.day + KINDS_SET_AFTER_DAYS, '14:00', () => ({
      kind: 'entry.amend',
      data: { entryId, set: { hours } },
      sets: { rowId: entryId, fields: hours.map((figure) => `hours/${figure.personId}`) },
    }));
  }

  private change({ key, day, time, by, does }: DemoChange): void {
    const entryId = this.id(`entry/${key}`);
    this.say(by, day, time, (atMs) => {
      if ('adds' in does)
        return { kind: 'entry.addTo', data: { entryId, additionId: this.ids.next(atMs), text: does.adds } };
      if ('strikes' in does) {
        const sets = { rowId: entryId, fields: ['struck'] };
        return {
          kind: 'entry.strike',
          data: { entryId, why: does.strikes, saw: [this.script.makerOf(entryId)] },
          sets,
        };
      }
      if ('movesTo' in does) {
        const { boat, stage } = does.movesTo;
        const set = { boatId: this.id(boat), stageId: this.id(`${boat}/${stage}`) };
        return {
          kind: 'entry.amend',
          data: { entryId, set, why: does.why },
          sets: { rowId: entryId, fields: ['stageId'] },
        };
      }
      const hours = this.figures(does.hours).map((figure) => ({ ...figure, kind: null }));
      const fields = hours.map((figure) => `hours/${figure.personId}`);
      const data = { entryId, set: { hours }, why: does.why };
      return { kind: 'entry.amend', data, sets: { rowId: entryId, fields }, isUnheard: does.isUnheard };
    });
  }

  /** A stage is the foreman's to mark: what Lenny marks is set aside. */
  private lennyFinishesAStage(): void {
    const stageId = this.id('hickory/laps');
    const workDate = this.days.workday(-1);
    this.say('lenny', -1, '15:42', (atMs) => ({
      kind: 'stage.mark',
      data: { stageId, markId: this.ids.next(atMs), workDate },
    }));
  }

  private owners(): DemoRecord['owners'] {
    const boats = Object.entries(DEMO_BOATS) as [BoatKey, (typeof DEMO_BOATS)[BoatKey]][];
    return boats.map(([key, { owner }]) => ({ boatId: this.id(key), personId: this.person(owner) }));
  }
}
