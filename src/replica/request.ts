import { z } from 'zod';
import type { World } from './world.ts';

/** A network that wants something first, as in an inn, answers everything with a page of its own. */
export const NOT_OURS = 'The network answered in place of the server.';

/** The server, or the way to it, took longer than a request may. */
export class TimedOut extends Error {
  override readonly name = 'TimedOut';
}

/** Runs `work` with a signal that is given up after `ms`; rejects with TimedOut then. */
export async function inTime<T>(
  world: Pick<World, 'after'>,
  ms: number,
  work: (signal: AbortSignal) => Promise<T>,
): Promise<T> {
  const controller = new AbortController();
  let giveUp = () => {};
  const late = new Promise<never>((_resolve, reject) => {
    giveUp = world.after(ms, () => {
      reject(new TimedOut(`No answer within ${ms / 1000} seconds.`));
      controller.abort();
    });
  });
  try {
    return await Promise.race([work(controller.signal), late]);
  } finally {
    giveUp();
  }
}

/** Whether the server could not be reached at all, which `fetch` tells by a TypeError. */
export function isUnreachable(error: unknown): boolean {
  return error instanceof TypeError || error instanceof TimedOut;
}

const problemSchema = z.object({ detail: z.string().optional(), title: z.string().optional() });

/** What a problem answer (RFC 9457) says, in words. */
export async function wordsOf(response: Response): Promise<string> {
  const read = problemSchema.safeParse(await readJson(response));
  return read.data?.detail ?? read.data?.title ?? `The server answered ${response.status}.`;
}

/** The JSON of an answer, or null where it is none. Rejects where the answer breaks off. */
export async function readJson(response: Response): Promise<unknown> {
  try {
    return JSON.parse(await response.text()) as unknown;
  } catch (error) {
    if (error instanceof SyntaxError) return null;
    throw error;
  }
}

export function asJson(body: object): RequestInit {
  return { method: 'POST', headers: { 'Content-Type': 'application/json' }, body: JSON.stringify(body) };
}
