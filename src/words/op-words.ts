import type { FindingNote } from '#shared/finding/finding.ts';
import type { SoundNote } from '#shared/sound/sound.ts';
import { opSchema, type Op } from '#shared/sync/op.ts';
import type { Entity } from '#shared/sync/row.ts';
import type { View } from '#src/replica/view.ts';
import { hoursText } from '#shared/measure/hours.ts';
import { dayWords } from '#src/words/day-words.ts';
import { findingTitle, soundTitle } from '#src/words/finding-words.ts';
import { openingWords } from '#src/words/name-words.ts';
import { placeWords } from '#src/words/place-words.ts';
import { boatWords, whereWords } from '#src/words/where.ts';
import { capital, whoWords } from '#src/words/who.ts';

/** What an op says, for a list of ops. */
export interface OpInWords {
  /** 'Entry', 'Ticked a task' */
  what: string;
  /** the words or the figures that it carries, shortened; empty where it carries none */
  words: string;
  /** the boat and stage; null where it is about none */
  where: string | null;
  /** where its whole can be read; null where there is no page of it */
  entryId: string | null;
}

type Data = Record<string, unknown>;

const WHAT: Record<string, string> = {
  'entry.write': 'Entry',
  'entry.amend': 'Change of an entry',
  'entry.addTo': 'Addition to an entry',
  'entry.takeBack': 'An addition taken back',
  'entry.strike': 'An entry struck',
  'entry.restore': 'An entry restored',
  'task.add': 'New task',
  'task.start': 'Task started',
  'task.stop': 'Task stopped',
  'task.mark': 'Task ticked off',
  'task.unmark': 'A tick taken back',
  'task.amend': 'Change of a task',
  'task.strike': 'A task struck',
  'task.restore': 'A task restored',
  'stage.add': 'New stage',
  'stage.mark': 'Stage finished',
  'stage.unmark': 'Stage taken up again',
  'stage.amend': 'Change of a stage',
  'stage.strike': 'A stage struck',
  'stage.restore': 'A stage restored',
  'boat.add': 'New boat',
  'boat.amend': 'Change of a boat',
  'boat.strike': 'A boat struck',
  'boat.restore': 'A boat restored',
  'finding.note': 'Finding',
  'finding.amend': 'Change of a finding',
  'finding.strike': 'A finding struck',
  'finding.restore': 'A finding restored',
  'sound.note': 'Found sound',
  'sound.amend': 'Change of what was found sound',
  'sound.strike': 'What was found sound, struck',
  'sound.restore': 'What was found sound, restored',
  'photo.attach': 'Photograph',
  'photo.amend': 'Change of a photograph',
  'photo.strike': 'A photograph struck',
  'photo.restore': 'A photograph restored',
  'setAside.admit': 'Something set aside, admitted',
  'setAside.dismiss': 'Something set aside, dismissed',
};

/** An op in words. `raw` is whatever was kept; what cannot be read as an op is said to be so. */
export function opWords(view: View, raw: unknown): OpInWords {
  const parsed = opSchema.safeParse(raw);
  if (!parsed.success)
    return { what: 'Something that cannot be read', words: '', where: null, entryId: null };
  const op = parsed.data;
  return {
    what: WHAT[op.kind] ?? `Something this version does not know (${op.kind})`,
    words: carriedWords(view, op),
    where: opWhere(view, op.data),
    entryId: entryIn(view, op.data),
  };
}

// what was set aside has made no entry that could be opened
function entryIn(view: View, { entryId }: Data): string | null {
  return typeof entryId === 'string' && view.find('entry', entryId) ? entryId : null;
}

function carriedWords(view: View, op: Op): string {
  const { data } = op;
  const set = (data['set'] ?? {}) as Data;
  const parts = [
    noteTitle(op),
    textOf(data['text']) ||
      textOf(set['text']) ||
      textOf(data['title']) ||
      textOf(data['name']) ||
      rowTitle(view, data),
    hoursWords(view, data['hours'] ?? set['hours']),
    typeof set['workDate'] === 'string' ? `moved to ${dayWords(set['workDate'], view.today)}` : '',
    typeof set['boatId'] === 'string'
      ? `moved to ${whereWords(view, set['boatId'], set['stageId'] as string | null)}`
      : '',
    typeof data['why'] === 'string' && data['why'] ? `because: ${openingWords(data['why'])}` : '',
  ];
  return parts.filter(Boolean).join(' · ');
}

/** 'Rot, deck beam 4 port' of what was found, found sound or photographed. */
function noteTitle({ kind, data }: Op): string {
  // whatever was kept: an op of a newer version may have no such fields
  const { kind: found = '', place = {}, about = null } = data as Partial<FindingNote & SoundNote>;
  if (kind === 'finding.note') return findingTitle({ kind: found, place });
  if (kind === 'sound.note') return soundTitle({ place, about });
  return kind === 'photo.attach' ? capital(placeWords(place)) : '';
}

function textOf(value: unknown): string {
  return typeof value === 'string' ? openingWords(value) : '';
}

/** What the changed row is called, where the op itself carries no words. */
function rowTitle(view: View, data: Data): string {
  const task = typeof data['taskId'] === 'string' && view.find('task', data['taskId']);
  if (task) return openingWords(task.title);
  const entry = typeof data['entryId'] === 'string' && view.find('entry', data['entryId']);
  return entry ? openingWords(entry.text) : '';
}

function hoursWords(view: View, hours: unknown): string {
  if (!Array.isArray(hours)) return '';
  return (hours as { personId: string; minutes: number }[])
    .map(({ personId, minutes }) => `${whoWords(view, personId)} ${unbroken(`${hoursText(minutes)} h`)}`)
    .join(', ');
}

// no line ends between '2' and '1/2'
function unbroken(words: string): string {
  return words.replaceAll(' ', '\u00a0');
}

const ROWS_WITH_BOAT: [field: string, entity: Extract<Entity, 'entry' | 'task' | 'stage'>][] = [
  ['entryId', 'entry'],
  ['taskId', 'task'],
  ['stageId', 'stage'],
];

function opWhere(view: View, data: Data): string | null {
  if (typeof data['boatId'] === 'string') {
    const stageId = data['stageId'];
    return typeof stageId === 'string'
      ? whereWords(view, data['boatId'], stageId)
      : boatWords(view, data['boatId']);
  }
  for (const [field, entity] of ROWS_WITH_BOAT) {
    const row = typeof data[field] === 'string' ? view.find(entity, data[field]) : undefined;
    if (!row?.boatId) continue;
    return whereWords(view, row.boatId, 'stageId' in row ? (row.stageId as string | null) : row.id);
  }
  return null;
}
