import type { HoursKind } from '#shared/entry/hours.ts';
import { hoursText } from '#shared/measure/hours.ts';
import type { Holding, Replica } from '#src/replica/replica.ts';
import { undoneAtOnce, UNDONE_WHY, type Done } from '#src/routes/alongside/done.ts';
import type { Where } from '#src/routes/alongside/read-boats.ts';
import type { OwnEntry } from '#src/routes/alongside/read-own-hours.ts';

interface OwnHours {
  where: Where;
  /** the entry that they are of; null for hours by themselves */
  entry: OwnEntry | null;
  minutes: number;
  kind: HoursKind | null;
  why: string;
}

/** Holds one's own hours of today: amends the entry that has them, or writes one of hours alone. Throws a HoldError, with words. */
export async function logOwnHours(replica: Replica, given: OwnHours): Promise<Done> {
  const { entry, minutes } = given;
  const op = entry
    ? await replica.hold('entry.amend', amendment(replica, given, entry))
    : await writeAlone(replica, given);
  return {
    done: op.id,
    words: `Your hours: ${hoursText(minutes)} h`,
    undo: entry
      ? [amendBack(replica, entry)]
      : undoneAtOnce([{ entity: 'entry', id: (op.data as { entryId: string }).entryId }]),
  };
}

function amendment(replica: Replica, { minutes, kind, why }: OwnHours, { entryId }: OwnEntry): object {
  const hours = [{ personId: replica.view().me.personId, minutes, kind }];
  return { entryId, set: { hours }, ...(why.trim() ? { why: why.trim() } : {}) };
}

function amendBack(replica: Replica, { entryId, minutes, kind }: OwnEntry): Holding {
  const hours = [{ personId: replica.view().me.personId, minutes: minutes ?? 0, kind }];
  return { kind: 'entry.amend', data: { entryId, set: { hours }, why: UNDONE_WHY } };
}

function writeAlone(replica: Replica, { where, minutes, kind }: OwnHours) {
  const { me, today } = replica.view();
  return replica.hold('entry.write', {
    entryId: replica.newId(),
    ...where,
    workDate: today,
    text: '',
    spoken: false,
    hours: [{ personId: me.personId, minutes, ...(kind ? { kind } : {}) }],
  });
}
