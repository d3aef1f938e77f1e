import { hoursText } from '#shared/measure/hours.ts';
import type { Replica } from '#src/replica/replica.ts';
import type { View } from '#src/replica/view.ts';
import { hoursOf, type EntryDraft } from '#src/routes/alongside/log/entry-draft.ts';
import type { Logged } from '#src/routes/alongside/log/logged-undo.tsx';
import { counted } from '#src/words/day-words.ts';
import { boatWords } from '#src/words/where.ts';

/**
 * Makes a draft's ops durable: the entry, then its ticks. What an earlier try already made is not made again.
 * Throws a HoldError, with words, where something cannot be held; nothing of the draft is lost then.
 */
export async function logEntry(replica: Replica, draft: EntryDraft): Promise<Logged> {
  const { entryId, boatId, stageId, workDate } = draft;
  const { me } = replica.view();
  const hours = hoursOf(draft, me.personId);
  if (!replica.view().find('entry', entryId)) {
    const text = draft.text.trim();
    await replica.hold('entry.write', { entryId, boatId, stageId, workDate, text, spoken: false, hours });
  }
  for (const { taskId, markId } of untickedYet(replica.view(), draft)) {
    await replica.hold('task.mark', { taskId, markId, workDate, entryId });
  }
  return { logged: 'entry', entryId, words: loggedWords(replica.view(), draft, hours), draft };
}

/** The ticks of a draft that are not in the record yet. */
export function untickedYet(view: View, { ticked }: EntryDraft): EntryDraft['ticked'] {
  return ticked.filter(({ taskId, markId }) => {
    const task = view.find('task', taskId);
    return task !== undefined && !task.marks.some(({ id }) => id === markId);
  });
}

function loggedWords(view: View, draft: EntryDraft, hours: { minutes: number }[]): string {
  const minutes = hours.reduce((sum, figure) => sum + figure.minutes, 0);
  const parts = [
    minutes > 0 && `${hoursText(minutes)} h`,
    draft.ticked.length > 0 && counted(draft.ticked.length, 'task') + ' ticked',
  ].filter(Boolean);
  const what = parts.length > 0 ? `: ${parts.join(', ')}` : '';
  return `Logged on ${boatWords(view, draft.boatId)}${what}`;
}
