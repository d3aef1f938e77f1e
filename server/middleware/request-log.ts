import type { RequestHandler } from 'express';
import type { Logger } from 'pino';
import { pinoHttp } from 'pino-http';

/** One line an API request; never headers, bodies or query strings, which carry tokens and people's words. */
export function requestLog(log: Logger): RequestHandler {
  return pinoHttp({
    logger: log,
    autoLogging: { ignore: (request) => !request.url?.startsWith('/api/') },
    serializers: {
      req: (request: { method: string; url: string }) => ({
        method: request.method,
        path: request.url.split('?', 1)[0],
      }),
      res: (response: { statusCode: number }) => ({ status: response.statusCode }),
    },
  });
}
