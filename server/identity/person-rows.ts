import type { Transaction } from 'sequelize';
import type { PersonRow } from '#shared/identity/person.ts';
import type { Database } from '#server/models/database.ts';
import type { PersonColumns } from '#server/models/person.ts';

type Shown = Pick<PersonColumns, 'id' | 'name' | 'email' | 'roles' | 'leftAt'>;

/** A person as they stand in the feed. */
export function personRow(person: Shown, boatIds: string[]): PersonRow {
  return {
    id: person.id,
    name: person.name,
    email: person.email,
    roles: person.roles,
    leftAt: person.leftAt?.toISOString() ?? null,
    boatIds,
  };
}

/** The boats that a person owns. */
export async function boatsOf(
  database: Database,
  transaction: Transaction,
  shopId: string,
  personId: string,
): Promise<string[]> {
  const owned = await database.models.BoatOwner.findAll({
    where: { shopId, personId },
    order: ['boatId'],
    transaction,
  });
  return owned.map((line) => line.boatId);
}
