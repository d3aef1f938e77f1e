import { demoAccounts, DEMO_SHOP_ID, seedDemo } from '#server/demo/seed.ts';
import { issueFirstRunCode } from '#server/identity/first-run.ts';
import type { Database } from '#server/models/database.ts';

interface Ways {
  isDemoWanted: boolean;
  nowMs: number;
  /** the demo shop's */
  timeZone: string;
}

/**
 * The lines that tell whoever started the server how to get in: the demo's accounts, whose shop is made where there is
 * none yet, or else the code for the first run.
 */
export async function waysIn(database: Database, { isDemoWanted, nowMs, timeZone }: Ways): Promise<string[]> {
  const shops = await database.models.KnownShop.findAll();
  if (shops.length === 0 && isDemoWanted) await seedDemo(database, nowMs, timeZone);
  else if (shops.length === 0) {
    const code = await issueFirstRunCode(database);
    return [`There is no shop yet. Open the address above and enter the code ${code}`];
  } else if (!shops.some(({ shopId }) => shopId === DEMO_SHOP_ID)) return [];
  return demoAccounts().map(({ role, email, password }) => `demo ${role} ${email} ${password}`);
}
