import { useState } from 'react';
import { FINDING_KINDS } from '#shared/trade/finding-kinds.ts';
import { findingWords } from '#shared/trade/finding-words.ts';
import { keyLook } from '#src/components/key-look.ts';
import { Key } from '#src/components/key.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { capital } from '#src/words/who.ts';

interface KindSheetProps {
  kind: string;
  onChoose: (kind: string) => void;
  onClose: () => void;
}

/** Every kind of the trade, found by a word of it; or what was typed, as the shop's own kind. */
export default function KindSheet({ kind, onChoose, onClose }: KindSheetProps) {
  const [asked, setAsked] = useState(FINDING_KINDS.includes(kind) ? '' : kind);
  const own = asked.trim();
  const words = own.toLowerCase().split(/\s+/);
  const found = FINDING_KINDS.filter((each) => words.every((word) => findingWords(each).includes(word)));
  return (
    <Sheet isOpen onClose={onClose} title="What is it?">
      <TextField
        label="Look for it, or say it in your own words"
        autoComplete="off"
        maxLength={100}
        value={asked}
        onChange={setAsked}
      />
      {own !== '' && !found.some((each) => findingWords(each) === own.toLowerCase()) && (
        <Key kind="main" onClick={() => onChoose(own)}>
          Call it ‘{own}’
        </Key>
      )}
      <div className="grid grid-cols-2 gap-3">
        {found.map((each) => (
          <button
            key={each}
            type="button"
            aria-pressed={each === kind}
            className={`${keyLook('plain')} !px-2 aria-pressed:bg-bilge aria-pressed:text-primer`}
            onClick={() => onChoose(each)}
          >
            {capital(findingWords(each))}
          </button>
        ))}
      </div>
    </Sheet>
  );
}
