import { afterAll, beforeAll, expect, test } from 'vitest';
import { version } from '#server/version.ts';
import { opKinds } from '#shared/sync/registry.ts';
import { startServer } from '#tests/worlds/server.ts';
import type { TestServer } from '#tests/worlds/server.ts';

let server: TestServer;
beforeAll(async () => {
  server = await startServer();
});
afterAll(() => server.close());

test('a server with its database says that all is well', async () => {
  const response = await fetch(`${server.url}/api/health`);
  expect(response.status).toBe(200);
  expect(await response.json()).toEqual({ status: 'ok', version, database: 'ok' });
});

test('an unknown path of the API is a problem, never the app', async () => {
  const response = await fetch(`${server.url}/api/nothing-here`, { headers: { Accept: 'text/html' } });
  expect(response.status).toBe(404);
  expect(response.headers.get('Content-Type')).toContain('application/problem+json');
  expect(await response.json()).toMatchObject({ type: 'about:blank', title: 'Not found', status: 404 });
});

test('the contract is served as OpenAPI 3.1', async () => {
  const document = (await (await fetch(`${server.url}/api/openapi.json`)).json()) as {
    openapi: string;
    paths: object;
  };
  expect(document.openapi).toBe('3.1.0');
  expect(document.paths).toHaveProperty(['/api/health', 'get', 'responses', '503']);
  expect(document.paths).toHaveProperty(['/api/openapi.json', 'get']);
});

test('it describes each kind of op by the schema that reads it', async () => {
  const { components } = (await (await fetch(`${server.url}/api/openapi.json`)).json()) as {
    components: { schemas: Record<string, { required: string[] }> };
  };
  expect(Object.keys(components.schemas)).toEqual(expect.arrayContaining(['Op', ...opKinds.keys()]));
  expect(components.schemas['entry.write']!.required).toEqual(['entryId', 'boatId', 'workDate', 'text', 'spoken', 'hours']);
});

test('a server without its database names the part that is away', async () => {
  const lost = await startServer();
  await lost.database.close();
  const response = await fetch(`${lost.url}/api/health`);
  expect(response.status).toBe(503);
  expect(await response.json()).toEqual({ status: 'down', version, database: 'unreachable' });
  await lost.close();
});
