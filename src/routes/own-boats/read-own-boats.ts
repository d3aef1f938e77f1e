import type { View } from '#src/replica/view.ts';
import { dayWords } from '#src/words/day-words.ts';

export interface OwnBoat {
  id: string;
  name: string;
  /** 'Here since Mon 31 Aug' */
  since: string | null;
  stages: { id: string; name: string; isDone: boolean; doneOn: string | null }[];
  doneCount: number;
}

/** A person's own boats with the progress of their stages, as far as an owner sees it. */
export function readOwnBoats(view: View): OwnBoat[] {
  const own = view.find('person', view.me.personId)?.boatIds ?? [];
  return view
    .all('boat')
    .filter((boat) => own.includes(boat.id) && !boat.struck)
    .sort((a, b) => a.name.localeCompare(b.name))
    .map((boat) => {
      const stages = readStages(view, boat.id);
      return {
        id: boat.id,
        name: boat.name,
        since: boat.arrivedOn ? `Here since ${dayWords(boat.arrivedOn, view.today)}` : null,
        stages,
        doneCount: stages.filter(({ isDone }) => isDone).length,
      };
    });
}

function readStages(view: View, boatId: string): OwnBoat['stages'] {
  return view
    .all('stage')
    .filter((stage) => stage.boatId === boatId && !stage.struck)
    .sort((a, b) => a.order - b.order || a.name.localeCompare(b.name))
    .map((stage) => {
      const { id, name, done, marks, doneOn } = stage as typeof stage & { doneOn?: string | null };
      // an owner's row has the day alone, without who said it
      const day =
        doneOn ??
        marks
          ?.filter(({ takenBack }) => !takenBack)
          .map(({ workDate }) => workDate)
          .sort()[0];
      return { id, name, isDone: done, doneOn: done && day ? dayWords(day, view.today) : null };
    });
}
