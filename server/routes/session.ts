import { Router, type Request, type Response } from 'express';
import { refreshRequestSchema, sessionAnswerSchema, sessionRequestSchema } from '#shared/identity/session.ts';
import { refresh, signOut } from '#server/identity/refresh.ts';
import { clearRefreshCookie, refreshCookie, setRefreshCookie } from '#server/identity/refresh-cookie.ts';
import { signIn, type SignedIn } from '#server/identity/sign-in.ts';
import { addressOf, emailKeyOf, failureLimit } from '#server/middleware/failure-limit.ts';
import { jsonBody } from '#server/middleware/json-body.ts';
import { parseBody } from '#server/middleware/problem.ts';
import type { Operation } from '#server/openapi/operation.ts';
import type { Parts } from '#server/parts.ts';

const BODY_BYTES_MAX = 16 * 1024;
const FAILURES_OF_EMAIL_MAX = 10;
// a whole shop shares one address
const FAILURES_OF_ADDRESS_MAX = 100;

export const sessionOperations: Operation[] = [
  {
    method: 'post',
    path: '/api/session',
    summary: 'Sign in on a device',
    roles: 'anyone',
    body: sessionRequestSchema,
    responses: {
      200: { description: 'Signed in; the refresh token is in a cookie', schema: sessionAnswerSchema },
      400: { description: 'Some fields are not as they should be' },
      401: { description: 'The e-mail or the password is not right' },
      409: { description: 'The e-mail is in several shops, which `shops` names' },
      429: { description: 'Too many failures: see Retry-After' },
    },
  },
  {
    method: 'post',
    path: '/api/session/refresh',
    summary: 'A new access token for the refresh cookie, for another person enrolled on the device if wished',
    roles: 'anyone',
    body: refreshRequestSchema,
    responses: {
      200: { description: 'Signed in still', schema: sessionAnswerSchema },
      401: { description: 'Sign in again' },
      403: { description: 'That person has not signed in on this device' },
    },
  },
  {
    method: 'delete',
    path: '/api/session',
    summary: 'Sign out',
    roles: 'anyone',
    responses: { 204: { description: 'Signed out' } },
  },
];

/** Sign-in, refresh and sign-out. */
export function sessionRoutes(parts: Parts): Router {
  const router = Router();
  const body = jsonBody(BODY_BYTES_MAX);
  const limits = [
    failureLimit(parts, {
      name: 'sign-in-address',
      failuresMax: FAILURES_OF_ADDRESS_MAX,
      keyOf: addressOf,
      status: 401,
    }),
    failureLimit(parts, {
      name: 'sign-in-email',
      failuresMax: FAILURES_OF_EMAIL_MAX,
      keyOf: emailKeyOf,
      status: 401,
    }),
  ];

  router.post('/session', body, ...limits, async (request, response) => {
    const asked = parseBody(sessionRequestSchema, request.body);
    send(request, response, await signIn(parts, asked));
  });

  router.post('/session/refresh', body, async (request, response) => {
    const { personId } = parseBody(refreshRequestSchema, request.body ?? {});
    send(request, response, await refresh(parts, refreshCookie(request), personId));
  });

  router.delete('/session', async (request, response) => {
    await signOut(parts, refreshCookie(request));
    clearRefreshCookie(request, response);
    response.status(204).end();
  });

  return router;
}

function send(request: Request, response: Response, { answer, refreshToken }: SignedIn): void {
  setRefreshCookie(request, response, refreshToken);
  response.set('Cache-Control', 'no-store').json(answer);
}
