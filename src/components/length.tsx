import { formatLength, type Units } from '#shared/measure/length.ts';

interface LengthProps {
  /** Whole millimetres. */
  mm: number;
  units: Units;
}

/** A length as the trade writes it: 11 3/4 in with a drawn fraction, 298 mm. */
export function Length({ mm, units }: LengthProps) {
  const { whole, fraction, unit } = formatLength(mm, units);
  return (
    <span className="whitespace-nowrap">
      {whole}
      {fraction !== null && (
        <>
          {whole !== '' && <span className="[word-spacing:-0.2em]"> </span>}
          <span className="frac">{fraction}</span>
        </>
      )}
      {` ${unit}`}
    </span>
  );
}
