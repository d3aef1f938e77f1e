import { addDays } from '#shared/sync/day.ts';
import type { Template } from '#shared/trade/load.ts';
import { orderOfWork, type WorkOp } from '#shared/trade/order-of-work.ts';
import type { TaskAdd } from '#shared/task/task.ts';
import type { BoatKey, DemoBoat, Doing, OwnTask, StageDone } from './demo-work.ts';
import type { PersonKey } from './demo-people.ts';
import type { SaidOp, Telling } from './telling.ts';

/** Working days on which nobody was there: the yard had no power, Wes was away, Lenny at school. */
const SHUT = [-33, -32];
const AWAY: Partial<Record<PersonKey, readonly number[]>> = {
  wes: [-46, -45, -44, -43, -42],
  lenny: [-51, -50],
};
const PLANNED_ON = -1;
const HALF_HOUR = 30;
const ASSIGNED_ON = -6;

/** Tells a boat's arrival, her list of work, and what was done of it. */
export function tellBoat(telling: Telling, key: BoatKey, boat: DemoBoat, template: Template): void {
  const boatId = telling.id(key);
  const [day, time] = boat.listed;
  const arrivedOn =
    boat.arrivedDaysAgo === undefined
      ? telling.days.workday(day)
      : addDays(telling.days.today, -boat.arrivedDaysAgo);
  const lies = { way: 'upright', since: arrivedOn };
  const data = { boatId, ...boat.particulars, arrivedOn, templateId: boat.template, lies };
  telling.say('orrin', day, time, () => ({ kind: 'boat.add', makes: boatId, data }));
  const list = listOf(telling, key, boat, template);
  for (const [stageKey, tasks] of list) {
    if (boat.before.includes(stageKey)) tellBefore(telling, boat, key, stageKey, tasks);
    const done = boat.done[stageKey];
    if (done)
      tellDone(
        telling,
        key,
        stageKey,
        done,
        tasks.filter((task) => !(task in boat.doing)),
      );
  }
  for (const [task, doing] of Object.entries(boat.doing)) tellDoing(telling, `${key}/task/${task}`, doing);
  for (const [stageKey, tasks] of Object.entries(boat.own))
    for (const task of tasks) tellOwn(telling, key, boat, stageKey, task);
  if (boat.lies) tellTurned(telling, boatId, boat.lies);
}

/** Makes the list from the template; returns the names of its tasks by stage. */
function listOf(telling: Telling, key: BoatKey, boat: DemoBoat, template: Template): Map<string, string[]> {
  const boatId = telling.id(key);
  const { lengthMm } = boat.particulars;
  const counts = { ...boat.counts, ...(lengthMm ? { lengthMm } : {}) };
  const list = new Map<string, string[]>();
  const stages = new Map<string, string>();
  const order = orderOfWork(template, { boatId, counts, chosen: boat.chosen }, () =>
    telling.ids.next(telling.startMs),
  );
  for (const op of order) {
    const name = nameOf(op);
    const rowId = op.kind === 'stage.add' ? op.data.stageId : op.data.taskId;
    if (op.kind === 'stage.add') {
      telling.name(`${key}/${name}`, rowId);
      stages.set(rowId, name);
      list.set(name, []);
    } else {
      telling.name(`${key}/task/${name}`, rowId);
      list.get(stages.get(op.data.stageId)!)!.push(name);
    }
    const stage = op.kind === 'task.add' ? stages.get(op.data.stageId)! : name;
    const data = { ...op.data, ...reckoned(op, boat.reckoned[stage] ?? 1) };
    telling.say('orrin', ...boat.listed, () => ({ kind: op.kind, makes: rowId, data }), 1);
  }
  return list;
}

function reckoned(op: WorkOp, times: number): { estimateMinutes?: number } {
  const minutes = op.kind === 'task.add' ? op.data.estimateMinutes : undefined;
  return minutes === undefined
    ? {}
    : { estimateMinutes: Math.round((minutes * times) / HALF_HOUR) * HALF_HOUR };
}

/** The id in the template, and which of several it is. */
function nameOf(op: WorkOp): string {
  const id = op.data.templateId!.split('/')[1]!;
  if (op.kind === 'stage.add') return id;
  const { number, side, words } = (op.data as TaskAdd).place ?? {};
  if (number !== undefined) return `${id}/${number}`;
  if (side === 'port' || side === 'starboard') return `${id}/${side}`;
  return words ? `${id}/${words}` : id;
}

function tellBefore(telling: Telling, boat: DemoBoat, key: BoatKey, stageKey: string, tasks: string[]): void {
  const [day, time] = boat.listed;
  for (const task of tasks)
    telling.say('orrin', day, time, mark(telling, 'task', `${key}/task/${task}`, day), 4);
  telling.say('orrin', day, time, mark(telling, 'stage', `${key}/${stageKey}`, day), 5);
}

function tellDone(telling: Telling, key: BoatKey, stageKey: string, done: StageDone, tasks: string[]): void {
  const ticked = tasks.filter((task) => !done.left?.includes(task));
  for (const [index, task] of ticked.entries()) {
    const by = done.by[index % done.by.length]!;
    const share = ticked.length > 1 ? index / (ticked.length - 1) : 1;
    const day = present(by, Math.round(done.from + (done.to - done.from) * share));
    telling.say(by, day, '15:41', mark(telling, 'task', `${key}/task/${task}`, day), index % 17);
  }
  telling.say('orrin', done.to, '16:50', mark(telling, 'stage', `${key}/${stageKey}`, done.to));
}

function present(by: PersonKey, day: number): number {
  let there = day;
  while (SHUT.includes(there) || AWAY[by]?.includes(there)) there += 1;
  return there;
}

function mark(telling: Telling, entity: 'task' | 'stage', name: string, day: number) {
  return (atMs: number): SaidOp => ({
    kind: `${entity}.mark`,
    data: {
      [`${entity}Id`]: telling.id(name),
      markId: telling.ids.next(atMs),
      workDate: telling.days.workday(day),
    },
  });
}

function tellDoing(
  telling: Telling,
  name: string,
  { assignees, planned, started, ticked = [], struck }: Doing,
): void {
  const taskId = telling.id(name);
  const amend = (day: number, set: Record<string, unknown>) =>
    telling.say('orrin', day, '17:05', () => ({
      kind: 'task.amend',
      data: { taskId, set },
      sets: { rowId: taskId, fields: Object.keys(set) },
    }));
  if (assignees) amend(ASSIGNED_ON, { assigneeIds: assignees.map((key) => telling.person(key)) });
  if (planned !== undefined) amend(PLANNED_ON, { plannedFor: telling.days.workday(planned) });
  if (started) {
    const [by, day, time] = started;
    telling.say(by, day, time, (atMs) => ({
      kind: 'task.start',
      data: { taskId, startId: telling.ids.next(atMs) },
    }));
  }
  for (const [by, day, time] of ticked) telling.say(by, day, time, mark(telling, 'task', name, day));
  if (struck)
    telling.say('orrin', ASSIGNED_ON, '17:08', () => ({
      kind: 'task.strike',
      data: { taskId, why: struck, saw: [telling.script.makerOf(taskId)] },
      sets: { rowId: taskId, fields: ['struck'] },
    }));
}

function tellOwn(telling: Telling, key: BoatKey, boat: DemoBoat, stageKey: string, task: OwnTask): void {
  const { title, estimateHours, place, finding, added, assignees, ...doing } = task;
  const name = `${key}/task/${title}`;
  const taskId = telling.id(name);
  const data = {
    taskId,
    boatId: telling.id(key),
    stageId: telling.id(`${key}/${stageKey}`),
    title,
    ...(estimateHours ? { estimateMinutes: estimateHours * 60 } : {}),
    ...(place ? { place } : {}),
    ...(finding ? { findingId: telling.id(`finding/${finding}`) } : {}),
    ...(assignees ? { assigneeIds: assignees.map((person) => telling.person(person)) } : {}),
  };
  const [day, time] = added === undefined ? boat.listed : [added, '17:00' as const];
  telling.say('orrin', day, time, () => ({ kind: 'task.add', makes: taskId, data }), 2);
  tellDoing(telling, name, doing);
}

function tellTurned(telling: Telling, boatId: string, { way, since }: NonNullable<DemoBoat['lies']>): void {
  const set = { lies: { way, since: telling.days.workday(since) } };
  telling.say('orrin', since, '16:40', () => ({
    kind: 'boat.amend',
    data: { boatId, set },
    sets: { rowId: boatId, fields: ['lies'] },
  }));
}
