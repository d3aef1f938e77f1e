import { Router } from 'express';
import {
  newPersonSchema,
  peopleAnswerSchema,
  personAnswerSchema,
  personChangeSchema,
} from '#shared/identity/person.ts';
import type { Role } from '#shared/identity/role.ts';
import { idSchema } from '#shared/sync/ids.ts';
import { addPerson } from '#server/identity/add-person.ts';
import { changePerson, foremanNeeded } from '#server/identity/change-person.ts';
import { hashPassword } from '#server/identity/passwords.ts';
import { jsonBody } from '#server/middleware/json-body.ts';
import { parseBody, Problem } from '#server/middleware/problem.ts';
import { requireSession, sessionOf } from '#server/middleware/session.ts';
import type { Operation } from '#server/openapi/operation.ts';
import type { Parts } from '#server/parts.ts';

const BODY_BYTES_MAX = 16 * 1024;
const ROLES: readonly Role[] = ['foreman', 'office'];

export const peopleOperations: Operation[] = [
  {
    method: 'get',
    path: '/api/people',
    summary: 'Everybody in the shop, those who have left too',
    roles: ROLES,
    responses: { 200: { description: 'The people, by name', schema: peopleAnswerSchema } },
  },
  {
    method: 'post',
    path: '/api/people',
    summary: 'Add a person; a foreman is added by a foreman',
    roles: ROLES,
    body: newPersonSchema,
    responses: {
      201: { description: 'Added', schema: personAnswerSchema },
      200: { description: 'Added before by the same request', schema: personAnswerSchema },
      409: { description: 'The id or the e-mail is in use' },
    },
  },
  {
    method: 'patch',
    path: '/api/people/:id',
    summary: 'Change a person; a foreman is changed by a foreman',
    roles: ROLES,
    body: personChangeSchema,
    responses: {
      200: { description: 'Changed', schema: personAnswerSchema },
      404: { description: 'No such person in this shop' },
      409: { description: 'The e-mail is in use, or this is the last foreman' },
    },
  },
];

/** The people of the shop. */
export function peopleRoutes(parts: Parts): Router {
  const { database, now, onChanged } = parts;
  const router = Router();
  const body = jsonBody(BODY_BYTES_MAX);
  router.use('/people', requireSession(parts, ROLES));

  router.get('/people', async (request, response) => {
    const { shopId } = sessionOf(request);
    const people = await database.inShop(shopId, (transaction) =>
      database.models.Person.findAll({ where: { shopId }, order: ['name', 'id'], transaction }),
    );
    response.set('Cache-Control', 'no-store').json({ people: people.map((person) => person.row) });
  });

  router.post('/people', body, async (request, response) => {
    const { shopId, roles } = sessionOf(request);
    const { password, ...person } = parseBody(newPersonSchema, request.body);
    if (person.roles.includes('foreman') && !roles.includes('foreman')) throw foremanNeeded();
    const passwordHash = await hashPassword(password);
    const added = await database.inShop(shopId, (transaction) =>
      addPerson(database, transaction, shopId, { ...person, passwordHash }),
    );
    if (added.seq !== null) onChanged(shopId, added.seq);
    response.status(added.seq === null ? 200 : 201).json({ person: added.person });
  });

  router.patch('/people/:id', body, async (request, response) => {
    const { shopId, roles: by } = sessionOf(request);
    const { password, ...rest } = parseBody(personChangeSchema, request.body);
    const id = idSchema.safeParse(request.params.id);
    if (!id.success) throw new Problem(404, 'There is no such person in this shop.');
    const change = password === undefined ? rest : { ...rest, passwordHash: await hashPassword(password) };
    const { person, seq } = await database.inShop(shopId, (transaction) =>
      changePerson(database, transaction, { shopId, id: id.data, change, by, nowMs: now() }),
    );
    onChanged(shopId, seq);
    response.json({ person });
  });

  return router;
}
