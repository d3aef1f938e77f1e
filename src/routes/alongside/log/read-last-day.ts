import { standingItems } from '#shared/sync/items.ts';
import type { Day } from '#shared/sync/day.ts';
import type { View } from '#src/replica/view.ts';
import type { EntryDraft } from '#src/routes/alongside/log/entry-draft.ts';
import { nearDayWords } from '#src/words/day-words.ts';
import { listWords } from '#src/words/name-words.ts';
import { stageWords } from '#src/words/where.ts';

/** What a person's last day on a boat was like, to be taken over into the form: never its words, nor its hours. */
export interface LastDay {
  day: Day;
  /** 'Same as yesterday' */
  title: string;
  /** 'Strip, with Wes, 2 tasks still open' */
  words: string;
  take: Pick<EntryDraft, 'stageId' | 'along'>;
  /** tasks that were worked on then and are open: they come first in the form, unticked, as nobody has finished them */
  taskIds: string[];
}

/** The last day before today on which this person has an entry on the boat; null where there is none. */
export function readLastDay(view: View, boatId: string): LastDay | null {
  const me = view.me.personId;
  const own = view
    .all('entry')
    .filter((entry) => entry.boatId === boatId && entry.authorId === me && !entry.struck)
    .filter(({ workDate }) => workDate < view.today);
  const day = own.reduce<Day>((last, { workDate }) => (workDate > last ? workDate : last), '');
  const entries = own
    .filter(({ workDate }) => workDate === day)
    .sort((a, b) => (a.writtenAt < b.writtenAt ? -1 : 1));
  const last = entries.at(-1);
  if (!last) return null;
  const along = peopleAlong(view, entries);
  const taskIds = openTasksOf(view, boatId, day);
  const parts = [
    stageWords(view, last.stageId),
    along.length > 0 && `with ${listWords(along.map(({ name }) => name))}`,
    taskIds.length > 0 && `${taskIds.length === 1 ? 'a task' : `${taskIds.length} tasks`} still open`,
  ];
  return {
    day,
    title: `Same as ${nearDayWords(day, view.today)}`,
    words: parts.filter(Boolean).join(', '),
    take: { stageId: last.stageId, along: along.map(({ id }) => ({ personId: id, minutes: null })) },
    taskIds,
  };
}

function peopleAlong(
  view: View,
  entries: { hours: { personId: string }[] }[],
): { id: string; name: string }[] {
  const ids = new Set(entries.flatMap(({ hours }) => hours.map(({ personId }) => personId)));
  return [...ids]
    .filter((id) => id !== view.me.personId)
    .flatMap((id) => {
      const person = view.find('person', id);
      return person && !person.leftAt ? [{ id, name: person.name }] : [];
    });
}

/** Open tasks that this person has started, or ticked on that day and somebody has opened again. */
function openTasksOf(view: View, boatId: string, day: Day): string[] {
  const me = view.me.personId;
  return view
    .all('task')
    .filter((task) => task.boatId === boatId && !task.struck && !task.done)
    .filter(
      (task) =>
        standingItems(task.starts).some(({ personId }) => personId === me) ||
        task.marks.some((mark) => mark.personId === me && mark.workDate === day),
    )
    .map(({ id }) => id);
}
