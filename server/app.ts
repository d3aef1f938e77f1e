import express from 'express';
import type { Express } from 'express';
import { appShell } from './middleware/app-shell.ts';
import { notFound, problemHandler } from './middleware/problem.ts';
import { requestLog } from './middleware/request-log.ts';
import { compressed, securityHeaders } from './middleware/security.ts';
import type { Parts } from './parts.ts';
import { apiRoutes } from './routes/api.ts';

export type AppParts = Omit<Parts, 'onChanged'> & {
  /** where the built front end is; without it only the API is served */
  distDir?: string;
};

/** The whole server as an Express app that listens nowhere yet. */
export function createApp(parts: AppParts): Express {
  const app = express();
  app.disable('x-powered-by');
  app.use(requestLog(parts.log), ...securityHeaders, compressed);
  app.use('/api', apiRoutes({ ...parts, onChanged: (shopId, seq) => parts.hails.announce(shopId, seq) }));
  if (parts.distDir) app.use(appShell(parts.distDir));
  app.use(notFound, problemHandler);
  return app;
}
