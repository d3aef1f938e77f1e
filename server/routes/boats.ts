import { Router } from 'express';
import { boatOwnersAnswerSchema, boatOwnersSchema } from '#shared/identity/person.ts';
import { idSchema } from '#shared/sync/ids.ts';
import { setBoatOwners } from '#server/identity/boat-owners.ts';
import { jsonBody } from '#server/middleware/json-body.ts';
import { parseBody, Problem } from '#server/middleware/problem.ts';
import { requireSession, sessionOf } from '#server/middleware/session.ts';
import type { Operation } from '#server/openapi/operation.ts';
import type { Parts } from '#server/parts.ts';

const BODY_BYTES_MAX = 16 * 1024;

export const boatOperations: Operation[] = [
  {
    method: 'put',
    path: '/api/boats/:id/owners',
    summary: "Make these people, and nobody else, the boat's owners",
    roles: ['foreman'],
    body: boatOwnersSchema,
    responses: {
      200: { description: 'They own her', schema: boatOwnersAnswerSchema },
      400: { description: 'Not all of them are people of this shop with the role owner' },
      404: { description: 'No such boat in this shop' },
    },
  },
];

/** A boat's owners, which decide who may read about her. All else about boats comes as ops. */
export function boatRoutes(parts: Parts): Router {
  const { database, onChanged } = parts;
  const router = Router();
  const body = jsonBody(BODY_BYTES_MAX);

  router.put('/boats/:id/owners', requireSession(parts, ['foreman']), body, async (request, response) => {
    const { shopId } = sessionOf(request);
    const { personIds } = parseBody(boatOwnersSchema, request.body);
    const boatId = idSchema.safeParse(request.params.id);
    if (!boatId.success) throw new Problem(404, 'There is no such boat in this shop.');
    const seq = await database.inShop(shopId, (transaction) =>
      setBoatOwners(database, transaction, shopId, boatId.data, personIds),
    );
    if (seq !== null) onChanged(shopId, seq);
    response.json({ boatId: boatId.data, personIds: [...new Set(personIds)] });
  });

  return router;
}
