import type { Channel, Locks } from '#src/replica/world.ts';
import { PowerCut, type Power } from './power.ts';

/** The tabs of one browser: what one posts, the others hear, in a task of their own. */
export class TabChannels {
  private readonly tabs = new Set<Set<(message: string) => void>>();

  join(power: Power): Channel {
    const own = new Set<(message: string) => void>();
    this.tabs.add(own);
    power.atCut(() => this.tabs.delete(own));
    return {
      post: (message) => {
        const others = [...this.tabs].filter((tab) => tab !== own);
        for (const tab of others)
          setImmediate(() => this.tabs.has(tab) && tab.forEach((listener) => listener(message)));
      },
      listen(listener) {
        own.add(listener);
        return () => own.delete(listener);
      },
    };
  }
}

/** The locks of one browser; a tab that has no power holds none. */
export class TabLocks {
  private readonly queues = new Map<string, Promise<void>>();

  join(power: Power): Locks {
    return {
      request: async <T>(name: string, work: () => Promise<T>): Promise<T> => {
        const before = this.queues.get(name) ?? Promise.resolve();
        let release = () => {};
        this.queues.set(
          name,
          before.then(() => new Promise<void>((resolve) => (release = resolve))),
        );
        await before;
        if (!power.isOn) {
          release();
          throw new PowerCut();
        }
        const forget = power.atCut(() => release());
        try {
          return await work();
        } finally {
          forget();
          release();
        }
      },
    };
  }
}
