import type { EntryRow } from '#shared/entry/entry.ts';
import { hoursKindSchema } from '#shared/entry/hours.ts';
import type { SetAsideRow } from '#shared/set-aside/set-aside.ts';
import type { StageRow } from '#shared/stage/stage.ts';
import { standingItems } from '#shared/sync/items.ts';
import type { TaskRow } from '#shared/task/task.ts';
import type { View } from '#src/replica/view.ts';
import type { Seeded } from '#tests/worlds/seeded.ts';

/** Something a person does: what is held, and whether they may. */
export interface Act {
  kind: string;
  data: object;
  isBarred?: boolean;
}

interface Doing {
  view: View;
  lots: Seeded;
  newId: () => string;
}

type Deed = (doing: Doing) => Act | null;

const WORDS = ['Scarfed', 'Faired', 'Primed', 'Bunged', 'Caulked', 'Sanded', 'Steamed', 'Riveted'];
const DAYS = ['2026-06-01', '2026-06-02', '2026-06-03'];
const WHY = { why: 'said otherwise since' };

function isForeman({ view }: Doing): boolean {
  return view.me.roles.includes('foreman');
}

function words({ lots }: Doing): string {
  return `${lots.pick(WORDS)} ${lots.pick(WORDS).toLowerCase()} ${lots.below(1000)}`;
}

function pickOf<T>({ lots }: Doing, list: T[]): T | null {
  return list.length > 0 ? lots.pick(list) : null;
}

function figure(doing: Doing, personId: string) {
  const minutes = doing.lots.below(9) * 15;
  return {
    personId,
    minutes,
    ...(doing.lots.chance(0.5) ? { kind: doing.lots.pick(hoursKindSchema.options) } : {}),
  };
}

const stageOf = (doing: Doing): StageRow | null => pickOf(doing, doing.view.all('stage'));
const taskOf = (doing: Doing): TaskRow | null => pickOf(doing, doing.view.all('task'));

/** An entry that the person may change: the foreman any, others their own. */
function entryToChange(doing: Doing): EntryRow | null {
  const { me } = doing.view;
  return pickOf(
    doing,
    doing.view.all('entry').filter((row) => isForeman(doing) || row.authorId === me.personId),
  );
}

function ownItems(doing: Doing, items: { id: string; personId: string; takenBack: unknown }[]): string[] {
  const standing = standingItems(items as Parameters<typeof standingItems>[0]);
  return standing
    .filter(({ personId }) => isForeman(doing) || personId === doing.view.me.personId)
    .map(({ id }) => id);
}

const write: Deed = (doing) => {
  const stage = stageOf(doing);
  if (!stage) return null;
  const { view, lots, newId } = doing;
  const along = lots.pick(view.all('person')).id;
  const people = [...new Set([view.me.personId, ...(lots.chance(0.4) ? [along] : [])])];
  const hours = people.map((personId) => figure(doing, personId));
  const { id: stageId, boatId } = stage;
  const data = {
    entryId: newId(),
    boatId,
    stageId,
    workDate: lots.pick(DAYS),
    text: words(doing),
    spoken: false,
    hours,
  };
  return { kind: 'entry.write', data };
};

const amend: Deed = (doing) => {
  const entry = entryToChange(doing);
  if (!entry) return null;
  const { lots } = doing;
  const set = lots.pick([
    () => ({ text: words(doing) }),
    () => ({ workDate: lots.pick(DAYS) }),
    () => ({ text: words(doing), workDate: lots.pick(DAYS) }),
    () => ({ hours: [figure(doing, entry.authorId)] }),
    () => {
      const stage = stageOf(doing)!;
      return { boatId: stage.boatId, stageId: stage.id };
    },
  ])();
  return { kind: 'entry.amend', data: { entryId: entry.id, set, ...WHY } };
};

const amendOwnFigure: Deed = (doing) => {
  const { me } = doing.view;
  const named = doing.view
    .all('entry')
    .filter(({ hours }) => hours.some(({ personId }) => personId === me.personId));
  const entry = pickOf(doing, named);
  return (
    entry && {
      kind: 'entry.amend',
      data: { entryId: entry.id, set: { hours: [figure(doing, me.personId)] } },
    }
  );
};

const addTo: Deed = (doing) => {
  const entry = pickOf(doing, doing.view.all('entry'));
  return (
    entry && {
      kind: 'entry.addTo',
      data: { entryId: entry.id, additionId: doing.newId(), text: words(doing) },
    }
  );
};

const takeBackAddition: Deed = (doing) => {
  const entry = pickOf(
    doing,
    doing.view.all('entry').filter(({ additions }) => ownItems(doing, additions).length > 0),
  );
  return (
    entry && {
      kind: 'entry.takeBack',
      data: { entryId: entry.id, additionIds: ownItems(doing, entry.additions) },
    }
  );
};

const strike: Deed = (doing) => {
  const entry = entryToChange(doing);
  return (
    entry && { kind: entry.struck ? 'entry.restore' : 'entry.strike', data: { entryId: entry.id, ...WHY } }
  );
};

const addTask: Deed = (doing) => {
  const stage = stageOf(doing);
  return (
    stage && {
      kind: 'task.add',
      data: { taskId: doing.newId(), boatId: stage.boatId, stageId: stage.id, title: words(doing) },
    }
  );
};

const mark: Deed = (doing) => {
  const task = taskOf(doing);
  return (
    task && {
      kind: 'task.mark',
      data: { taskId: task.id, markId: doing.newId(), workDate: doing.lots.pick(DAYS) },
    }
  );
};

const unmark: Deed = (doing) => {
  const task = pickOf(
    doing,
    doing.view.all('task').filter(({ marks }) => ownItems(doing, marks).length > 0),
  );
  return task && { kind: 'task.unmark', data: { taskId: task.id, markIds: ownItems(doing, task.marks) } };
};

const start: Deed = (doing) => {
  const task = taskOf(doing);
  return task && { kind: 'task.start', data: { taskId: task.id, startId: doing.newId() } };
};

const stop: Deed = (doing) => {
  const task = pickOf(
    doing,
    doing.view.all('task').filter(({ starts }) => ownItems(doing, starts).length > 0),
  );
  return task && { kind: 'task.stop', data: { taskId: task.id, startIds: ownItems(doing, task.starts) } };
};

const retitle: Deed = (doing) => {
  const task = isForeman(doing) ? taskOf(doing) : null;
  return task && { kind: 'task.amend', data: { taskId: task.id, set: { title: words(doing) } } };
};

const renameBoat: Deed = (doing) => {
  const boat = pickOf(doing, doing.view.all('boat'));
  return (
    boat && {
      kind: 'boat.amend',
      data: { boatId: boat.id, set: { name: words(doing) } },
      isBarred: !isForeman(doing),
    }
  );
};

const markStage: Deed = (doing) => {
  const stage = isForeman(doing) ? stageOf(doing) : null;
  return (
    stage && {
      kind: 'stage.mark',
      data: { stageId: stage.id, markId: doing.newId(), workDate: doing.lots.pick(DAYS) },
    }
  );
};

const decide: Deed = (doing) => {
  const waiting = doing.view
    .all('setAside')
    .filter((row: SetAsideRow) => row.state === 'waiting' && row.reason === 'not-entitled');
  const row = isForeman(doing) ? pickOf(doing, waiting) : null;
  return (
    row && {
      kind: doing.lots.chance(0.6) ? 'setAside.admit' : 'setAside.dismiss',
      data: { setAsideId: row.id },
    }
  );
};

/** Settles a loose end by saying the value that stands once more, now over all of them. */
const settle: Deed = (doing) => {
  const ends = doing.view
    .all('looseEnd')
    .filter(({ entity, field }) => entity === 'entry' && field === 'text');
  const end = isForeman(doing) ? pickOf(doing, ends) : null;
  const entry = end && doing.view.find('entry', end.rowId);
  return entry
    ? { kind: 'entry.amend', data: { entryId: entry.id, set: { text: entry.text }, ...WHY } }
    : null;
};

const deeds: Record<string, [Deed, number]> = {
  write: [write, 5],
  amend: [amend, 6],
  amendOwnFigure: [amendOwnFigure, 3],
  addTo: [addTo, 2],
  takeBackAddition: [takeBackAddition, 1],
  strike: [strike, 2],
  addTask: [addTask, 1],
  mark: [mark, 3],
  unmark: [unmark, 2],
  start: [start, 1],
  stop: [stop, 1],
  retitle: [retitle, 2],
  renameBoat: [renameBoat, 1],
  markStage: [markStage, 1],
  decide: [decide, 2],
  settle: [settle, 1],
};

/** Something that this person might do with what their phone shows; null where that is nothing. */
export function pickAct(doing: Doing): Act | null {
  const left = new Map(Object.entries(deeds));
  while (left.size > 0) {
    const name = doing.lots.weighted(Object.fromEntries([...left].map(([key, [, weight]]) => [key, weight])));
    const act = left.get(name)![0](doing);
    if (act) return act;
    left.delete(name);
  }
  return null;
}
