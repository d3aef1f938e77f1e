import { useState } from 'react';
import type { BoatRow } from '#shared/boat/boat.ts';
import type { Template } from '#shared/trade/load.ts';
import { Choice } from '#src/components/choice.tsx';
import { Loading } from '#src/components/empty.tsx';
import { Hours } from '#src/components/hours.tsx';
import { Key } from '#src/components/key.tsx';
import { Notice } from '#src/components/notice.tsx';
import { Sheet } from '#src/components/sheet.tsx';
import { counted } from '#src/words/day-words.ts';
import { useMakeWork, useTemplates, type WorkPlan } from './use-work-plan.ts';
import { NEW_WORK, planOf, readOutlook } from './work-draft.ts';
import { WorkQuestions } from './work-questions.tsx';

/** Gives a boat without stages the stages and tasks of a template. */
export function WorkSheet({ boat, onClose }: { boat: BoatRow; onClose: () => void }) {
  const { data: templates, error: loadError } = useTemplates();
  const { make, error, isPending } = useMakeWork(boat);
  const [draft, setDraft] = useState({ ...NEW_WORK, templateId: boat.templateId ?? null });
  const template = templates?.find(({ id }) => id === draft.templateId);
  const plan = planOf(draft, boat);
  return (
    <Sheet
      isOpen
      onClose={() => (isPending ? undefined : onClose())}
      title={`${boat.name}: list of work`}
      foot={
        <>
          {template && plan && <Outlook template={template} plan={plan} />}
          <Key
            kind="main"
            disabled={isPending || !template || !plan}
            onClick={() => template && plan && make({ template, plan }, { onSuccess: onClose })}
          >
            {isPending ? 'Making it …' : 'Make the list'}
          </Key>
        </>
      }
    >
      {loadError && (
        <Notice tone="error">The templates could not be read. Open the app again with signal.</Notice>
      )}
      {error && <Notice tone="error">{error.message}</Notice>}
      {!templates && !loadError && <Loading />}
      {templates && !isPending && (
        <Choice
          label="Template"
          value={draft.templateId}
          onChange={(templateId) => setDraft({ ...draft, templateId })}
          options={templates.map(({ id, name }) => ({ value: id, label: name }))}
        />
      )}
      {template && !isPending && (
        <WorkQuestions
          template={template}
          draft={draft}
          onChange={setDraft}
          hasLength={Boolean(boat.lengthMm)}
        />
      )}
      {template && <p className="text-slate">{template.note}</p>}
    </Sheet>
  );
}

/** What the list comes to, in sight until it is made. */
function Outlook({ template, plan }: { template: Template; plan: WorkPlan }) {
  const { stages, tasks, minutes } = readOutlook(template, plan);
  return (
    <p className="font-semibold">
      {counted(stages, 'stage')}, {counted(tasks, 'task')}, <Hours minutes={minutes} /> estimated
    </p>
  );
}
