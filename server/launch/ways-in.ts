import { issueFirstRunCode } from '#server/identity/first-run.ts';
import type { Database } from '#server/models/database.ts';

export type DemoAccount = { role: string; email: string; password: string };

/** Makes the demo shop in a database without shops; returns its accounts, or none where the shops are people's own. */
export type SeedDemo = (database: Database, nowMs: number) => Promise<DemoAccount[]>;

/** The lines that tell whoever started the server how to get in: demo accounts, or the code for the first run. */
export async function waysIn(
  database: Database,
  nowMs: number,
  seedDemo: SeedDemo | null,
): Promise<string[]> {
  const accounts = seedDemo ? await seedDemo(database, nowMs) : [];
  const code = await issueFirstRunCode(database);
  const lines = accounts.map(({ role, email, password }) => `demo ${role} ${email} ${password}`);
  if (code !== null) lines.push(`There is no shop yet. Open the address above and enter the code ${code}`);
  return lines;
}
