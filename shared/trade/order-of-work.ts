import type { StageAdd } from '../stage/stage.ts';
import type { TaskAdd } from '../task/task.ts';
import type { Template } from './load.ts';
import { inOrder } from './stage-order.ts';
import { templateIdOf } from './task-template.ts';
import { estimateOf, makingsOf, type Counts } from './task-places.ts';
import type { Choice, StageTemplate, TaskTemplate } from './template.ts';

/** A boat whose list of work is to be made; `chosen` is what was decided, and left out is what is not in it. */
export interface BoatToWorkOn {
  boatId: string;
  counts?: Counts;
  chosen?: readonly Choice[];
}

export type WorkOp = { kind: 'stage.add'; data: StageAdd } | { kind: 'task.add'; data: TaskAdd };

/**
 * The ops that give a boat the stages and tasks of a template, each behind all that it names: stages, then their tasks.
 * Throws BrokenTemplate where its stages wait for one another.
 */
export function orderOfWork(template: Template, boat: BoatToWorkOn, newId: () => string): WorkOp[] {
  const { boatId, counts = {}, chosen = [] } = boat;
  const stages = chosenStages(inOrder(template.stages), chosen);
  const stageIds = new Map(stages.map((stage) => [stage.id, newId()]));
  const stageOps = stages.map((stage, index): WorkOp => {
    const after = stage.after.map((id) => stageIds.get(id)!);
    const templateId = templateIdOf(template, stage);
    return {
      kind: 'stage.add',
      data: {
        stageId: stageIds.get(stage.id)!,
        boatId,
        name: stage.name,
        order: index + 1,
        after,
        templateId,
      },
    };
  });
  const taskOps = stages.flatMap((stage) => {
    const belongs = { boatId, stageId: stageIds.get(stage.id)! };
    const tasks = stage.tasks.filter((task) => isChosen(task, chosen));
    return tasks.flatMap((task) => taskOpsOf(template, task, belongs, counts, newId));
  });
  return [...stageOps, ...taskOps];
}

function taskOpsOf(
  template: Template,
  task: TaskTemplate,
  belongs: { boatId: string; stageId: string },
  counts: Counts,
  newId: () => string,
): WorkOp[] {
  const estimateMinutes = estimateOf(task, counts);
  const estimate = estimateMinutes === undefined ? {} : { estimateMinutes };
  return makingsOf(task, counts).map((making) => ({
    kind: 'task.add',
    data: { taskId: newId(), ...belongs, ...making, ...estimate, templateId: templateIdOf(template, task) },
  }));
}

function isChosen(one: { choice?: Choice | undefined }, chosen: readonly Choice[]): boolean {
  return one.choice === undefined || chosen.includes(one.choice);
}

/** What comes after a stage that is left out comes after all that it came after itself. `stages` are in order. */
function chosenStages(stages: StageTemplate[], chosen: readonly Choice[]): StageTemplate[] {
  const standsFor = new Map<string, string[]>();
  const kept: StageTemplate[] = [];
  for (const stage of stages) {
    const after = [...new Set(stage.after.flatMap((id) => standsFor.get(id)!))];
    standsFor.set(stage.id, isChosen(stage, chosen) ? [stage.id] : after);
    if (isChosen(stage, chosen)) kept.push({ ...stage, after });
  }
  return kept;
}

/** What a template asks before its list is made: the choices in it, what is counted, and the tasks made at named places. */
export interface Questions {
  choices: Choice[];
  counts: ('ribs' | 'planks' | 'lengthMm')[];
  places: TaskTemplate[];
}

export function questionsOf(template: Template): Questions {
  const tasks = template.stages.flatMap((stage) => stage.tasks);
  const choices = [...template.stages, ...tasks].flatMap(({ choice }) => choice ?? []);
  const counted = { rib: 'ribs', plank: 'planks', tenFeet: 'lengthMm' } as const;
  const counts = tasks.flatMap(({ per }) =>
    per === 'rib' || per === 'plank' || per === 'tenFeet' ? [counted[per]] : [],
  );
  return {
    choices: [...new Set(choices)],
    counts: [...new Set(counts)],
    places: tasks.filter(({ per }) => per === 'place' || per === 'finding'),
  };
}
