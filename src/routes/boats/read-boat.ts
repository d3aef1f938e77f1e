import type { BoatRow } from '#shared/boat/boat.ts';
import { hoursLines, sumHours } from '#shared/entry/sums.ts';
import { boatLengthText } from '#shared/measure/length.ts';
import type { Units } from '#shared/measure/length.ts';
import type { StageRow } from '#shared/stage/stage.ts';
import { standingItems } from '#shared/sync/items.ts';
import type { TaskRow } from '#shared/task/task.ts';
import type { View } from '#src/replica/view.ts';
import { dayWords, momentWords } from '#src/words/day-words.ts';
import { listWords } from '#src/words/name-words.ts';
import { stageWords } from '#src/words/where.ts';
import { whoWords } from '#src/words/who.ts';
import { readProgress } from './read-boats.ts';

export interface TaskOfBoat {
  row: TaskRow;
  /** 'done by Rosa Mon 4 May' */
  words: string | null;
  assigned: string | null;
}

export interface StageOfBoat {
  row: StageRow;
  minutes: number;
  /** 'finished Mon 4 May by Orrin'; null where it is not */
  finished: string | null;
  /** 'after Strip out and Survey' */
  after: string | null;
  tasks: TaskOfBoat[];
  doneTasks: number;
}

export interface BoatPage {
  row: BoatRow;
  units: Units;
  particulars: { label: string; words: string }[];
  owners: { id: string; name: string }[];
  progress: { stages: string; tasks: string };
  minutes: number;
  stages: StageOfBoat[];
  struckStages: StageRow[];
  struckTasks: TaskRow[];
  mayChange: boolean;
}

/** Everything about one boat; null where she is not known here. */
export function readBoat(view: View, boatId: string): BoatPage | null {
  const row = view.find('boat', boatId);
  if (!row) return null;
  const units = view.all('shop')[0]?.units ?? 'imperial';
  const own = view.all('entry').filter((entry) => entry.boatId === boatId);
  const stages = view.all('stage').filter((stage) => stage.boatId === boatId);
  const tasks = view.all('task').filter((task) => task.boatId === boatId);
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
    stages: inOrder(stages.filter((stage) => !stage.struck)).map((stage) => ({
      row: stage,
      minutes: minutes.get(stage.id) ?? 0,
      finished: finishedWords(view, stage),
      after:
        stage.after.length > 0 ? `after ${listWords(stage.after.map((id) => stageWords(view, id)))}` : null,
      ...readTasks(
        view,
        tasks.filter((task) => task.stageId === stage.id && !task.struck),
      ),
    })),
    struckStages: inOrder(stages.filter((stage) => stage.struck)),
    struckTasks: tasks.filter((task) => task.struck),
    mayChange: view.me.roles.includes('foreman'),
  };
}

export function inOrder(stages: StageRow[]): StageRow[] {
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

function readTasks(view: View, tasks: TaskRow[]): Pick<StageOfBoat, 'tasks' | 'doneTasks'> {
  const sorted = [...tasks].sort((a, b) => Number(a.done) - Number(b.done) || (a.id < b.id ? -1 : 1));
  return {
    tasks: sorted.map((row) => ({
      row,
      words: taskWords(view, row),
      assigned: row.assigneeIds?.length
        ? `for ${listWords(row.assigneeIds.map((id) => whoWords(view, id)))}`
        : null,
    })),
    doneTasks: tasks.filter((task) => task.done).length,
  };
}

function taskWords(view: View, task: TaskRow): string | null {
  const marks = standingItems(task.marks);
  if (marks.length > 0) {
    const said = marks.map(
      (mark) => `${whoWords(view, mark.personId)} ${dayWords(mark.workDate, view.today)}`,
    );
    return `${task.twice ? 'done twice, by' : 'done by'} ${listWords(said)}`;
  }
  const starts = standingItems(task.starts);
  if (starts.length === 0) return null;
  const said = starts.map(
    (start) => `${whoWords(view, start.personId)} ${momentWords(start.at, view.timeZone, view.today)}`,
  );
  return `started by ${listWords(said)}`;
}
