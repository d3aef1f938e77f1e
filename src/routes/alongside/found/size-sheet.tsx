import { useState } from 'react';
import type { Extent } from '#shared/finding/finding.ts';
import type { Units } from '#shared/measure/length.ts';
import { keyLook } from '#src/components/key-look.ts';
import { Key } from '#src/components/key.tsx';
import { LengthPad } from '#src/components/length-pad.tsx';
import { Length } from '#src/components/length.tsx';
import { Sheet } from '#src/components/sheet.tsx';

interface SizeSheetProps {
  title: string;
  extent: Extent;
  units: Units;
  onChange: (extent: Extent) => void;
  onClose: () => void;
}

const DIMENSIONS = [
  { field: 'lengthMm', word: 'Length' },
  { field: 'widthMm', word: 'Width' },
  { field: 'depthMm', word: 'Depth' },
] as const;

/** Length, width and depth, each by one pad of keys; any of them may be left out. */
export default function SizeSheet({ title, extent, units, onChange, onClose }: SizeSheetProps) {
  const [field, setField] = useState<(typeof DIMENSIONS)[number]['field']>('lengthMm');
  const { word } = DIMENSIONS.find((dimension) => dimension.field === field)!;
  function set(mm: number | undefined) {
    const { [field]: _before, ...others } = extent;
    onChange(mm ? { ...others, [field]: mm } : others);
  }
  return (
    <Sheet
      isOpen
      onClose={onClose}
      title={title}
      foot={
        <Key kind="main" onClick={onClose}>
          That is it
        </Key>
      }
    >
      <div role="group" aria-label="What is measured" className="grid grid-cols-3 gap-3">
        {DIMENSIONS.map((dimension) => (
          <button
            key={dimension.field}
            type="button"
            aria-pressed={dimension.field === field}
            className={`${keyLook('plain')} flex-col !gap-0 !px-1 aria-pressed:bg-bilge aria-pressed:text-primer`}
            onClick={() => setField(dimension.field)}
          >
            <span className="font-normal">{dimension.word}</span>
            <span aria-live={dimension.field === field ? 'polite' : undefined}>
              {extent[dimension.field] === undefined ? (
                '–'
              ) : (
                <Length mm={extent[dimension.field]!} units={units} />
              )}
            </span>
          </button>
        ))}
      </div>
      <LengthPad label={word} units={units} mm={extent[field]} onChange={set} />
    </Sheet>
  );
}
