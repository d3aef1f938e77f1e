import type { FindingRow } from '#shared/finding/finding.ts';
import type { PhotoRow } from '#shared/photo/photo.ts';
import type { SoundRow } from '#shared/sound/sound.ts';

import { differingStatements, STAGE_FIELD, STRUCK_FIELD } from '#shared/sync/fields.ts';
import { dayAt } from '#shared/sync/day.ts';
import type { Bung } from '#src/components/bung-mark.tsx';
import type { View } from '#src/replica/view.ts';
import { readHistory, type HistoryLine } from '#src/routes/alongside/entry/read-history.ts';
import { SETTLED_WHY, type Settling } from '#src/routes/alongside/entry/settle.ts';
import { mayDo, mayStrike } from '#src/replica/may-do.ts';
import type { NoteEntity, NoteRow } from '#src/routes/alongside/note/note-values.ts';
import { readEnds, type EndLine } from '#src/routes/alongside/read-ends.ts';
import { markOf, struckWords } from '#src/routes/alongside/read-mark.ts';
import { readFinding, readSound } from '#src/routes/alongside/read-note-line.ts';
import { photosByOwner, photoTitle, readPhoto, type PhotoLine } from '#src/routes/alongside/read-photos.ts';
import { dayWords, timeWords } from '#src/words/day-words.ts';
import { whereWords } from '#src/words/where.ts';
import { capital, whoWords } from '#src/words/who.ts';

export interface NotePage {
  entity: NoteEntity;
  row: NoteRow;
  title: string;
  where: string;
  /** 'Rosa, Tue 8 Sep 14:05' */
  said: string;
  facts: string[];
  words: string;
  photos: PhotoLine[];
  mark: Bung;
  isHeld: boolean;
  struck: string | null;
  ends: EndLine[];
  history: HistoryLine[];
  /** what it came with or shows, each with its page */
  links: { to: string; words: string }[];
  mayAmend: boolean;
  mayStrike: boolean;
}

/** A finding, what was found sound or a photograph, with its history; null where it is not on this device. */
export function readNotePage(view: View, entity: NoteEntity, id: string): NotePage | null {
  const row = view.find(entity, id);
  if (!row) return null;
  const ends = readEnds(view, entity, row);
  const isHeld = view.isHeld(entity, id);
  const at = 'notedAt' in row ? row.notedAt : row.attachedAt;
  return {
    entity,
    row,
    where: whereWords(view, row.boatId, row.stageId),
    said: `${capital(whoWords(view, row.authorId))}, ${dayWords(dayAt(Date.parse(at), view.timeZone), view.today)} ${timeWords(at, view.timeZone)}`,
    ...readSaid(view, entity, row),
    mark: markOf(row, ends, isHeld),
    isHeld,
    struck: struckWords(view, row),
    ends,
    history: readHistory(view, row),
    links: readLinks(view, row),
    mayAmend: row.struck === null && mayDo(view, `${entity}.amend`, {}, row),
    mayStrike: mayStrike(view, entity, row),
  };
}

function readSaid(
  view: View,
  entity: NoteEntity,
  row: NoteRow,
): Pick<NotePage, 'title' | 'facts' | 'words' | 'photos'> {
  if (entity === 'photo') {
    const photo = row as PhotoRow;
    return {
      title: capital(photoTitle({ ...photo, caption: null })),
      facts: [],
      words: photo.caption ?? '',
      photos: [readPhoto(view, photo)],
    };
  }
  const line =
    entity === 'finding'
      ? readFinding(view, row as FindingRow, photosByOwner(view, row.boatId))
      : readSound(view, row as SoundRow);
  const { title, facts, words, photos } = line;
  return { title, facts: facts.map(capital), words, photos };
}

function readLinks(view: View, row: NoteRow): NotePage['links'] {
  const entry = row.entryId ? view.find('entry', row.entryId) : undefined;
  const findingId = 'findingId' in row ? row.findingId : null;
  const finding = findingId ? view.find('finding', findingId) : undefined;
  return [
    ...(finding ? [{ to: `/finding/${finding.id}`, words: 'The finding that it shows' }] : []),
    ...(entry ? [{ to: `/entry/${entry.id}`, words: 'The entry that it came with' }] : []),
  ];
}

/** The op that has one of a loose end's values stand, and names them all; null where it is settled otherwise. */
export function settleNote(
  { entity, row, mayAmend, mayStrike: may }: NotePage,
  end: EndLine,
  opId: string,
): Settling | null {
  if (end.kind !== 'field' || end.field === null) return null;
  const said = differingStatements(row, end.field).find((statement) => statement.opId === opId);
  if (!said) return null;
  const id = { [`${entity}Id`]: row.id };
  if (end.field === STRUCK_FIELD) {
    const kind = `${entity}.${said.value === null ? 'restore' : 'strike'}`;
    return may ? { kind, data: { ...id, why: SETTLED_WHY } } : null;
  }
  const set = end.field === STAGE_FIELD ? said.value : { [end.field]: said.value };
  return mayAmend ? { kind: `${entity}.amend`, data: { ...id, set, why: SETTLED_WHY } } : null;
}
