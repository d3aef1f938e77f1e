import { z } from 'zod';
import { problemSchema } from '#server/middleware/problem.ts';
import { version } from '#server/version.ts';
import type { Answer, Operation } from './operation.ts';

type Json = Record<string, unknown>;

/** OpenAPI 3.1 made from the very schemas that validate requests. */
export function openApiDocument(operations: readonly Operation[]): Json {
  const paths: Record<string, Json> = {};
  for (const operation of operations) {
    const at = operation.path.replace(/:(\w+)/g, '{$1}');
    (paths[at] ??= {})[operation.method] = describe(operation);
  }
  return {
    openapi: '3.1.0',
    info: { title: 'Ribband', version },
    paths,
    components: {
      schemas: { Problem: jsonSchema(problemSchema, 'output') },
      securitySchemes: { bearer: { type: 'http', scheme: 'bearer', bearerFormat: 'JWT' } },
    },
  };
}

function describe(operation: Operation): Json {
  const { summary, roles, body } = operation;
  return {
    summary,
    ...(typeof roles === 'string' ? {} : { 'x-roles': roles }),
    security: roles === 'anyone' ? [] : [{ bearer: [] }],
    parameters: [...pathParameters(operation.path), ...queryParameters(operation.query)],
    ...(body ? { requestBody: requestBody(body, operation.bodyType) } : {}),
    responses: Object.fromEntries(
      Object.entries(operation.responses).map(([status, answer]) => [
        status,
        response(Number(status), answer),
      ]),
    ),
  };
}

function pathParameters(path: string): Json[] {
  return [...path.matchAll(/:(\w+)/g)].map(([, name]) => ({
    name,
    in: 'path',
    required: true,
    schema: { type: 'string' },
  }));
}

function queryParameters(query: z.ZodObject | undefined): Json[] {
  return Object.entries(query?.shape ?? {}).map(([name, schema]) => ({
    name,
    in: 'query',
    required: !z.safeParse(schema, undefined).success,
    schema: jsonSchema(schema as z.ZodType, 'input'),
  }));
}

function requestBody(body: z.ZodType, contentType = 'application/json'): Json {
  return { required: true, content: { [contentType]: { schema: jsonSchema(body, 'input') } } };
}

function response(status: number, answer: Answer): Json {
  const { description, schema, contentType = 'application/json' } = answer;
  if (schema) return { description, content: { [contentType]: { schema: jsonSchema(schema, 'output') } } };
  if (contentType !== 'application/json') return { description, content: { [contentType]: {} } };
  if (status < 400) return { description };
  return {
    description,
    content: { 'application/problem+json': { schema: { $ref: '#/components/schemas/Problem' } } },
  };
}

// each schema stands whole in its place, so that no reference has to be rewritten
function jsonSchema(schema: z.ZodType, io: 'input' | 'output'): Json {
  const { $schema: _, ...rest } = z.toJSONSchema(schema, { io, unrepresentable: 'any', reused: 'inline' });
  return rest;
}
