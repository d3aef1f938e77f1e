/** What was running has ended, as when a phone dies or a tab is shut: nobody hears of this. */
export class PowerCut extends Error {}

/**
 * The power of a tab. It can be cut at any of the points that its code passes: before a transaction or a request, and
 * after it is done but before the code has heard so. Nothing after that has any effect.
 */
export class Power {
  isOn = true;
  readonly off: Promise<void>;
  private pointsLeft = Infinity;
  private readonly cleanups = new Set<() => void>();
  private tellOff!: () => void;

  constructor() {
    this.off = new Promise((resolve) => (this.tellOff = resolve));
  }

  /** Cuts the power once `points` more points have been passed. */
  cutAfter(points: number): void {
    this.pointsLeft = points;
  }

  disarm(): void {
    this.pointsLeft = Infinity;
  }

  /** Passes a point; answers whether there is still power. */
  pass(): boolean {
    if (this.isOn && this.pointsLeft-- <= 0) this.cut();
    return this.isOn;
  }

  cut(): void {
    if (!this.isOn) return;
    this.isOn = false;
    for (const cleanup of [...this.cleanups]) cleanup();
    this.tellOff();
  }

  /** Has `cleanup` called at a cut, unless what is returned is called before. */
  atCut(cleanup: () => void): () => void {
    this.cleanups.add(cleanup);
    return () => this.cleanups.delete(cleanup);
  }
}

/** An IDBFactory whose transactions end unfinished, and whose connections are gone, when the power is cut. */
export function poweredIndexedDB(factory: IDBFactory, power: Power): IDBFactory {
  const open = (...args: Parameters<IDBFactory['open']>): IDBOpenDBRequest => {
    const request = factory.open(...args);
    request.addEventListener('success', (event) => {
      if (power.pass()) return plugIn(request.result, power);
      event.stopImmediatePropagation();
      request.result.close();
    });
    return request;
  };
  return { open } as IDBFactory;
}

function plugIn(database: IDBDatabase, power: Power): void {
  const begin = database.transaction.bind(database);
  power.atCut(() => database.close());
  database.transaction = (...args: Parameters<IDBDatabase['transaction']>) => {
    if (!power.pass()) throw new PowerCut();
    const transaction = begin(...args);
    const forget = power.atCut(() => abort(transaction));
    transaction.addEventListener('complete', (event) => {
      forget();
      if (!power.pass()) event.stopImmediatePropagation();
    });
    transaction.addEventListener('abort', (event) => {
      forget();
      if (!power.isOn) event.stopImmediatePropagation();
    });
    return transaction;
  };
}

function abort(transaction: IDBTransaction): void {
  try {
    transaction.abort();
  } catch {
    // it is being committed: it counts, and nobody hears of it
  }
}
