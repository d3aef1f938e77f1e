import { Router } from 'express';
import { HailStream } from '#server/hails/hail-stream.ts';
import { requireSession, sessionOf } from '#server/middleware/session.ts';
import type { Operation } from '#server/openapi/operation.ts';
import type { Parts } from '#server/parts.ts';

export const eventOperations: Operation[] = [
  {
    method: 'get',
    path: '/api/events',
    summary: 'Hails: an event `changed` with the feed\'s latest number, at once and at each change, until the token ends',
    roles: 'signed-in',
    responses: { 200: { description: 'A stream of server-sent events', contentType: 'text/event-stream' } },
  },
];

/** Hails for a device that is in signal: it is told that something changed, and pulls. */
export function eventRoutes(parts: Parts): Router {
  const router = Router();
  router.get('/events', requireSession(parts), (request, response) => {
    const { shopId, endsAtMs } = sessionOf(request);
    const stream = new HailStream(response, endsAtMs - parts.now());
    response.once('close', parts.hails.listen(shopId, stream));
  });
  return router;
}
