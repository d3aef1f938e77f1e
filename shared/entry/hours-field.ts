import type { Row, Statement } from '../sync/row.ts';
import type { Hours, HoursKind } from './hours.ts';

export interface HoursValue {
  minutes: number;
  kind: HoursKind | null;
}

interface WithHours {
  hours?: Hours[];
}

/** What the making op gave for a person: figures that stand in the row while nothing else was said. */
export function readHours(row: Row, personId: string): HoursValue | undefined {
  const own = (row as Row & WithHours).hours?.find((figure) => figure.personId === personId);
  return own && { minutes: own.minutes, kind: own.kind };
}

/** Whether the making op gave a person's kind by somebody who sets kinds. */
export function isKindSet(row: Row, personId: string): boolean {
  return (row as Row & WithHours).hours?.find((figure) => figure.personId === personId)?.proposed === false;
}

/** Puts the standing figure of a person into the row's list; no minutes leave it. */
export function writeHours(row: Row, personId: string, standing: Statement, said: Statement[]): void {
  const value = standing.value as HoursValue;
  const others = ((row as Row & WithHours).hours ?? []).filter((figure) => figure.personId !== personId);
  const own: Hours = { personId, ...value, proposed: !isKindSettled(value.kind, said) };
  const hours = value.minutes > 0 ? [...others, own] : others;
  (row as Row & WithHours).hours = hours.sort((a, b) => (a.personId < b.personId ? -1 : 1));
}

/** A kind is a proposal until it is what was last said by somebody who sets kinds. `said` has the latest last. */
function isKindSettled(kind: HoursKind | null, said: Statement[]): boolean {
  const settling = said.findLast((statement) => statement.settles);
  return kind !== null && (settling?.value as HoursValue | undefined)?.kind === kind;
}
