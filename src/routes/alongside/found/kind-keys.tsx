import { lazy, Suspense, useState } from 'react';
import { FINDING_KINDS, USUAL_KINDS_COUNT } from '#shared/trade/finding-kinds.ts';
import { findingWords } from '#shared/trade/finding-words.ts';
import { FieldProblem } from '#src/components/field.tsx';
import { Icon } from '#src/components/icons.tsx';
import { keyLook } from '#src/components/key-look.ts';
import { Key } from '#src/components/key.tsx';
import { capital } from '#src/words/who.ts';

const KindSheet = lazy(() => import('#src/routes/alongside/found/kind-sheet.tsx'));

interface KindKeysProps {
  legend: string;
  /** empty where none is chosen */
  kind: string;
  onChange: (kind: string) => void;
  problem?: string | undefined;
}

const USUAL = FINDING_KINDS.slice(0, USUAL_KINDS_COUNT);

/** What it is: the usual kinds as keys, all of them and own words one key away. */
export function KindKeys({ legend, kind, onChange, problem }: KindKeysProps) {
  const [isMore, setMore] = useState(false);
  const shown = kind === '' || USUAL.includes(kind) ? USUAL : [kind, ...USUAL];
  return (
    <fieldset className="grid gap-3" aria-describedby="kind-problem">
      <legend className="pb-1 text-[18px] font-semibold">{legend}</legend>
      <div className="grid grid-cols-2 gap-3 md:grid-cols-3">
        {shown.map((each) => (
          <button
            key={each}
            type="button"
            aria-pressed={each === kind}
            className={`${keyLook('plain')} !px-2 aria-pressed:bg-bilge aria-pressed:text-primer`}
            onClick={() => onChange(each === kind ? '' : each)}
          >
            {each === kind && <Icon name="tick" size={20} />}
            {capital(findingWords(each))}
          </button>
        ))}
      </div>
      <Key kind="quiet" onClick={() => setMore(true)}>
        Something else, or your own words
      </Key>
      <FieldProblem id="kind-problem" problem={problem} />
      {isMore && (
        <Suspense fallback={null}>
          <KindSheet
            kind={kind}
            onClose={() => setMore(false)}
            onChoose={(chosen) => {
              onChange(chosen);
              setMore(false);
            }}
          />
        </Suspense>
      )}
    </fieldset>
  );
}
