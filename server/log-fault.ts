import type { Logger } from 'pino';

/** Logs what was thrown, but not the error itself, to which Sequelize adds what was to be written: people's words. */
export function logFault(log: Logger, error: unknown, message: string): void {
  const fault = error instanceof Error ? { name: error.name, message: error.message, stack: error.stack } : { name: typeof error };
  log.error({ fault }, message);
}
