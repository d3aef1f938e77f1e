import type { EntryRow } from '#shared/entry/entry.ts';
import type { FindingRow } from '#shared/finding/finding.ts';
import type { PhotoRow } from '#shared/photo/photo.ts';
import type { SoundRow } from '#shared/sound/sound.ts';
import type { Day } from '#shared/sync/day.ts';
import type { Row } from '#shared/sync/row.ts';
import type { Bung } from '#src/components/bung-mark.tsx';
import type { View } from '#src/replica/view.ts';
import {
  CERTAINTY_WORDS,
  extentWords,
  findingTitle,
  KNOWN_WORDS,
  soundTitle,
} from '#src/words/finding-words.ts';
import { PHOTO_SET_WORDS } from '#src/words/photo-words.ts';
import { placeWords } from '#src/words/place-words.ts';
import { boatWords } from '#src/words/where.ts';
import { whoWords } from '#src/words/who.ts';

export interface PhotoOnSheet {
  id: string;
  sha256: string;
  width: number;
  height: number;
  words: string;
}

/** A finding, or what was found sound, as a day tells it. */
export interface NoteOnSheet {
  id: string;
  entity: 'finding' | 'sound';
  mark: Bung;
  /** 'Found: rot, floor 7'; 'Sound: stringer, no rot' */
  title: string;
  /** 'proved, opened up', '6 in long' */
  facts: string[];
  words: string;
  photos: PhotoOnSheet[];
  struck: string | null;
}

/** What somebody noted or photographed on a boat by itself, with no entry. */
export interface AloneOnSheet {
  boatId: string;
  boatName: string;
  notes: NoteOnSheet[];
  photos: PhotoOnSheet[];
}

export interface NotesOfDay {
  ofEntry: (entryId: string) => Pick<AloneOnSheet, 'notes' | 'photos'>;
  /** of one person, by boat */
  alone: (personId: string) => AloneOnSheet[];
}

type NoteRow = FindingRow | SoundRow;

/** What came with the day's entries, and what was noted or photographed on the day by itself. */
export function readNotes(
  view: View,
  day: Day,
  entries: readonly EntryRow[],
  looseIds: ReadonlySet<string>,
): NotesOfDay {
  const entryIds = new Set(entries.map(({ id }) => id));
  const isOfEntry = ({ entryId }: { entryId?: string }) => entryId !== undefined && entryIds.has(entryId);
  const isAlone = ({ entryId }: { entryId?: string }) => !entryId || !view.find('entry', entryId);
  const notes: [NoteOnSheet['entity'], NoteRow][] = [
    ...view.all('finding').map((row) => ['finding', row] as [NoteOnSheet['entity'], NoteRow]),
    ...view.all('sound').map((row) => ['sound', row] as [NoteOnSheet['entity'], NoteRow]),
  ].filter(([, row]) => isOfEntry(row) || (isAlone(row) && row.notedOn === day));
  const findingIds = new Set(notes.map(([, { id }]) => id));
  const photos = view.all('photo').filter(({ struck }) => !struck);
  const ownPhotos = photos.filter(({ findingId }) => !findingId || !findingIds.has(findingId));
  const photosOf = (findingId: string) => photos.filter((photo) => photo.findingId === findingId);
  const read = ([entity, row]: (typeof notes)[number]) =>
    readNote(view, entity, row, photosOf(row.id), looseIds);
  return {
    ofEntry: (entryId) => ({
      notes: notes.filter(([, row]) => row.entryId === entryId).map(read),
      photos: ownPhotos.filter((photo) => photo.entryId === entryId).map(readPhoto),
    }),
    alone(personId) {
      const isOwn = (row: Row & { authorId: string; entryId?: string }) =>
        row.authorId === personId && isAlone(row);
      const ownNotes = notes.filter(([, row]) => isOwn(row));
      const own = ownPhotos.filter((photo) => isOwn(photo) && photo.attachedOn === day);
      const boatIds = new Set([...ownNotes.map(([, row]) => row), ...own].map(({ boatId }) => boatId));
      return [...boatIds].map((boatId) => ({
        boatId,
        boatName: boatWords(view, boatId),
        notes: ownNotes.filter(([, row]) => row.boatId === boatId).map(read),
        photos: own.filter((photo) => photo.boatId === boatId).map(readPhoto),
      }));
    },
  };
}

function readNote(
  view: View,
  entity: NoteOnSheet['entity'],
  row: NoteRow,
  photos: PhotoRow[],
  looseIds: ReadonlySet<string>,
): NoteOnSheet {
  return {
    id: row.id,
    entity,
    mark: markOfRow(view, entity, row, looseIds),
    ...(entity === 'finding' ? foundWords(view, row as FindingRow) : soundWords(row as SoundRow)),
    photos: photos.map(readPhoto),
    struck: row.struck && `struck by ${whoWords(view, row.struck.by)}: ${row.struck.why}`,
  };
}

function foundWords(view: View, row: FindingRow): Pick<NoteOnSheet, 'title' | 'facts' | 'words'> {
  const units = view.all('shop')[0]?.units ?? 'imperial';
  const feared = extentWords(row.fearedExtent, units);
  const facts = [
    `${CERTAINTY_WORDS[row.certainty]}, ${KNOWN_WORDS[row.known]}`,
    extentWords(row.seenExtent, units),
    feared && `feared ${feared}`,
  ];
  const title = findingTitle(row);
  return {
    title: `Found: ${title.charAt(0).toLowerCase()}${title.slice(1)}`,
    facts: facts.filter(Boolean),
    words: row.text,
  };
}

function soundWords(row: SoundRow): Pick<NoteOnSheet, 'title' | 'facts' | 'words'> {
  return { title: soundTitle(row), facts: [KNOWN_WORDS[row.known]], words: row.text ?? '' };
}

function markOfRow(view: View, entity: NoteOnSheet['entity'], row: Row, looseIds: ReadonlySet<string>): Bung {
  if (looseIds.has(row.id)) return 'loose';
  if (row.struck) return 'struck';
  return view.isHeld(entity, row.id) ? 'held' : 'sent';
}

function readPhoto({ id, sha256, width, height, place, set, caption }: PhotoRow): PhotoOnSheet {
  const of = [placeWords(place), set && PHOTO_SET_WORDS[set]].filter(Boolean).join(', ');
  const words = [of, caption?.trim()].filter(Boolean).join(': ') || 'Photograph';
  return { id, sha256, width, height, words };
}
