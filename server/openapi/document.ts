import { z } from 'zod';
import { problemSchema } from '#server/middleware/problem.ts';
import { version } from '#server/version.ts';
import type { Answer, Operation } from './operation.ts';

type Json = Record<string, unknown>;

/** OpenAPI 3.1 made from the very schemas that validate requests; `named` are those of parts of bodies that no body's own schema describes. */
export function openApiDocument(operations: readonly Operation[], named: Record<string, z.ZodType> = {}): Json {
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
      schemas: { Problem: jsonSchema(problemSchema, 'output'), ...inputSchemas(named) },
      securitySchemes: { bearer: { type: 'http', scheme: 'bearer', bearerFormat: 'JWT' } },
    },
  };
}

function inputSchemas(named: Record<string, z.ZodType>): Json {
  return Object.fromEntries(Object.entries(named).map(([name, schema]) => [name, jsonSchema(schema, 'input')]));
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
      Object.entries({ ...refusals(operation), ...operation.responses }).map(([status, answer]) => [
        status,
        response(Number(status), answer),
      ]),
    ),
  };
}

const BODY_REFUSALS: Operation['responses'] = {
  400: { description: 'The body is not as its schema says: `issues` names each bad field' },
  413: { description: 'The body is too large' },
};
const SESSION_REFUSALS: Operation['responses'] = {
  401: { description: 'No access token that holds' },
  403: { description: 'Not for this role or this device' },
};

// what can happen at any such operation, so that none has to say it
function refusals({ roles, body }: Operation): Operation['responses'] {
  const away = { 503: { description: 'The database is away' } };
  return { ...(body ? BODY_REFUSALS : {}), ...(roles === 'anyone' ? {} : SESSION_REFUSALS), ...away };
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
