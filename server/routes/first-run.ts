import { Router } from 'express';
import { firstRunAnswerSchema, firstRunRequestSchema } from '#shared/identity/first-run.ts';
import { firstRun } from '#server/identity/first-run.ts';
import { addressOf, failureLimit } from '#server/middleware/failure-limit.ts';
import { jsonBody } from '#server/middleware/json-body.ts';
import { parseBody } from '#server/middleware/problem.ts';
import type { Operation } from '#server/openapi/operation.ts';
import type { Parts } from '#server/parts.ts';

const BODY_BYTES_MAX = 16 * 1024;
const FAILURES_OF_ADDRESS_MAX = 20;

export const firstRunOperations: Operation[] = [
  {
    method: 'post',
    path: '/api/first-run',
    summary: 'Make the shop and its first foreman, while there is no shop',
    roles: 'anyone',
    body: firstRunRequestSchema,
    responses: {
      201: { description: 'Made: sign in', schema: firstRunAnswerSchema },
      403: { description: 'Not the code that the server printed at its last start' },
      409: { description: 'There is a shop already' },
      429: { description: 'Too many failures: see Retry-After' },
    },
  },
];

/** The first start of an empty installation. */
export function firstRunRoutes(parts: Parts): Router {
  const router = Router();
  const limit = failureLimit(parts, {
    name: 'first-run',
    failuresMax: FAILURES_OF_ADDRESS_MAX,
    keyOf: addressOf,
    status: 403,
  });
  router.post('/first-run', limit, jsonBody(BODY_BYTES_MAX), async (request, response) => {
    const asked = parseBody(firstRunRequestSchema, request.body);
    const { shopId, personId, seq } = await firstRun(parts.database, asked, parts.now());
    parts.onChanged(shopId, seq);
    response.status(201).json({ shopId, personId });
  });
  return router;
}
