import { isKindSet, readHours, writeHours } from '../entry/hours-field.ts';
import { isSameJson } from './canonical.ts';
import type { Op } from './op.ts';
import type { Facts, Row, Statement, Struck } from './row.ts';

/** Boat and stage are one field: who moves a thing moves it to a boat and a stage of hers, or none. */
export const STAGE_FIELD = 'stageId';
export const STRUCK_FIELD = 'struck';
export const HOURS_PREFIX = 'hours/';

type Fields = Record<string, unknown>;

// what the making op gave; nothing given is no value, and nothing conflicts with it
function madeValue(row: Row, field: string): unknown {
  if (field === STRUCK_FIELD) return undefined;
  if (field.startsWith(HOURS_PREFIX)) return readHours(row, field.slice(HOURS_PREFIX.length));
  const fields = row as unknown as Fields;
  if (field === STAGE_FIELD) return { boatId: row.boatId, stageId: fields.stageId ?? null };
  return fields[field] ?? undefined;
}

function writeField(row: Row, field: string, standing: Statement): void {
  if (field === STRUCK_FIELD) row.struck = standing.value as Struck | null;
  else if (field.startsWith(HOURS_PREFIX))
    writeHours(row, field.slice(HOURS_PREFIX.length), standing, statementsOf(row, field));
  else if (field === STAGE_FIELD) Object.assign(row, standing.value);
  else (row as unknown as Fields)[field] = standing.value;
}

function madeStatement(row: Row, field: string): Statement[] {
  const value = madeValue(row, field);
  if (value === undefined) return [];
  const made: Statement = {
    field,
    value,
    opId: row.madeBy,
    personId: row.makerId,
    at: row.stamps[row.madeBy]!,
    over: [],
  };
  return [
    field.startsWith(HOURS_PREFIX) && isKindSet(row, field.slice(HOURS_PREFIX.length))
      ? { ...made, settles: true }
      : made,
  ];
}

/** All that was said about a field, the making op's value first. */
export function statementsOf(row: Row, field: string): Statement[] {
  const said = row.statements.filter((statement) => statement.field === field);
  return said.length > 0 ? said : madeStatement(row, field);
}

function byLatest(a: Statement, b: Statement): number {
  if (a.at !== b.at) return a.at < b.at ? 1 : -1;
  if (a.opId !== b.opId) return a.opId < b.opId ? 1 : -1;
  return a.field < b.field ? 1 : -1;
}

/** The values of a field that no kept op has replaced, the standing one first. */
export function liveStatements(row: Row, field: string): Statement[] {
  const said = statementsOf(row, field);
  if (said.length < 2) return said;
  const replaced = new Set(said.flatMap((statement) => statement.over.filter((id) => id !== statement.opId)));
  const live = said.filter((statement) => !replaced.has(statement.opId));
  // two that each claim to replace the other leave none: the latest stands
  return live.length > 0 ? live.sort(byLatest) : [...said].sort(byLatest).slice(0, 1);
}

/** Two strikes are one value, whatever their words, and so are two restores. */
function isSameValue(field: string, a: unknown, b: unknown): boolean {
  return field === STRUCK_FIELD ? (a === null) === (b === null) : isSameJson(a, b);
}

/** The live values of a field if they differ, the standing one first; otherwise none. */
export function differingStatements(row: Row, field: string): Statement[] {
  const live = liveStatements(row, field);
  const differ = live.some((statement) => !isSameValue(field, statement.value, live[0]!.value));
  return differ ? live : [];
}

/** The fields about which something was said since the row was made. */
export function saidFields(row: Row): string[] {
  return [...new Set(row.statements.map((statement) => statement.field))];
}

/** The ops whose values of a field stand or still ask to, for `over`: its heads, or the making op. */
export function headsOf(row: Row, field: string): string[] {
  return row.heads[field] ?? [row.madeBy];
}

function headsAndStamps(row: Row): Pick<Row, 'heads' | 'stamps'> {
  const heads: Row['heads'] = {};
  const stamps: Row['stamps'] = { [row.madeBy]: row.stamps[row.madeBy]! };
  for (const field of saidFields(row).sort()) {
    const live = liveStatements(row, field);
    if (live.length === 1 && live[0]!.opId === row.madeBy) continue;
    heads[field] = live.map((statement) => statement.opId);
    for (const statement of live) stamps[statement.opId] = statement.at;
  }
  return { heads, stamps };
}

type Said = Pick<Statement, 'why' | 'saw'>;

function stateField(
  row: Row,
  field: string,
  value: unknown,
  op: Op<unknown>,
  facts: Facts,
  said: Said,
): void {
  const before = statementsOf(row, field);
  if (before.some((statement) => statement.opId === op.id)) return;
  const isFirst = !row.statements.some((statement) => statement.field === field);
  const settles =
    field.startsWith(HOURS_PREFIX) && (facts.roles.includes('foreman') || facts.roles.includes('office'));
  const statement: Statement = {
    field,
    value,
    opId: op.id,
    personId: op.personId,
    at: facts.orderedAt,
    over: op.over[field] ?? [],
    ...(said.why ? { why: said.why } : {}),
    ...(said.saw ? { saw: said.saw } : {}),
    ...(settles ? { settles: true as const } : {}),
  };
  for (const one of isFirst ? [...before, statement] : [statement])
    row.statements = withStatement(row.statements, one);
}

// kept oldest first: nearly always what is new comes last
function withStatement(statements: Statement[], statement: Statement): Statement[] {
  const place = statements.findLastIndex((earlier) => byLatest(earlier, statement) > 0) + 1;
  return statements.toSpliced(place, 0, statement);
}

/** The row once `op` has said `values` about its fields; unchanged where it already did. */
export function stateFields<R extends Row>(
  row: R,
  values: Fields,
  op: Op<unknown>,
  facts: Facts,
  said: Said = {},
): R {
  const next = { ...row };
  for (const [field, value] of Object.entries(values)) {
    stateField(next, field, value, op, facts, said);
    writeField(next, field, liveStatements(next, field)[0]!);
  }
  return Object.assign(next, headsAndStamps(next));
}
