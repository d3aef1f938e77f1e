import path from 'node:path';
import express, { Router } from 'express';
import type { Request } from 'express';

const FOR_EVER = 'public, max-age=31536000, immutable';
const ASK_FIRST = 'no-cache';

/** The built front end. Files under assets/ carry their hash in their names; all others are asked for anew. */
export function appShell(distDir: string): Router {
  const router = Router();
  const assets = path.join(distDir, 'assets') + path.sep;
  router.use(
    express.static(distDir, {
      index: false,
      redirect: false,
      cacheControl: false,
      setHeaders: (response, file) => {
        response.setHeader('Cache-Control', file.startsWith(assets) ? FOR_EVER : ASK_FIRST);
      },
    }),
  );
  router.get('/{*path}', (request, response, next) => {
    if (!isNavigation(request)) return next();
    response.set('Cache-Control', ASK_FIRST);
    response.sendFile('index.html', { root: distDir, cacheControl: false });
  });
  return router;
}

// a missing picture or script must be a 404, not the app's page under a wrong name
function isNavigation(request: Request): boolean {
  return (
    path.extname(request.path) === '' && request.accepts(['html', 'json']) === 'html' && wantsHtml(request)
  );
}

function wantsHtml(request: Request): boolean {
  return (request.get('Accept') ?? '').includes('text/html');
}
