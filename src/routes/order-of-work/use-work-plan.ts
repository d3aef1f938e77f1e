import { useMutation, useQuery } from '@tanstack/react-query';
import type { BoatRow } from '#shared/boat/boat.ts';
import { TEMPLATE_IDS, loadTemplate, type Template } from '#shared/trade/load.ts';
import { orderOfWork, type BoatToWorkOn } from '#shared/trade/order-of-work.ts';
import { useReplica } from '#src/replica/hooks.tsx';
import type { Holding } from '#src/replica/replica.ts';

export type WorkPlan = Omit<BoatToWorkOn, 'boatId'>;

/** The stage templates, which come with the app's files. */
export function useTemplates() {
  return useQuery({
    queryKey: ['stage-templates'],
    queryFn: () => Promise.all(TEMPLATE_IDS.map(loadTemplate)),
    networkMode: 'always',
    staleTime: Infinity,
  });
}

/** Makes a boat's list of work, all of it or nothing. */
export function useMakeWork(boat: BoatRow) {
  const replica = useReplica();
  const { mutate, error, isPending } = useMutation({
    mutationFn: ({ template, plan }: { template: Template; plan: WorkPlan }) =>
      replica.holdAll(workHoldings(boat, template, plan, replica.newId)),
    networkMode: 'always',
    retry: false,
  });
  return { make: mutate, error, isPending };
}

function workHoldings(boat: BoatRow, template: Template, plan: WorkPlan, newId: () => string): Holding[] {
  const ops = orderOfWork(template, { boatId: boat.id, ...plan }, newId);
  return [{ kind: 'boat.amend', data: { boatId: boat.id, set: { templateId: template.id } } }, ...ops];
}
