import type { Gate } from './gate.ts';
import type { Rules } from './rules.ts';
import { BrokenTemplate, inOrder } from './stage-order.ts';
import type { TemplateFile } from './template.ts';

/** Throws BrokenTemplate unless every id is used once, every name leads somewhere and the stages have an order. */
export function checkTemplate(template: TemplateFile, rules: Rules): void {
  inOrder(template.stages);
  const tasks = template.stages.flatMap((stage) => stage.tasks);
  const taskIds = tasks.map(({ id }) => id);
  const twice = taskIds.find((id, index) => taskIds.indexOf(id) !== index);
  if (twice) throw new BrokenTemplate(`two tasks have the id ${twice}`);

  const gates = [...template.stages, ...tasks].flatMap((one) => one.gates);
  const stageIds = template.stages.map(({ id }) => id);
  const cautionIds = rules.cautions.map(({ id }) => id);
  mustHave(
    taskIds,
    gates.flatMap((gate) => (gate.type === 'task_done' ? [gate.task] : [])),
    'task',
  );
  mustHave(stageIds, gates.flatMap(openStage), 'stage');
  mustHave(
    Object.keys(rules.checklists),
    gates.flatMap((gate) => (gate.type === 'checklist' ? [gate.checklist] : [])),
    'checklist',
  );
  mustHave(
    cautionIds,
    tasks.flatMap((task) => task.cautions),
    'caution',
  );
}

function openStage(gate: Gate): string[] {
  return gate.type === 'checklist' && gate.when ? [gate.when.open] : [];
}

function mustHave(ids: string[], named: string[], what: string): void {
  const missing = named.find((id) => !ids.includes(id));
  if (missing !== undefined) throw new BrokenTemplate(`it names the ${what} ${missing}, which is not there`);
}
