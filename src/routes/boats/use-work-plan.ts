import { useMutation, useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import type { BoatRow } from '#shared/boat/boat.ts';
import { TEMPLATE_IDS, loadTemplate, type Template } from '#shared/trade/load.ts';
import { orderOfWork, type BoatToWorkOn } from '#shared/trade/order-of-work.ts';
import { useReplica, type Holding } from '#src/replica/hooks.tsx';
import { holdInTurn } from './hold-work.ts';

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

/** Makes a boat's list of work. Asked again after a failure, it goes on with the same list where that stopped. */
export function useMakeWork(boat: BoatRow) {
  const replica = useReplica();
  const [holdings, setHoldings] = useState<Holding[]>([]);
  const [kept, setKept] = useState(0);
  const { mutate, error, isPending } = useMutation({
    mutationFn: (list: Holding[]) =>
      holdInTurn(({ kind, data, options }) => replica.hold(kind, data, options), list, kept, setKept),
    networkMode: 'always',
    retry: false,
  });
  const make = (template: Template, plan: WorkPlan, onDone: () => void) => {
    const list = kept > 0 ? holdings : workHoldings(boat, template, plan, replica.newId);
    setHoldings(list);
    mutate(list, { onSuccess: onDone });
  };
  return { make, error, isPending, kept, of: holdings.length };
}

function workHoldings(boat: BoatRow, template: Template, plan: WorkPlan, newId: () => string): Holding[] {
  const ops = orderOfWork(template, { boatId: boat.id, ...plan }, newId);
  return [{ kind: 'boat.amend', data: { boatId: boat.id, set: { templateId: template.id } } }, ...ops];
}
