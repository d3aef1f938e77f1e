import type { Transaction } from 'sequelize';
import { Problem } from '#server/middleware/problem.ts';
import type { Database } from '#server/models/database.ts';
import { numberRows } from '#server/sync/feed.ts';
import { boatsOf, personRow } from './person-rows.ts';

/**
 * Makes these people, and nobody else, the boat's owners. Returns the last number that a person's row got, or null
 * where nothing changes. Throws a 404 for the boat, a 400 for people who are none of the shop's owners.
 */
export async function setBoatOwners(
  database: Database,
  transaction: Transaction,
  shopId: string,
  boatId: string,
  personIds: string[],
): Promise<number | null> {
  // takes the shop's row before it is known how many numbers are needed
  await numberRows(transaction, shopId, 0);
  await requireBoat(database, transaction, shopId, boatId);
  await requireOwners(database, transaction, shopId, personIds);
  const before = await ownersOf(database, transaction, shopId, boatId);
  const added = personIds.filter((id) => !before.includes(id));
  const removed = before.filter((id) => !personIds.includes(id));
  const touched = [...new Set([...added, ...removed])];
  if (touched.length === 0) return null;

  const { BoatOwner } = database.models;
  await BoatOwner.destroy({ where: { shopId, boatId, personId: removed }, transaction });
  await BoatOwner.bulkCreate(
    [...new Set(added)].map((personId) => ({ shopId, boatId, personId })),
    { transaction },
  );
  const { first, last } = await numberRows(transaction, shopId, touched.length);
  for (const [index, id] of touched.entries())
    await otherBoats(database, transaction, shopId, id, first + index);
  return last;
}

async function requireBoat(
  { models }: Database,
  transaction: Transaction,
  shopId: string,
  id: string,
): Promise<void> {
  const found = await models.Boat.count({ where: { shopId, id }, transaction });
  if (found === 0) throw new Problem(404, 'There is no such boat in this shop.');
}

async function requireOwners(
  { models }: Database,
  transaction: Transaction,
  shopId: string,
  personIds: string[],
): Promise<void> {
  const found = await models.Person.findAll({ where: { shopId, id: personIds }, transaction });
  const owners = new Set(found.filter((person) => person.roles.includes('owner')).map((person) => person.id));
  const issues = personIds.flatMap((id, index) =>
    owners.has(id)
      ? []
      : [{ path: `personIds.${index}`, message: 'no person of this shop with the role owner' }],
  );
  if (issues.length > 0) throw new Problem(400, 'Not all of these people can own a boat here.', { issues });
}

async function ownersOf(
  { models }: Database,
  transaction: Transaction,
  shopId: string,
  boatId: string,
): Promise<string[]> {
  const lines = await models.BoatOwner.findAll({ where: { shopId, boatId }, transaction });
  return lines.map((line) => line.personId);
}

// whoever gains or loses a boat begins a new feed
async function otherBoats(
  database: Database,
  transaction: Transaction,
  shopId: string,
  id: string,
  seq: number,
): Promise<void> {
  const person = await database.models.Person.findOne({
    where: { shopId, id },
    transaction,
    rejectOnEmpty: true,
  });
  const row = personRow(person, await boatsOf(database, transaction, shopId, id));
  await person.update({ seq, row, feedEpoch: person.feedEpoch + 1 }, { transaction });
}
