import type { ErrorRequestHandler, RequestHandler, Response } from 'express';
import { z } from 'zod';
import { logFault } from '#server/log-fault.ts';
import { isDatabaseAway } from '#server/models/database-away.ts';

export type Issue = { path: string; message: string };

/** What a problem answer looks like on the wire (RFC 9457). */
export const problemSchema = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  detail: z.string().optional(),
  issues: z.array(z.object({ path: z.string(), message: z.string() })).optional(),
});

const TITLES: Record<number, string> = {
  400: 'The request cannot be read',
  401: 'Sign in',
  403: 'Not allowed',
  404: 'Not found',
  409: 'Conflict',
  413: 'Too large',
  415: 'Not a kind of content that is taken here',
  422: 'Not acceptable as it stands',
  429: 'Too many tries',
  500: 'A fault in the server',
  503: 'Not ready',
};

type ProblemExtras = {
  title?: string;
  issues?: Issue[];
  headers?: Record<string, string>;
  more?: Record<string, unknown>;
};

/** Throw it anywhere below a route; `more` are members of the answer beyond those of RFC 9457. */
export class Problem extends Error {
  readonly status: number;
  readonly title: string;
  readonly issues: Issue[];
  readonly headers: Record<string, string>;
  readonly more: Record<string, unknown>;

  constructor(status: number, detail: string, extras: ProblemExtras = {}) {
    super(detail);
    this.status = status;
    this.title = extras.title ?? TITLES[status] ?? 'Problem';
    this.issues = extras.issues ?? [];
    this.headers = extras.headers ?? {};
    this.more = extras.more ?? {};
  }
}

/** The value as the schema reads it, or a 400 naming each bad field. */
export function parseBody<Schema extends z.ZodType>(schema: Schema, value: unknown): z.output<Schema> {
  const read = schema.safeParse(value);
  if (read.success) return read.data;
  throw new Problem(400, 'Some fields are missing or not as they should be.', {
    issues: read.error.issues.flatMap(issuesFromZod),
  });
}

function issuesFromZod(issue: z.core.$ZodIssue): Issue[] {
  const at = issue.path.map(String);
  if (issue.code !== 'unrecognized_keys') return [{ path: at.join('.'), message: issue.message }];
  return issue.keys.map((key) => ({
    path: [...at, key].join('.'),
    message: 'This field is not known here.',
  }));
}

export const notFound: RequestHandler = (request) => {
  throw new Problem(404, `There is nothing at ${request.method} ${request.baseUrl}${request.path}.`);
};

/** The one place where what was thrown becomes an answer. */
export const problemHandler: ErrorRequestHandler = (error: unknown, request, response, next) => {
  if (response.headersSent) return next(error);
  const problem = problemFrom(error);
  if (problem.status >= 500 && request.log) logFault(request.log, error, 'request failed');
  sendProblem(response, problem);
};

export function sendProblem(response: Response, problem: Problem): void {
  response.status(problem.status).set(problem.headers).type('application/problem+json');
  response.send(
    JSON.stringify({
      type: 'about:blank',
      title: problem.title,
      status: problem.status,
      detail: problem.message,
      ...(problem.issues.length > 0 ? { issues: problem.issues } : {}),
      ...problem.more,
    }),
  );
}

function problemFrom(error: unknown): Problem {
  if (error instanceof Problem) return error;
  if (isDatabaseAway(error)) return new Problem(503, 'The database cannot be reached.');
  const status = statusOf(error);
  if (status !== null) return new Problem(status, (error as Error).message);
  return new Problem(500, 'Something went wrong here; it has been written to the log.');
}

// body parsers and Express itself mark what the client did wrong with a status and `expose`
function statusOf(error: unknown): number | null {
  if (!(error instanceof Error) || !('status' in error) || !('expose' in error)) return null;
  return typeof error.status === 'number' && error.expose === true ? error.status : null;
}
