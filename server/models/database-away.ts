// SQLSTATE classes (PostgreSQL manual, appendix A) of what passes: connections, rollbacks that ask for another try,
// resources, an operator's stop, the system's own errors; and a database that is read-only for the time being
const PASSING_CODE = /^(08|40|53|57|58)...$|^25006$/;
const SOCKET_CODE = /^(ECONNRESET|ECONNREFUSED|EPIPE|ETIMEDOUT)$/;
const LOST_MESSAGE = /^Connection terminated|not queryable|^Client was closed/;

interface Cause {
  code?: unknown;
  message?: unknown;
}

/** Whether something failed because the database is away or busy for the time being, not because of what it was asked. */
export function isDatabaseAway(error: unknown): boolean {
  if (!(error instanceof Error)) return false;
  if (error.name.startsWith('SequelizeConnection')) return true;
  const { code, message } = ((error as { parent?: Cause }).parent ?? error) as Cause;
  const codeText = String(code);
  return PASSING_CODE.test(codeText) || SOCKET_CODE.test(codeText) || LOST_MESSAGE.test(String(message));
}
