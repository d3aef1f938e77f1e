import { Fragment } from 'react';
import { Fractions } from '#src/components/fractions.tsx';
import { Hours } from '#src/components/hours.tsx';
import type { EndLine } from '#src/routes/alongside/read-ends.ts';
import type { HoursLine } from '#src/routes/alongside/read-entry-line.ts';
import type { SaidValue } from '#src/words/said-words.ts';
import { capital } from '#src/words/who.ts';

interface HoursByPersonProps {
  hours: HoursLine[];
  /** Whose entry it is: their figure stands first, under the name before it. */
  author: string;
}

/** '2 1/2 h, Orrin 4 h · extra work (proposed)', the first of them the author's own. */
export function HoursByPerson({ hours, author }: HoursByPersonProps) {
  const ordered = [
    ...hours.filter(({ who }) => who === author),
    ...hours.filter(({ who }) => who !== author),
  ];
  const kinds = [...new Set(hours.map(kindWords))];
  const isOneKind = kinds.length === 1;
  return (
    <>
      {ordered.map((line, index) => (
        <Fragment key={line.personId}>
          {index > 0 && ', '}
          {line.who !== author && `${line.who} `}
          <Hours minutes={line.minutes} />
          {!isOneKind && kindWords(line) && ` ${kindWords(line)}`}
        </Fragment>
      ))}
      {isOneKind && kinds[0] && ` · ${kinds[0]}`}
    </>
  );
}

function kindWords({ kind, isProposed }: HoursLine): string {
  if (kind === null) return '';
  return isProposed ? `${kind} (proposed)` : kind;
}

/** A value as somebody said it: drawn hours, or words. */
export function Said({ value }: { value: SaidValue }) {
  if (value.minutes === undefined) return <Fractions text={value.words} />;
  return (
    <>
      <Hours minutes={value.minutes} />
      {value.words && ` ${value.words}`}
    </>
  );
}

/** A loose end as the question that it is: "Rosa's hours: 3 h or 2 1/2 h?" */
export function EndQuestion({ end }: { end: EndLine }) {
  return (
    <p className="mt-1">
      <span className="font-semibold">{capital(end.about)}: </span>
      {end.values.map((value, index) => (
        <Fragment key={value.opId}>
          {index > 0 && (end.kind === 'field' ? ' or ' : ', ')}
          <b>
            <Said value={value} />
          </b>
        </Fragment>
      ))}
      {end.kind === 'field' && '?'}
    </p>
  );
}
