import type { Logger } from 'pino';

/** Logs what was thrown at the merge, but not the error itself, to which Sequelize adds what was to be written: people's words. */
export function logFault(log: Logger, error: unknown, message: string): void {
  const { name, stack } = error instanceof Error ? error : { name: typeof error, stack: undefined };
  log.error({ fault: { name, stack } }, message);
}
