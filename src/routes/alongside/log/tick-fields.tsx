import { CheckKey } from '#src/components/check-key.tsx';
import { Fold } from '#src/components/fold.tsx';
import type { DraftFields } from '#src/routes/alongside/log/entry-draft.ts';
import type { LogForm } from '#src/routes/alongside/log/read-log.ts';
import type { TaskLine } from '#src/routes/alongside/tasks/read-tasks.ts';

interface TickFieldsProps extends DraftFields {
  shown: Pick<LogForm, 'tasks' | 'otherTasks'>;
  /** tasks that come before the others: those of the last day */
  firstTaskIds?: string[];
  newId: () => string;
}

/** The tasks that were finished in the same go: those of this stage, and folded away those of the others. */
export function TickFields({ draft, change, shown, firstTaskIds = [], newId }: TickFieldsProps) {
  const { ticked } = draft;
  const isTicked = (taskId: string) => ticked.some((each) => each.taskId === taskId);

  function setTicked(taskId: string, isDone: boolean) {
    const others = ticked.filter((each) => each.taskId !== taskId);
    change({ ticked: isDone ? [...others, { taskId, markId: newId() }] : others });
  }

  const key = (task: TaskLine, stageName?: string) => (
    <CheckKey
      key={task.id}
      label={task.title}
      note={[stageName, task.started].filter(Boolean).join(' · ') || undefined}
      isChecked={isTicked(task.id)}
      onChange={(isDone) => setTicked(task.id, isDone)}
    />
  );

  if (shown.tasks.length + shown.otherTasks.length === 0) return null;
  const isFirst = ({ id }: TaskLine) => firstTaskIds.includes(id);
  const others = shown.otherTasks.filter((task) => !isFirst(task));
  const isOtherTicked = others.some(({ id }) => isTicked(id));
  return (
    <fieldset className="grid gap-3">
      <legend className="pb-1 text-[18px] font-semibold">Finished with it?</legend>
      {shown.tasks.filter(isFirst).map((task) => key(task))}
      {shown.otherTasks.filter(isFirst).map((task) => key(task, task.stageName))}
      {shown.tasks.filter((task) => !isFirst(task)).map((task) => key(task))}
      {others.length > 0 && (
        <Fold title={`Tasks of her other stages (${others.length})`} isOpenAtFirst={isOtherTicked}>
          <div className="grid gap-3">{others.map((task) => key(task, task.stageName))}</div>
        </Fold>
      )}
    </fieldset>
  );
}
