import { v7 } from 'uuid';
import type { Role } from '#shared/identity/role.ts';
import type { SyncRequest } from '#shared/sync/protocol.ts';
import { readCursor, writeCursor } from '#server/sync/cursor.ts';
import { feedSeq } from '#server/sync/feed.ts';
import { layDown, senderFor, type Sender, type Yard } from '#tests/worlds/sender.ts';
import type { TestServer } from '#tests/worlds/server.ts';
import { makePerson, makeShop, type TestShop } from '#tests/worlds/shop.ts';
import { post, syncBody, type Came } from './wire.ts';

export const DEVICES = 10;

const WORDS = 'Two strakes hung on the port side, the third dry fitted; the steam box leaks at its door again and wants new felt.';

/** A shop with a boat and ten people, each signed in on a phone of their own. */
export interface Crew {
  server: TestServer;
  shop: TestShop;
  foreman: Sender;
  yard: Yard;
  hands: Sender[];
}

export async function makeCrew(server: TestServer, roles: Role[]): Promise<Crew> {
  const shop = await makeShop(server.database);
  const foreman = await senderFor(server, shop.people.foreman);
  const yard = await layDown(foreman);
  const hands: Sender[] = [];
  for (let index = 0; index < DEVICES; index += 1) {
    hands.push(await senderFor(server, await makePerson(server.database, shop.shopId, roles)));
  }
  return { server, shop, foreman, yard, hands };
}

/** An entry with two people's hours, but for its id. */
export function entryData(hand: Sender, { yard, shop }: Crew) {
  const { boatId, stageId } = yard;
  const hours = [hand.personId, shop.people.foreman.id].map((personId) => ({ personId, minutes: 150, kind: 'agreed' }));
  return { boatId, stageId, workDate: '2026-06-01', text: WORDS, spoken: false, hours };
}

export function entryOps(hand: Sender, crew: Crew, count: number) {
  return Array.from({ length: count }, () => hand.op('entry.write', { entryId: v7(), ...entryData(hand, crew) }));
}

/** The body of a sync as a phone sends it, with what it holds, made just now. */
export function bodyOf({ server }: Crew, hand: Sender, request: Partial<SyncRequest>): Buffer {
  const held = { ops: request.ops?.length ?? 0, photos: 0, oldest: new Date(server.clock.now()).toISOString() };
  return syncBody({ deviceId: hand.deviceId, cursor: null, ops: [], held, appVersion: '0.1.0', ...request });
}

export function postSync({ server }: Crew, hand: Sender, body: Buffer): Promise<Came> {
  return post(`${server.url}/api/sync`, hand.session.accessToken, body);
}

/** The cursor of a phone that has all that there is. */
export async function latestCursor({ server, shop }: Crew, hand: Sender): Promise<string> {
  const own = readCursor((await hand.sync({ limit: 1 })).body.cursor)!;
  const seq = await server.database.inShop(shop.shopId, (transaction) => feedSeq(transaction, shop.shopId));
  return writeCursor({ ...own, seq });
}
