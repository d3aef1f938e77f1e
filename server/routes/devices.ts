import { Router } from 'express';
import { deviceAnswerSchema, devicesAnswerSchema } from '#shared/identity/device.ts';
import { idSchema } from '#shared/sync/ids.ts';
import { revokeDevice } from '#server/identity/revoke-device.ts';
import { Problem } from '#server/middleware/problem.ts';
import { requireSession, sessionOf } from '#server/middleware/session.ts';
import type { Operation } from '#server/openapi/operation.ts';
import type { Parts } from '#server/parts.ts';

export const deviceOperations: Operation[] = [
  {
    method: 'get',
    path: '/api/devices',
    summary: 'The devices of the shop; for crew those on which they have signed in',
    roles: ['foreman', 'office', 'crew'],
    responses: { 200: { description: 'The devices, by label', schema: devicesAnswerSchema } },
  },
  {
    method: 'post',
    path: '/api/devices/:id/revoke',
    summary: 'Revoke a device: it is signed out, told nothing more, and what it sends is set aside',
    roles: ['foreman'],
    responses: {
      200: { description: 'Revoked, now or before', schema: deviceAnswerSchema },
      404: { description: 'No such device in this shop' },
    },
  },
];

/** The devices of the shop. */
export function deviceRoutes(parts: Parts): Router {
  const { database, now, onChanged } = parts;
  const router = Router();

  router.get('/devices', requireSession(parts, ['foreman', 'office', 'crew']), async (request, response) => {
    const { shopId, personId, roles } = sessionOf(request);
    const devices = await database.inShop(shopId, (transaction) =>
      database.models.Device.findAll({ where: { shopId }, order: ['label', 'id'], transaction }),
    );
    const seesAll = roles.includes('foreman') || roles.includes('office');
    const shown = devices
      .map((device) => device.row)
      .filter((row) => seesAll || row.personIds.includes(personId));
    response.set('Cache-Control', 'no-store').json({ devices: shown });
  });

  router.post('/devices/:id/revoke', requireSession(parts, ['foreman']), async (request, response) => {
    const { shopId } = sessionOf(request);
    const id = idSchema.safeParse(request.params.id);
    if (!id.success) throw new Problem(404, 'There is no such device in this shop.');
    const { device, seq } = await database.inShop(shopId, (transaction) =>
      revokeDevice(database, transaction, shopId, id.data, now()),
    );
    if (seq !== null) onChanged(shopId, seq);
    response.json({ device });
  });

  return router;
}
