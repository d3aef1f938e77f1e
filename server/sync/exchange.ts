import type { Outcome } from '#shared/sync/merge.ts';
import { ROWS_PER_ANSWER_MAX, type SyncRequest } from '#shared/sync/protocol.ts';
import type { Session } from '#server/middleware/session.ts';
import type { Parts } from '#server/parts.ts';
import { answerText } from './answer.ts';
import { pull, type Page } from './pull.ts';
import { receive } from './receive.ts';

/** Takes in what a device sends and tells it what is new: the answer as JSON text, of what has been committed. */
export async function exchange(parts: Parts, session: Session, request: SyncRequest): Promise<string> {
  const nowMs = parts.now();
  const takeIn = () => receiveAndHail(parts, session, request, nowMs);
  const tell = () => (session.isRevoked ? nothingFrom(request.cursor) : pullFor(parts, session, request));
  // what was sent is among what is told; where nothing was sent, neither has to wait for the other
  const isPullOnly = request.ops.length === 0;
  const [outcomes, page] = isPullOnly ? await Promise.all([takeIn(), tell()]) : [await takeIn(), await tell()];
  return answerText(outcomes, page, nowMs);
}

async function receiveAndHail(parts: Parts, session: Session, { ops, held, appVersion }: SyncRequest, nowMs: number): Promise<Outcome[]> {
  const { outcomes, seq } = await receive(parts, session, ops, { held, appVersion, nowMs });
  if (seq !== null) parts.onChanged(session.shopId, seq);
  return outcomes;
}

function pullFor({ database }: Parts, { shopId, personId }: Session, { cursor, limit = ROWS_PER_ANSWER_MAX }: SyncRequest): Promise<Page> {
  return pull(database, shopId, personId, cursor, limit);
}

/** A revoked device is told nothing. */
function nothingFrom(cursor: string | null): Page {
  return { rows: [], cursor: cursor ?? '', more: false, reset: false, replayFrom: null };
}
