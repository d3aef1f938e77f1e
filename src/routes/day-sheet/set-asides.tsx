import { useState } from 'react';
import { Fold } from '#src/components/fold.tsx';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Why } from '#src/components/why.tsx';
import { useHold } from '#src/replica/hooks.tsx';
import type { SetAsideOnSheet } from './read-set-aside.ts';

interface Asked {
  choice: 'admit' | 'dismiss';
  line: SetAsideOnSheet;
}

/** What was kept but does not count, until the foreman admits or dismisses it. */
export function SetAsides({ lines }: { lines: SetAsideOnSheet[] }) {
  const { mutate, error } = useHold();
  const [asked, setAsked] = useState<Asked | null>(null);
  const isAdmit = asked?.choice === 'admit';
  return (
    <section aria-label="Set aside">
      <h2 className="px-4 pt-6 pb-3 text-[24px] leading-tight font-bold md:px-0">
        Set aside <span className="font-normal text-slate">{lines.length}</span>
      </h2>
      {error && <Notice tone="error">{error.message}</Notice>}
      {lines.length === 0 && <p className="px-4 text-slate md:px-0">Nothing. All that came counts.</p>}
      <ul className="grid gap-seam bg-line py-seam empty:hidden">
        {lines.map((line) => (
          <SetAside key={line.id} line={line} onAsk={(choice) => setAsked({ choice, line })} />
        ))}
      </ul>
      <Why
        isOpen={asked !== null}
        onClose={() => setAsked(null)}
        title={`${isAdmit ? 'Let it count' : 'Dismiss it'}: ${asked?.line.words || asked?.line.what}`}
        question={isAdmit ? 'Why does it count?' : 'Why does it not count?'}
        confirm={isAdmit ? 'Admit it' : 'Dismiss it'}
        onConfirm={(why) => {
          if (asked) mutate({ kind: `setAside.${asked.choice}`, data: { setAsideId: asked.line.id, why } });
          setAsked(null);
        }}
      />
    </section>
  );
}

function SetAside({ line, onAsk }: { line: SetAsideOnSheet; onAsk: (choice: Asked['choice']) => void }) {
  return (
    <li className="grid gap-2 bg-plank px-4 py-3">
      <div className="leading-snug break-words">
        <h3 className="font-bold">
          {line.what}
          {line.words && <span className="font-normal">: {line.words}</span>}
        </h3>
        <p className="text-[16px] text-slate">
          {[line.where, line.who, line.when].filter(Boolean).join(' · ')}
        </p>
        <p className="pt-1">{line.reason}</p>
      </div>
      <div className="print:hidden">
        <Fold title="As it came">
          {/* scrolled by the keyboard too */}
          <pre
            tabIndex={0}
            aria-label="As it came"
            role="region"
            className="max-h-[16em] overflow-auto border-2 border-line p-2 text-[16px] whitespace-pre-wrap"
          >
            {line.raw}
          </pre>
        </Fold>
      </div>
      {(line.mayAdmit || line.mayDismiss) && (
        <div className="flex gap-3">
          {line.mayAdmit && (
            <Key kind="main" onClick={() => onAsk('admit')}>
              Admit
            </Key>
          )}
          {line.mayDismiss && <Key onClick={() => onAsk('dismiss')}>Dismiss</Key>}
        </div>
      )}
    </li>
  );
}
