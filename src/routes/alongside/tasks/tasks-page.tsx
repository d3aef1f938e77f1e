import { useState } from 'react';
import { useSearchParams } from 'react-router-dom';
import { BackBar } from '#src/components/back-bar.tsx';
import { Empty } from '#src/components/empty.tsx';
import { Fold } from '#src/components/fold.tsx';
import { Notice } from '#src/components/notice.tsx';
import { KeyRack, Page, Section } from '#src/components/page.tsx';
import { Planks } from '#src/components/ribband.tsx';
import { useRead } from '#src/replica/hooks.tsx';
import { DoneUndo } from '#src/routes/alongside/done-undo.tsx';
import type { Where } from '#src/routes/alongside/read-boats.ts';
import { AddTask } from '#src/routes/alongside/tasks/add-task.tsx';
import { readTask, readTasks, type TaskGroup } from '#src/routes/alongside/tasks/read-tasks.ts';
import { TaskRow } from '#src/routes/alongside/tasks/task-row.tsx';
import { useTaskDoings, type TaskDoings } from '#src/routes/alongside/tasks/use-task-doings.ts';
import { useWhere } from '#src/routes/alongside/use-where.ts';
import { RecordBar } from '#src/shell/record-bar.tsx';
import { whereWords } from '#src/words/where.ts';

/** What is to be done on the boat: started, stopped, ticked off and taken back here. */
export default function TasksPage() {
  const [where] = useWhere();
  if (where) return <Tasks where={where} />;
  return (
    <Page
      bars={
        <>
          <title>Tick off · Ribband</title>
          <BackBar title="Tick off" to="/alongside" backWord="Back to Alongside" />
        </>
      }
    >
      <Empty>No boat is here yet.</Empty>
    </Page>
  );
}

function Tasks({ where }: { where: Where }) {
  const groups = useRead(['tasks', where], (view) => readTasks(view, where));
  const place = useRead(['place', where], (view) => whereWords(view, where.boatId, where.stageId));
  const doings = useTaskDoings();
  const askedId = useSearchParams()[0].get('task');
  const asked = useRead(['asked task', askedId], (view) => {
    const task = askedId === null ? undefined : view.find('task', askedId);
    return task ? readTask(view, task) : null;
  });
  const [here, elsewhere] = [groups.filter(isHere), groups.filter((group) => !isHere(group))];
  function isHere(group: TaskGroup) {
    return group.stageId === where.stageId;
  }
  return (
    <Page
      bars={
        <>
          <title>Tick off · Ribband</title>
          <BackBar isCoaming title="Tick off" subTitle={place} to="/alongside" backWord="Back to Alongside" />
          <RecordBar />
        </>
      }
      foot={
        doings.done && (
          <KeyRack>
            <div className="-mb-3">
              <DoneUndo key={doings.done.done} done={doings.done} onGone={doings.onGone} />
            </div>
          </KeyRack>
        )
      }
    >
      {doings.failure && <Notice tone="error">{doings.failure}</Notice>}
      {asked && (
        <Section title="The one you looked for">
          <Planks>
            <TaskRow task={asked} doings={doings} />
          </Planks>
        </Section>
      )}
      {here.map((group) => (
        <Group key={group.stageId} group={group} doings={doings} />
      ))}
      {groups.every((group) => group.open.length + group.done.length === 0) && (
        <Empty>No tasks are on this boat yet.</Empty>
      )}
      {where.stageId && <AddTask boatId={where.boatId} stageId={where.stageId} />}
      {elsewhere.length > 0 && (
        <Section title="Her other stages">
          <div className="grid gap-3">
            {elsewhere.map((group) => (
              <OtherGroup key={group.stageId} group={group} doings={doings} />
            ))}
          </div>
        </Section>
      )}
    </Page>
  );
}

interface GroupProps {
  group: TaskGroup;
  doings: TaskDoings;
}

function Group({ group, doings }: GroupProps) {
  return (
    <Section title={group.stageName}>
      {group.open.length > 0 && (
        <Planks>
          {group.open.map((task) => (
            <TaskRow key={task.id} task={task} doings={doings} />
          ))}
        </Planks>
      )}
      {group.open.length === 0 && group.done.length > 0 && (
        <p className="px-4 text-slate md:px-6">All ticked off.</p>
      )}
      <Done group={group} doings={doings} />
    </Section>
  );
}

function Done({ group, doings }: GroupProps) {
  // the ones that were just ticked stay in sight, with the way back
  const [isShort] = useState(group.done.length <= 3);
  if (group.done.length === 0) return null;
  return (
    <div className="pt-3">
      <div className="px-4 md:px-6">
        <Fold title={`Ticked off (${group.done.length})`} isOpenAtFirst={isShort}>
          <div className="-mx-4 md:-mx-6">
            <Planks>
              {group.done.map((task) => (
                <TaskRow key={task.id} task={task} doings={doings} />
              ))}
            </Planks>
          </div>
        </Fold>
      </div>
    </div>
  );
}

function OtherGroup({ group, doings }: GroupProps) {
  return (
    <div className="px-4 md:px-6">
      <Fold title={`${group.stageName} (${group.open.length} open)`}>
        <div className="-mx-4 md:-mx-6">
          <Group group={group} doings={doings} />
        </div>
      </Fold>
    </div>
  );
}
