import type { Outcome } from '#shared/sync/merge.ts';
import type { SyncAnswer } from '#shared/sync/protocol.ts';
import type { Page } from './pull.ts';

/** The answer to a sync as JSON text, into which the rows' text is put as it is kept. */
export function answerText(outcomes: Outcome[], { rows, ...page }: Page, nowMs: number): string {
  const rest: Omit<SyncAnswer, 'outcomes' | 'rows'> = { ...page, backedUpTo: null, serverTime: new Date(nowMs).toISOString() };
  return `{"outcomes":${JSON.stringify(outcomes)},"rows":[${rows.join(',')}],${JSON.stringify(rest).slice(1)}`;
}
