import type { CookieOptions, Request, Response } from 'express';
import { FAMILY_IDLE_MAX_MS } from './families.ts';

const NAME = 'ribband_refresh';

function options(request: Request): CookieOptions {
  return { httpOnly: true, sameSite: 'strict', secure: request.secure, path: '/api/session' };
}

export function setRefreshCookie(request: Request, response: Response, token: string): void {
  response.cookie(NAME, token, { ...options(request), maxAge: FAMILY_IDLE_MAX_MS });
}

export function clearRefreshCookie(request: Request, response: Response): void {
  response.clearCookie(NAME, options(request));
}

/** The refresh token's text as the browser sent it, or null. */
export function refreshCookie(request: Request): string | null {
  for (const pair of (request.get('Cookie') ?? '').split(';')) {
    const [name, value] = pair.trim().split('=', 2);
    if (name === NAME && value) return value;
  }
  return null;
}
