import { createHash, randomInt } from 'node:crypto';
import type { Transaction } from 'sequelize';
import { v7 } from 'uuid';
import type { FirstRunRequest } from '#shared/identity/first-run.ts';
import type { NewShop } from '#shared/identity/shop.ts';
import { Problem } from '#server/middleware/problem.ts';
import type { Database } from '#server/models/database.ts';
import { query } from '#server/models/query.ts';
import { numberRows } from '#server/sync/feed.ts';
import { addPerson } from './add-person.ts';
import { hashPassword } from './passwords.ts';

// no letters or figures that are taken for one another
const CODE_LETTERS = 'ABCDEFGHJKMNPQRSTUVWXYZ23456789';
const CODE_GROUPS = 4;
const CODE_GROUP_LETTERS = 4;

/**
 * A new one-time code for the shop's first foreman, in place of any before it; null once there is a shop. Only its
 * hash is kept.
 */
export async function issueFirstRunCode(database: Database): Promise<string | null> {
  const { Installation, KnownShop } = database.models;
  if ((await KnownShop.count()) > 0) return null;
  const code = Array.from({ length: CODE_GROUPS }, newGroup).join('-');
  await Installation.update({ firstRunCodeHash: hashOf(code) }, { where: { onlyOne: true } });
  return code;
}

function newGroup(): string {
  return Array.from({ length: CODE_GROUP_LETTERS }, () => CODE_LETTERS[randomInt(CODE_LETTERS.length)]).join(
    '',
  );
}

// however it is typed: small letters, spaces for dashes
function hashOf(code: string): string {
  return createHash('sha256').update(code.toUpperCase().replace(/[\s-]/g, '')).digest('hex');
}

/** Makes the first shop and its first foreman. Throws a 409 once there is a shop, a 403 for another code. */
export async function firstRun(
  database: Database,
  { code, shop, person }: FirstRunRequest,
  nowMs: number,
): Promise<{ shopId: string; personId: string; seq: number }> {
  const [shopId, personId] = [v7({ msecs: nowMs }), v7({ msecs: nowMs })];
  const { name, email, password } = person;
  const passwordHash = await hashPassword(password);
  return database.inShop(shopId, async (transaction) => {
    await takeCode(database, transaction, code);
    await addShop(database, transaction, shopId, shop);
    const foreman = { id: personId, name, email, passwordHash, roles: ['foreman' as const] };
    const { seq } = await addPerson(database, transaction, shopId, foreman);
    return { shopId, personId, seq: seq! };
  });
}

async function takeCode({ models }: Database, transaction: Transaction, code: string): Promise<void> {
  const lock = transaction.LOCK.UPDATE;
  const installation = await models.Installation.findOne({ lock, transaction, rejectOnEmpty: true });
  if ((await models.KnownShop.count({ transaction })) > 0)
    throw new Problem(409, 'There is a shop here already. Sign in.');
  if (installation.firstRunCodeHash !== hashOf(code)) {
    throw new Problem(403, 'That is not the code which the server printed at its last start.');
  }
  await models.Installation.update({ firstRunCodeHash: null }, { where: { onlyOne: true }, transaction });
}

/** Makes a shop with nobody in it, within a transaction that is in it already. */
export async function addShop(
  { models }: Database,
  transaction: Transaction,
  shopId: string,
  shop: NewShop,
): Promise<void> {
  await models.KnownShop.create({ shopId }, { transaction });
  const row = { id: shopId, ...shop };
  await query(
    transaction,
    `INSERT INTO shops (shop_id, name, time_zone, currency, units, row) VALUES ($1, $2, $3, $4, $5, $6)`,
    [shopId, shop.name, shop.timeZone, shop.currency, shop.units, JSON.stringify(row)],
  );
  const { last: rowSeq } = await numberRows(transaction, shopId, 1);
  await models.Shop.update({ rowSeq }, { where: { shopId }, transaction });
}
