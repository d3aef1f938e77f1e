import { Hours } from '#src/components/hours.tsx';
import { QuarterHours } from '#src/components/quarter-hours.tsx';
import type { EntryToSplit } from './read-split.ts';
import { figuresOf, type SplitDraft } from './split-draft.ts';

interface SplitHoursProps {
  entry: EntryToSplit;
  draft: SplitDraft;
  change: (part: Partial<SplitDraft>) => void;
}

/** How many of each person's hours go over, and that the two parts come to what was there. */
export function SplitHours({ entry: { row, names }, draft, change }: SplitHoursProps) {
  const figures = figuresOf(row, draft);
  if (figures.length === 0) return null;
  return (
    <>
      {figures.map(({ personId, secondMinutes, beforeMinutes }) => (
        <QuarterHours
          key={personId}
          label={`${names[personId]}: hours for the second part`}
          minutes={secondMinutes || null}
          onChange={(minutes) =>
            change({ moved: { ...draft.moved, [personId]: Math.min(minutes ?? 0, beforeMinutes) } })
          }
          isShort
        />
      ))}
      <table className="w-full border-y-2 border-bilge text-left">
        <caption className="sr-only">Hours before and after</caption>
        <thead>
          <tr>
            {['', 'Before', 'First', 'Second'].map((head) => (
              <th key={head} scope="col" className="py-1 font-semibold">
                {head || <span className="sr-only">Who</span>}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {figures.map(({ personId, beforeMinutes, firstMinutes, secondMinutes }) => (
            <tr key={personId}>
              <th scope="row" className="py-1 font-normal">
                {names[personId]}
              </th>
              {[beforeMinutes, firstMinutes, secondMinutes].map((minutes, index) => (
                <td key={index}>
                  <Hours minutes={minutes} />
                </td>
              ))}
            </tr>
          ))}
          <Sums figures={figures} />
        </tbody>
      </table>
    </>
  );
}

function Sums({ figures }: { figures: ReturnType<typeof figuresOf> }) {
  const sum = (field: 'beforeMinutes' | 'firstMinutes' | 'secondMinutes') =>
    figures.reduce((all, figure) => all + figure[field], 0);
  return (
    <tr className="border-t-2 border-line font-bold">
      <th scope="row" className="py-1">
        All
      </th>
      <td>
        <Hours minutes={sum('beforeMinutes')} />
      </td>
      <td colSpan={2}>
        <Hours minutes={sum('firstMinutes')} /> and <Hours minutes={sum('secondMinutes')} />, together{' '}
        <Hours minutes={sum('firstMinutes') + sum('secondMinutes')} />
      </td>
    </tr>
  );
}
