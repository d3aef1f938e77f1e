import { Router } from 'express';
import { z } from 'zod';
import { notFound } from '#server/middleware/problem.ts';
import { openApiDocument } from '#server/openapi/document.ts';
import { opSchemas } from '#server/openapi/op-schemas.ts';
import type { Operation } from '#server/openapi/operation.ts';
import type { Parts } from '#server/parts.ts';
import { boatOperations, boatRoutes } from './boats.ts';
import { deviceOperations, deviceRoutes } from './devices.ts';
import { eventOperations, eventRoutes } from './events.ts';
import { firstRunOperations, firstRunRoutes } from './first-run.ts';
import { healthOperations, healthRoutes } from './health.ts';
import { peopleOperations, peopleRoutes } from './people.ts';
import { photoOperations, photoRoutes } from './photos.ts';
import { sessionOperations, sessionRoutes } from './session.ts';
import { syncOperations, syncRoutes } from './sync.ts';

/** Every route module of the API: its routes (paths below /api) and what it declares about them. */
const modules: { routes: (parts: Parts) => Router; operations: Operation[] }[] = [
  { routes: healthRoutes, operations: healthOperations },
  { routes: firstRunRoutes, operations: firstRunOperations },
  { routes: sessionRoutes, operations: sessionOperations },
  { routes: peopleRoutes, operations: peopleOperations },
  { routes: deviceRoutes, operations: deviceOperations },
  { routes: boatRoutes, operations: boatOperations },
  { routes: syncRoutes, operations: syncOperations },
  { routes: photoRoutes, operations: photoOperations },
  { routes: eventRoutes, operations: eventOperations },
];

const documentOperation: Operation = {
  method: 'get',
  path: '/api/openapi.json',
  summary: 'This document',
  roles: 'anyone',
  responses: { 200: { description: 'OpenAPI 3.1', schema: z.object({ openapi: z.string() }) } },
};

export const apiOperations: Operation[] = [...modules.flatMap((module) => module.operations), documentOperation];

/** The API, to be mounted at /api; an unknown path below it is a problem, never the app's page. */
export function apiRoutes(parts: Parts): Router {
  const router = Router();
  for (const { routes } of modules) router.use(routes(parts));
  const document = openApiDocument(apiOperations, opSchemas);
  router.get('/openapi.json', (_request, response) => {
    response.set('Cache-Control', 'no-cache').json(document);
  });
  router.use(notFound);
  return router;
}
