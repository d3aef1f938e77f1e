import { BUNG_WORDS, BungMark } from '#src/components/bung-mark.tsx';
import { Key } from '#src/components/key.tsx';
import { PlainPlank } from '#src/components/plank.tsx';
import type { TaskLine } from '#src/routes/alongside/tasks/read-tasks.ts';
import type { TaskDoings } from '#src/routes/alongside/tasks/use-task-doings.ts';

interface TaskRowProps {
  task: TaskLine;
  doings: TaskDoings;
}

/** A task: who began it, who ticked it, and the keys for oneself. */
export function TaskRow({ task, doings }: TaskRowProps) {
  const facts = [task.assigned, task.started, task.done].filter((fact) => fact !== null);
  return (
    <PlainPlank id={`task-${task.id}`}>
      <div className="grid gap-3 md:grid-cols-[1fr_auto] md:items-center">
        <div>
          <p className="font-semibold">{task.title}</p>
          {facts.map((fact) => (
            <p key={fact} className="text-slate">
              {fact}
            </p>
          ))}
          {task.isTwice && <p className="font-semibold">Done twice: both ticks stand.</p>}
          {task.isHeld && (
            <p className="flex items-center gap-2 text-slate">
              <BungMark mark="held" word="" size={22} /> {BUNG_WORDS.held}
            </p>
          )}
        </div>
        <TaskKeys task={task} doings={doings} />
      </div>
    </PlainPlank>
  );
}

function TaskKeys({ task, doings }: TaskRowProps) {
  const named = (word: string) => `${word}: ${task.title}`;
  if (task.isDone) {
    return task.myMarkIds.length > 0 ? (
      <Key aria-label={named('Take the tick back')} onClick={() => doings.untick(task)}>
        Take the tick back
      </Key>
    ) : null;
  }
  return (
    <div className="grid grid-cols-2 gap-3 md:w-[300px]">
      {task.myStartIds.length > 0 ? (
        <Key aria-label={named('Stop')} onClick={() => doings.stop(task)}>
          Stop
        </Key>
      ) : (
        <Key aria-label={named('Start')} onClick={() => doings.start(task)}>
          Start
        </Key>
      )}
      <Key icon="tick" aria-label={named('Tick off')} onClick={() => doings.tick(task)}>
        Tick off
      </Key>
    </div>
  );
}
