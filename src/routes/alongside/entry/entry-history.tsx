import { Plank } from '#src/components/plank.tsx';
import { Section } from '#src/components/page.tsx';
import { Planks, Ribband } from '#src/components/ribband.tsx';
import { Said } from '#src/routes/alongside/entry-parts.tsx';
import type { HistoryLine } from '#src/routes/alongside/entry/read-history.ts';
import { capital } from '#src/words/who.ts';

interface EntryHistoryProps {
  history: HistoryLine[];
  /** what it is the history of; an entry unless told */
  of?: string;
}

/** Everything that was said about a row, on the ribband line: nothing earlier is lost. */
export function EntryHistory({ history, of = 'entry' }: EntryHistoryProps) {
  return (
    <Section title="History">
      <Ribband label={`History of this ${of}, the newest first`}>
        <Planks>
          {history.map((line) => (
            <Plank key={line.key} mark={line.mark} time={line.time}>
              <p className="text-slate">
                <span className="font-semibold">{capital(line.who)}</span> {line.did}
                {line.when && ` · ${line.when}`}
              </p>
              {line.before.map((value, index) => (
                <p key={index} className="whitespace-pre-line text-slate line-through">
                  <span className="sr-only">before: </span>
                  <Said value={value} />
                </p>
              ))}
              {line.value && (
                <p className="whitespace-pre-line">
                  <Said value={line.value} />
                </p>
              )}
              {line.why && <p className="text-slate">Why: {line.why}</p>}
            </Plank>
          ))}
        </Planks>
      </Ribband>
    </Section>
  );
}
