import type { PhotoRow } from '#shared/photo/photo.ts';
import type { Place } from '#shared/place/place.ts';
import type { Row } from '#shared/sync/row.ts';
import { dayAt } from '#shared/sync/day.ts';
import { stampTime } from '#shared/sync/stamp.ts';
import { findingWords } from '#shared/trade/finding-words.ts';
import { PARTS } from '#shared/trade/parts.ts';
import type { View } from '#src/replica/view.ts';
import { photoTitle } from '#src/routes/alongside/read-photos.ts';
import { isFound, wordsOf } from '#src/routes/alongside/search/search-words.ts';
import { counted, dayWords } from '#src/words/day-words.ts';
import { CERTAINTY_WORDS, findingTitle, KNOWN_WORDS, soundTitle } from '#src/words/finding-words.ts';
import { openingWords } from '#src/words/name-words.ts';
import { PHOTO_SET_WORDS } from '#src/words/photo-words.ts';
import { boatWords, whereWords } from '#src/words/where.ts';
import { capital, whoWords } from '#src/words/who.ts';

type Searched = 'entry' | 'finding' | 'sound' | 'photo' | 'task' | 'boat';

/** Something that was found by its words, with the way to its page. */
export interface Hit {
  id: string;
  entity: Searched;
  /** 'Entry', 'Finding' */
  what: string;
  title: string;
  /** 'Rosa · Tue 8 Sep · Penny Candle · Strip' */
  about: string;
  isStruck: boolean;
  to: string;
  /** where one has to be for its page to show it */
  where: { boatId: string; stageId: string | null };
}

/** What is looked for in a row, and what is shown of it. */
interface Entry {
  entity: Searched;
  row: Row & { boatId?: string; stageId?: string | null };
  at: string;
  /** everything that it can be found by */
  text: () => string;
  hit: () => Pick<Hit, 'what' | 'title' | 'to'> & { who?: string };
}

export interface SearchAnswer {
  hits: Hit[];
  /** how many there are, shown or not */
  count: number;
}

const wordsOfRow = new WeakMap<object, ReadonlySet<string>>();
const TITLE_LENGTH_MAX = 140;

/** What this device carries that has every word asked for, the newest first; of one boat, or of all. */
export function readSearch(view: View, asked: string, boatId: string | null, hitsMax: number): SearchAnswer {
  const words = wordsOf(asked);
  if (words.length === 0) return { hits: [], count: 0 };
  const found = entriesOf(view)
    .filter(({ row, entity }) => boatId === null || (entity === 'boat' ? row.id : row.boatId) === boatId)
    .filter((entry) => isFound(knownWords(entry), words))
    .sort((a, b) => (a.at !== b.at ? (a.at < b.at ? 1 : -1) : a.row.id < b.row.id ? 1 : -1));
  return { hits: found.slice(0, hitsMax).map((entry) => hitOf(view, entry)), count: found.length };
}

// a row never changes: another state of it is another object
function knownWords({ row, text }: Entry): ReadonlySet<string> {
  const known = wordsOfRow.get(row) ?? new Set(wordsOf(text()));
  wordsOfRow.set(row, known);
  return known;
}

function hitOf(view: View, { entity, row, at, hit }: Entry): Hit {
  const { who, ...shown } = hit();
  const boatId = row.boatId ?? row.id;
  const stageId = row.stageId ?? null;
  const where =
    entity === 'boat' ? null : stageId ? whereWords(view, boatId, stageId) : boatWords(view, boatId);
  const day = entity === 'boat' ? null : dayWords(dayAt(Date.parse(at), view.timeZone), view.today);
  return {
    ...shown,
    id: row.id,
    entity,
    about: [who && capital(who), day, where].filter(Boolean).join(' · '),
    isStruck: row.struck !== null,
    where: { boatId, stageId },
  };
}

function entriesOf(view: View): Entry[] {
  const who = (personId: string) => whoWords(view, personId);
  return [
    ...view.all('entry').map((row) => ({
      entity: 'entry' as const,
      row,
      at: `${row.workDate}T${row.writtenAt.slice(11)}`,
      text: () => [row.text, placeText(row.place), ...row.additions.map(({ text }) => text)].join(' '),
      hit: () => ({
        what: 'Entry',
        title: openingWords(row.text, TITLE_LENGTH_MAX) || 'Hours alone',
        to: `/entry/${row.id}`,
        who: who(row.authorId),
      }),
    })),
    ...view.all('finding').map((row) => ({
      entity: 'finding' as const,
      row,
      at: row.notedAt,
      text: () =>
        [
          'found finding',
          row.text,
          findingWords(row.kind),
          placeText(row.place),
          KNOWN_WORDS[row.known],
          CERTAINTY_WORDS[row.certainty],
        ].join(' '),
      hit: () => ({
        what: `Finding, ${CERTAINTY_WORDS[row.certainty]}`,
        title: findingTitle(row),
        to: `/finding/${row.id}`,
        who: who(row.authorId),
      }),
    })),
    ...view.all('sound').map((row) => ({
      entity: 'sound' as const,
      row,
      at: row.notedAt,
      text: () =>
        [
          'sound looked',
          row.text ?? '',
          row.about ? findingWords(row.about) : '',
          placeText(row.place),
          KNOWN_WORDS[row.known],
        ].join(' '),
      hit: () => ({
        what: 'Found sound',
        title: soundTitle(row),
        to: `/sound/${row.id}`,
        who: who(row.authorId),
      }),
    })),
    ...photoEntries(view),
    ...view.all('task').map((row) => ({
      entity: 'task' as const,
      row,
      at: stampTime(row.stamps[row.madeBy]!),
      text: () => ['task', row.title, placeText(row.place)].join(' '),
      hit: () => ({
        what: row.done ? 'Task, ticked off' : 'Task',
        title: row.title,
        to: `/tasks?task=${row.id}`,
      }),
    })),
    ...view.all('boat').map((row) => ({
      entity: 'boat' as const,
      row,
      at: stampTime(row.stamps[row.madeBy]!),
      text: () =>
        [
          row.name,
          ...(row.names ?? []).map(({ name }) => name),
          row.hullNumber ?? '',
          row.type ?? '',
          row.builder ?? '',
        ].join(' '),
      hit: () => ({ what: 'Boat', title: boatTitle(row.name, row.names), to: '/alongside' }),
    })),
  ];
}

/** Photographs of one pick, with the same words, are one thing to be found. */
function photoEntries(view: View): Entry[] {
  const picks = new Map<string, PhotoRow[]>();
  for (const row of view.all('photo')) {
    const { boatId, authorId, attachedOn, entryId, findingId, place, set, caption, struck } = row;
    const key = JSON.stringify([
      boatId,
      authorId,
      attachedOn,
      entryId,
      findingId,
      place,
      set,
      caption,
      struck !== null,
    ]);
    picks.set(key, [...(picks.get(key) ?? []), row]);
  }
  return [...picks.values()].map((rows) => {
    const row = rows[0]!;
    return {
      entity: 'photo' as const,
      row,
      at: row.attachedAt,
      text: () =>
        ['photo', row.caption ?? '', placeText(row.place), row.set ? PHOTO_SET_WORDS[row.set] : ''].join(' '),
      hit: () => ({
        what: rows.length === 1 ? 'Photo' : counted(rows.length, 'photo'),
        title: capital(photoTitle(row)),
        to: `/photo/${row.id}`,
        who: whoWords(view, row.authorId),
      }),
    };
  });
}

function boatTitle(name: string, names: { name: string }[] | null | undefined): string {
  const others = (names ?? []).map((each) => each.name).filter((each) => each !== name);
  return others.length > 0 ? `${name}, once ${others.join(', ')}` : name;
}

const RANGE_MAX = 200;

/** Everything that a place can be found by: the part by any of its names, each number of a range, both sides where it is both. */
function placeText(place: Place | null | undefined): string {
  if (!place) return '';
  const { partId, side, number, toNumber, words } = place;
  const part = PARTS.find(({ id }) => id === partId);
  const to = Math.min(toNumber ?? number ?? 0, (number ?? 0) + RANGE_MAX);
  const numbers =
    number === undefined
      ? []
      : Array.from({ length: Math.max(to - number, 0) + 1 }, (_none, index) => number + index);
  return [
    part ? [part.word, ...part.also].join(' ') : (partId ?? ''),
    ...numbers,
    side === 'both' ? 'both port starboard' : (side ?? ''),
    words ?? '',
  ].join(' ');
}
