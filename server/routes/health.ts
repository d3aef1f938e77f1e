import { Router } from 'express';
import { z } from 'zod';
import type { Operation } from '#server/openapi/operation.ts';
import type { Parts } from '#server/parts.ts';
import { version } from '#server/version.ts';

const DATABASE_WAIT_MS = 3000;

const healthSchema = z.object({
  status: z.enum(['ok', 'down']),
  version: z.string(),
  database: z.enum(['ok', 'unreachable']),
});

export const healthOperations: Operation[] = [
  {
    method: 'get',
    path: '/api/health',
    summary: 'Whether the server and its database answer',
    roles: 'anyone',
    responses: {
      200: { description: 'All is well', schema: healthSchema },
      503: { description: 'The part that does not answer is named', schema: healthSchema },
    },
  },
];

export function healthRoutes(parts: Parts): Router {
  const router = Router();
  router.get('/health', async (request, response) => {
    const isUp = await answers(parts).catch((error: unknown) => {
      request.log.warn({ err: error }, 'the database does not answer');
      return false;
    });
    response.set('Cache-Control', 'no-store').status(isUp ? 200 : 503);
    response.json({ status: isUp ? 'ok' : 'down', version, database: isUp ? 'ok' : 'unreachable' });
  });
  return router;
}

async function answers({ database }: Parts): Promise<boolean> {
  const asked = database.sequelize.query('SELECT 1').then(() => true);
  let timer: NodeJS.Timeout | undefined;
  const tooLate = new Promise<boolean>((resolve) => {
    timer = setTimeout(() => resolve(false), DATABASE_WAIT_MS);
  });
  return Promise.race([asked, tooLate]).finally(() => clearTimeout(timer));
}
