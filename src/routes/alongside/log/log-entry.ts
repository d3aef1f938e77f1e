import { hoursText } from '#shared/measure/hours.ts';
import type { Holding, Replica } from '#src/replica/replica.ts';
import type { View } from '#src/replica/view.ts';
import { undoneAtOnce, type Done } from '#src/routes/alongside/done.ts';
import { entryText, hoursOf, type EntryDraft } from '#src/routes/alongside/log/entry-draft.ts';
import { DRAFT_KEY } from '#src/routes/alongside/log/waiting-draft.ts';
import { holdTogether } from '#src/routes/alongside/photos/hold-together.ts';
import { carryOn, plainPlace } from '#src/routes/alongside/place/carried.ts';
import { counted } from '#src/words/day-words.ts';
import { boatWords } from '#src/words/where.ts';

/**
 * Makes a draft's ops durable as one: the entry, its ticks and its photographs. What an earlier try already made is not
 * made again. Throws a HoldError, with words, where something cannot be held; nothing of the draft is lost then.
 */
export async function logEntry(replica: Replica, draft: EntryDraft): Promise<Done> {
  const { entryId, boatId, stageId, workDate, pictures, set } = draft;
  const { me } = replica.view();
  const hours = hoursOf(draft, me.personId);
  const holdings: Holding[] = untickedYet(replica.view(), draft).map(({ taskId, markId }) => ({
    kind: 'task.mark',
    data: { taskId, markId, workDate, entryId },
  }));
  if (!replica.view().find('entry', entryId)) {
    const data = { entryId, boatId, stageId, workDate, text: entryText(draft), spoken: false, hours };
    holdings.unshift({ kind: 'entry.write', data });
  }
  const place = plainPlace(draft.place);
  await holdTogether(replica, holdings, pictures, {
    boatId,
    stageId,
    entryId,
    place,
    ...(set ? { set } : {}),
  });
  if (pictures.length > 0) await carryOn(replica, { boatId, place, set });
  return {
    done: entryId,
    words: loggedWords(replica.view(), draft, hours),
    undo: [
      ...draft.ticked.map(({ taskId, markId }) => ({
        kind: 'task.unmark',
        data: { taskId, markIds: [markId] },
      })),
      ...undoneAtOnce([
        ...pictures.map(({ photoId }) => ({ entity: 'photo' as const, id: photoId })),
        { entity: 'entry', id: entryId },
      ]),
    ],
    draftBack: { key: DRAFT_KEY, value: anew(draft, () => replica.newId()) },
  };
}

/** The ticks of a draft that are not in the record yet. */
export function untickedYet(view: View, { ticked }: EntryDraft): EntryDraft['ticked'] {
  return ticked.filter(({ taskId, markId }) => {
    const task = view.find('task', taskId);
    return task !== undefined && !task.marks.some(({ id }) => id === markId);
  });
}

/** The same draft under new ids, to be logged again. */
function anew(draft: EntryDraft, newId: () => string): EntryDraft {
  return {
    ...draft,
    entryId: newId(),
    ticked: draft.ticked.map(({ taskId }) => ({ taskId, markId: newId() })),
    pictures: draft.pictures.map((picture) => ({ ...picture, photoId: newId() })),
  };
}

function loggedWords(view: View, draft: EntryDraft, hours: { minutes: number }[]): string {
  const minutes = hours.reduce((sum, figure) => sum + figure.minutes, 0);
  const parts = [
    minutes > 0 && `${hoursText(minutes)} h`,
    draft.ticked.length > 0 && counted(draft.ticked.length, 'task') + ' ticked',
    draft.pictures.length > 0 && counted(draft.pictures.length, 'photo'),
  ].filter(Boolean);
  const what = parts.length > 0 ? `: ${parts.join(', ')}` : '';
  return `Logged on ${boatWords(view, draft.boatId)}${what}`;
}
