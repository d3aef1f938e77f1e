import { Hours } from '#src/components/hours.tsx';

interface HoursAgainstProps {
  minutes: number;
  /** Null where nothing was estimated. */
  estimateMinutes: number | null;
}

// what goes by a boat's length comes out in odd minutes
const QUARTER_MINUTES = 15;

/** Hours logged so far against what was estimated: '12 1/2 of 40 h'; what is over is said. */
export function HoursAgainst({ minutes, estimateMinutes }: HoursAgainstProps) {
  if (estimateMinutes === null) return minutes > 0 ? <Hours minutes={minutes} /> : null;
  const estimate = Math.round(estimateMinutes / QUARTER_MINUTES) * QUARTER_MINUTES;
  const over = minutes - estimate;
  return (
    <>
      <Hours minutes={minutes} unit="" /> of <Hours minutes={estimate} />
      {over > 0 && (
        <strong className="ml-2 border-2 border-bilge px-[6px] whitespace-nowrap">
          <Hours minutes={over} /> over
        </strong>
      )}
    </>
  );
}
