import type { z } from 'zod';
import { isForeman, type AnyOpKind, type OpKind } from '../sync/op-kind.ts';
import { madeAt } from '../sync/row.ts';
import { decideSchema, isAdmissible, withState, type Decision, type SetAsideRow } from './set-aside.ts';

type Decide = z.infer<typeof decideSchema>;

function byTime(a: Decision, b: Decision): number {
  if (a.at !== b.at) return a.at < b.at ? -1 : 1;
  return a.opId < b.opId ? -1 : 1;
}

function decideKind(choice: Decision['choice']): OpKind<Decide, SetAsideRow> {
  return {
    kind: `setAside.${choice}`,
    v: 1,
    data: decideSchema,
    entity: 'setAside',
    rowId: (data) => data.setAsideId,
    makes: false,
    // what cannot be admitted now may come to be: judged again once its row has come, it was not its author's to make
    fits: ({ setAsideId }, look) =>
      choice === 'dismiss' || isAdmissible(look({ entity: 'setAside', id: setAsideId }) as SetAsideRow),
    mayMake: isForeman,
    reduce: (row, op, facts) => {
      if (row.decisions.some((decision) => decision.opId === op.id)) return row;
      const decision: Decision = {
        choice,
        by: op.personId,
        at: madeAt(facts),
        opId: op.id,
        why: op.data.why || null,
      };
      return withState({ ...row, decisions: [...row.decisions, decision].sort(byTime) });
    },
  };
}

export const setAsideKinds: AnyOpKind[] = [decideKind('admit'), decideKind('dismiss')];
