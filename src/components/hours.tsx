import { formatHours } from '#shared/measure/hours.ts';

interface HoursProps {
  /** Whole minutes, zero or more. */
  minutes: number;
  /** The unit behind the figure; 'h' unless told, none for an empty string. */
  unit?: string;
}

/** Hours as the trade writes them: 2 1/2 h with a drawn fraction, 2:20 h where no quarter fits. */
export function Hours({ minutes, unit = 'h' }: HoursProps) {
  const { whole, fraction, oddMinutes } = formatHours(minutes);
  const figure = oddMinutes > 0 ? `${whole}:${String(oddMinutes).padStart(2, '0')}` : String(whole);
  return (
    <span className="whitespace-nowrap">
      {(fraction === null || whole > 0) && figure}
      {fraction !== null && (
        <>
          {/* a space is read out and copied; to the eye the fraction stands close */}
          {whole > 0 && <span className="[word-spacing:-0.2em]"> </span>}
          <span className="frac">{fraction}</span>
        </>
      )}
      {unit && ` ${unit}`}
    </span>
  );
}
