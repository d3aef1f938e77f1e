import { useState } from 'react';
import type { Part } from '#shared/trade/parts.ts';
import { Key } from '#src/components/key.tsx';
import { keyLook } from '#src/components/key-look.ts';
import { Sheet } from '#src/components/sheet.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { useRead } from '#src/replica/hooks.tsx';
import { readRecentParts, searchParts } from '#src/routes/alongside/place/read-parts.ts';
import { capital } from '#src/words/who.ts';

interface PartSheetProps {
  boatId: string;
  partId: string | undefined;
  onChoose: (part: Part | null) => void;
  onClose: () => void;
}

const REGION_WORDS: Record<string, string> = {
  whole: 'The whole of her',
  deck: 'Deck',
  topsides: 'Topsides',
  bottom: 'Bottom',
  framing: 'Framing',
  interior: 'Inside',
  machinery: 'Machinery',
  hardware: 'Hardware',
};

/** A part from a list: those named last on this boat, then all of them by region, or those that were searched for. */
export default function PartSheet({ boatId, partId, onChoose, onClose }: PartSheetProps) {
  const [asked, setAsked] = useState('');
  const recent = useRead(['recent parts', boatId], (view) => readRecentParts(view, boatId));
  const found = searchParts(asked);
  const isAsking = asked.trim() !== '';
  const keys = (parts: readonly Part[]) => (
    <div className="grid grid-cols-2 gap-3">
      {parts.map((part) => (
        <button
          key={part.id}
          type="button"
          aria-pressed={part.id === partId}
          className={`${keyLook('plain')} aria-pressed:bg-bilge aria-pressed:text-primer`}
          onClick={() => onChoose(part)}
        >
          {capital(part.word)}
        </button>
      ))}
    </div>
  );
  return (
    <Sheet isOpen onClose={onClose} title="Which part?">
      <TextField
        label="Look for a part"
        type="search"
        autoComplete="off"
        enterKeyHint="search"
        value={asked}
        onChange={setAsked}
      />
      {isAsking && found.length === 0 && (
        <p className="text-slate">No part is called that. Leave the part out and say it in your own words.</p>
      )}
      {isAsking && keys(found)}
      {!isAsking && recent.length > 0 && (
        <section className="grid gap-3">
          <h3 className="font-semibold">Named last on her</h3>
          {keys(recent)}
        </section>
      )}
      {partId !== undefined && (
        <Key kind="quiet" onClick={() => onChoose(null)}>
          No part
        </Key>
      )}
      {!isAsking &&
        Object.entries(REGION_WORDS).map(([region, words]) => (
          <section key={region} className="grid gap-3">
            <h3 className="font-semibold">{words}</h3>
            {keys(found.filter((part) => part.region === region))}
          </section>
        ))}
    </Sheet>
  );
}
