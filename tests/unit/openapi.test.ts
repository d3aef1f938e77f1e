import { expect, test } from 'vitest';
import { z } from 'zod';
import { openApiDocument } from '#server/openapi/document.ts';
import type { Operation } from '#server/openapi/operation.ts';

const operation: Operation = {
  method: 'post',
  path: '/api/boats/:id/owners',
  summary: 'Who owns a boat',
  roles: ['foreman'],
  query: z.object({ limit: z.coerce.number().int().max(1000).default(100), name: z.string() }),
  body: z.strictObject({ ownerIds: z.array(z.uuid()) }),
  responses: { 204: { description: 'Done' }, 403: { description: 'Not a foreman' } },
};

test('an operation is described by the schemas that validate it', () => {
  const { paths } = openApiDocument([operation]);
  expect(paths).toEqual({
    '/api/boats/{id}/owners': {
      post: expect.objectContaining({
        'x-roles': ['foreman'],
        security: [{ bearer: [] }],
        parameters: [
          { name: 'id', in: 'path', required: true, schema: { type: 'string' } },
          expect.objectContaining({ name: 'limit', in: 'query', required: false }),
          expect.objectContaining({ name: 'name', in: 'query', required: true, schema: { type: 'string' } }),
        ],
      }),
    },
  });
  expect(paths).toHaveProperty(
    ['/api/boats/{id}/owners', 'post', 'requestBody', 'content', 'application/json', 'schema'],
    expect.objectContaining({ additionalProperties: false, required: ['ownerIds'] }),
  );
});

test('a refusal without a schema of its own is a problem', () => {
  expect(openApiDocument([operation]).paths).toHaveProperty(
    ['/api/boats/{id}/owners', 'post', 'responses', '403', 'content', 'application/problem+json', 'schema'],
    { $ref: '#/components/schemas/Problem' },
  );
});

test('what any operation may answer is said of each: a bad body, no token, another role, a database that is away', () => {
  const { body: _body, ...bodiless } = operation;
  const { paths } = openApiDocument([operation, { ...bodiless, method: 'get', roles: 'anyone' }]);
  const { post, get } = (paths as Record<string, Record<string, { responses: object }>>)['/api/boats/{id}/owners']!;
  expect(Object.keys(post!.responses)).toEqual(['204', '400', '401', '403', '413', '503']);
  expect(Object.keys(get!.responses)).toEqual(['204', '403', '503']);
});
