import { Router } from 'express';
import type { Request, RequestHandler } from 'express';
import {
  OPS_PER_REQUEST_MAX,
  SYNC_BODY_BYTES_MAX,
  syncAnswerSchema,
  syncRequestSchema,
  type SyncRequest,
} from '#shared/sync/protocol.ts';
import { jsonBody } from '#server/middleware/json-body.ts';
import { Problem, parseBody } from '#server/middleware/problem.ts';
import { requireSession, sessionOf } from '#server/middleware/session.ts';
import type { Operation } from '#server/openapi/operation.ts';
import type { Parts } from '#server/parts.ts';
import { exchange } from '#server/sync/exchange.ts';
import { isNestedDeeperThan } from '#server/sync/nesting.ts';

/** PostgreSQL and the merge both walk JSON by recursion; nothing that people do is nested a tenth as deep. */
const NESTING_MAX = 500;

export const syncOperations: Operation[] = [
  {
    method: 'post',
    path: '/api/sync',
    summary: 'Send ops and hear what has changed',
    roles: 'signed-in',
    body: syncRequestSchema,
    responses: {
      200: { description: 'What became of each op, and a page of the feed as this person may see it', schema: syncAnswerSchema },
      400: { description: 'The request is not as its schema says; single ops that cannot be read are set aside instead' },
      403: { description: "The device is not the token's" },
      413: { description: `More than ${OPS_PER_REQUEST_MAX} ops, or over 1 MiB after unzipping` },
      503: { description: 'The database is away; nothing was taken' },
    },
  },
];

/** The one way in and out of the record. */
export function syncRoutes(parts: Parts): Router {
  const router = Router();
  router.post('/sync', requireSession(parts, undefined, { evenRevoked: true }), jsonBody(SYNC_BODY_BYTES_MAX), sync(parts));
  return router;
}

function sync(parts: Parts): RequestHandler {
  return async (request, response) => {
    const session = sessionOf(request);
    const asked = readRequest(request);
    if (asked.deviceId !== session.deviceId) throw new Problem(403, 'This token is for another device.');
    const text = await exchange(parts, session, asked);
    // ended by hand: Express would first hash the whole of it for an ETag that no POST needs
    response.set('Cache-Control', 'no-store').type('json').end(text);
  };
}

function readRequest(request: Request): SyncRequest {
  const { ops } = (request.body ?? {}) as { ops?: unknown };
  if (Array.isArray(ops) && ops.length > OPS_PER_REQUEST_MAX) {
    throw new Problem(413, `${ops.length} ops at once; at most ${OPS_PER_REQUEST_MAX} are taken.`);
  }
  if (isNestedDeeperThan(ops, NESTING_MAX)) throw new Problem(400, `An op is nested deeper than ${NESTING_MAX} levels.`);
  return parseBody(syncRequestSchema, request.body);
}
