import { Fragment } from 'react';

const FRACTION = /((?:\d+ )?\d+\/\d+(?= (?:in|ft)\b))/;

/** A text whose lengths have drawn fractions: '11 3/4 in long' reads as one figure. */
export function Fractions({ text }: { text: string }) {
  return text
    .split(FRACTION)
    .map((part, index) => <Fragment key={index}>{index % 2 === 1 ? <Figure text={part} /> : part}</Fragment>);
}

function Figure({ text }: { text: string }) {
  const [whole, fraction] = text.includes(' ') ? text.split(' ') : ['', text];
  return (
    <span className="whitespace-nowrap">
      {whole}
      {/* a space is read out and copied; to the eye the fraction stands close */}
      {whole && <span className="[word-spacing:-0.2em]"> </span>}
      <span className="frac">{fraction}</span>
    </span>
  );
}
