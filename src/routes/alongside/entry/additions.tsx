import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { useHold } from '#src/replica/hooks.tsx';
import type { AdditionLine } from '#src/routes/alongside/read-entry-line.ts';
import { capital } from '#src/words/who.ts';

interface AdditionsProps {
  entryId: string;
  additions: AdditionLine[];
}

/** What was added to an entry; one's own can be taken back, and stays to be read. */
export function Additions({ entryId, additions }: AdditionsProps) {
  const hold = useHold();
  const takeBack = (id: string) =>
    hold.mutate({ kind: 'entry.takeBack', data: { entryId, additionIds: [id] } });
  return (
    <>
      {additions.map((addition) => (
        <div key={addition.id} className="border-l-[3px] border-line pl-3">
          <p className="text-slate">
            <span className="font-semibold">{capital(addition.who)}</span> added {addition.at}
            {addition.takenBackBy !== null && `, taken back by ${addition.takenBackBy}`}
          </p>
          <p className={addition.takenBackBy === null ? 'whitespace-pre-line' : 'text-slate line-through'}>
            {addition.text}
          </p>
          {addition.isMine && addition.takenBackBy === null && (
            <Key kind="quiet" className="-ml-4" onClick={() => takeBack(addition.id)}>
              Take it back
            </Key>
          )}
        </div>
      ))}
      {hold.error && <Notice tone="error">{hold.error.message}</Notice>}
    </>
  );
}
