import { lazy, Suspense, useState } from 'react';
import type { Extent } from '#shared/finding/finding.ts';
import { Fractions } from '#src/components/fractions.tsx';
import { Key } from '#src/components/key.tsx';
import { useRead } from '#src/replica/hooks.tsx';
import { isSized } from '#src/routes/alongside/found/found-draft.ts';
import { extentWords } from '#src/words/finding-words.ts';
import { unitsOf } from '#src/words/units.ts';

const SizeSheet = lazy(() => import('#src/routes/alongside/found/size-sheet.tsx'));

interface SizeFieldsProps {
  seen: Extent;
  feared: Extent;
  onChange: (next: { seenExtent?: Extent; fearedExtent?: Extent }) => void;
}

/** How far it goes: what was seen, and what is feared. */
export function SizeFields({ seen, feared, onChange }: SizeFieldsProps) {
  const units = useRead(['units'], unitsOf);
  const [open, setOpen] = useState<'seen' | 'feared' | null>(null);
  const key = (which: 'seen' | 'feared', word: string, extent: Extent) => (
    <Key className="!justify-between" onClick={() => setOpen(which)}>
      <span>{word}</span>
      <span className="text-right font-normal">
        {isSized(extent) ? <Fractions text={extentWords(extent, units)} /> : 'not measured'}
      </span>
    </Key>
  );
  return (
    <fieldset className="grid gap-3">
      <legend className="pb-1 text-[18px] font-semibold">How far does it go?</legend>
      {key('seen', 'Seen', seen)}
      {key('feared', 'Feared', feared)}
      {open && (
        <Suspense fallback={null}>
          <SizeSheet
            title={open === 'seen' ? 'The size seen' : 'The size feared'}
            extent={open === 'seen' ? seen : feared}
            units={units}
            onClose={() => setOpen(null)}
            onChange={(extent) =>
              onChange(open === 'seen' ? { seenExtent: extent } : { fearedExtent: extent })
            }
          />
        </Suspense>
      )}
    </fieldset>
  );
}
