import type { Logger } from 'pino';
import type { Hails } from '#server/hails/hails.ts';
import type { Database } from '#server/models/database.ts';
import type { PictureStore } from '#server/photos/store.ts';

/** What every route is given; nothing in `server/` reads a clock or opens a database of its own. */
export type Parts = {
  database: Database;
  pictures: PictureStore;
  /** the server's time in milliseconds since 1970 */
  now: () => number;
  log: Logger;
  hails: Hails;
  /** told after a commit how far a shop's feed has come, so that its devices can be hailed */
  onChanged: (shopId: string, seq: number) => void;
};
