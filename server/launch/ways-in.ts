import { demoAccounts, DEMO_SHOP_ID, seedDemo } from '#server/demo/seed.ts';
import { developPictures } from '#server/demo/pictures/develop.ts';
import { issueFirstRunCode } from '#server/identity/first-run.ts';
import type { Database } from '#server/models/database.ts';
import type { PictureStore } from '#server/photos/store.ts';

interface Ways {
  pictures: PictureStore;
  isDemoWanted: boolean;
  nowMs: number;
  /** the demo shop's */
  timeZone: string;
  /** a line to whoever started the server, while they wait */
  tell: (line: string) => void;
}

/**
 * The lines that tell whoever started the server how to get in: the demo's accounts, whose shop is made where there is
 * none yet, or else the code for the first run.
 */
export async function waysIn(database: Database, ways: Ways): Promise<string[]> {
  const shops = await database.models.KnownShop.findAll();
  if (shops.length === 0 && ways.isDemoWanted) await makeDemo(database, ways);
  else if (shops.length === 0) {
    const code = await issueFirstRunCode(database);
    return [`There is no shop yet. Open the address above and enter the code ${code}`];
  } else if (!shops.some(({ shopId }) => shopId === DEMO_SHOP_ID)) return [];
  return demoAccounts().map(({ role, email, password }) => `demo ${role} ${email} ${password}`);
}

async function makeDemo(database: Database, { pictures: store, nowMs, timeZone, tell }: Ways): Promise<void> {
  tell('Making the demo shop: three boats, three months of work. Drawing its pictures takes half a minute.');
  const pictures = await developPictures();
  tell(`${pictures.size} pictures are drawn; writing down what was done.`);
  await seedDemo(database, nowMs, timeZone, { pictures, store });
}
