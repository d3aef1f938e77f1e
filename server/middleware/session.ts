import type { Request, RequestHandler } from 'express';
import type { Role } from '#shared/identity/role.ts';
import { readAccessToken, type Bearer } from '#server/identity/access-token.ts';
import { installationSecret } from '#server/identity/installation.ts';
import { Problem } from '#server/middleware/problem.ts';
import type { Database } from '#server/models/database.ts';
import type { Parts } from '#server/parts.ts';

/** Who asks. The roles are read anew at each request, so that a change of them holds at once. */
export interface Session {
  personId: string;
  shopId: string;
  deviceId: string;
  roles: Role[];
  /** the device was revoked: what it sends is set aside, and it is told nothing */
  isRevoked: boolean;
  /** when the access token ends, in milliseconds since 1970 */
  endsAtMs: number;
}

declare module 'express-serve-static-core' {
  interface Request {
    session?: Session;
  }
}

/**
 * Lets through whoever is signed in and, where roles are named, has one of them; else a 401 or 403. A revoked device
 * is refused unless the route says that it knows what to do with one.
 */
export function requireSession(
  parts: Pick<Parts, 'database' | 'now'>,
  roles?: readonly Role[],
  { evenRevoked = false } = {},
): RequestHandler {
  return async (request, _response, next) => {
    const session = await readSession(parts, request);
    if (session.isRevoked && !evenRevoked) throw new Problem(403, 'This device was revoked by the foreman.');
    if (roles && !session.roles.some((role) => roles.includes(role))) {
      throw new Problem(403, `This is for: ${roles.join(', ')}.`);
    }
    request.session = session;
    next();
  };
}

/** The session of a request that `requireSession` let through. */
export function sessionOf(request: Request): Session {
  if (!request.session)
    throw new Error(`${request.path} asks for a session but no requireSession stands before it.`);
  return request.session;
}

async function readSession(
  { database, now }: Pick<Parts, 'database' | 'now'>,
  request: Request,
): Promise<Session> {
  const [scheme, token] = (request.get('Authorization') ?? '').split(' ');
  if (scheme?.toLowerCase() !== 'bearer' || !token) throw unauthorised('Sign in first.');
  const bearer = readAccessToken(await installationSecret(database), token, now());
  if (!bearer) throw unauthorised('The access token has ended or is not from here.');
  const standing = await readStanding(database, bearer);
  if (!standing || standing.hasLeft) throw unauthorised('This person cannot sign in any more.');
  return { ...bearer, roles: standing.roles, isRevoked: standing.isRevoked };
}

interface StandingLine {
  roles: Role[];
  hasLeft: boolean;
  isRevoked: boolean;
}

const STANDING = `
  SELECT person.roles, person.left_at IS NOT NULL AS "hasLeft", device.revoked_at IS NOT NULL AS "isRevoked"
  FROM people person JOIN devices device ON device.shop_id = person.shop_id
  WHERE person.shop_id = :shopId AND person.id = :personId AND device.id = :deviceId`;

async function readStanding(database: Database, bearer: Bearer): Promise<StandingLine | undefined> {
  const { shopId, personId, deviceId } = bearer;
  const [standing] = await database.readInShop<StandingLine>(shopId, STANDING, { shopId, personId, deviceId });
  return standing;
}

function unauthorised(detail: string): Problem {
  return new Problem(401, detail, { headers: { 'WWW-Authenticate': 'Bearer' } });
}
