import express from 'express';
import type { RequestHandler } from 'express';
import { Problem } from './problem.ts';

/** Reads a JSON body, gzip or plain, of at most `bytesMax` bytes after unzipping; more is a 413. */
export function jsonBody(bytesMax: number): RequestHandler {
  const parse = express.json({ limit: bytesMax, inflate: true });
  return (request, response, next) => {
    parse(request, response, (error?: unknown) => next(isTooLarge(error) ? tooLarge(bytesMax) : error));
  };
}

function isTooLarge(error: unknown): boolean {
  return error instanceof Error && 'type' in error && error.type === 'entity.too.large';
}

function tooLarge(bytesMax: number): Problem {
  return new Problem(413, `The body is over ${bytesMax} bytes after unzipping.`);
}
