import type { Transaction } from 'sequelize';
import type { SessionRequest } from '#shared/identity/session.ts';
import { Problem } from '#server/middleware/problem.ts';
import type { Database } from '#server/models/database.ts';
import { numberRows } from '#server/sync/feed.ts';
import type { Bearer } from './access-token.ts';
import { deviceRow, enrolledOn } from './device-rows.ts';

const NEW_DEVICE = { lastHeardAt: null, appVersion: null, held: null, lastOrderedAt: null, revokedAt: null };

/**
 * Writes down that a person has signed in on a device, which is made if it is new. Returns the number that the
 * device's row got, or null where nothing that others see has changed (then the shop's row is not locked either).
 */
export async function enrol(
  database: Database,
  transaction: Transaction,
  bearer: Bearer,
  device: SessionRequest['device'],
): Promise<number | null> {
  if (await isAsKnown(database, transaction, bearer, device)) return null;
  const { shopId, personId } = bearer;
  const { last: seq } = await numberRows(transaction, shopId, 1);
  const known = await findDevice(database, transaction, shopId, device.id);
  const replaces = device.replaces ?? known?.replaces ?? null;
  await requireReplaced(database, transaction, bearer, replaces);
  const personIds = new Set(await enrolledOn(database, transaction, shopId, device.id)).add(personId);
  const columns = {
    ...NEW_DEVICE,
    ...known?.get(),
    shopId,
    id: device.id,
    label: device.label,
    replaces,
    personId,
    seq,
  };
  const row = deviceRow(columns, [...personIds].sort());
  await database.models.Device.upsert({ ...columns, row }, { transaction });
  const line = { shopId, deviceId: device.id, personId };
  await database.models.DevicePerson.bulkCreate([line], { ignoreDuplicates: true, transaction });
  return seq;
}

function findDevice({ models }: Database, transaction: Transaction, shopId: string, id: string) {
  return models.Device.findOne({ where: { shopId, id }, lock: transaction.LOCK.NO_KEY_UPDATE, transaction });
}

async function isAsKnown(
  database: Database,
  transaction: Transaction,
  bearer: Bearer,
  device: SessionRequest['device'],
): Promise<boolean> {
  const { shopId, personId } = bearer;
  const { Device, DevicePerson } = database.models;
  const known = await Device.findOne({ where: { shopId, id: device.id }, transaction });
  if (!known || known.label !== device.label || known.replaces !== (device.replaces ?? known.replaces))
    return false;
  const enrolled = await DevicePerson.count({
    where: { shopId, deviceId: device.id, personId },
    transaction,
  });
  if (enrolled === 0) return false;
  await Device.update({ personId }, { where: { shopId, id: device.id }, transaction });
  return true;
}

async function requireReplaced(
  { models }: Database,
  transaction: Transaction,
  bearer: Bearer,
  replaces: string | null,
): Promise<void> {
  if (replaces === null) return;
  const { shopId, deviceId } = bearer;
  const found = await models.Device.count({ where: { shopId, id: replaces }, transaction });
  if (found === 1 && replaces !== deviceId) return;
  const message = 'no other device of this shop';
  throw new Problem(400, 'The device that this one is to replace is not known here.', {
    issues: [{ path: 'device.replaces', message }],
  });
}
