import type { PhotoRow } from '#shared/photo/photo.ts';
import type { View } from '#src/replica/view.ts';
import type { BoatRows, DayRows, Tick } from '#src/routes/alongside/read-boat-rows.ts';
import { readEntry, type EntryLine } from '#src/routes/alongside/read-entry-line.ts';
import { readFinding, readSound, type NoteLine } from '#src/routes/alongside/read-note-line.ts';
import { photoTitle, readPhoto, type PhotoLine } from '#src/routes/alongside/read-photos.ts';
import { timeWords } from '#src/words/day-words.ts';
import { whoWords } from '#src/words/who.ts';

/** An entry with what came with it. */
export interface EntryItem extends EntryLine {
  item: 'entry';
  photos: PhotoLine[];
  notes: NoteLine[];
  /** the tasks that were ticked with it */
  ticked: string[];
}

export interface NoteItem extends NoteLine {
  item: 'note';
}

/** Photographs that one person took of one place, one after the other. */
export interface PhotosItem {
  item: 'photos';
  id: string;
  time: string;
  author: string;
  title: string;
  photos: PhotoLine[];
  isHeld: boolean;
}

/** Tasks that one person ticked off, with no entry. */
export interface TicksItem {
  item: 'ticks';
  id: string;
  time: string;
  author: string;
  titles: string[];
  isHeld: boolean;
}

export type LineItem = EntryItem | NoteItem | PhotosItem | TicksItem;

type Timed = LineItem & { at: string };

/** What a day holds, the newest first. `stageId` is the stage that is being looked at. */
export function readItems(view: View, rows: BoatRows, day: DayRows, stageId: string | null): LineItem[] {
  const items: Timed[] = [
    ...day.entries.map((entry) => ({
      ...readEntryItem(view, rows, readEntry(view, entry, stageId)),
      at: entry.writtenAt,
    })),
    ...day.findings.map((finding) => ({
      item: 'note' as const,
      at: finding.notedAt,
      ...readFinding(view, finding, rows.photos),
    })),
    ...day.sounds.map((sound) => ({ item: 'note' as const, at: sound.notedAt, ...readSound(view, sound) })),
    ...photosItems(view, day.photos),
    ...ticksItems(view, day.ticks),
  ];
  return items.sort(byNewest).map(({ at: _at, ...item }) => item as LineItem);
}

/** The findings, what was found sound, the photographs and the ticks that came with an entry. */
export function readEntryItem(view: View, rows: BoatRows, entry: EntryLine): EntryItem {
  const { id } = entry;
  return {
    item: 'entry',
    ...entry,
    photos: (rows.photos.ofEntry.get(id) ?? []).map((photo) => readPhoto(view, photo)),
    notes: [
      ...(rows.findingsOf.get(id) ?? []).map((finding) => readFinding(view, finding, rows.photos)),
      ...(rows.soundsOf.get(id) ?? []).map((sound) => readSound(view, sound)),
    ],
    ticked: (rows.ticksOf.get(id) ?? []).map(({ title }) => title),
  };
}

function byNewest(a: Timed, b: Timed): number {
  if (a.at !== b.at) return a.at < b.at ? 1 : -1;
  return a.id < b.id ? 1 : -1;
}

function photosItems(view: View, photos: PhotoRow[]): (PhotosItem & { at: string })[] {
  return runsOf(
    photos,
    (photo) => `${photo.authorId} ${photo.findingId ?? ''} ${JSON.stringify([photo.place, photo.set])}`,
  ).map((run) => {
    const last = run.at(-1)!;
    const { place, set } = last;
    return {
      item: 'photos' as const,
      id: last.id,
      at: last.attachedAt,
      time: timeWords(last.attachedAt, view.timeZone),
      author: whoWords(view, last.authorId),
      title: photoTitle({ place, set, caption: null }),
      photos: run.map((photo) => readPhoto(view, photo)),
      isHeld: run.some(({ id }) => view.isHeld('photo', id)),
    };
  });
}

function ticksItems(view: View, ticks: Tick[]): (TicksItem & { at: string })[] {
  const byTime = [...ticks].sort((a, b) => (a.mark.at < b.mark.at ? -1 : 1));
  return runsOf(byTime, ({ mark }) => mark.personId).map((run) => {
    const { mark } = run.at(-1)!;
    return {
      item: 'ticks' as const,
      id: mark.id,
      at: mark.at,
      time: timeWords(mark.at, view.timeZone),
      author: whoWords(view, mark.personId),
      titles: run.map(({ title }) => title),
      isHeld: run.some(({ taskId }) => view.isHeld('task', taskId)),
    };
  });
}

/** Neighbours with the same key, together. */
function runsOf<T>(items: readonly T[], keyOf: (item: T) => string): T[][] {
  const runs: T[][] = [];
  let lastKey: string | null = null;
  for (const item of items) {
    const key = keyOf(item);
    if (key === lastKey) runs.at(-1)!.push(item);
    else runs.push([item]);
    lastKey = key;
  }
  return runs;
}
