import type { z } from 'zod';
import type { Session } from './session.ts';

/** What came of asking the server for something that only it can do. */
export type Asked<T> = { ok: T } | { refused: string } | { offline: true };

interface Question {
  method: 'GET' | 'POST' | 'PATCH' | 'PUT';
  body?: unknown;
}

interface Refusal {
  detail?: string;
  issues?: { path: string; message: string }[];
}

/** Asks the server as the person signed in, and reads its answer by `schema`. Throws where the answer is not what was agreed. */
export async function ask<T>(
  session: Session,
  path: string,
  { method, body }: Question,
  schema: z.ZodType<T>,
): Promise<Asked<T>> {
  let response: Response;
  try {
    const json =
      body === undefined
        ? {}
        : { headers: { 'Content-Type': 'application/json' }, body: JSON.stringify(body) };
    response = await session.fetchAsMe(path, { method, ...json });
  } catch (error) {
    if (error instanceof TypeError) return { offline: true };
    throw error;
  }
  if (response.ok) return { ok: schema.parse(await response.json()) };
  return { refused: await refusalWords(response) };
}

async function refusalWords(response: Response): Promise<string> {
  if (response.status >= 500) return 'The server could not do it just now. Nothing has changed; try again.';
  const refusal = await response.json().then(
    (read) => read as Refusal,
    () => ({}) as Refusal,
  );
  const issues = (refusal.issues ?? []).map(({ path, message }) => `${path}: ${message}`);
  return [refusal.detail ?? `The server refused it (${response.status}).`, ...issues].join(' ');
}
