import type { Role } from '#shared/identity/role.ts';
import type { SessionAnswer } from '#shared/identity/session.ts';
import { couldSee, seen, type Viewer } from '#shared/sync/audience.ts';
import { MemoryStore } from '#shared/sync/memory-store.ts';
import { mergeBatch } from '#shared/sync/merge.ts';
import { syncRequestSchema, type SyncAnswer, type SyncRequest } from '#shared/sync/protocol.ts';
import type { Entity } from '#shared/sync/row.ts';
import { Turns } from '#src/replica/turns.ts';
import { MemoryPictures } from './memory-pictures.ts';

export const TIME_ZONE = 'Europe/Dublin';

interface Person {
  id: string;
  name: string;
  roles: Role[];
  boatIds: string[];
  /** counts the changes of roles and boats */
  epoch: number;
}

interface Device {
  id: string;
  label: string;
  personIds: Set<string>;
  isRevoked: boolean;
}

/** What the browser keeps of the server for a device: the refresh cookie. */
export interface CookieJar {
  deviceId: string | null;
}

interface Asked {
  method: string;
  path: string;
  authorization: string | null;
  body: unknown;
}

/** The server of one shop in memory, as the contract has it: the real merge, audience and feed; sessions by name alone. */
export class MemoryServer {
  store = new MemoryStore();
  readonly people = new Map<string, Person>();
  readonly devices = new Map<string, Device>();
  readonly pictures = new MemoryPictures(() => this.store);
  readonly shopId: string;
  /** rows in an answer, at most, whatever a phone asks for */
  pageRowsMax = 1000;
  backedUpTo: string | null = null;
  /** sessions are no longer good, as after a password was changed */
  isEveryoneSignedOut = false;
  /** what the device that was heard last said that it holds */
  lastHeld: SyncRequest['held'] | null = null;
  private readonly now: () => number;
  private readonly turns = new Turns();
  private tokens = new Map<string, { deviceId: string; personId: string }>();
  private tokensGiven = 0;
  private incarnation = 1;

  constructor(shopId: string, now: () => number) {
    this.shopId = shopId;
    this.now = now;
    const shop = { id: shopId, name: 'Alder Reach', timeZone: TIME_ZONE, currency: 'EUR', units: 'metric' };
    this.store.put('shop', shopId, shop);
  }

  addPerson(id: string, name: string, roles: Role[]): void {
    this.putPerson({ id, name, roles, boatIds: [], epoch: 1 });
  }

  changePerson(id: string, change: Partial<Pick<Person, 'roles' | 'boatIds'>>): void {
    const person = this.people.get(id)!;
    this.putPerson({ ...person, ...change, epoch: person.epoch + 1 });
  }

  private putPerson(person: Person): void {
    this.people.set(person.id, person);
    const { id, name, roles, boatIds } = person;
    this.store.put('person', id, { id, name, email: `${name}@ribband.test`, roles, leftAt: null, boatIds });
  }

  /** No access token given so far is good any more. */
  endTokens(): void {
    this.tokens.clear();
  }

  /** A copy of the record as it is now, as a backup would have it. */
  backUp(): MemoryStore {
    const copy = new MemoryStore();
    for (const { entity, id, row } of this.store.feed(0)) copy.put(entity, id, row);
    for (const [key, logged] of this.store.ops) copy.ops.set(key, structuredClone(logged));
    for (const [deviceId, stamp] of this.store.lastOrderedAt) copy.lastOrderedAt.set(deviceId, stamp);
    return copy;
  }

  /** The record is again as it was at a backup. */
  restore(backup: MemoryStore): void {
    this.store = backup;
    this.incarnation += 1;
    for (const person of this.people.values()) this.putPerson(person);
    for (const device of this.devices.values()) this.putDevice(device);
  }

  /** Answers a request as it stands; one at a time, as under the shop's lock. */
  answer(asked: Asked, jar: CookieJar): Promise<Response> {
    return this.turns.take(async () => {
      const { method, path } = asked;
      if (method === 'POST' && path === '/api/session') return this.signIn(asked.body, jar);
      if (method === 'DELETE' && path === '/api/session') return this.signOut(jar);
      if (method === 'POST' && path === '/api/session/refresh') return this.refresh(asked.body, jar);
      const bearer = this.tokens.get(asked.authorization?.replace('Bearer ', '') ?? '');
      if (!bearer || this.isEveryoneSignedOut) return problem(401, 'Sign in.');
      if (method === 'POST' && path === '/api/sync') return this.sync(asked.body, bearer);
      if (path.startsWith('/api/photos/')) return this.pictures.answer(asked);
      return problem(404, 'There is nothing here.');
    });
  }

  private signIn(body: unknown, jar: CookieJar): Response {
    const { email, device } = body as {
      email: string;
      device: { id: string; label: string; replaces?: string };
    };
    const person = [...this.people.values()].find(({ name }) => email === `${name}@ribband.test`);
    if (!person) return problem(401, 'That e-mail and password do not go together.');
    this.isEveryoneSignedOut = false;
    const known = this.devices.get(device.id) ?? {
      id: device.id,
      label: device.label,
      personIds: new Set(),
      isRevoked: false,
    };
    const isNew = !known.personIds.has(person.id);
    known.personIds.add(person.id);
    this.devices.set(device.id, known);
    if (isNew) this.putDevice(known);
    jar.deviceId = device.id;
    return this.session(person, device.id);
  }

  private putDevice({ id, label, personIds, isRevoked }: Device): void {
    const revokedAt = isRevoked ? new Date(this.now()).toISOString() : null;
    const unknown = { replaces: null, lastHeardAt: null, appVersion: null, held: null };
    this.store.put('device', id, { id, label, personIds: [...personIds], ...unknown, revokedAt });
  }

  private signOut(jar: CookieJar): Response {
    jar.deviceId = null;
    return new Response(null, { status: 204 });
  }

  private refresh(body: unknown, { deviceId }: CookieJar): Response {
    const device = this.devices.get(deviceId ?? '');
    const person = this.people.get((body as { personId: string }).personId);
    if (!device || !person || this.isEveryoneSignedOut) return problem(401, 'Sign in again on this device.');
    if (!device.personIds.has(person.id))
      return problem(403, 'That person has not signed in on this device.');
    return this.session(person, device.id);
  }

  private session({ id, name, roles }: Person, deviceId: string): Response {
    const accessToken = `token-${(this.tokensGiven += 1)}`;
    this.tokens.set(accessToken, { deviceId, personId: id });
    const person = { id, name, roles, shopId: this.shopId };
    return json({
      accessToken,
      expiresInSeconds: 900,
      person,
      device: { id: deviceId },
    } satisfies SessionAnswer);
  }

  private async sync(
    body: unknown,
    { deviceId, personId }: { deviceId: string; personId: string },
  ): Promise<Response> {
    const request = syncRequestSchema.parse(body);
    this.lastHeld = request.held ?? null;
    if (request.deviceId !== deviceId) return problem(403, 'This token is for another device.');
    const outcomes = await mergeBatch(this.store, this.batchFrom(deviceId, personId), request.ops);
    const serverTime = new Date(this.now()).toISOString();
    return json({
      outcomes,
      ...this.pull(request, personId),
      backedUpTo: this.backedUpTo,
      serverTime,
    } satisfies SyncAnswer);
  }

  private batchFrom(deviceId: string, personId: string) {
    const device = this.devices.get(deviceId)!;
    return {
      shop: { id: this.shopId, timeZone: TIME_ZONE },
      device: {
        id: deviceId,
        isRevoked: device.isRevoked,
        lastOrderedAt: this.store.lastOrderedAt.get(deviceId) ?? null,
      },
      personId,
      people: new Map([...device.personIds].map((id) => [id, this.people.get(id)!.roles])),
      nowMs: this.now(),
    };
  }

  viewer(personId: string): Viewer {
    const { roles, boatIds } = this.people.get(personId)!;
    return { personId, roles, boatIds: new Set(boatIds) };
  }

  private pull({ cursor, limit = 1000 }: SyncRequest, personId: string) {
    const { epoch } = this.people.get(personId)!;
    const [incarnation, of, atEpoch, seq] = (cursor === null ? [] : JSON.parse(cursor)) as [
      number?,
      string?,
      number?,
      number?,
    ];
    const isOtherLife = cursor !== null && incarnation !== this.incarnation;
    const reset = cursor !== null && (isOtherLife || of !== personId || atEpoch !== epoch);
    const lines = this.store.feed(reset ? 0 : (seq ?? 0));
    const page = lines.slice(0, Math.min(limit, this.pageRowsMax));
    const more = lines.length > page.length;
    const upTo = more ? page.at(-1)!.seq : this.store.seq;
    return {
      rows: page.flatMap((line) => shown(line, this.viewer(personId)) ?? []),
      cursor: JSON.stringify([this.incarnation, personId, epoch, upTo]),
      more,
      reset,
      replayFrom: isOtherLife ? this.lastReceipt() : null,
    };
  }

  private lastReceipt(): string {
    return (
      [...this.store.ops.values()]
        .map(({ receivedAt }) => receivedAt)
        .sort()
        .at(-1) ?? new Date(0).toISOString()
    );
  }
}

function shown(
  { entity, id, seq, row }: { entity: Entity; id: string; seq: number; row: object | null },
  viewer: Viewer,
) {
  const visible = row && seen(entity, row, viewer);
  if (!visible && !couldSee(entity, row, viewer)) return null;
  return { entity, id, seq, row: visible as Record<string, unknown> | null, gone: !visible };
}

function json(body: object): Response {
  return new Response(JSON.stringify(body), { headers: { 'Content-Type': 'application/json' } });
}

function problem(status: number, detail: string): Response {
  return new Response(JSON.stringify({ type: 'about:blank', title: 'Problem', status, detail }), { status });
}
