import { isTemplateId, loadTemplate, type Template } from './load.ts';
import type { Caution } from './rules.ts';
import type { StageTemplate, TaskTemplate } from './template.ts';

/** What a stage or task row says as its templateId: the template and the id in it, 'annual_refit/bottom_paint'. */
export function templateIdOf(template: { id: string }, one: { id: string }): string {
  return `${template.id}/${one.id}`;
}

/** What a template says of a task; cautions are never without who decides. */
export interface TaskText {
  stage: StageTemplate;
  task: TaskTemplate;
  cautions: Caution[];
  safetyNote: string;
}

/** Undefined where the template has no such task. */
export function findTaskTemplate(template: Template, templateId: string): TaskText | undefined {
  for (const stage of template.stages) {
    const task = stage.tasks.find((each) => templateIdOf(template, each) === templateId);
    if (task)
      return { stage, task, cautions: cautionsOf(template, task), safetyNote: template.rules.safetyNote };
  }
  return undefined;
}

/** Reads the template that a task row's templateId names; undefined where this version knows no such template or task. */
export async function taskTemplate(templateId: string): Promise<TaskText | undefined> {
  const [id = ''] = templateId.split('/');
  return isTemplateId(id) ? findTaskTemplate(await loadTemplate(id), templateId) : undefined;
}

function cautionsOf(template: Template, task: TaskTemplate): Caution[] {
  return task.cautions.flatMap((id) => template.rules.cautions.find((caution) => caution.id === id) ?? []);
}
