import { pipeline } from 'node:stream/promises';
import { Router } from 'express';
import type { Request, RequestHandler, Response } from 'express';
import { z } from 'zod';
import { sha256Schema } from '#shared/photo/photo.ts';
import type { Role } from '#shared/identity/role.ts';
import { fileField, fileOf } from '#server/middleware/file-field.ts';
import { parseBody, Problem } from '#server/middleware/problem.ts';
import { requireSession, sessionOf, type Session } from '#server/middleware/session.ts';
import type { Operation } from '#server/openapi/operation.ts';
import type { Parts } from '#server/parts.ts';
import { isKept } from '#server/photos/is-kept.ts';
import { keepPhoto } from '#server/photos/keep-photo.ts';
import { openPhoto, type OpenPhoto } from '#server/photos/open-photo.ts';
import type { Picture, SentSize } from '#server/photos/store.ts';

const FULL_BYTES_MAX = 15 * 1024 * 1024;
const THUMB_BYTES_MAX = 100 * 1024;
const FIELD = 'photo';
const WORKING: readonly Role[] = ['crew', 'foreman', 'office'];

const askedSchema = z.object({ size: z.enum(['thumb', 'view', 'full']).default('full') });
const bodySchema = z.object({ [FIELD]: z.file() });

const SENT: Operation['responses'] = {
  200: { description: 'It was there' },
  201: { description: 'It is kept, and rows that name it say so' },
  400: { description: 'The body is not one file in this field, or it broke off' },
  422: { description: 'No JPEG, PNG or WebP by its content, too many pixels, or not the bytes of this name' },
};

export const photoOperations: Operation[] = [
  {
    method: 'head',
    path: '/api/photos/:sha256',
    summary: 'Whether a photo has come whole',
    roles: WORKING,
    responses: { 200: { description: 'It has' }, 404: { description: 'It has not' } },
  },
  {
    method: 'put',
    path: '/api/photos/:sha256',
    summary: 'Send a photo, whether or not the op that names it has come',
    roles: WORKING,
    bodyType: 'multipart/form-data',
    body: bodySchema,
    responses: { ...SENT, 413: { description: 'The file is over 15 MiB' } },
  },
  {
    method: 'put',
    path: '/api/photos/:sha256/thumb',
    summary: 'Send a small picture of a photo, before the photo itself',
    roles: WORKING,
    bodyType: 'multipart/form-data',
    body: bodySchema,
    responses: { ...SENT, 413: { description: 'The file is over 100 KiB' } },
  },
  {
    method: 'get',
    path: '/api/photos/:sha256',
    summary: 'A photo that a row shows, small, for a screen (1600 px) or whole',
    roles: WORKING,
    query: askedSchema,
    responses: {
      200: { description: 'The picture', contentType: 'image/*' },
      404: { description: 'It has not come in this size, or no row shows it' },
      422: { description: 'Its bytes cannot be decoded, so that nothing smaller can be made of them' },
    },
  },
];

/** The bytes of photos, in and out. */
export function photoRoutes(parts: Parts): Router {
  const router = Router();
  const signedIn = requireSession(parts);
  const working = requireSession(parts, WORKING);
  router.head('/photos/:sha256', signedIn, tellWhetherKept(parts));
  router.get('/photos/:sha256', signedIn, give(parts));
  router.put('/photos/:sha256', working, fileField(FIELD, FULL_BYTES_MAX), take(parts, 'full'));
  router.put('/photos/:sha256/thumb', working, fileField(FIELD, THUMB_BYTES_MAX), take(parts, 'thumb'));
  return router;
}

function tellWhetherKept(parts: Parts): RequestHandler {
  return async (request, response) => {
    const photo = photoAsked(request);
    if (!photo || !(await isKept(parts, photo, 'full'))) throw notThere();
    response.set('Cache-Control', 'no-store').end();
  };
}

function give(parts: Parts): RequestHandler {
  return async (request, response) => {
    const { size } = parseBody(askedSchema, request.query);
    const photo = photoAsked(request);
    const opened = photo ? await openPhoto(parts, sessionOf(request).personId, photo, size) : 'missing';
    if (opened === 'missing') throw notThere();
    if (opened === 'undecodable')
      throw new Problem(422, 'These bytes cannot be decoded; they can be had whole.');
    await stream(opened, response);
  };
}

function take(parts: Parts, size: SentSize): RequestHandler {
  return async (request, response) => {
    const { personId, shopId } = sessionOf(request);
    const sha256 = sha256Schema.safeParse(request.params.sha256);
    if (!sha256.success) throw new Problem(422, `The name of a photo is ${sha256.error.issues[0]!.message}.`);
    const arrival = { photo: { shopId, sha256: sha256.data }, size, personId, nowMs: parts.now() };
    const kept = await keepPhoto(parts, arrival, fileOf(request));
    if ('refused' in kept) throw new Problem(422, kept.refused);
    response.status(kept.isNew ? 201 : 200).end();
  };
}

/** null where the name is none, or where whoever asks sees no photos: an owner is not told even that there is one. */
function photoAsked(request: Request): Picture | null {
  const session = sessionOf(request);
  const sha256 = sha256Schema.safeParse(request.params.sha256);
  return sha256.success && worksHere(session) ? { shopId: session.shopId, sha256: sha256.data } : null;
}

function worksHere({ roles }: Session): boolean {
  return roles.some((role) => WORKING.includes(role));
}

function notThere(): Problem {
  return new Problem(404, 'There is no such photo here.');
}

async function stream({ mediaType, bytes, stream: from }: OpenPhoto, response: Response): Promise<void> {
  response.set({ 'Cache-Control': 'no-store', 'Content-Type': mediaType, 'Content-Length': String(bytes) });
  try {
    await pipeline(from, response);
  } catch (error) {
    // whoever asked has gone
    if ((error as NodeJS.ErrnoException).code !== 'ERR_STREAM_PREMATURE_CLOSE') throw error;
  }
}
