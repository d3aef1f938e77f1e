import type { Role } from '#shared/identity/role.ts';
import {
  sessionAnswerSchema,
  shopChoiceSchema,
  type SessionAnswer,
  type ShopChoice,
} from '#shared/identity/session.ts';
import { NOBODY, type SessionRecord } from './device-records.ts';
import type { DeviceStore } from './device-store.ts';
import { NOT_OURS, asJson, inTime, isUnreachable, readJson, wordsOf } from './request.ts';
import type { Me } from './view.ts';
import type { World } from './world.ts';

export interface SignInRequest {
  email: string;
  password: string;
  /** what people call this device */
  label: string;
  /** which shop, where the e-mail is in several */
  shopId?: string;
  /** the device in whose place this one comes */
  replaces?: string;
}

export type SignInResult = { ok: true } | { choose: ShopChoice } | { refused: string } | { offline: true };
export type SignOutResult = { ok: true } | { refused: string };

/** Who is signed in here, offline too. */
export interface Session {
  current(): Me | null;
  signIn(request: SignInRequest): Promise<SignInResult>;
  /** Refuses while ops are held, unless told to go on; they stay on the device and go with the next who signs in. */
  signOut(options?: { evenWithHeldOps?: boolean }): Promise<SignOutResult>;
  /**
   * `fetch` with the person's token, which is refreshed where it has run out. A 401 means that the server wants the
   * password again. Rejects with a TypeError where the server cannot be reached.
   */
  fetchAsMe(path: string, init?: RequestInit): Promise<Response>;
}

/** A token is renewed this long before its end, in milliseconds. */
const TOKEN_SLACK_MS = 30_000;
/** How long the server may take to answer a sign-in, in milliseconds. */
const SIGN_IN_MAX_MS = 20_000;

interface Token {
  text: string;
  endsAtMs: number;
}

interface Dealings {
  world: World;
  device: DeviceStore;
  /** how many pictures of the one signed in are not sent; they go when that person signs in here again */
  heldPhotos: () => number;
  /** makes ready what `me` needs; what it resolves with is called as they become the one who is signed in */
  prepare: (me: Me | null) => Promise<() => void>;
  /** called once who is signed in, or how, has changed */
  onChange: () => void;
}

export class LiveSession implements Session {
  private record: SessionRecord = NOBODY;
  private readonly tokens = new Map<string, Token>();
  private readonly dealings: Dealings;
  private me: Me | null = null;

  constructor(dealings: Dealings) {
    this.dealings = dealings;
  }

  /** Reads who is signed in, as kept on the device; another tab may have changed it. */
  async load(): Promise<void> {
    await this.adopt(await this.dealings.device.readSession());
  }

  readonly current = (): Me | null => this.me;

  /** Whether the server wants the password before anything else. */
  get needsSignIn(): boolean {
    return this.record.needsSignIn;
  }

  get rolesOnDevice(): ReadonlyMap<string, Role[]> {
    return new Map(Object.entries(this.record.rolesOnDevice));
  }

  async signIn({ email, password, label, shopId, replaces }: SignInRequest): Promise<SignInResult> {
    const { world, device } = this.dealings;
    const body = {
      email,
      password,
      device: { id: device.deviceId, label, ...(replaces ? { replaces } : {}) },
      ...(shopId ? { shopId } : {}),
    };
    try {
      const response = await inTime(world, SIGN_IN_MAX_MS, (signal) =>
        world.fetch('/api/session', { ...asJson(body), signal }),
      );
      const answer = await readJson(response.clone());
      if (response.ok) return this.welcome(sessionAnswerSchema.safeParse(answer).data);
      const choice = response.status === 409 ? shopChoiceSchema.safeParse(answer).data : undefined;
      return choice ? { choose: choice.shops } : { refused: await wordsOf(response) };
    } catch (error) {
      if (isUnreachable(error)) return { offline: true };
      throw error;
    }
  }

  async signOut({ evenWithHeldOps = false } = {}): Promise<SignOutResult> {
    const { world } = this.dealings;
    const held = this.heldWords();
    if (held && !evenWithHeldOps) {
      const photoWords = this.dealings.heldPhotos() > 0 ? ' Photos go when you sign in here again.' : '';
      return { refused: `${held} not sent yet. Send first, or leave it on this device.${photoWords}` };
    }
    // without signal the server's half waits for the family to run out
    await inTime(world, SIGN_IN_MAX_MS, (signal) =>
      world.fetch('/api/session', { method: 'DELETE', signal }),
    ).catch(() => undefined);
    this.tokens.clear();
    await this.keep({ ...this.record, me: null, needsSignIn: false });
    return { ok: true };
  }

  /** What would stay behind: 'One thing is', '3 things and 2 photos are'; null where nothing would. */
  private heldWords(): string | null {
    const { device, heldPhotos } = this.dealings;
    const [ops, photos] = [device.outbox.length, heldPhotos()];
    if (ops + photos === 0) return null;
    if (ops + photos === 1) return ops === 1 ? 'One thing is' : 'One photo is';
    const things = ops > 0 && `${ops} ${ops === 1 ? 'thing' : 'things'}`;
    const pictures = photos > 0 && `${photos} ${photos === 1 ? 'photo' : 'photos'}`;
    return `${[things, pictures].filter(Boolean).join(' and ')} are`;
  }

  readonly fetchAsMe = (path: string, init: RequestInit = {}): Promise<Response> => {
    if (!this.me) throw new Error('Nobody is signed in.');
    return this.fetchAs(this.me.personId, path, init);
  };

  /** As `fetchAsMe`, as somebody who has signed in on this device. */
  async fetchAs(personId: string, path: string, init: RequestInit = {}): Promise<Response> {
    const token = this.goodToken(personId) ?? (await this.refresh(personId, null));
    if (token instanceof Response) return token;
    const response = await this.send(path, init, token);
    if (response.status !== 401) return response;
    const renewed = await this.refresh(personId, token);
    if (renewed instanceof Response) return renewed;
    const again = await this.send(path, init, renewed);
    if (again.status === 401) await this.needSignIn(personId);
    return again;
  }

  private send(path: string, init: RequestInit, { text }: Token): Promise<Response> {
    const headers = new Headers(init.headers);
    headers.set('Authorization', `Bearer ${text}`);
    return this.dealings.world.fetch(path, { ...init, headers });
  }

  private goodToken(personId: string): Token | null {
    const token = this.tokens.get(personId);
    return token && token.endsAtMs > this.dealings.world.now() ? token : null;
  }

  // one tab at a time, and one request however many wait; an answer that was lost is simply asked for again
  private refresh(personId: string, refused: Token | null): Promise<Token | Response> {
    const { world } = this.dealings;
    const ask = async () => {
      const known = this.goodToken(personId);
      if (known && known !== refused) return known;
      const response = await inTime(world, SIGN_IN_MAX_MS, (signal) =>
        world.fetch('/api/session/refresh', { ...asJson({ personId }), signal }),
      );
      if (response.ok) return this.renew(sessionAnswerSchema.safeParse(await readJson(response)).data);
      if (response.status === 401) await this.needSignIn(personId);
      return response;
    };
    return world.locks ? world.locks.request('ribband-refresh', ask) : ask();
  }

  private async renew(answer: SessionAnswer | undefined): Promise<Token | Response> {
    if (!answer) return new Response(JSON.stringify({ detail: NOT_OURS }), { status: 502 });
    const token = this.tokenFrom(answer);
    const { person } = answer;
    const isMe = this.record.me?.personId === person.id;
    if (isMe && (this.record.needsSignIn || this.record.me!.roles.join() !== person.roles.join())) {
      await this.keep(withPerson(this.record, answer));
    }
    return token;
  }

  private async welcome(answer: SessionAnswer | undefined): Promise<SignInResult> {
    if (!answer) return { refused: NOT_OURS };
    this.tokenFrom(answer);
    await this.keep(withPerson(this.record, answer));
    return { ok: true };
  }

  private tokenFrom({ accessToken, expiresInSeconds, person }: SessionAnswer): Token {
    const token = {
      text: accessToken,
      endsAtMs: this.dealings.world.now() + expiresInSeconds * 1000 - TOKEN_SLACK_MS,
    };
    this.tokens.set(person.id, token);
    return token;
  }

  private async needSignIn(personId: string): Promise<void> {
    if (this.record.me?.personId === personId) await this.keep({ ...this.record, needsSignIn: true });
  }

  private async keep(record: SessionRecord): Promise<void> {
    await this.dealings.device.writeSession(record);
    await this.adopt(record);
    this.dealings.world.channel.post('session');
  }

  private async adopt(record: SessionRecord): Promise<void> {
    const me = record.me && { ...record.me, deviceId: this.dealings.device.deviceId };
    const enter = await this.dealings.prepare(me);
    enter();
    this.record = record;
    // one object while nothing has changed, for those who compare
    if (JSON.stringify(me) !== JSON.stringify(this.me)) this.me = me;
    this.dealings.onChange();
  }
}

function withPerson(record: SessionRecord, { person }: SessionAnswer): SessionRecord {
  return {
    me: { personId: person.id, name: person.name, roles: person.roles, shopId: person.shopId },
    needsSignIn: false,
    rolesOnDevice: { ...record.rolesOnDevice, [person.id]: person.roles },
  };
}
