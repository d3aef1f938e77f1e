import { createHash } from 'node:crypto';
import type { Request, RequestHandler } from 'express';
import { ipKeyGenerator, rateLimit } from 'express-rate-limit';
import { emailSchema } from '#shared/identity/words.ts';
import { RateLimitStore } from '#server/identity/rate-limit-store.ts';
import type { Parts } from '#server/parts.ts';
import { Problem } from './problem.ts';

const WINDOW_MS = 15 * 60_000;

interface FailureLimit {
  /** what is counted, as the first part of the key */
  name: string;
  failuresMax: number;
  /** what is tried too often: an e-mail, an address; null is not counted */
  keyOf: (request: Request) => string | null;
  /** the answer that counts as a failure */
  status: number;
}

/** Refuses with 429 what has failed too often in a quarter of an hour. Only failures stay counted. */
export function failureLimit(
  { database, log }: Parts,
  { name, failuresMax, keyOf, status }: FailureLimit,
): RequestHandler {
  return rateLimit({
    windowMs: WINDOW_MS,
    limit: failuresMax,
    store: new RateLimitStore(database, `${name}:`),
    keyGenerator: (request) => keyOf(request) ?? '',
    skip: (request) => keyOf(request) === null,
    skipSuccessfulRequests: true,
    requestWasSuccessful: (_request, response) => response.statusCode !== status,
    standardHeaders: 'draft-6',
    legacyHeaders: false,
    logger: log,
    // it sets Retry-After first
    handler: (_request, _response, next) => next(new Problem(429, 'Too many tries. Wait, then try again.')),
  });
}

export function addressOf(request: Request): string {
  return ipKeyGenerator(request.ip ?? '');
}

/** The e-mail in a request's body as a key: hashed, since people mistype passwords into it. */
export function emailKeyOf(request: Request): string | null {
  const email = emailSchema.safeParse((request.body as { email?: unknown } | undefined)?.email);
  return email.success ? createHash('sha256').update(email.data).digest('hex') : null;
}
