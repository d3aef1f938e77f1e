import { useState } from 'react';
import { NameBar, StateBar } from '#src/components/bars.tsx';
import { Choice } from '#src/components/choice.tsx';
import { DayChoice } from '#src/components/day-choice.tsx';
import { Empty, Loading } from '#src/components/empty.tsx';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { KeyRack, KeyRow, Page, Section } from '#src/components/page.tsx';
import { QuarterHours } from '#src/components/quarter-hours.tsx';
import { SetChoice } from '#src/components/set-choice.tsx';
import { TextBox } from '#src/components/text-box.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { UpdateNotice } from '#src/components/update-notice.tsx';
import { AppUpdateContext } from '#src/components/use-update.ts';
import { Why } from '#src/components/why.tsx';

const STAGES = [
  { value: 'deck', label: 'Deck', note: '40 h so far' },
  { value: 'frames', label: 'Frames' },
] as const;

const WAITING_UPDATE = {
  state: () => 'waiting' as const,
  subscribe: () => () => undefined,
  apply: () => undefined,
};

/** A crew screen's form: every field, notice and key, and the sheet that asks why. */
export function FormScreen() {
  const [text, setText] = useState('Reefed seams, starboard side deck, half way.\nNext: the king plank.');
  const [name, setName] = useState('Orrin');
  const [day, setDay] = useState('2026-09-08');
  const [stage, setStage] = useState<'deck' | 'frames'>('deck');
  const [minutes, setMinutes] = useState<number | null>(150);
  const [isAsking, setAsking] = useState(false);
  return (
    <Page
      bars={
        <>
          <NameBar title="Juniper Tide" subTitle="Entry" />
          <StateBar tone="quiet" left="All sent 14:05" />
          <StateBar tone="warning" left="This phone's clock is a year ahead" />
        </>
      }
      foot={
        <KeyRack>
          <KeyRow>
            <Key kind="danger" onClick={() => setAsking(true)}>
              Strike
            </Key>
            <Key kind="main">Log it</Key>
          </KeyRow>
        </KeyRack>
      }
    >
      <Section title="Entry" aside={<Key kind="quiet">Put back</Key>}>
        <div className="grid gap-5 px-4 md:px-6">
          <TextBox label="What you did" value={text} onChange={setText} hint="As you would say it." />
          <DayChoice
            label="On which day"
            today="2026-09-08"
            yesterday="2026-09-07"
            value={day}
            onChange={setDay}
            words={inWords}
          />
          <QuarterHours label="Your hours" minutes={minutes} onChange={setMinutes} />
          <Choice label="Stage" options={STAGES} value={stage} onChange={setStage} />
          <TextField
            label="Name"
            value={name}
            onChange={setName}
            problem={name === '' ? 'Write your name.' : undefined}
          />
          <TextField
            label="Password"
            type="password"
            value=""
            onChange={() => undefined}
            problem="That is not the password of this e-mail."
          />
          <SetChoice />
        </div>
      </Section>
      <Section title="Said in words">
        <div className="grid gap-3 px-4 md:px-6">
          <AppUpdateContext value={WAITING_UPDATE}>
            <UpdateNotice />
          </AppUpdateContext>
          <Notice tone="warn">A photo of Monday is still on this phone alone.</Notice>
          <Notice tone="error">
            The server cannot be reached. Your entry is kept here and goes when there is signal.
          </Notice>
          <Key disabled>Cannot be done yet</Key>
        </div>
        <Loading />
        <Empty action={<Key icon="plus">Add a task</Key>}>No tasks on this stage yet.</Empty>
      </Section>
      <Why
        isOpen={isAsking}
        onClose={() => setAsking(false)}
        title="Strike this entry"
        question="Why is it struck?"
        confirm="Strike it"
        isDanger
        onConfirm={() => setAsking(false)}
      />
    </Page>
  );
}

function inWords(day: string): string {
  return new Intl.DateTimeFormat('en-GB', {
    weekday: 'short',
    day: 'numeric',
    month: 'short',
    timeZone: 'UTC',
  })
    .format(new Date(`${day}T00:00:00Z`))
    .replace(',', '');
}
