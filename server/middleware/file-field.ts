import type { Request, RequestHandler } from 'express';
import multer, { MulterError } from 'multer';
import { Problem } from './problem.ts';

/** Reads one file, in the field `name` of a multipart body, of at most `bytesMax` bytes; more is a 413. */
export function fileField(name: string, bytesMax: number): RequestHandler {
  const read = multer({ limits: { fileSize: bytesMax, files: 1, fields: 0, parts: 1 } }).single(name);
  return (request, response, next) => {
    read(request, response, (error?: unknown) => {
      if (error) return next(problemOf(error, name, bytesMax));
      next(
        request.file
          ? undefined
          : new Problem(400, `There is no file in the field ${name} of a multipart body.`),
      );
    });
  };
}

/** The bytes of the file that `fileField` let through. */
export function fileOf(request: Request): Buffer {
  if (!request.file) throw new Error(`${request.path} asks for a file but no fileField stands before it.`);
  return request.file.buffer;
}

// in memory there is nothing that can go wrong but the request
function problemOf(error: unknown, name: string, bytesMax: number): Problem {
  const isTooLarge = error instanceof MulterError && error.code === 'LIMIT_FILE_SIZE';
  if (isTooLarge) return new Problem(413, `The file is over ${bytesMax} bytes.`);
  return new Problem(
    400,
    `The body is not one file in the field ${name}, or it broke off; send it again whole.`,
  );
}
