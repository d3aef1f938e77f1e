import type { Template } from '#shared/trade/load.ts';
import { questionsOf } from '#shared/trade/order-of-work.ts';
import type { Choice } from '#shared/trade/template.ts';
import { CheckKey } from '#src/components/check-key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { TextField } from '#src/components/text-field.tsx';
import { readWhich, type HowMany } from './which-ones.ts';
import type { WorkDraft } from './work-draft.ts';

const CHOICES: Record<Choice, string> = {
  bottom_scope: 'The bottom comes off',
  bleach: 'She is bleached',
  turn_over: 'She is turned over for the work',
};

interface WorkQuestionsProps {
  template: Template;
  draft: WorkDraft;
  onChange: (draft: WorkDraft) => void;
  hasLength: boolean;
}

/** What a template asks before its list is made; what is left open is left out. */
export function WorkQuestions({ template, draft, onChange, hasLength }: WorkQuestionsProps) {
  const { choices, counts } = questionsOf(template);
  const choose = (choice: Choice, isOn: boolean) => {
    const others = draft.chosen.filter((one) => one !== choice);
    onChange({ ...draft, chosen: isOn ? [...others, choice] : others });
  };
  return (
    <>
      {choices.map((choice) => (
        <CheckKey
          key={choice}
          label={CHOICES[choice]}
          isChecked={draft.chosen.includes(choice)}
          onChange={(isOn) => choose(choice, isOn)}
        />
      ))}
      {(['ribs', 'planks'] as const)
        .filter((noun) => counts.includes(noun))
        .map((noun) => (
          <Which
            key={noun}
            noun={noun}
            value={draft[noun]}
            onChange={(value) => onChange({ ...draft, [noun]: value })}
          />
        ))}
      {counts.includes('lengthMm') && !hasLength && (
        <Notice>Her length is not written down: what goes by it gets no estimate.</Notice>
      )}
    </>
  );
}

interface WhichProps {
  noun: 'ribs' | 'planks';
  value: HowMany;
  onChange: (value: HowMany) => void;
}

function Which({ noun, value, onChange }: WhichProps) {
  const read = readWhich(value);
  return (
    <>
      <TextField
        label={`How many ${noun} are to be made`}
        inputMode="numeric"
        value={value.count}
        onChange={(count) => onChange({ ...value, count })}
        autoComplete="off"
      />
      <TextField
        label={`Which ${noun}, where known`}
        hint="Like 4 port, 7-9 starboard."
        value={value.which}
        onChange={(which) => onChange({ ...value, which })}
        problem={Array.isArray(read) ? undefined : read.problem}
        autoComplete="off"
      />
    </>
  );
}
