import type { ShopChoice } from '#shared/identity/session.ts';
import type { Me } from './view.ts';

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
  /** `fetch` with the person's token, refreshed once on a 401. Rejects with a TypeError where the server cannot be reached. */
  fetchAsMe(path: string, init?: RequestInit): Promise<Response>;
}
