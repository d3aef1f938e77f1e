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
    mayMake: (author, _data, row) => isForeman(author) && row !== undefined && (choice === 'dismiss' || isAdmissible(row)),
    reduce: (row, op, facts) => {
      if (row.decisions.some((decision) => decision.opId === op.id)) return row;
      const decision: Decision = { choice, by: op.personId, at: madeAt(facts), opId: op.id, why: op.data.why || null };
      return withState({ ...row, decisions: [...row.decisions, decision].sort(byTime) });
    },
  };
}

export const setAsideKinds: AnyOpKind[] = [decideKind('admit'), decideKind('dismiss')];
