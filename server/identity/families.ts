import { Op as where, type Transaction } from 'sequelize';
import { v7 } from 'uuid';
import type { Database } from '#server/models/database.ts';
import type { Bearer } from './access-token.ts';
import type { RefreshToken } from './refresh-token.ts';

/** How long a device may stay away and still be signed in. */
export const FAMILY_IDLE_MAX_MS = 180 * 86_400_000;

/** Begins a family and returns its first token. */
export async function openFamily(
  database: Database,
  transaction: Transaction,
  bearer: Bearer,
  nowMs: number,
): Promise<RefreshToken> {
  const id = v7({ msecs: nowMs });
  await database.models.RefreshFamily.create({ ...bearer, id, lastUsedAt: new Date(nowMs) }, { transaction });
  return { shopId: bearer.shopId, familyId: id, number: 1 };
}

/**
 * Takes a presented token. It is good until its successor has been presented: a lost answer may be asked for again,
 * and two tabs may ask at once. An older one than that ends the family. Returns who is signed in, or null.
 */
export async function presentToken(
  database: Database,
  transaction: Transaction,
  { shopId, familyId, number }: RefreshToken,
  nowMs: number,
): Promise<Bearer | null> {
  const family = await database.models.RefreshFamily.findOne({
    where: { shopId, id: familyId },
    lock: transaction.LOCK.UPDATE,
    transaction,
  });
  const now = new Date(nowMs);
  if (!family || family.endedAt || nowMs - family.lastUsedAt.getTime() > FAMILY_IDLE_MAX_MS) return null;
  if (number < family.used) {
    await family.update({ endedAt: now }, { transaction });
    return null;
  }
  await family.update({ used: number, lastUsedAt: now }, { transaction });
  return { shopId, deviceId: family.deviceId, personId: family.personId };
}

/** Lets the family go on as another person. */
export async function handOver(
  database: Database,
  transaction: Transaction,
  token: RefreshToken,
  personId: string,
): Promise<void> {
  const { shopId, familyId } = token;
  await database.models.RefreshFamily.update({ personId }, { where: { shopId, id: familyId }, transaction });
}

/** Ends the families that match: one by its id, or all those of a device or a person. */
export async function endFamilies(
  database: Database,
  transaction: Transaction,
  which: { shopId: string } & ({ id: string } | { deviceId: string } | { personId: string }),
  nowMs: number,
): Promise<void> {
  await database.models.RefreshFamily.update(
    { endedAt: new Date(nowMs) },
    { where: { ...which, endedAt: { [where.is]: null } }, transaction },
  );
}
