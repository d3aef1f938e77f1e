import type { SetAsideRow } from '#shared/set-aside/set-aside.ts';
import type { HeldPicture } from '#src/replica/photos/picture.ts';
import type { SentItem } from '#src/replica/replica.ts';
import type { View } from '#src/replica/view.ts';
import { momentWords, spanWords } from '#src/words/day-words.ts';
import { opWords, type OpInWords } from '#src/words/op-words.ts';
import { REASON_WORDS } from '#src/words/reason-words.ts';
import { whoWords } from '#src/words/who.ts';

export interface HeldLine extends OpInWords {
  id: string;
  /** '14:05' */
  made: string;
  /** '3 hours' */
  age: string;
  /** whose it is, where it is another person's of this device */
  whose: string | null;
}

export interface SetAsideLine extends OpInWords {
  id: string;
  reason: string;
  /** what has become of it */
  state: string;
  isWaiting: boolean;
}

export interface SentLine extends OpInWords {
  id: string;
  /** 'Kept 14:05' */
  became: string;
  isLoose: boolean;
}

export interface HeldPhotoLine {
  sha256: string;
  /** 'Penny Candle', or what the file was called where no photo names it */
  where: string;
  /** what has become of it, in one sentence */
  became: string;
  made: string;
  isRefused: boolean;
}

const SENT_SHOWN_MAX = 30;

/** What this device has not sent yet, the oldest first. */
export function readHeld(view: View): HeldLine[] {
  return view.held.map(({ op, personId, heldSince }) => ({
    ...opWords(view, op),
    id: op.id,
    made: momentWords(heldSince, view.timeZone, view.today),
    age: spanWords(Math.max(view.nowMs - Date.parse(heldSince), 0)),
    whose: personId === view.me.personId ? null : whoWords(view, personId),
  }));
}

/** The pictures that are not with the server whole, the oldest first. */
export function readHeldPhotos(view: View, held: HeldPicture[]): HeldPhotoLine[] {
  const photos = new Map(view.all('photo').map((photo) => [photo.sha256, photo]));
  return held.map((picture) => {
    const { sha256, name, since, state } = picture;
    const boatId = photos.get(sha256)?.boatId;
    return {
      sha256,
      where: (boatId && view.find('boat', boatId)?.name) ?? name,
      became: pictureBecame(picture),
      made: momentWords(since, view.timeZone, view.today),
      isRefused: state === 'refused',
    };
  });
}

function pictureBecame({ state, words }: HeldPicture): string {
  if (state === 'refused')
    return `The server does not take it: ${words} It stays here; ‘Send now’ tries it again.`;
  return state === 'thumb' ? 'The small picture is sent, the whole one waits.' : 'Waits to be sent.';
}

/** What this person sent and the server set aside: what waits first, then the newest. */
export function readSetAside(view: View): SetAsideLine[] {
  return view
    .all('setAside')
    .filter((row) => row.authorId === view.me.personId)
    .map((row) => ({ row, isWaiting: row.state === 'waiting' }))
    .sort((a, b) => Number(b.isWaiting) - Number(a.isWaiting) || (a.row.id < b.row.id ? 1 : -1))
    .map(({ row, isWaiting }) => ({
      ...opWords(view, row.op),
      id: row.id,
      reason: REASON_WORDS[row.reason],
      state: stateWords(view, row),
      isWaiting,
    }));
}

function stateWords(view: View, row: SetAsideRow): string {
  if (row.state === 'waiting') return 'It does not count yet.';
  if (row.state === 'since-kept') return 'It counts since then.';
  const did = row.state === 'admitted' ? 'Admitted' : 'Dismissed';
  const by = row.by ? ` by ${whoWords(view, row.by)}` : '';
  const at = row.at ? ` ${momentWords(row.at, view.timeZone, view.today)}` : '';
  return `${did}${by}${at}${row.why ? `: ${row.why}` : ''}.`;
}

/** What this person sent from here lately, and what the server made of it. */
export function readSent(view: View, sent: SentItem[]): SentLine[] {
  return sent
    .filter(({ personId }) => personId === view.me.personId)
    .slice(0, SENT_SHOWN_MAX)
    .map((item) => ({
      ...opWords(view, item.op),
      id: item.op.id,
      became: becameWords(view, item),
      isLoose: item.outcome !== 'kept',
    }));
}

function becameWords(view: View, { outcome, reason, answeredAt }: SentItem): string {
  const at = momentWords(answeredAt, view.timeZone, view.today);
  if (outcome === 'kept') return `Kept ${at}`;
  if (outcome === 'loose-end') return `Kept ${at}. Somebody else had said otherwise: it became a loose end.`;
  return `Set aside ${at}. ${reason ? REASON_WORDS[reason] : ''}`.trim();
}
