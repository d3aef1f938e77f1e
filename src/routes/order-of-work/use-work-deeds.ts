import { useReplica } from '#src/replica/hooks.tsx';
import { useDeeds, type Deeds } from '#src/shell/use-deeds.ts';
import { openingWords } from '#src/words/name-words.ts';
import { standingItems } from '#shared/sync/items.ts';
import type { StageOfOrder } from './read-stages.ts';
import type { TaskOfOrder } from './read-task.ts';

const TITLE_LENGTH_MAX = 44;

/** What is done with tasks and stages in one tap, each with its way back. */
export interface WorkDeeds {
  deeds: Deeds;
  start: (task: TaskOfOrder) => void;
  stop: (task: TaskOfOrder) => void;
  tick: (task: TaskOfOrder) => void;
  untick: (task: TaskOfOrder) => void;
  finish: (stage: StageOfOrder) => void;
  reopen: (stage: StageOfOrder) => void;
}

export function useWorkDeeds(): WorkDeeds {
  const replica = useReplica();
  const deeds = useDeeds();
  const workDate = () => replica.view().today;
  const title = ({ row }: TaskOfOrder) => openingWords(row.title, TITLE_LENGTH_MAX);

  /** Adds an item to a row; undone, it is taken back. */
  function add(words: string, entity: 'task' | 'stage', rowId: string, verb: 'start' | 'mark') {
    const itemId = replica.newId();
    const id = { [`${entity}Id`]: rowId };
    const item = verb === 'mark' ? { markId: itemId, workDate: workDate() } : { startId: itemId };
    deeds.doIt({
      words,
      holdings: [{ kind: `${entity}.${verb}`, data: { ...id, ...item } }],
      back: [takeBack(entity, rowId, verb, [itemId])],
    });
  }

  /** Takes items back; undone, one is there again. */
  function remove(
    words: string,
    entity: 'task' | 'stage',
    rowId: string,
    verb: 'start' | 'mark',
    ids: string[],
  ) {
    const again =
      verb === 'mark' ? { markId: replica.newId(), workDate: workDate() } : { startId: replica.newId() };
    deeds.doIt({
      words,
      holdings: [takeBack(entity, rowId, verb, ids)],
      back: [{ kind: `${entity}.${verb}`, data: { [`${entity}Id`]: rowId, ...again } }],
    });
  }

  return {
    deeds,
    start: (task) => add(`Started: ${title(task)}`, 'task', task.row.id, 'start'),
    stop: (task) => remove(`Stopped: ${title(task)}`, 'task', task.row.id, 'start', task.myStartIds),
    tick: (task) => add(`Ticked off: ${title(task)}`, 'task', task.row.id, 'mark'),
    untick: (task) =>
      remove(`Not done after all: ${title(task)}`, 'task', task.row.id, 'mark', task.myMarkIds),
    finish: ({ row }) => add(`Finished: ${row.name}`, 'stage', row.id, 'mark'),
    reopen: ({ row }) =>
      remove(
        `Taken up again: ${row.name}`,
        'stage',
        row.id,
        'mark',
        standingItems(row.marks).map(({ id }) => id),
      ),
  };
}

const TAKE_BACK = { start: 'stop', mark: 'unmark' } as const;

function takeBack(entity: 'task' | 'stage', rowId: string, verb: 'start' | 'mark', itemIds: string[]) {
  return {
    kind: `${entity}.${TAKE_BACK[verb]}`,
    data: { [`${entity}Id`]: rowId, [`${verb}Ids`]: itemIds },
  };
}
