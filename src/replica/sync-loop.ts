import { backOffMs, hearHails } from './hails.ts';
import type { LiveReplica } from './live-replica.ts';
import type { World } from './world.ts';

/** How long after a round that went well the next is due, whatever happens, in milliseconds. */
const ROUND_EVERY_MS = 60_000;
/** A stream that lasted this long was no failure, in milliseconds. */
const STREAM_LASTED_MS = 10_000;

/**
 * Keeps the device in step: a round at each thing held, at regained signal and focus, at a hail, and by its own timer
 * however sure the browser is of being online. One tab at a time listens for hails. Returns what ends it.
 */
export function startSyncLoop(replica: LiveReplica, world: World): () => void {
  const loop = new SyncLoop(replica, world);
  loop.start();
  return () => loop.stop();
}

class SyncLoop {
  private readonly replica: LiveReplica;
  private readonly world: World;
  private readonly ending = new AbortController();
  private readonly leaving: (() => void)[] = [];
  private failures = 0;
  private cancelTimer = () => {};
  private lastSeen = { personId: '', heldOps: 0, needsSignIn: false };

  constructor(replica: LiveReplica, world: World) {
    this.replica = replica;
    this.world = world;
  }

  start(): void {
    this.leaving.push(
      this.world.onWake(() => {
        this.replica.noticeDay();
        this.round();
      }),
      this.replica.subscribe(() => this.notice()),
    );
    this.notice();
    void this.listenForHails();
  }

  stop(): void {
    this.ending.abort();
    this.cancelTimer();
    for (const leave of this.leaving) leave();
  }

  /** A round where something new is held, or somebody has come. */
  private notice(): void {
    const before = this.lastSeen;
    const { needsSignIn } = this.replica.session;
    const { heldOps } = this.replica.syncState();
    const personId = this.replica.session.current()?.personId ?? '';
    this.lastSeen = { personId, heldOps, needsSignIn };
    const hasCome = personId !== '' && (personId !== before.personId || (before.needsSignIn && !needsSignIn));
    if (hasCome || heldOps > before.heldOps) this.round();
  }

  private round(): void {
    this.cancelTimer();
    // the next sign-in begins again
    if (this.ending.signal.aborted || this.replica.session.needsSignIn) return;
    const settle = (isDone: boolean) => {
      this.failures = isDone ? 0 : this.failures + 1;
      this.waitFor(
        isDone ? ROUND_EVERY_MS * (0.75 + this.world.random() / 2) : backOffMs(this.failures, this.world),
      );
    };
    this.replica.syncNow().then(
      ({ outcome }) => outcome !== 'sign-in-needed' && settle(outcome === 'done'),
      (error: unknown) => {
        settle(false);
        this.world.report(error);
      },
    );
  }

  private waitFor(ms: number): void {
    this.cancelTimer();
    this.cancelTimer = this.world.after(ms, () => {
      this.replica.noticeDay();
      this.round();
    });
  }

  private async listenForHails(): Promise<void> {
    const listen = async () => {
      for (let tries = 0; !this.ending.signal.aborted;) {
        const beganMs = this.world.now();
        await this.hearOnce();
        tries = this.world.now() - beganMs > STREAM_LASTED_MS ? 1 : tries + 1;
        await this.pause(backOffMs(tries, this.world));
      }
    };
    // held for as long as this tab lives; the browser passes it on when it is gone
    await (this.world.locks ? this.world.locks.request('ribband-hails', listen) : listen());
  }

  private async hearOnce(): Promise<void> {
    const { session } = this.replica;
    if (!session.current() || session.needsSignIn) return;
    await hearHails(session.fetchAsMe, () => this.round(), this.ending.signal);
  }

  private pause(ms: number): Promise<void> {
    return new Promise((resolve) => {
      if (this.ending.signal.aborted) return resolve();
      const cancel = this.world.after(ms, resolve);
      this.ending.signal.addEventListener('abort', () => {
        cancel();
        resolve();
      });
    });
  }
}
