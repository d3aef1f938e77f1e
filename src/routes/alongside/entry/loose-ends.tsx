import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { useHold } from '#src/replica/hooks.tsx';
import { EndQuestion, Said } from '#src/routes/alongside/entry-parts.tsx';
import type { Settling } from '#src/routes/alongside/entry/settle.ts';
import type { EndLine } from '#src/routes/alongside/read-ends.ts';
import { capital } from '#src/words/who.ts';

interface LooseEndsProps {
  ends: EndLine[];
  /** the op that has one of an end's values stand; null where this person may not */
  settle: (end: EndLine, opId: string) => Settling | null;
}

/** A row's loose ends, each with the values and who said them; settled here by whoever may set the field. */
export function LooseEnds({ ends, settle }: LooseEndsProps) {
  return ends.map((end) => <OneEnd key={end.id} end={end} settle={settle} />);
}

function OneEnd({ end, settle }: Pick<LooseEndsProps, 'settle'> & { end: EndLine }) {
  const hold = useHold();
  return (
    <div className="grid gap-3">
      <EndQuestion end={end} />
      {end.values.map((value) => {
        const op = settle(end, value.opId);
        return (
          <div key={value.opId} className="grid gap-1">
            <p className="text-slate">
              <Said value={value} />: {capital(value.who)} {value.at}
              {value.stands && ', stands meanwhile'}
            </p>
            {op && (
              <Key onClick={() => hold.mutate(op)}>
                <span>
                  It is <Said value={value} />
                </span>
              </Key>
            )}
          </div>
        );
      })}
      {end.kind === 'struck-and-changed' && (
        <p>Bring it back if what came still counts, or strike it again now that you know of it.</p>
      )}
      {hold.error && <Notice tone="error">{hold.error.message}</Notice>}
    </div>
  );
}
