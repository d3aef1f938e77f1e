import type { BoatRow } from '#shared/boat/boat.ts';
import type { Template } from '#shared/trade/load.ts';
import { orderOfWork } from '#shared/trade/order-of-work.ts';
import type { Choice } from '#shared/trade/template.ts';
import type { WorkPlan } from './use-work-plan.ts';
import { readWhich, type HowMany } from './which-ones.ts';

/** What is being answered about a list of work. */
export interface WorkDraft {
  templateId: string | null;
  chosen: Choice[];
  ribs: HowMany;
  planks: HowMany;
}

export const NEW_WORK: WorkDraft = {
  templateId: null,
  chosen: [],
  ribs: { count: '', which: '' },
  planks: { count: '', which: '' },
};

/** Null where something written cannot be read. */
export function planOf(
  { chosen, ribs, planks }: WorkDraft,
  boat: Pick<BoatRow, 'lengthMm'>,
): WorkPlan | null {
  const [someRibs, somePlanks] = [readWhich(ribs), readWhich(planks)];
  if (!Array.isArray(someRibs) || !Array.isArray(somePlanks)) return null;
  const length = boat.lengthMm ? { lengthMm: boat.lengthMm } : {};
  return { chosen, counts: { ribs: someRibs, planks: somePlanks, ...length } };
}

/** What a list comes to before it is made. */
export function readOutlook(
  template: Template,
  plan: WorkPlan,
): { stages: number; tasks: number; minutes: number } {
  const ops = orderOfWork(template, { boatId: '', ...plan }, () => '');
  const tasks = ops.flatMap((op) => (op.kind === 'task.add' ? [op.data] : []));
  const minutes = tasks.reduce((sum, task) => sum + (task.estimateMinutes ?? 0), 0);
  return { stages: ops.length - tasks.length, tasks: tasks.length, minutes };
}
