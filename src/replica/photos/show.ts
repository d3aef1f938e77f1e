import { inTime, isUnreachable } from '../request.ts';
import type { World } from '../world.ts';
import type { PictureSize } from './picture.ts';
import type { PictureStore } from './picture-store.ts';

const ANSWER_MAX_MS = 60_000;

/** What of a picture on this device serves for each size. */
const SERVES: Record<PictureSize, PictureSize[]> = {
  thumb: ['thumb'],
  view: ['view', 'full'],
  full: ['full'],
};

interface Showing {
  world: World;
  store: PictureStore;
  nowMs: () => number;
  /** whether the server has it, as far as is known here */
  canCome: (sha256: string, size: PictureSize) => boolean;
  fetch: (path: string, init: RequestInit) => Promise<Response>;
}

/** Finds pictures: on this device, or else with the server, asking once however many want one. */
export class PictureFinder {
  private readonly showing: Showing;
  private readonly asked = new Map<string, Promise<Blob | null>>();

  constructor(showing: Showing) {
    this.showing = showing;
  }

  /** A picture, or null where it cannot be had now. */
  find(sha256: string, size: PictureSize): Promise<Blob | null> {
    const key = `${sha256}/${size}`;
    const known = this.asked.get(key);
    if (known) return known;
    const asking = this.look(sha256, size).finally(() => this.asked.delete(key));
    this.asked.set(key, asking);
    return asking;
  }

  private async look(sha256: string, size: PictureSize): Promise<Blob | null> {
    const own = await this.showing.store.bytes(sha256, SERVES[size]);
    if (own) return own;
    if (!this.showing.canCome(sha256, size)) return null;
    const heard = await this.ask(sha256, size);
    if (heard && size !== 'full') await this.keep(sha256, size, heard);
    return heard;
  }

  private async ask(sha256: string, size: PictureSize): Promise<Blob | null> {
    const { world, fetch } = this.showing;
    try {
      return await inTime(world, ANSWER_MAX_MS, async (signal) => {
        const response = await fetch(`/api/photos/${sha256}?size=${size}`, { signal });
        const isPicture = response.ok && (response.headers.get('Content-Type') ?? '').startsWith('image/');
        return isPicture ? response.blob() : null;
      });
    } catch (error) {
      if (isUnreachable(error)) return null;
      throw error;
    }
  }

  private async keep(sha256: string, size: 'thumb' | 'view', blob: Blob): Promise<void> {
    const { store, nowMs, world } = this.showing;
    try {
      await store.keepShown(sha256, size, blob, new Date(nowMs()).toISOString());
    } catch (error) {
      // it is shown all the same, and asked for again another time
      if (!(error instanceof DOMException)) world.report(error);
    }
  }
}
