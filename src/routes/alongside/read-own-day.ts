import type { View } from '#src/replica/view.ts';
import type { BoatRows } from '#src/routes/alongside/read-boat-rows.ts';

/** What a person did on a boat today, in figures; what was struck or taken back is not in it. */
export interface OwnDay {
  minutes: number;
  entries: number;
  photos: number;
  findings: number;
  sounds: number;
  ticks: number;
}

export function readOwnDay(view: View, rows: BoatRows): OwnDay {
  const me = view.me.personId;
  const day = rows.days.get(view.today);
  const isMine = (row: { authorId: string; struck: unknown }) => row.authorId === me && !row.struck;
  const isTodays = (day: string) => day === view.today;
  const entries = (day?.entries ?? []).filter((entry) => !entry.struck);
  const hours = entries.flatMap((entry) => entry.hours).filter(({ personId }) => personId === me);
  const all = <T>(lists: ReadonlyMap<string, T[]>, alone: T[] | undefined) => [
    ...[...lists.values()].flat(),
    ...(alone ?? []),
  ];
  const photos = [...all(rows.photos.ofEntry, rows.photos.alone), ...all(rows.photos.ofFinding, [])];
  return {
    minutes: hours.reduce((sum, figure) => sum + figure.minutes, 0),
    entries: entries.filter(isMine).length,
    photos: photos.filter((photo) => isMine(photo) && isTodays(photo.attachedOn)).length,
    findings: all(rows.findingsOf, day?.findings).filter((row) => isMine(row) && isTodays(row.notedOn))
      .length,
    sounds: all(rows.soundsOf, day?.sounds).filter((row) => isMine(row) && isTodays(row.notedOn)).length,
    ticks: all(rows.ticksOf, day?.ticks).filter(({ mark }) => mark.personId === me && isTodays(mark.workDate))
      .length,
  };
}
