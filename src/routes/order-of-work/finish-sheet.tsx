import { Key } from '#src/components/key.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { counted } from '#src/words/day-words.ts';
import type { StageOfOrder } from './read-stages.ts';

interface FinishSheetProps {
  stage: StageOfOrder;
  onFinish: () => void;
  onClose: () => void;
}

/** Before a stage is marked finished: what is still open in it. It is told, and forbids nothing. */
export function FinishSheet({ stage: { row, open }, onFinish, onClose }: FinishSheetProps) {
  return (
    <Sheet
      isOpen
      onClose={onClose}
      title={`${row.name}: finished?`}
      foot={
        <>
          <Key kind="main" onClick={onFinish}>
            {open.length > 0 ? 'Finished all the same' : 'Mark it finished'}
          </Key>
          <Key kind="quiet" onClick={onClose}>
            Leave it open
          </Key>
        </>
      }
    >
      {open.length === 0 ? (
        <p>Nothing is open in it.</p>
      ) : (
        <>
          <p className="font-semibold">Still open: {counted(open.length, 'task')}.</p>
          <ul className="grid gap-seam bg-line py-seam">
            {open.map(({ row: task, words }) => (
              <li key={task.id} className="bg-plank px-3 py-2 leading-snug break-words">
                {task.title}
                {words && <span className="text-slate"> · {words}</span>}
              </li>
            ))}
          </ul>
        </>
      )}
    </Sheet>
  );
}
