import { BackBar } from '#src/components/back-bar.tsx';
import { KeyLink } from '#src/components/key.tsx';
import { Page, Section } from '#src/components/page.tsx';
import { SetChoice } from '#src/components/set-choice.tsx';
import { useRead, useSyncState } from '#src/replica/hooks.tsx';
import { readMe, storageWords } from '#src/routes/me/read-me.ts';
import { SignOut } from '#src/routes/me/sign-out.tsx';
import { deviceWord } from '#src/shell/device-words.ts';
import { homeFor, placesFor } from '#src/shell/places.ts';
import { RecordBar } from '#src/shell/record-bar.tsx';
import { Warnings } from '#src/shell/warnings.tsx';

/** One's own page: who one is, the other places, the colours, this device, the way out. */
export default function MePage() {
  const me = useRead(['me page'], readMe);
  const { storage } = useSyncState();
  const device = deviceWord();
  return (
    <Page
      bars={
        <>
          <title>You · Ribband</title>
          <BackBar title={me.name} subTitle={me.roles} to={homeFor(me.roleList)} backWord="Back" />
          <RecordBar />
        </>
      }
    >
      <Warnings isAll />
      <Section title="Places">
        <nav aria-label="Places" className="grid gap-3 px-4 md:grid-cols-2 md:px-6">
          {placesFor(me.roleList).map(({ to, label }) => (
            <KeyLink key={to} to={to}>
              {label}
            </KeyLink>
          ))}
        </nav>
      </Section>
      <Section title="How it looks">
        <div className="px-4 md:px-6">
          <SetChoice />
        </div>
      </Section>
      <Section title={`This ${device}`}>
        <dl className="grid grid-cols-[minmax(0,1fr)] gap-3 px-4 md:px-6">
          <Fact term="Called" words={me.deviceLabel ?? 'not heard by the server yet'} />
          {me.email && <Fact term="Your e-mail" words={me.email} />}
          <Fact term="What is held here" words={storageWords(storage, device)} />
        </dl>
      </Section>
      <SignOut />
    </Page>
  );
}

function Fact({ term, words }: { term: string; words: string }) {
  return (
    <div>
      <dt className="text-slate">{term}</dt>
      <dd className="font-semibold break-words">{words}</dd>
    </div>
  );
}
