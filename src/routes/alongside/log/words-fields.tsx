import { Key } from '#src/components/key.tsx';
import { TextBox } from '#src/components/text-box.tsx';
import { entryText, type DraftFields } from '#src/routes/alongside/log/entry-draft.ts';

interface WordsFieldsProps extends DraftFields {
  problem: string | undefined;
}

/** What was done, in one's own words; or what was not done, and why. */
export function WordsFields({ draft, change, problem }: WordsFieldsProps) {
  const { notDone, text } = draft;
  if (!notDone) {
    return (
      <div className="grid gap-2">
        <TextBox
          label="What did you do?"
          rows={4}
          autoFocus
          value={text}
          onChange={(next) => change({ text: next })}
          problem={problem}
        />
        <Key kind="quiet" onClick={() => change({ notDone: { what: text, why: '' } })}>
          Not done, and why
        </Key>
      </div>
    );
  }
  const reads = entryText(draft);
  return (
    <div className="grid gap-4">
      <TextBox
        label="What was not done?"
        rows={1}
        autoFocus
        placeholder="varnish coat three"
        value={notDone.what}
        onChange={(what) => change({ notDone: { ...notDone, what } })}
      />
      <TextBox
        label="Why not?"
        rows={1}
        placeholder="74 percent in the room"
        value={notDone.why}
        onChange={(why) => change({ notDone: { ...notDone, why } })}
        problem={problem}
      />
      {reads !== '' && (
        <div className="border-l-[3px] border-bilge pl-3">
          <p className="text-slate">It will read:</p>
          <p className="break-words" aria-live="polite">
            {reads}
          </p>
        </div>
      )}
      <Key kind="quiet" onClick={() => change({ notDone: null, text: text || notDone.what })}>
        It was done after all
      </Key>
    </div>
  );
}
