import { useState } from 'react';
import { Link } from 'react-router-dom';
import { BungMark } from '#src/components/bung-mark.tsx';
import { Hours } from '#src/components/hours.tsx';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Why } from '#src/components/why.tsx';
import { useHold } from '#src/replica/hooks.tsx';
import { HOURS_KIND_WORDS } from '#src/words/hours-words.ts';
import type { EndOnSheet, EndValue } from './read-loose-ends.ts';
import type { Settlement } from './settle.ts';

/** What the merge could not settle alone, each settled in place. */
export function LooseEnds({ ends }: { ends: EndOnSheet[] }) {
  const { mutate, error } = useHold();
  const [asked, setAsked] = useState<Settlement | null>(null);

  function settle(settlement: Settlement) {
    if (settlement.asksWhy) return setAsked(settlement);
    mutate({ kind: settlement.kind, data: settlement.data });
  }

  return (
    <section id="loose-ends" className="scroll-mt-4">
      <h2 className="px-4 pt-6 pb-3 text-[24px] leading-tight font-bold md:px-0">
        Loose ends <span className="font-normal text-slate">{ends.length}</span>
      </h2>
      {error && <Notice tone="error">{error.message}</Notice>}
      {ends.length === 0 && (
        <p className="px-4 text-slate md:px-0">None. Whatever two people said fits together.</p>
      )}
      <ul className="grid gap-seam bg-line py-seam empty:hidden">
        {ends.map((end) => (
          <End key={end.id} end={end} onSettle={settle} />
        ))}
      </ul>
      <Why
        isOpen={asked !== null}
        onClose={() => setAsked(null)}
        title={asked?.kind.endsWith('.strike') ? 'Strike it' : 'Keep it'}
        question={asked?.kind.endsWith('.strike') ? 'Why is it struck?' : 'Why is it kept?'}
        confirm={asked?.kind.endsWith('.strike') ? 'Strike it' : 'Keep it'}
        onConfirm={(why) => {
          if (asked) mutate({ kind: asked.kind, data: { ...asked.data, why } });
          setAsked(null);
        }}
      />
    </section>
  );
}

interface EndProps {
  end: EndOnSheet;
  onSettle: (settlement: Settlement) => void;
}

function End({ end, onSettle }: EndProps) {
  return (
    <li className="bg-plank px-4 py-3">
      <div className="flex gap-3">
        <BungMark mark="loose" word="" />
        <div className="min-w-0">
          <h3 className="leading-snug font-bold">{end.about}</h3>
          <p className="text-[16px] leading-snug break-words text-slate">
            {end.entryId ? (
              <Link to={`/entry/${end.entryId}`} className="py-1 underline">
                {end.of}
              </Link>
            ) : (
              end.of
            )}
            {end.where && ` · ${end.where}`}
          </p>
        </div>
      </div>
      <ul>
        {end.values.map((value) => (
          <Value key={value.opId + value.words} value={value} onSettle={onSettle} />
        ))}
      </ul>
      {(end.restore ?? end.strike) && (
        <div className="flex gap-3 pt-2">
          {end.restore && <Key onClick={() => onSettle(end.restore!)}>Keep the entry</Key>}
          {end.strike && <Key onClick={() => onSettle(end.strike!)}>Strike it again</Key>}
        </div>
      )}
    </li>
  );
}

function Value({ value, onSettle }: { value: EndValue; onSettle: EndProps['onSettle'] }) {
  const { hours, words, who, when, why, stands, take } = value;
  return (
    <li className="mt-2 flex items-center justify-between gap-3 border-t-2 border-line pt-2">
      <div className="min-w-0 leading-snug break-words">
        <p className="font-semibold">
          {hours ? <SaidHours minutes={hours.minutes} kind={hours.kind} /> : words}
        </p>
        <p className="text-[16px] text-slate">
          {who}, {when}
          {why && `: ${why}`}
          {stands && ' · stands meanwhile'}
        </p>
      </div>
      {take && (
        <Key className="shrink-0" onClick={() => onSettle(take)}>
          take
          <span className="sr-only">
            {' '}
            {words} of {who}
          </span>
        </Key>
      )}
    </li>
  );
}

function SaidHours({ minutes, kind }: NonNullable<EndValue['hours']>) {
  if (minutes === 0) return 'no hours';
  return (
    <>
      <Hours minutes={minutes} />
      {kind && `, ${HOURS_KIND_WORDS[kind]}`}
    </>
  );
}
