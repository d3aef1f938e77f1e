import { Key } from '#src/components/key.tsx';
import type { LastDay } from '#src/routes/alongside/log/read-last-day.ts';

/** Takes the last day's stage, people and tasks into the form. */
export function SameKey({ last, onTake }: { last: LastDay; onTake: () => void }) {
  return (
    <Key className="!justify-start !text-left" onClick={onTake}>
      <span>
        <span className="block">{last.title}</span>
        <span className="block font-normal">{last.words}</span>
      </span>
    </Key>
  );
}
