import type { BoatRow } from '#shared/boat/boat.ts';
import { hoursLines, sumHours } from '#shared/entry/sums.ts';
import { boatLengthText } from '#shared/measure/length.ts';
import type { Units } from '#shared/measure/length.ts';
import type { StageRow } from '#shared/stage/stage.ts';
import { standingItems } from '#shared/sync/items.ts';
import type { TaskRow } from '#shared/task/task.ts';
import type { View } from '#src/replica/view.ts';
import { counted, dayWords } from '#src/words/day-words.ts';
import { listWords } from '#src/words/name-words.ts';
import { whoWords } from '#src/words/who.ts';
import { readProgress } from './read-boats.ts';

export interface StageOfBoat {
  id: string;
  name: string;
  minutes: number;
  /** 'finished Mon 4 May by Orrin'; null where it is not */
  finished: string | null;
  /** '3 of 4 tasks done'; null where it has none */
  tasks: string | null;
}

export interface BoatPage {
  row: BoatRow;
  units: Units;
  particulars: { label: string; words: string }[];
  owners: { id: string; name: string }[];
  progress: { stages: string; tasks: string };
  minutes: number;
  stages: StageOfBoat[];
  mayChange: boolean;
}

/** Everything about one boat; null where she is not known here. */
export function readBoat(view: View, boatId: string): BoatPage | null {
  const row = view.find('boat', boatId);
  if (!row) return null;
  const units = view.all('shop')[0]?.units ?? 'imperial';
  const own = view.all('entry').filter((entry) => entry.boatId === boatId);
  const stages = view.all('stage').filter((stage) => stage.boatId === boatId && !stage.struck);
  const tasks = view.all('task').filter((task) => task.boatId === boatId && !task.struck);
  const minutes = sumHours(hoursLines(own), 'stage');
  return {
    row,
    units,
    particulars: readParticulars(view, row, units),
    owners: view
      .all('person')
      .filter((person) => person.boatIds?.includes(boatId))
      .map(({ id, name }) => ({ id, name })),
    progress: readProgress(view, boatId),
    minutes: [...minutes.values()].reduce((sum, part) => sum + part, 0),
    stages: inOrder(stages).map((stage) => ({
      id: stage.id,
      name: stage.name,
      minutes: minutes.get(stage.id) ?? 0,
      finished: finishedWords(view, stage),
      tasks: tasksWords(tasks.filter((task) => task.stageId === stage.id)),
    })),
    mayChange: view.me.roles.includes('foreman'),
  };
}

function inOrder(stages: StageRow[]): StageRow[] {
  return [...stages].sort((a, b) => a.order - b.order || (a.id < b.id ? -1 : 1));
}

function readParticulars(view: View, boat: BoatRow, units: Units): BoatPage['particulars'] {
  const said: [string, string | null | undefined][] = [
    ['What she is', boat.type],
    ['Length', boat.lengthMm ? boatLengthText(boat.lengthMm, units) : null],
    ['Beam', boat.beamMm ? boatLengthText(boat.beamMm, units) : null],
    ['Hull number', boat.hullNumber],
    ['Built', [boat.builder, boat.builtYear].filter(Boolean).join(', ')],
    ['Came', boat.arrivedOn && dayWords(boat.arrivedOn, view.today)],
    [
      'Lies',
      boat.lies &&
        `${boat.lies.way === 'upright' ? 'upright' : 'upside down'}, since ${dayWords(boat.lies.since, view.today)}`,
    ],
    ['Counted', boat.numbering],
  ];
  return said.flatMap(([label, words]) => (words ? [{ label, words }] : []));
}

function finishedWords(view: View, stage: StageRow): string | null {
  const marks = standingItems(stage.marks);
  if (marks.length === 0) return null;
  const names = listWords([...new Set(marks.map((mark) => whoWords(view, mark.personId)))]);
  return `finished ${dayWords(marks[0]!.workDate, view.today)} by ${names}`;
}

function tasksWords(tasks: TaskRow[]): string | null {
  if (tasks.length === 0) return null;
  return `${tasks.filter((task) => task.done).length} of ${counted(tasks.length, 'task')} done`;
}
