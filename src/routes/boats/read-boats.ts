import { hoursLines, sumHours } from '#shared/entry/sums.ts';
import { daysBetween } from '#shared/sync/day.ts';
import type { View } from '#src/replica/view.ts';
import { counted, dayWords } from '#src/words/day-words.ts';
import { listWords } from '#src/words/name-words.ts';

export interface BoatLine {
  id: string;
  name: string;
  type: string | null;
  /** day 1 is her arrival */
  dayOfStay: number | null;
  arrived: string | null;
  minutes: number;
  /** '3 of 6 stages finished' */
  stages: string;
  /** '9 of 14 tasks done' */
  tasks: string;
  /** stages that are not finished and have work in them */
  under: string | null;
  isHeld: boolean;
}

/** The shop's boats, who has been here longest first; what is struck stands apart. */
export function readBoats(view: View): {
  here: BoatLine[];
  struck: { id: string; name: string; why: string }[];
} {
  const minutes = sumHours(hoursLines(view.all('entry')), 'boat');
  const boats = [...view.all('boat')].sort(
    (a, b) => arrival(a).localeCompare(arrival(b)) || a.name.localeCompare(b.name),
  );
  return {
    here: boats
      .filter((boat) => !boat.struck)
      .map((boat) => ({
        id: boat.id,
        name: boat.name,
        type: boat.type ?? null,
        dayOfStay: boat.arrivedOn ? Math.max(daysBetween(boat.arrivedOn, view.today) + 1, 1) : null,
        arrived: boat.arrivedOn ? `came ${dayWords(boat.arrivedOn, view.today)}` : null,
        minutes: minutes.get(boat.id) ?? 0,
        ...readProgress(view, boat.id),
        isHeld: view.isHeld('boat', boat.id),
      })),
    struck: boats.flatMap(({ id, name, struck }) => (struck ? [{ id, name, why: struck.why }] : [])),
  };
}

function arrival({ arrivedOn }: { arrivedOn?: string | null }): string {
  return arrivedOn ?? '9999';
}

/** How far a boat is, always with what it is out of. */
export function readProgress(view: View, boatId: string): Pick<BoatLine, 'stages' | 'tasks' | 'under'> {
  const stages = view.all('stage').filter((stage) => stage.boatId === boatId && !stage.struck);
  const tasks = view.all('task').filter((task) => task.boatId === boatId && !task.struck);
  const worked = new Set(view.all('entry').flatMap((entry) => (entry.struck ? [] : (entry.stageId ?? []))));
  const under = stages
    .filter((stage) => !stage.done && worked.has(stage.id))
    .sort((a, b) => a.order - b.order);
  return {
    stages: progress(stages.filter((stage) => stage.done).length, stages.length, 'stage', 'finished'),
    tasks: progress(tasks.filter((task) => task.done).length, tasks.length, 'task', 'done'),
    under: under.length > 0 ? listWords(under.map((stage) => stage.name)) : null,
  };
}

function progress(count: number, of: number, noun: string, done: string): string {
  return of === 0 ? `no ${noun}s yet` : `${count} of ${counted(of, noun)} ${done}`;
}
