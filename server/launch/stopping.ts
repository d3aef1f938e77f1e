import { stopCommands } from './command.ts';

const PARENT_LOOK_MS = 1000;

type Step = () => Promise<void>;

export type Stopping = {
  /** what a stop must undo; the last added is undone first */
  before: (step: Step) => void;
  /** true once a stop was asked for */
  isUnderWay: () => boolean;
  stop: (code: number) => Promise<never>;
};

/** Ends the process in good order at SIGTERM, SIGINT, SIGHUP, or when the npm that started it is gone. */
export function orderlyStop(): Stopping {
  const steps: Step[] = [];
  let ending: Promise<never> | null = null;

  const stop = (code: number) => (ending ??= undo(steps).then((isClean) => process.exit(isClean ? code : 1)));
  for (const signal of ['SIGTERM', 'SIGINT', 'SIGHUP'] as const) process.on(signal, () => void stop(0));
  watchParent(() => void stop(0));
  return { before: (step) => steps.push(step), isUnderWay: () => ending !== null, stop };
}

async function undo(steps: Step[]): Promise<boolean> {
  await stopCommands();
  let isClean = true;
  for (const step of steps.toReversed()) {
    await step().catch((error: unknown) => {
      isClean = false;
      console.error(error);
    });
  }
  return isClean;
}

// npm that is killed hard tells nobody; without this the server would go on behind the person's back
function watchParent(whenGone: () => void): void {
  const parent = process.ppid;
  if (process.env.npm_lifecycle_event !== 'start' || parent === 1) return;
  setInterval(() => {
    if (process.ppid !== parent) whenGone();
  }, PARENT_LOOK_MS).unref();
}
