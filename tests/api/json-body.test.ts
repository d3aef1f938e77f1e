import { gzipSync } from 'node:zlib';
import express from 'express';
import request from 'supertest';
import { expect, test } from 'vitest';
import { z } from 'zod';
import { jsonBody } from '#server/middleware/json-body.ts';
import { parseBody, Problem, problemHandler } from '#server/middleware/problem.ts';

const BYTES_MAX = 1024 * 1024;
const app = express()
  .post('/', jsonBody(BYTES_MAX), (req, res) => {
    const { text } = parseBody(
      z.strictObject({ text: z.string(), at: z.object({ day: z.iso.date() }).optional() }),
      req.body,
    );
    res.json({ length: text.length });
  })
  .get('/busy', () => {
    throw new Problem(429, 'Wait a little.', { headers: { 'Retry-After': '30' } });
  })
  .get('/mistake', () => {
    throw new TypeError('a secret of the inside');
  })
  .use(problemHandler);

const overhead = JSON.stringify({ text: '' }).length;
const textOf = (bytes: number) => JSON.stringify({ text: 'a'.repeat(bytes - overhead) });
const post = (body: string | Buffer, headers: Record<string, string> = {}) =>
  request(app)
    .post('/')
    .set({ 'Content-Type': 'application/json', ...headers })
    .serialize((whole) => whole)
    .send(body as string);

test('a body of exactly the limit is read', async () => {
  expect((await post(textOf(BYTES_MAX))).body).toEqual({ length: BYTES_MAX - overhead });
});

test('one byte more is a 413', async () => {
  const { status, body, type } = await post(textOf(BYTES_MAX + 1));
  expect([status, type, body.status]).toEqual([413, 'application/problem+json', 413]);
});

test('a gzip body is read, and measured as it is after unzipping', async () => {
  const zipped = { 'Content-Encoding': 'gzip' };
  const small = await post(gzipSync(textOf(BYTES_MAX)), zipped);
  expect(small.body).toEqual({ length: BYTES_MAX - overhead });
  const large = gzipSync(textOf(BYTES_MAX + 100_000));
  expect(large.length).toBeLessThan(10_000);
  expect((await post(large, zipped)).status).toBe(413);
});

test('what is no JSON, or no gzip though it says so, is a 400', async () => {
  expect((await post('{"text":')).status).toBe(400);
  expect((await post('{"text":"a"}', { 'Content-Encoding': 'gzip' })).status).toBe(400);
});

test('each bad field is named, an unknown one too', async () => {
  const { status, body } = await post(JSON.stringify({ text: 5, at: { day: 'Tuesday' }, extra: true }));
  expect(status).toBe(400);
  expect(body.issues.map(({ path }: { path: string }) => path)).toEqual(['text', 'at.day', 'extra']);
});

test('a body of another kind is a 400 and no fault of ours', async () => {
  expect((await post('text=a', { 'Content-Type': 'application/x-www-form-urlencoded' })).status).toBe(400);
});

test('a problem carries its headers', async () => {
  const response = await request(app).get('/busy');
  expect([response.status, response.headers['retry-after']]).toEqual([429, '30']);
});

test('a mistake of ours tells nothing of the inside', async () => {
  const response = await request(app).get('/mistake');
  expect(response.status).toBe(500);
  expect(response.text).not.toContain('secret');
});
