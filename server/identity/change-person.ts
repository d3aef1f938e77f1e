import { Op as where, type Transaction } from 'sequelize';
import type { PersonChange, PersonRow } from '#shared/identity/person.ts';
import type { Role } from '#shared/identity/role.ts';
import { Problem } from '#server/middleware/problem.ts';
import type { Database } from '#server/models/database.ts';
import type { PersonColumns } from '#server/models/person.ts';
import { numberRows } from '#server/sync/feed.ts';
import { requireFreeEmail } from './add-person.ts';
import { endFamilies } from './families.ts';
import { boatsOf, personRow } from './person-rows.ts';

export type ChangeToPerson = Omit<PersonChange, 'password'> & { passwordHash?: string };

interface Change {
  shopId: string;
  id: string;
  change: ChangeToPerson;
  /** the roles of the one who makes the change */
  by: Role[];
  nowMs: number;
}

/** Changes a person. Throws a 404, a 403 where a foreman is needed, or a 409 with what stands against it. */
export async function changePerson(
  database: Database,
  transaction: Transaction,
  { shopId, id, change, by, nowMs }: Change,
): Promise<{ person: PersonRow; seq: number }> {
  const { last: seq } = await numberRows(transaction, shopId, 1);
  const { Person } = database.models;
  const found = await Person.findOne({ where: { shopId, id }, transaction });
  if (!found) throw new Problem(404, 'There is no such person in this shop.');
  const before = found.get();
  const after = changed(before, change, nowMs);
  requireForemanForForemen(by, before, after);
  await requireForemanLeft(database, transaction, before, after);
  if (after.email !== before.email) await requireFreeEmail(database, transaction, shopId, after.email);

  const row = personRow(after, await boatsOf(database, transaction, shopId, id));
  await found.update({ ...after, seq, row }, { transaction });
  if (change.passwordHash) await endFamilies(database, transaction, { shopId, personId: id }, nowMs);
  return { person: row, seq };
}

function changed(before: PersonColumns, change: ChangeToPerson, nowMs: number): PersonColumns {
  const roles = change.roles ?? before.roles;
  const isOtherRoles = [...roles].sort().join() !== [...before.roles].sort().join();
  return {
    ...before,
    name: change.name ?? before.name,
    email: change.email ?? before.email,
    passwordHash: change.passwordHash ?? before.passwordHash,
    roles,
    leftAt: leftAtAfter(before.leftAt, change.hasLeft, nowMs),
    feedEpoch: before.feedEpoch + (isOtherRoles ? 1 : 0),
  };
}

function leftAtAfter(before: Date | null, hasLeft: boolean | undefined, nowMs: number): Date | null {
  if (hasLeft === undefined) return before;
  return hasLeft ? (before ?? new Date(nowMs)) : null;
}

// else whoever keeps the list of people could make a foreman of themselves, or take over a foreman's sign-in
function requireForemanForForemen(by: Role[], before: PersonColumns, after: PersonColumns): void {
  if (by.includes('foreman')) return;
  if ([...before.roles, ...after.roles].includes('foreman')) throw foremanNeeded();
}

export function foremanNeeded(): Problem {
  return new Problem(403, 'Only a foreman makes, changes or unmakes a foreman.');
}

async function requireForemanLeft(
  { models }: Database,
  transaction: Transaction,
  before: PersonColumns,
  after: PersonColumns,
): Promise<void> {
  if (!isForeman(before) || isForeman(after)) return;
  const others = await models.Person.count({
    where: {
      shopId: before.shopId,
      id: { [where.ne]: before.id },
      roles: { [where.contains]: ['foreman'] },
      leftAt: null,
    },
    transaction,
  });
  if (others === 0)
    throw new Problem(409, `${before.name} is the shop's last foreman. Make another one first.`);
}

function isForeman(person: PersonColumns): boolean {
  return person.roles.includes('foreman') && person.leftAt === null;
}
