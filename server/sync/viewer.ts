import type { Transaction } from 'sequelize';
import type { Role } from '#shared/identity/role.ts';
import type { Viewer } from '#shared/sync/audience.ts';
import { query } from '#server/models/query.ts';

/** A person as the audience knows them, and where their feed and the shop's stand. */
export interface Standing {
  viewer: Viewer;
  epoch: number;
  shop: { seq: number; incarnation: string };
}

interface Line {
  roles: Role[];
  epoch: number;
  seq: number;
  incarnation: string;
  boatIds: string[];
}

// The feed that is read next is to be read along its index: a table without statistics, as after a great many ops at
// once, would be read and sorted whole for each page. What is off counts as so dear that PostgreSQL would compile the
// statement, so that is off too.
const READ_IN_ORDER = ['enable_sort', 'enable_bitmapscan', 'jit'].map((name) => `set_config('${name}', 'off', true)`).join(', ');

const STANDING = `
  SELECT person.roles, person.feed_epoch AS epoch, shop.seq, shop.incarnation,
    ARRAY(SELECT boat_id FROM boat_owners WHERE shop_id = $1 AND person_id = $2) AS "boatIds", ${READ_IN_ORDER}
  FROM people person JOIN shops shop ON shop.shop_id = person.shop_id
  WHERE person.shop_id = $1 AND person.id = $2`;

/** Reads it, and readies the transaction for reading the feed. */
export async function readStanding(transaction: Transaction, shopId: string, personId: string): Promise<Standing> {
  const [line] = await query<Line>(transaction, STANDING, [shopId, personId]);
  if (!line) throw new Error(`There is no person ${personId} in this shop.`);
  const { roles, epoch, seq, incarnation, boatIds } = line;
  return { viewer: { personId, roles, boatIds: new Set(boatIds) }, epoch, shop: { seq, incarnation } };
}
