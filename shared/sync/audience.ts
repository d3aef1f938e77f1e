import type { Role } from '../identity/role.ts';
import type { SetAsideRow } from '../set-aside/set-aside.ts';
import type { StageRow } from '../stage/stage.ts';
import { standingItems } from './items.ts';
import type { Entity } from './row.ts';

export interface Viewer {
  personId: string;
  roles: Role[];
  /** the boats that they own */
  boatIds: ReadonlySet<string>;
}

type AnyRow = Record<string, unknown>;

function worksHere(viewer: Viewer): boolean {
  return viewer.roles.some((role) => role !== 'owner');
}

function readsAll(viewer: Viewer): boolean {
  return viewer.roles.includes('foreman') || viewer.roles.includes('office');
}

/** Names and roles for whoever works here; e-mail and boats for those who keep the people, and of oneself. */
function seenPerson(row: AnyRow, viewer: Viewer): AnyRow | null {
  if (readsAll(viewer) || row.id === viewer.personId) return row;
  if (!worksHere(viewer)) return null;
  const { email: _email, boatIds: _boatIds, ...seen } = row;
  return seen;
}

function seenDevice(row: AnyRow, viewer: Viewer): AnyRow | null {
  const isOwn = (row.personIds as string[]).includes(viewer.personId);
  return readsAll(viewer) || isOwn ? row : null;
}

// an owner writes no stage and no boat: no heads, no stamps, nothing of who said what
function forOwner(row: AnyRow): AnyRow {
  const { statements: _statements, takeBacks: _takeBacks, makerId: _makerId, ...seen } = row;
  return { ...seen, heads: {}, stamps: {} };
}

function seenStage(row: AnyRow, viewer: Viewer): AnyRow | null {
  if (worksHere(viewer)) return row;
  if (!viewer.boatIds.has(row.boatId as string)) return null;
  const { marks, twice: _twice, struck, ...seen } = forOwner(row);
  if (struck) return null;
  const days = standingItems(marks as StageRow['marks'])
    .map((mark) => mark.workDate)
    .sort();
  return { ...seen, struck: null, doneOn: days[0] ?? null };
}

function seenBoat(row: AnyRow, viewer: Viewer): AnyRow | null {
  if (worksHere(viewer)) return row;
  // why a row was struck is said among those who work here
  return viewer.boatIds.has(row.id as string) && !row.struck ? forOwner(row) : null;
}

function seenSetAside(row: AnyRow, viewer: Viewer): AnyRow | null {
  return readsAll(viewer) || (row as unknown as SetAsideRow).authorId === viewer.personId ? row : null;
}

/** A row as a person may see it, or null where they may not. The row itself where they see the whole of it. */
export function seen(entity: Entity, row: object, viewer: Viewer): object | null {
  const fields = row as AnyRow;
  switch (entity) {
    case 'shop':
      return row;
    case 'person':
      return seenPerson(fields, viewer);
    case 'device':
      return seenDevice(fields, viewer);
    case 'boat':
      return seenBoat(fields, viewer);
    case 'stage':
      return seenStage(fields, viewer);
    case 'setAside':
      return seenSetAside(fields, viewer);
    case 'task':
    case 'entry':
    case 'finding':
    case 'sound':
    case 'photo':
    case 'looseEnd':
      return worksHere(viewer) ? row : null;
  }
}

/** Whether a person sees no row of an entity and never could. */
export function seesNone(entity: Entity, viewer: Viewer): boolean {
  return !worksHere(viewer) && ['task', 'entry', 'finding', 'sound', 'photo', 'looseEnd'].includes(entity);
}

/** Whether a person sees every row of an entity whole, so that rows can be passed on as they are kept. */
export function seesWhole(entity: Entity, viewer: Viewer): boolean {
  switch (entity) {
    case 'shop':
      return true;
    case 'person':
    case 'device':
    case 'setAside':
      return readsAll(viewer);
    default:
      return worksHere(viewer);
  }
}

/** Whether a person could see an earlier state of a row that is no more (null), or that they see no longer. */
export function couldSee(entity: Entity, row: object | null, viewer: Viewer): boolean {
  if (entity === 'looseEnd') return worksHere(viewer);
  const { id, boatId } = row as AnyRow;
  return (
    (entity === 'boat' && viewer.boatIds.has(id as string)) ||
    (entity === 'stage' && viewer.boatIds.has(boatId as string))
  );
}
