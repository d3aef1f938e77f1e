import { useState } from 'react';
import { deviceAnswerSchema } from '#shared/identity/device.ts';
import { Icon } from '#src/components/icons.tsx';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Section } from '#src/components/page.tsx';
import { Planks } from '#src/components/ribband.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { useMe, useRead, useSyncState } from '#src/replica/hooks.tsx';
import { askedWords, useAsk } from '#src/replica/use-ask.ts';
import { PlacePage } from '#src/shell/place-page.tsx';
import { readDevices, type DeviceLine } from './read-devices.ts';

/** The shop's phones, tablets and computers: who uses them, when they were heard, what they hold. */
export default function DevicesPage() {
  const lines = useRead(['devices'], readDevices);
  const [asked, setAsked] = useState<DeviceLine | null>(null);
  return (
    <PlacePage title="Devices">
      <Section title="Devices" level={1}>
        <Planks>
          {lines.map((line) => (
            <Device key={line.id} line={line} onRevoke={() => setAsked(line)} />
          ))}
        </Planks>
      </Section>
      {asked && <RevokeSheet line={asked} onClose={() => setAsked(null)} />}
    </PlacePage>
  );
}

function Device({ line, onRevoke }: { line: DeviceLine; onRevoke: () => void }) {
  const isForeman = useMe()?.roles.includes('foreman') ?? false;
  return (
    <li className="flex flex-wrap items-center justify-between gap-x-4 gap-y-2 bg-plank px-4 py-3 md:px-6">
      <div className="min-w-[min(11em,100%)] flex-1 leading-snug break-words">
        <h2 className="text-[20px] font-bold">
          {line.label}
          {line.isThis && <span className="font-normal text-slate"> (this one)</span>}
        </h2>
        <p>
          {line.people || 'nobody'} · {line.heard}
        </p>
        {line.held && (
          <p className="my-1 w-fit border-2 border-on-seam bg-seam px-2 text-on-seam">{line.held}</p>
        )}
        <p className="text-[16px] text-slate">
          {[line.version, ...line.notes, line.revoked].filter(Boolean).join(' · ')}
        </p>
      </div>
      {isForeman && !line.revoked && !line.isThis && (
        <Key onClick={onRevoke}>
          Shut out<span className="sr-only"> {line.label}</span>
        </Key>
      )}
      {line.gap && (
        <p className="flex w-full gap-2 border-l-[9px] border-redlead pl-3 leading-snug font-semibold">
          <Icon name="warning" className="mt-[1px]" />
          {line.gap}
        </p>
      )}
    </li>
  );
}

function RevokeSheet({ line, onClose }: { line: DeviceLine; onClose: () => void }) {
  const { mutateAsync: askFor, data: answer, isPending } = useAsk(deviceAnswerSchema);
  const isOffline = useSyncState().phase === 'offline';
  const shutOut = async () => {
    if ('ok' in (await askFor({ path: `/api/devices/${line.id}/revoke`, method: 'POST' }))) onClose();
  };
  return (
    <Sheet
      isOpen
      onClose={onClose}
      title={`Shut out ${line.label}?`}
      foot={
        <>
          <Key kind="danger" disabled={isPending || isOffline} onClick={() => void shutOut()}>
            Shut it out
          </Key>
          <Key kind="quiet" onClick={onClose}>
            Leave it as it is
          </Key>
        </>
      }
    >
      {isOffline && <Notice tone="warn">This needs signal, and there is none now.</Notice>}
      {askedWords(answer) && <Notice tone="error">{askedWords(answer)}</Notice>}
      <p>For a phone that was lost or stolen, or is no longer the shop’s. This is not taken back.</p>
      <ul className="grid list-disc gap-1 pl-5">
        <li>Whoever holds it hears nothing more of the shop.</li>
        <li>What it has sent stays in the record.</li>
        <li>
          What it sends from now on does not count: it is set aside, and you admit or dismiss it.
          {line.held && ` It ${line.held} when it was last heard.`}
        </li>
        <li>What it has already read stays on it until it is cleared.</li>
      </ul>
    </Sheet>
  );
}
