import { standingItems } from '#shared/sync/items.ts';
import { Key } from '#src/components/key.tsx';
import { useHold, useRead, useReplica } from '#src/replica/hooks.tsx';
import type { StageOfBoat } from './read-boat.ts';

/** Marks the stage finished, or takes up again what was marked. */
export function FinishKey({ stage: { row, finished } }: { stage: StageOfBoat }) {
  const replica = useReplica();
  const { mutate: hold } = useHold();
  const today = useRead(['today'], (view) => view.today);
  const markIds = standingItems(row.marks).map((mark) => mark.id);
  if (finished) {
    return (
      <Key icon="undo" onClick={() => hold({ kind: 'stage.unmark', data: { stageId: row.id, markIds } })}>
        Take it up again
      </Key>
    );
  }
  const data = () => ({ stageId: row.id, markId: replica.newId(), workDate: today });
  return (
    <Key icon="tick" onClick={() => hold({ kind: 'stage.mark', data: data() })}>
      Stage finished<span className="sr-only"> {row.name}</span>
    </Key>
  );
}
