import type { Locator, Page } from 'playwright-core';
import { CPU_SLOWED, type BenchPhone } from './bench-phone.ts';
import type { Figure } from './measuring.ts';

const ROUNDS = 3;
const GOAL_MS = 200;
const WORDS = 'Rib nine fitted dry';
/** The shortest event that a browser tells of, in milliseconds. */
const EVENT_MIN_MS = 16;

declare global {
  interface Window {
    /** durations of what was tapped and typed since they were last taken, in milliseconds from event to next frame */
    eventsMs?: number[];
  }
}

export interface InpFindings {
  /** the longest event of each round */
  figure: Figure;
  /** by step: its longest event in each round, in milliseconds; 0 where none took 16 ms */
  steps: Map<string, number[]>;
}

/** A fixed series of taps and typing on Alongside, by what each is called. */
function seriesOn(page: Page): [step: string, act: () => Promise<void>][] {
  const tap = (target: Locator) => () => target.tap();
  const button = (name: string | RegExp) => page.getByRole('button', { name });
  return [
    ['open the form', tap(page.getByRole('link', { name: 'Log it' }))],
    ['into the words', tap(page.getByLabel('What did you do?'))],
    ['type', () => page.keyboard.type(WORDS, { delay: 80 })],
    ['hours: two', tap(page.getByRole('group', { name: 'Your hours' }).getByRole('button', { name: /^2/ }))],
    ['hours: a quarter more', tap(button('A quarter hour more').first())],
    ['back', tap(page.getByRole('link', { name: /^Back to Alongside/ }))],
    ['open the form again', tap(page.getByRole('link', { name: 'Go on' }))],
    ['log it', tap(button('Log it'))],
    ['open the tasks', tap(page.getByRole('link', { name: 'Tick off' }))],
    ['tick off', tap(button(/^Tick off:/).first())],
    ['take it back', tap(button('Undo'))],
    ['back from the tasks', tap(page.getByRole('link', { name: 'Back to Alongside' }))],
  ];
}

/** How long the phone takes to show that it was tapped, step by step. */
export async function benchInp(phone: BenchPhone): Promise<InpFindings> {
  const steps = new Map<string, number[]>();
  await phone.withPage(async (page) => {
    await page.addInitScript(listenToEvents, EVENT_MIN_MS);
    await page.goto('/alongside');
    await page.locator('a[href^="/entry/"]').first().waitFor();
    for (let round = 0; round < ROUNDS; round += 1) {
      for (const [step, act] of seriesOn(page)) {
        await act();
        steps.set(step, [...(steps.get(step) ?? []), Math.max(0, ...(await takeEvents(page)))]);
      }
    }
  });
  const rounds = Array.from({ length: ROUNDS }, (_none, round) => Math.max(...[...steps.values()].map((each) => each[round]!)));
  const what = `longest event of a round of taps on Alongside, ${CPU_SLOWED} times slower`;
  return { figure: { what, unit: 'ms', values: rounds, goal: GOAL_MS }, steps };
}

function listenToEvents(durationThreshold: number): void {
  const eventsMs: number[] = [];
  window.eventsMs = eventsMs;
  new PerformanceObserver((list) => {
    const events = list.getEntries() as (PerformanceEntry & { interactionId: number })[];
    eventsMs.push(...events.filter(({ interactionId }) => interactionId > 0).map(({ duration }) => duration));
  }).observe({ type: 'event', durationThreshold } as PerformanceObserverInit);
}

// An event is told of once the frame after it has been shown, and the observer's turn has come after that. No function
// within has a name: the loader of TypeScript would mark it by one of its own, which the page does not have.
function takeEvents(page: Page): Promise<number[]> {
  return page.evaluate(
    () =>
      new Promise<number[]>((resolve) => {
        requestAnimationFrame(() =>
          requestAnimationFrame(() => requestIdleCallback(() => resolve(window.eventsMs!.splice(0)))),
        );
      }),
  );
}
