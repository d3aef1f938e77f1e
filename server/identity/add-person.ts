import type { Transaction } from 'sequelize';
import type { NewPerson, PersonRow } from '#shared/identity/person.ts';
import { Problem } from '#server/middleware/problem.ts';
import type { Database } from '#server/models/database.ts';
import { numberRows } from '#server/sync/feed.ts';
import { personRow } from './person-rows.ts';

export type PersonToAdd = Omit<NewPerson, 'password'> & { passwordHash: string };

export interface Added {
  person: PersonRow;
  /** the number that the row got; null where the same request had come before */
  seq: number | null;
}

/** Adds a person to the shop. Throws a 409 where the id or the e-mail is somebody else's. */
export async function addPerson(
  database: Database,
  transaction: Transaction,
  shopId: string,
  person: PersonToAdd,
): Promise<Added> {
  const { last: seq } = await numberRows(transaction, shopId, 1);
  const { Person } = database.models;
  const sameId = await Person.findOne({ where: { shopId, id: person.id }, transaction });
  if (sameId) return { person: repeated(sameId.row, person), seq: null };
  await requireFreeEmail(database, transaction, shopId, person.email);
  const row = personRow({ ...person, leftAt: null }, []);
  await Person.create({ ...person, shopId, seq, row }, { transaction });
  return { person: row, seq };
}

export async function requireFreeEmail(
  { models }: Database,
  transaction: Transaction,
  shopId: string,
  email: string,
): Promise<void> {
  const taken = await models.Person.count({ where: { shopId, email }, transaction });
  if (taken === 0) return;
  throw new Problem(409, 'Another person of this shop has that e-mail.', {
    issues: [{ path: 'email', message: 'another person has it' }],
  });
}

function repeated(known: PersonRow, person: PersonToAdd): PersonRow {
  const isSame =
    known.name === person.name && known.email === person.email && known.roles.join() === person.roles.join();
  if (isSame) return known;
  throw new Problem(409, 'A person with that id is there already, and is somebody else.', {
    issues: [{ path: 'id', message: 'in use' }],
  });
}
