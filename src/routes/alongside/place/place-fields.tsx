import { lazy, Suspense, useState } from 'react';
import type { Place } from '#shared/place/place.ts';
import { partWords } from '#shared/trade/part-words.ts';
import { Key } from '#src/components/key.tsx';
import { keyLook } from '#src/components/key-look.ts';
import { Icon } from '#src/components/icons.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { withPart } from '#src/routes/alongside/place/read-parts.ts';
import { capital } from '#src/words/who.ts';

const PartSheet = lazy(() => import('#src/routes/alongside/place/part-sheet.tsx'));

interface PlaceFieldsProps {
  boatId: string;
  place: Place;
  onChange: (place: Place) => void;
}

const SIDES = ['port', 'starboard', 'centre', 'both'] as const;
const NUMBER_MAX = 9999;

/** Where on the boat: part, side, number and words, each to be left out. */
export function PlaceFields({ boatId, place, onChange }: PlaceFieldsProps) {
  const [isChoosing, setChoosing] = useState(false);
  const set = (next: Partial<Place>) => onChange({ ...place, ...next });
  return (
    <fieldset className="grid gap-3">
      <legend className="pb-1 text-[18px] font-semibold">Where?</legend>
      <Key className="!justify-between" onClick={() => setChoosing(true)}>
        <span>{place.partId === undefined ? 'Which part?' : capital(partWords(place.partId))}</span>
        <span className="font-normal underline decoration-2 underline-offset-4">
          {place.partId === undefined ? 'choose' : 'other part'}
        </span>
      </Key>
      <SideKeys side={place.side} onChange={(side) => set({ side })} />
      <div className="grid grid-cols-2 gap-3">
        <NumberField label="Number" value={place.number} onChange={(number) => set({ number })} />
        <NumberField label="to number" value={place.toNumber} onChange={(toNumber) => set({ toNumber })} />
      </div>
      <TextField
        label="Nearer, in words"
        placeholder="two feet aft of the windshield"
        maxLength={500}
        value={place.words ?? ''}
        onChange={(words) => set({ words: words === '' ? undefined : words })}
      />
      {isChoosing && (
        <Suspense fallback={null}>
          <PartSheet
            boatId={boatId}
            partId={place.partId}
            onClose={() => setChoosing(false)}
            onChoose={(part) => {
              onChange(withPart(place, part));
              setChoosing(false);
            }}
          />
        </Suspense>
      )}
    </fieldset>
  );
}

function SideKeys({ side, onChange }: { side: Place['side']; onChange: (side: Place['side']) => void }) {
  return (
    <div role="group" aria-label="Side" className="grid grid-cols-2 gap-3 md:grid-cols-4">
      {SIDES.map((each) => (
        <button
          key={each}
          type="button"
          aria-pressed={each === side}
          className={`${keyLook('plain')} aria-pressed:bg-bilge aria-pressed:text-primer`}
          onClick={() => onChange(each === side ? undefined : each)}
        >
          {each === side && <Icon name="tick" size={20} />}
          {capital(each)}
        </button>
      ))}
    </div>
  );
}

interface NumberFieldProps {
  label: string;
  value: number | undefined;
  onChange: (value: number | undefined) => void;
}

function NumberField({ label, value, onChange }: NumberFieldProps) {
  return (
    <TextField
      label={label}
      inputMode="numeric"
      autoComplete="off"
      value={value === undefined ? '' : String(value)}
      onChange={(text) => {
        const digits = text.replace(/\D/g, '');
        onChange(digits === '' ? undefined : Math.min(Number(digits), NUMBER_MAX));
      }}
    />
  );
}
