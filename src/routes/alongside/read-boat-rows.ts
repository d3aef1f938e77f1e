import type { EntryRow } from '#shared/entry/entry.ts';
import type { FindingRow } from '#shared/finding/finding.ts';
import type { PhotoRow } from '#shared/photo/photo.ts';
import type { SoundRow } from '#shared/sound/sound.ts';
import type { Mark } from '#shared/stage/stage.ts';
import type { Day } from '#shared/sync/day.ts';
import { standingItems } from '#shared/sync/items.ts';
import type { View } from '#src/replica/view.ts';
import { photosByOwner, type PhotosByOwner } from '#src/routes/alongside/read-photos.ts';

/** A tick of a task, with what the task is. */
export interface Tick {
  mark: Mark;
  taskId: string;
  title: string;
}

/** What a boat's day holds, as rows. */
export interface DayRows {
  entries: EntryRow[];
  /** that came with no entry that is on this device */
  findings: FindingRow[];
  sounds: SoundRow[];
  photos: PhotoRow[];
  ticks: Tick[];
}

/** A boat's rows by day, and by the entry that they came with. */
export interface BoatRows {
  days: ReadonlyMap<Day, DayRows>;
  findingsOf: ReadonlyMap<string, FindingRow[]>;
  soundsOf: ReadonlyMap<string, SoundRow[]>;
  ticksOf: ReadonlyMap<string, Tick[]>;
  photos: PhotosByOwner;
}

/** Everything that was logged on a boat, sorted into days. */
export function readBoatRows(view: View, boatId: string): BoatRows {
  const days = new Map<Day, DayRows>();
  const dayRows = (day: Day) => {
    const known = days.get(day) ?? { entries: [], findings: [], sounds: [], photos: [], ticks: [] };
    days.set(day, known);
    return known;
  };
  const photos = photosByOwner(view, boatId);
  const [findingsOf, soundsOf, ticksOf] = [
    new Map<string, FindingRow[]>(),
    new Map<string, SoundRow[]>(),
    new Map<string, Tick[]>(),
  ];
  const isHere = (row: { boatId: string } | undefined) => row?.boatId === boatId;
  /** the entry that something came with, where it is on this boat still */
  const entryOf = (entryId: string | undefined) =>
    entryId !== undefined && isHere(view.find('entry', entryId)) ? entryId : null;
  for (const entry of view.all('entry')) if (isHere(entry)) dayRows(entry.workDate).entries.push(entry);
  for (const finding of view.all('finding').filter(isHere)) {
    const entryId = entryOf(finding.entryId);
    if (entryId) push(findingsOf, entryId, finding);
    else dayRows(finding.notedOn).findings.push(finding);
  }
  for (const sound of view.all('sound').filter(isHere)) {
    const entryId = entryOf(sound.entryId);
    if (entryId) push(soundsOf, entryId, sound);
    else dayRows(sound.notedOn).sounds.push(sound);
  }
  for (const photo of photos.alone) dayRows(photo.attachedOn).photos.push(photo);
  for (const tick of ticksOn(view, boatId)) {
    const entryId = entryOf(tick.mark.entryId);
    if (entryId) push(ticksOf, entryId, tick);
    else dayRows(tick.mark.workDate).ticks.push(tick);
  }
  return { days, findingsOf, soundsOf, ticksOf, photos };
}

function ticksOn(view: View, boatId: string): Tick[] {
  return view
    .all('task')
    .filter((task) => task.boatId === boatId && !task.struck && task.marks.length > 0)
    .flatMap((task) =>
      standingItems(task.marks).map((mark) => ({ mark, taskId: task.id, title: task.title })),
    );
}

function push<T>(map: Map<string, T[]>, key: string, value: T): void {
  const known = map.get(key);
  if (known) known.push(value);
  else map.set(key, [value]);
}
