import { HoldError } from '../hold-error.ts';
import type { World } from '../world.ts';
import { PictureError, type FailedPicture, type PickProgress, type PreparedPicture } from './picture.ts';
import type { PictureStore } from './picture-store.ts';

/** What a prepared picture and its thumbnail take on the device, at most, as a rule, in bytes. */
const PREPARED_BYTES = 2 * 1024 * 1024;
/** Left free for what is written and said, in bytes. */
const RESERVE_BYTES = 20 * 1024 * 1024;

interface Taking<T> {
  world: World;
  store: PictureStore;
  files: readonly File[];
  onProgress: (progress: PickProgress) => void;
  /** what is to become of each; what it rejects with is told of that one alone */
  settle: (picture: PreparedPicture, name: string) => Promise<T>;
}

/** Takes in a pick of files, one after another. What fails is named, and holds up none of the others. */
export async function takePictures<T>(taking: Taking<T>): Promise<{ taken: T[]; failed: FailedPicture[] }> {
  const { world, store, files, onProgress } = taking;
  const taken: T[] = [];
  const failed: FailedPicture[] = [];
  if (!(await makeRoom(world, store, files.length * PREPARED_BYTES))) {
    return { taken, failed: files.map(({ name }) => ({ name, words: noRoomFor(files.length) })) };
  }
  for (const file of files) {
    onProgress({ done: taken.length + failed.length, of: files.length });
    try {
      taken.push(await takeOne(taking, file));
    } catch (error) {
      failed.push({ name: file.name, words: wordsOf(error, world) });
    }
  }
  onProgress({ done: files.length, of: files.length });
  return { taken, failed };
}

async function takeOne<T>({ world, store, settle }: Taking<T>, file: File): Promise<T> {
  const picture = await world.preparePicture(file);
  try {
    return await settle(picture, file.name);
  } catch (error) {
    // what the server has is let go of before anything is refused
    if (!isDiskFull(error) || (await store.trim(0)) === 0) throw error;
    return settle(picture, file.name);
  }
}

/** Whether `bytes` more will fit, if need be once pictures are let go of that the server has. */
async function makeRoom({ storage }: World, store: PictureStore, bytes: number): Promise<boolean> {
  // where the browser does not tell, writing will
  const { quota, usage } = (await storage?.estimate().catch(() => null)) ?? {};
  if (quota === undefined || usage === undefined) return true;
  const missing = bytes + RESERVE_BYTES - (quota - usage);
  return missing <= 0 || (await store.trim(0)) >= missing;
}

function isDiskFull(error: unknown): boolean {
  return error instanceof DOMException && error.name === 'QuotaExceededError';
}

function noRoomFor(count: number): string {
  const what = count === 1 ? 'this picture' : `these ${count} pictures`;
  return `This device has no room for ${what}. Free some room, or take fewer.`;
}

function wordsOf(error: unknown, world: World): string {
  if (isDiskFull(error)) return noRoomFor(1);
  if (error instanceof PictureError || error instanceof HoldError) return error.message;
  world.report(error);
  return 'Something went wrong with this picture on this device. Try it again.';
}
