import { dayAt } from '#shared/sync/day.ts';
import type { Op } from '#shared/sync/op.ts';
import { composeOps, readHoldData, type HoldOptions, type OpDraft } from './compose-op.ts';
import { DeviceStore } from './device-store.ts';
import { HoldError } from './hold-error.ts';
import { idMaker } from './new-id.ts';
import { PersonStore, type Remembered } from './person-store.ts';
import { LivePhotos } from './photos/live-photos.ts';
import type { HeldPicture } from './photos/picture.ts';
import type { Holding, Replica, SentItem } from './replica.ts';
import { unsealed, type Seal } from './seal.ts';
import { LiveSession } from './session.ts';
import { composeSyncState, type Attempt } from './standing.ts';
import { Syncer } from './sync-once.ts';
import type { SyncResult, SyncState } from './sync-state.ts';
import { Turns } from './turns.ts';
import { makeView, type HeldItem, type Me, type View } from './view.ts';
import type { World } from './world.ts';

const NO_PICTURES: HeldPicture[] = [];
const NOTHING_REMEMBERED: Remembered = { boatId: null, stageId: null };

/** What a view says its time by, in milliseconds. */
const MINUTE_MS = 60_000;

/** What a view was made of; while all of it is the same, so is the view. The last two are its day and minute. */
type MadeOf = [Me, PersonStore['rows'], DeviceStore['outbox'], DeviceStore['sent'], string, number];

/** Opens the replica of whoever is signed in on this device, with signal or without. */
export async function openReplica(world: World, seal: Seal = unsealed): Promise<LiveReplica> {
  let now = world.now;
  const newId = idMaker(() => now(), world.randomBytes);
  const device = await DeviceStore.open(world, newId);
  now = () => device.nowMs();
  const replica = new LiveReplica(world, seal, device, newId);
  await replica.session.load();
  await replica.readStorage();
  return replica;
}

export class LiveReplica implements Replica {
  readonly session: LiveSession;
  readonly newId: () => string;
  private readonly world: World;
  private readonly seal: Seal;
  private readonly device: DeviceStore;
  private readonly syncer: Syncer;
  private readonly syncs = new Turns();
  private readonly listeners = new Set<() => void>();
  private readonly leaveChannel: () => void;
  private person: PersonStore | null = null;
  private photos: LivePhotos | null = null;
  private seen: { view: View; madeOf: MadeOf } | null = null;
  private queuedSync: Promise<SyncResult> | null = null;
  private attempt: Attempt = { phase: 'idle' };
  private storage: SyncState['storage'] = 'unknown';
  private isStorageAsked = false;
  private lastState: SyncState | null = null;

  constructor(world: World, seal: Seal, device: DeviceStore, newId: () => string) {
    this.world = world;
    this.seal = seal;
    this.device = device;
    this.newId = newId;
    this.session = new LiveSession({
      world,
      device,
      heldPhotos: () => this.heldPictures().length,
      prepare: (me) => this.prepare(me),
      onChange: () => this.changed(),
    });
    this.syncer = new Syncer({ world, device, fetchAs: (...request) => this.session.fetchAs(...request) });
    device.onNewRows = async () => this.person?.catchUp();
    this.leaveChannel = world.channel.listen((about) => void this.hearTab(about).catch(world.report));
  }

  close(): void {
    this.leaveChannel();
    this.device.close();
    this.person?.close();
  }

  readonly subscribe = (listener: () => void): (() => void) => {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  };

  readonly view = (): View => {
    const { device, person, session } = this;
    const me = session.current();
    if (!me || !person) throw new Error('Nobody is signed in.');
    const minute = Math.floor(device.nowMs() / MINUTE_MS);
    const madeOf: MadeOf = [me, person.rows, device.outbox, device.sent, this.today(), minute];
    if (!this.seen?.madeOf.every((part, index) => part === madeOf[index])) {
      this.seen = { view: this.makeView(me, person), madeOf };
    }
    return this.seen!.view;
  };

  private makeView(me: Me, person: PersonStore, further: HeldItem[] = []): View {
    const { device, session, world } = this;
    const held = device.outbox.map(({ op, heldSince }) => ({ op, personId: op.personId, heldSince }));
    return makeView({
      me,
      rows: person.rows,
      held: [...held, ...further],
      unheard: device.sent
        .filter(({ outcome, inRowsOf }) => outcome !== 'set-aside' && !inRowsOf.includes(person.personId))
        .map(({ op, orderedAt, answeredAt }) => ({ op, orderedAt, receivedAt: answeredAt })),
      rolesOnDevice: session.rolesOnDevice,
      nowMs: device.nowMs(),
      deviceTimeZone: world.timeZone,
    });
  }

  private viewWith(ops: Op[]): View {
    const heldSince = new Date(this.device.nowMs()).toISOString();
    const further = ops.map((op) => ({ op, personId: op.personId, heldSince }));
    return this.makeView(this.session.current()!, this.signedIn(), further);
  }

  async hold(kind: string, data: object, options: HoldOptions = {}): Promise<Op> {
    const [op] = await this.holdAll([{ kind, data, ...options }]);
    return op!;
  }

  readonly holdAll = async (holdings: Holding[]): Promise<Op[]> => {
    const me = this.session.current();
    if (!me) throw new HoldError('Nobody is signed in on this device.');
    if (holdings.length === 0) return [];
    const drafts = holdings.map((holding) => this.draftOf(holding));
    for (;;) {
      const ops = await this.device
        .hold((nextStamp) => {
          const viewWith = (before: Op[]) => this.viewWith(before);
          return composeOps(drafts, { personId: me.personId, nextStamp, view: this.view(), viewWith });
        })
        .catch(asHoldError);
      if (ops) {
        this.changed();
        this.world.channel.post('record');
        void this.askToKeep().catch(this.world.report);
        return ops;
      }
      await this.device.catchUp();
    }
  };

  private draftOf({ kind, data, ...options }: Holding): OpDraft {
    return { id: this.newId(), kind, data: readHoldData(data), options };
  }

  /** Asks while another is under way wait for one more round together. */
  readonly syncNow = (): Promise<SyncResult> => {
    this.queuedSync ??= this.syncs.take(() => {
      this.queuedSync = null;
      return this.sync();
    });
    return this.queuedSync;
  };

  readonly sendNow = async (): Promise<SyncResult> => {
    await this.photos?.retryRefused();
    const result = await this.syncNow();
    if (result.outcome !== 'done') return result;
    return (await this.photos?.sent()) ?? result;
  };

  private async sync(): Promise<SyncResult> {
    const { person, world } = this;
    if (!person) return { outcome: 'sign-in-needed' };
    this.tried({ phase: 'syncing' });
    const work = () => this.syncer.sync(person);
    try {
      const result = await (world.locks ? world.locks.request('ribband-sync', work) : work());
      this.tried(attemptFrom(result));
      // pictures are many times larger: ops never wait for them
      if (result.outcome === 'done') void this.photos?.send().catch(world.report);
      return result;
    } catch (error) {
      this.tried({
        phase: 'failed',
        words: 'Something went wrong on this device. What is held is untouched.',
      });
      throw error;
    } finally {
      world.channel.post('record');
    }
  }

  private tried(attempt: Attempt): void {
    this.attempt = attempt;
    this.changed();
  }

  readonly syncState = (): SyncState => {
    const { device, person, photos, session, attempt, storage } = this;
    const state = composeSyncState({
      device,
      person,
      heldPictures: photos?.held() ?? NO_PICTURES,
      isSendingPhotos: photos?.isSending ?? false,
      attempt,
      storage,
      needsSignIn: session.needsSignIn,
    });
    if (JSON.stringify(state) !== JSON.stringify(this.lastState)) this.lastState = state;
    return this.lastState!;
  };

  readonly sent = (): SentItem[] =>
    this.device.sent
      .map(({ op, outcome, reason, answeredAt }) => ({
        op,
        personId: op.personId,
        outcome,
        ...(reason ? { reason } : {}),
        answeredAt,
      }))
      .reverse();

  readonly attachPhotos: Replica['attachPhotos'] = (...args) => this.livePhotos().attach(...args);
  readonly keepPictures: Replica['keepPictures'] = (...args) => this.livePhotos().keepAll(...args);
  readonly attachKept: Replica['attachKept'] = (...args) => this.livePhotos().attachKept(...args);
  readonly dropKept: Replica['dropKept'] = (...args) => this.livePhotos().dropKept(...args);
  readonly picture: Replica['picture'] = (...args) => this.livePhotos().find(...args);
  readonly heldPictures: Replica['heldPictures'] = () => this.photos?.held() ?? NO_PICTURES;

  readonly draft: Replica['draft'] = {
    read: <T>(key: string) => this.person?.drafts.get(key) as T | undefined,
    write: async (key, value) => {
      await this.signedIn().writeDraft(key, value);
      this.world.channel.post('drafts');
    },
    clear: async (key) => {
      await this.signedIn().writeDraft(key, undefined);
      this.world.channel.post('drafts');
    },
  };

  readonly remember: Replica['remember'] = {
    read: () => this.person?.remembered ?? NOTHING_REMEMBERED,
    write: async (remembered) => this.signedIn().writeRemembered(remembered),
  };

  /** Tells those who listen where a new day has begun since the last view. */
  readonly noticeDay = (): void => {
    if (this.seen && this.seen.view.today !== this.today()) this.changed();
  };

  async readStorage(): Promise<void> {
    // a browser that does not answer this has not promised anything
    const isPersistent = await this.world.storage?.persisted().catch(() => false);
    if (isPersistent) this.storage = 'persistent';
  }

  private signedIn(): PersonStore {
    if (!this.person) throw new Error('Nobody is signed in.');
    return this.person;
  }

  private livePhotos(): LivePhotos {
    if (!this.photos) throw new Error('Nobody is signed in.');
    return this.photos;
  }

  private photosOf({ personId, pictures }: PersonStore): LivePhotos {
    return new LivePhotos({
      world: this.world,
      store: pictures,
      newId: this.newId,
      nowMs: () => this.device.nowMs(),
      view: this.view,
      holdAll: this.holdAll,
      fetch: (path, init) => this.session.fetchAs(personId, path, init),
      onChange: () => this.changed(),
    });
  }

  private today(): string {
    const shopZone = this.seen?.view.timeZone ?? this.world.timeZone;
    return dayAt(this.device.nowMs(), shopZone);
  }

  private changed(): void {
    for (const listener of [...this.listeners]) listener();
  }

  private async prepare(me: Me | null): Promise<() => void> {
    const before = this.person;
    if (me?.personId === before?.personId) return () => {};
    // the record does not stay behind for whoever picks the device up; what is held, and drafts, do
    if (!me) await before?.forgetRows();
    const next = me && (await PersonStore.open(this.world, this.seal, me.personId));
    return () => {
      this.person = next;
      this.photos = next && this.photosOf(next);
      this.attempt = { phase: 'idle' };
      before?.close();
    };
  }

  private async hearTab(about: string): Promise<void> {
    if (about === 'session') await this.session.load();
    else if (about === 'drafts') await this.person?.readDrafts();
    else if (about === 'pictures') await this.person?.pictures.read();
    else await this.device.catchUp();
    this.changed();
  }

  private async askToKeep(): Promise<void> {
    if (this.isStorageAsked || !this.world.storage) return;
    this.isStorageAsked = true;
    const isKept = await this.world.storage.persist().catch(() => false);
    this.storage = isKept ? 'persistent' : 'best-effort';
    this.changed();
  }
}

function attemptFrom(result: SyncResult): Attempt {
  if (result.outcome === 'failed') return { phase: 'failed', words: result.words };
  return { phase: result.outcome === 'offline' ? 'offline' : 'idle' };
}

function asHoldError(error: unknown): never {
  const isFull = error instanceof DOMException && error.name === 'QuotaExceededError';
  throw isFull
    ? new HoldError('This device has no room left, so this could not be kept. Free some room and try again.')
    : error;
}
