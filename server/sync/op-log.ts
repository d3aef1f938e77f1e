import { createHash } from 'node:crypto';
import type { Transaction } from 'sequelize';
import type { LoggedOp } from '#shared/sync/store.ts';
import { query } from '#server/models/query.ts';

const READ = `
  SELECT op_key AS "key", op, device_id AS "deviceId", person_id AS "personId", kind, received_at AS "receivedAt",
    received_on::text AS "receivedOn", ordered_at AS "orderedAt", ordered_on::text AS "orderedOn", roles, outcome, reason
  FROM unnest($2::text[]) wanted(wanted_key)
    CROSS JOIN LATERAL (SELECT * FROM ops WHERE shop_id = $1 AND op_key = wanted_key LIMIT 1) logged`;

/** Of `keys`, the ops that are in the log. */
export async function readOps(transaction: Transaction, shopId: string, keys: string[]): Promise<Map<string, LoggedOp>> {
  if (keys.length === 0) return new Map();
  const found = await query<Omit<LoggedOp, 'receivedAt'> & { receivedAt: Date }>(transaction, READ, [shopId, keys]);
  return new Map(found.map((line) => [line.key, { ...line, receivedAt: line.receivedAt.toISOString() }]));
}

// op as a string that is cast: it is kept letter for letter, and a recordset function takes no \u0000
const APPEND = `
  INSERT INTO ops (shop_id, op_key, op, sha256, device_id, person_id, kind, received_at, received_on, ordered_at,
    ordered_on, roles, outcome, reason)
  SELECT $1, line.op_key, line.op::json, line.sha256, line.device_id, line.person_id, line.kind, line.received_at,
    line.received_on, line.ordered_at, line.ordered_on, line.roles, line.outcome, line.reason
  FROM jsonb_to_recordset($2::jsonb) AS line(op_key text, op text, sha256 text, device_id uuid, person_id uuid, kind text,
    received_at timestamptz, received_on date, ordered_at text, ordered_on date, roles text[], outcome text, reason text)`;

/** Adds ops to the log, with the SHA-256 of each one's text as it is kept. */
export async function appendOps(transaction: Transaction, shopId: string, ops: LoggedOp[]): Promise<void> {
  if (ops.length > 0) await query(transaction, APPEND, [shopId, JSON.stringify(ops.map(opLine))]);
}

function opLine(logged: LoggedOp) {
  const op = JSON.stringify(logged.op);
  return {
    op_key: logged.key,
    op,
    sha256: createHash('sha256').update(op).digest('hex'),
    device_id: logged.deviceId,
    person_id: logged.personId,
    kind: logged.kind,
    received_at: logged.receivedAt,
    received_on: logged.receivedOn,
    ordered_at: logged.orderedAt,
    ordered_on: logged.orderedOn,
    roles: logged.roles,
    outcome: logged.outcome,
    reason: logged.reason,
  };
}
