import compression from 'compression';
import type { RequestHandler } from 'express';
import helmet from 'helmet';

/** Headers for every answer. Scripts come from here alone; WebAssembly is for the password hash, blob: workers for pictures. */
export const securityHeaders: RequestHandler[] = [
  helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'", "'wasm-unsafe-eval'"],
        styleSrc: ["'self'"],
        workerSrc: ["'self'", 'blob:'],
        imgSrc: ["'self'", 'blob:', 'data:'],
        mediaSrc: ["'self'", 'blob:'],
        fontSrc: ["'self'"],
        connectSrc: ["'self'"],
        manifestSrc: ["'self'"],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        upgradeInsecureRequests: null,
      },
    },
    referrerPolicy: { policy: 'no-referrer' },
  }),
  (_request, response, next) => {
    response.set('Permissions-Policy', 'camera=(self), microphone=(self), geolocation=()');
    next();
  },
];

/** gzip for all that shrinks, save event streams, which compression would hold back until they end. */
export const compressed = compression({
  filter: (request, response) =>
    !String(response.getHeader('Content-Type')).startsWith('text/event-stream') &&
    compression.filter(request, response),
});
