import { knownSchema, type Certainty, type Known } from '#shared/finding/finding.ts';
import { Choice } from '#src/components/choice.tsx';
import { Icon } from '#src/components/icons.tsx';
import { keyLook } from '#src/components/key-look.ts';
import { KNOWN_WORDS } from '#src/words/finding-words.ts';
import { capital } from '#src/words/who.ts';

/** How it is known, from hearsay to sound wood all round. */
export function KnownKeys({ known, onChange }: { known: Known; onChange: (known: Known) => void }) {
  return (
    <fieldset>
      <legend className="pb-1 text-[18px] font-semibold">How do you know?</legend>
      <div className="grid grid-cols-2 gap-3 md:grid-cols-4">
        {knownSchema.options.map((each) => (
          <button
            key={each}
            type="button"
            aria-pressed={each === known}
            className={`${keyLook('plain')} !px-2 aria-pressed:bg-bilge aria-pressed:text-primer`}
            onClick={() => onChange(each)}
          >
            {each === known && <Icon name="tick" size={20} />}
            {capital(KNOWN_WORDS[each])}
          </button>
        ))}
      </div>
    </fieldset>
  );
}

const CERTAINTIES = [
  { value: 'suspected', label: 'Suspected' },
  { value: 'proved', label: 'Proved' },
] as const;

/** Suspected or proved: proposed by how it is known, and the person's to say. */
export function CertaintyChoice(props: { certainty: Certainty; onChange: (certainty: Certainty) => void }) {
  return (
    <Choice
      label="Suspected or proved?"
      options={CERTAINTIES}
      value={props.certainty}
      onChange={props.onChange}
      isRow
    />
  );
}
