import type { Database } from '#server/models/database.ts';

const secrets = new WeakMap<Database, Promise<string>>();

/** The secret under which this installation signs its tokens; it never changes, so it is read once. */
export function installationSecret(database: Database): Promise<string> {
  const known = secrets.get(database);
  if (known) return known;
  const read = readSecret(database);
  secrets.set(database, read);
  // a database that was away is asked again
  read.catch(() => secrets.delete(database));
  return read;
}

async function readSecret({ models }: Database): Promise<string> {
  const installation = await models.Installation.findOne({ rejectOnEmpty: true });
  return installation.jwtSecret;
}
