import { BackBar } from '#src/components/back-bar.tsx';
import { Empty } from '#src/components/empty.tsx';
import { Page, Section } from '#src/components/page.tsx';
import { Planks } from '#src/components/ribband.tsx';
import { useMe, useRead, useReplica } from '#src/replica/hooks.tsx';
import { HeldPhotoRow, HeldRow, SentRow, SetAsideRow } from '#src/routes/held/op-rows.tsx';
import { readHeld, readHeldPhotos, readSent, readSetAside } from '#src/routes/held/read-held.ts';
import { SendNow } from '#src/routes/held/send-now.tsx';
import { deviceWord } from '#src/shell/device-words.ts';
import { homeFor } from '#src/shell/places.ts';
import { useMinute } from '#src/shell/use-minute.ts';
import { Warnings } from '#src/shell/warnings.tsx';

/** What this device holds, thing by thing; what was set aside; what became of what was sent. */
export default function HeldPage() {
  const replica = useReplica();
  const home = homeFor(useMe()?.roles ?? []);
  const minute = useMinute();
  const held = useRead(['held', minute], readHeld);
  const photos = useRead(['held photos'], (view) => readHeldPhotos(view, replica.heldPictures()));
  const setAside = useRead(['set aside'], readSetAside);
  const sent = useRead(['sent'], (view) => readSent(view, replica.sent()));
  return (
    <Page
      bars={
        <>
          <title>Held · Ribband</title>
          <BackBar title={`On this ${deviceWord()}`} to={home} backWord="Back" />
        </>
      }
      foot={<SendNow />}
    >
      <Warnings isAll />
      <Section title={held.length > 0 ? `Held, not sent yet (${held.length})` : 'Held, not sent yet'}>
        {held.length > 0 ? (
          <Planks>
            {held.map((line) => (
              <HeldRow key={line.id} line={line} />
            ))}
          </Planks>
        ) : photos.length > 0 ? (
          <Empty>All that was said here is with the server; photos are on their way.</Empty>
        ) : (
          <Empty>Nothing is held. Everything said here is with the server.</Empty>
        )}
      </Section>
      {photos.length > 0 && (
        <Section title={`Photos on their way (${photos.length})`}>
          <Planks>
            {photos.map((line) => (
              <HeldPhotoRow key={line.sha256} line={line} />
            ))}
          </Planks>
        </Section>
      )}
      {setAside.length > 0 && (
        <Section title="Set aside">
          <Planks>
            {setAside.map((line) => (
              <SetAsideRow key={line.id} line={line} />
            ))}
          </Planks>
        </Section>
      )}
      {sent.length > 0 && (
        <Section title="Sent lately">
          <Planks>
            {sent.map((line) => (
              <SentRow key={line.id} line={line} />
            ))}
          </Planks>
        </Section>
      )}
    </Page>
  );
}
