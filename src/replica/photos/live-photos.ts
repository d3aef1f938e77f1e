import type { Op } from '#shared/sync/op.ts';
import { HoldError } from '../hold-error.ts';
import type { Attached, Holding, Kept } from '../replica.ts';
import { Turns } from '../turns.ts';
import type { View } from '../view.ts';
import type { World } from '../world.ts';
import { arrivedOf, canCome } from './arrived.ts';
import type {
  HeldPicture,
  KeptPicture,
  PhotoAbout,
  PickProgress,
  PictureSize,
  PreparedPicture,
} from './picture.ts';
import { SHOWN_BYTES_MAX, heldPictures, type PictureStore, type Queue } from './picture-store.ts';
import { hasWaiting, sendPictures, type NotSent } from './send.ts';
import { PictureFinder } from './show.ts';
import { takePictures } from './take.ts';

interface Dealings {
  world: World;
  store: PictureStore;
  newId: () => string;
  nowMs: () => number;
  view: () => View;
  holdAll: (holdings: Holding[]) => Promise<Op[]>;
  /** as the person whose pictures they are */
  fetch: (path: string, init: RequestInit) => Promise<Response>;
  onChange: () => void;
}

type OnProgress = (progress: PickProgress) => void;

/** One person's photos on this device: taken in, attached to the record, sent, and found again. */
export class LivePhotos {
  isSending = false;
  private readonly dealings: Dealings;
  private readonly finder: PictureFinder;
  private readonly sends = new Turns();
  private queuedSend: Promise<NotSent> | null = null;
  private lastSend: Promise<NotSent> = Promise.resolve(null);
  private seen: { queue: Queue; held: HeldPicture[] } | null = null;

  constructor(dealings: Dealings) {
    this.dealings = dealings;
    this.finder = new PictureFinder({
      ...dealings,
      canCome: (sha256, size) => canCome(arrivedOf(dealings.view(), sha256), size),
    });
  }

  async attach(
    files: readonly File[],
    about: PhotoAbout,
    onProgress: OnProgress = () => {},
  ): Promise<Attached> {
    const settle = async (picture: PreparedPicture, name: string) => {
      const kept = await this.keep(picture, name, true);
      try {
        await this.dealings.holdAll([attachOf(kept, about)]);
      } catch (error) {
        await this.dealings.store.assign([kept], 'nothing');
        throw error;
      }
      return kept.photoId;
    };
    const { taken, failed } = await takePictures({ ...this.dealings, files, onProgress, settle });
    this.changed();
    return { attached: taken, failed };
  }

  async keepAll(files: readonly File[], onProgress: OnProgress = () => {}): Promise<Kept> {
    const settle = (picture: PreparedPicture, name: string) => this.keep(picture, name, false);
    const { taken, failed } = await takePictures({ ...this.dealings, files, onProgress, settle });
    this.changed();
    return { kept: taken, failed };
  }

  // bytes go over to the record before the op that names them, so that a kill between leaves no op without its bytes
  async attachKept(
    kept: KeptPicture[],
    about: PhotoAbout | ((picture: KeptPicture) => PhotoAbout),
    along: Holding[] = [],
  ): Promise<Op[]> {
    const { store, view, holdAll } = this.dealings;
    const fresh = kept.filter(({ photoId }) => !view().find('photo', photoId));
    const lost = fresh.find(({ sha256 }) => !store.queue.has(sha256));
    if (lost)
      throw new HoldError(`‘${lost.name}’ is no longer on this device. Take it out, or choose it again.`);
    const aboutOf = typeof about === 'function' ? about : () => about;
    await store.assign(fresh, 'record');
    try {
      return await holdAll([...along, ...fresh.map((picture) => attachOf(picture, aboutOf(picture)))]);
    } catch (error) {
      await store.assign(fresh, 'form');
      throw error;
    } finally {
      this.changed();
    }
  }

  async dropKept(kept: KeptPicture[]): Promise<void> {
    const { store, view } = this.dealings;
    const unlogged = kept.filter(({ photoId }) => !view().find('photo', photoId));
    await store.assign(unlogged, 'nothing');
    this.changed();
  }

  find(sha256: string, size: PictureSize): Promise<Blob | null> {
    return this.finder.find(sha256, size);
  }

  held(): HeldPicture[] {
    const { queue } = this.dealings.store;
    if (this.seen?.queue !== queue) this.seen = { queue, held: heldPictures(queue) };
    return this.seen!.held;
  }

  /** Sends what waits. Asks while another is under way wait for one more round together. */
  send(): Promise<NotSent> {
    if (!hasWaiting(this.dealings.store)) return (this.lastSend = Promise.resolve(null));
    this.queuedSend ??= this.sends.take(() => {
      this.queuedSend = null;
      return this.sendWaiting();
    });
    return (this.lastSend = this.queuedSend);
  }

  /** What comes of the sending that was last asked for. */
  sent(): Promise<NotSent> {
    return this.lastSend;
  }

  /** Tries again, when next sending, what the server has refused. */
  async retryRefused(): Promise<void> {
    for (const { sha256, state } of this.held()) {
      if (state === 'refused') await this.dealings.store.note(sha256, { refused: null });
    }
  }

  private async sendWaiting(): Promise<NotSent> {
    const { world, store, fetch } = this.dealings;
    const work = () => sendPictures({ world, store, fetch, onSent: () => this.changed() });
    this.isSending = true;
    this.dealings.onChange();
    try {
      // one tab at a time; the next finds nothing left to send
      const notSent = await (world.locks ? world.locks.request('ribband-pictures', work) : work());
      await store.trim(SHOWN_BYTES_MAX);
      return notSent;
    } finally {
      this.isSending = false;
      this.dealings.onChange();
    }
  }

  private async keep(picture: PreparedPicture, name: string, isAttached: boolean): Promise<KeptPicture> {
    const { store, newId, nowMs } = this.dealings;
    const { sha256, width, height, bytes, takenAt } = picture;
    const photoId = newId();
    await store.keep(picture, { photoId, isAttached, name, since: new Date(nowMs()).toISOString() });
    return { photoId, name, sha256, width, height, bytes, ...(takenAt ? { takenAt } : {}) };
  }

  private changed(): void {
    this.dealings.onChange();
    this.dealings.world.channel.post('pictures');
  }
}

function attachOf({ name: _name, ...picture }: KeptPicture, about: PhotoAbout): Holding {
  return { kind: 'photo.attach', data: { ...about, ...picture } };
}
