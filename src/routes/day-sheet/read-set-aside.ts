import { isAdmissible, type SetAsideRow } from '#shared/set-aside/set-aside.ts';
import type { Reason } from '#shared/sync/op.ts';
import { stampTime } from '#shared/sync/stamp.ts';
import type { View } from '#src/replica/view.ts';
import { momentWords } from '#src/words/day-words.ts';
import { opWords } from '#src/words/op-words.ts';
import { capital, whoWords } from '#src/words/who.ts';

export interface SetAsideOnSheet {
  id: string;
  what: string;
  words: string;
  where: string | null;
  who: string;
  when: string;
  reason: string;
  mayAdmit: boolean;
  mayDismiss: boolean;
  /** as it came, to be looked at where its words say too little */
  raw: string;
}

/** `decider` is 'you', or who else can let it count. */
const REASONS: Record<Reason, (who: string, decider: string) => string> = {
  malformed: () => 'It could not be read.',
  'not-understood': () =>
    'This server does not know such a thing yet. It is judged again when a newer one is here.',
  'id-reused': () => 'Something else had come under the same mark before.',
  'not-entitled': (who, decider) => `${capital(who)} may not do this; ${decider} can let it count.`,
  'no-such-row': () => 'What it is about has not come yet. It counts by itself as soon as it has.',
  'device-revoked': (_who, decider) =>
    `It came from a device that had been shut out; ${decider} can let it count.`,
  'server-fault': () => 'The server made a mistake with it. It is judged again when a newer one is here.',
};

const RAW_LENGTH_MAX = 4000;

/** What was set aside and waits for somebody to decide, the latest first. */
export function readSetAsides(view: View): SetAsideOnSheet[] {
  const isForeman = view.me.roles.includes('foreman');
  return view
    .all('setAside')
    .filter((row) => row.state === 'waiting')
    .sort((a, b) => (madeAt(a) < madeAt(b) ? 1 : -1))
    .map((row) => {
      const { what, words, where } = opWords(view, row.op);
      return {
        id: row.id,
        what,
        words,
        where,
        who: whoWords(view, row.authorId),
        when: momentWords(madeAt(row), view.timeZone, view.today),
        reason: REASONS[row.reason](whoWords(view, row.authorId), isForeman ? 'you' : 'the foreman'),
        mayAdmit: isForeman && isAdmissible(row),
        mayDismiss: isForeman,
        raw: JSON.stringify(row.op, null, 1).slice(0, RAW_LENGTH_MAX),
      };
    });
}

function madeAt(row: SetAsideRow): string {
  return stampTime(row.stamps[row.madeBy]!);
}
