import { useState } from 'react';
import { BackBar } from '#src/components/back-bar.tsx';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { KeyRack, Page } from '#src/components/page.tsx';
import { QuarterHours } from '#src/components/quarter-hours.tsx';
import { Undo } from '#src/components/undo.tsx';
import { useRead } from '#src/replica/hooks.tsx';
import { BoatSheet } from '#src/routes/alongside/boat-sheet.tsx';
import { AlongFields } from '#src/routes/alongside/log/along-fields.tsx';
import type { Done } from '#src/routes/alongside/done.ts';
import { draftProblems, entryText, isWorthKeeping } from '#src/routes/alongside/log/entry-draft.ts';
import { KindField } from '#src/routes/alongside/log/kind-field.tsx';
import { readLastDay } from '#src/routes/alongside/log/read-last-day.ts';
import { readLog } from '#src/routes/alongside/log/read-log.ts';
import { SameKey } from '#src/routes/alongside/log/same-key.tsx';
import { TickFields } from '#src/routes/alongside/log/tick-fields.tsx';
import { useEntryForm, type LogFor } from '#src/routes/alongside/log/use-entry-form.ts';
import { WordsFields } from '#src/routes/alongside/log/words-fields.tsx';
import { PictureFields } from '#src/routes/alongside/photos/picture-fields.tsx';
import { PicturePlace } from '#src/routes/alongside/photos/picture-place.tsx';
import type { Where } from '#src/routes/alongside/read-boats.ts';
import { DayChoice } from '#src/components/day-choice.tsx';
import { dayWords, momentWords } from '#src/words/day-words.ts';
import { tooLongWords } from '#src/words/too-long.ts';

interface EntryFormProps {
  /** where the work was, unless a draft says otherwise */
  where: Where;
  /** whose day it is, where the form was opened for somebody else */
  logFor: LogFor | null;
  onMove: (where: Where) => void;
  onLogged: (done: Done) => void;
}

/** What was done, in how long, with whom: kept on the device at every keystroke until it is logged. */
export function EntryForm({ where, logFor, onMove, onLogged }: EntryFormProps) {
  const form = useEntryForm(where, logFor, onLogged);
  const { draft, change } = form;
  const here = { boatId: draft.boatId, stageId: draft.stageId };
  const shown = useRead(['log', here], (view) => readLog(view, here));
  const { me, timeZone } = useRead(['me'], (view) => ({ me: view.me.personId, timeZone: view.timeZone }));
  const last = useRead(['last day', draft.boatId], (view) => readLastDay(view, draft.boatId));
  const [isMoving, setMoving] = useState(false);
  const [firstTaskIds, setFirstTaskIds] = useState<string[]>([]);
  const problems = form.isAsked ? draftProblems(draft, me) : { text: tooLongWords(entryText(draft)) };
  const isFresh = !isWorthKeeping(draft) && !logFor;

  return (
    <Page
      bars={
        <>
          <title>Log it · Ribband</title>
          <BackBar
            isCoaming
            title={shown.boatName}
            subTitle={shown.stageName}
            to={logFor ? `/day/${logFor.day}` : '/alongside'}
            backWord={`Back to ${logFor ? 'the day sheet' : 'Alongside'}; your words are kept`}
            right={
              <Key kind="onDeep" onClick={() => setMoving(true)}>
                Other boat
              </Key>
            }
          />
        </>
      }
      foot={
        <KeyRack>
          {form.emptied && (
            <div className="-mx-3 -mt-3">
              <Undo words="The form is empty" onUndo={form.bringBack} onGone={form.forgetEmptied} />
            </div>
          )}
          {form.failure && <Notice tone="error">{form.failure}</Notice>}
          <Key kind="main" icon="entry" isGreat disabled={form.isLogging} onClick={form.log}>
            Log it
          </Key>
        </KeyRack>
      }
    >
      {/* an emptied form is another one: what its fields remember by themselves goes too */}
      <form
        key={draft.entryId}
        className="grid gap-5 p-4 pb-8 md:p-6"
        onSubmit={(event) => event.preventDefault()}
      >
        {form.restoredAt && (
          <p className="text-slate">
            Kept since {momentWords(form.restoredAt, timeZone, shown.today)}, as you left it.
          </p>
        )}
        {form.isUnkept && (
          <Notice tone="error">
            This device has no room to keep what you write. Log it before you leave this screen.
          </Notice>
        )}
        <WordsFields draft={draft} change={change} problem={problems.text} />
        {isFresh && last && (
          <SameKey
            last={last}
            onTake={() => {
              change(last.take);
              setFirstTaskIds(last.taskIds);
            }}
          />
        )}
        <QuarterHours
          label="Your hours"
          minutes={draft.minutes}
          onChange={(minutes) => change({ minutes })}
        />
        <PictureFields pictures={draft.pictures} onAdd={form.addPictures} onRemove={form.removePicture} />
        {draft.pictures.length > 0 && <PicturePlace draft={draft} change={change} />}
        <DayChoice
          label="Which day was it?"
          today={shown.today}
          yesterday={shown.yesterday}
          value={draft.workDate}
          onChange={(workDate) => change({ workDate })}
          words={(day) => dayWords(day, shown.today)}
        />
        <AlongFields draft={draft} change={change} people={shown.people} problem={problems.along} />
        <KindField draft={draft} change={change} />
        <TickFields
          draft={draft}
          change={change}
          shown={shown}
          firstTaskIds={firstTaskIds}
          newId={form.newId}
        />
        {isWorthKeeping(draft) && (
          <Key kind="quiet" onClick={form.empty}>
            Empty the form
          </Key>
        )}
      </form>
      <BoatSheet
        isOpen={isMoving}
        where={here}
        onClose={() => setMoving(false)}
        onChoose={(chosen) => {
          // ticks and places are of the boat that was left
          change(chosen.boatId === draft.boatId ? chosen : { ...chosen, ticked: [], place: {} });
          onMove(chosen);
          setMoving(false);
        }}
      />
    </Page>
  );
}
