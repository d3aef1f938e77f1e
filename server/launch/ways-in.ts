import { issueFirstRunCode } from '#server/identity/first-run.ts';
import type { Database } from '#server/models/database.ts';

/** The lines that tell whoever started the server how to get in: the code for the first run while there is no shop. */
export async function waysIn(database: Database): Promise<string[]> {
  const code = await issueFirstRunCode(database);
  return code === null ? [] : [`There is no shop yet. Open the address above and enter the code ${code}`];
}
