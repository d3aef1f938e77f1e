import { useMutation } from '@tanstack/react-query';
import type { z } from 'zod';
import { ask, type Asked } from './ask.ts';
import { useReplica } from './hooks.tsx';

interface Request {
  path: string;
  method: 'POST' | 'PATCH' | 'PUT';
  body?: unknown;
}

/** Asks the server for a change that needs signal; what came of it is heard at once where it was done. */
export function useAsk<T>(schema: z.ZodType<T>) {
  const replica = useReplica();
  return useMutation({
    mutationFn: async ({ path, ...question }: Request): Promise<Asked<T>> => {
      const asked = await ask(replica.session, path, question, schema);
      if ('ok' in asked) await replica.syncNow();
      return asked;
    },
    // without signal the answer is that there is none, not a wait
    networkMode: 'always',
    retry: false,
  });
}

/** What to tell the person; undefined where it was done, or not asked yet. */
export function askedWords(asked: Asked<unknown> | undefined): string | undefined {
  if (!asked || 'ok' in asked) return undefined;
  return 'offline' in asked
    ? 'This needs signal, and there is none here. Try again when there is.'
    : asked.refused;
}
