import type { Reason } from '#shared/sync/op.ts';

/** Why something was set aside, and what can be done, in one sentence. */
export const REASON_WORDS: Record<Reason, string> = {
  malformed: 'The server could not read it. Show it to the foreman.',
  'not-understood':
    'The server does not know this kind of thing yet. It counts as soon as the server is renewed.',
  'id-reused': 'Something else was already kept under the same mark. Log it again.',
  'not-entitled': 'It is not yours to change. The foreman can admit it or dismiss it.',
  'no-such-row': 'What it is about has not come to the server yet. It counts as soon as that is there.',
  'device-revoked': 'This device was shut out before it was sent. The foreman can admit it or dismiss it.',
  'server-fault': 'The server made a mistake with it. It will be tried again.',
};
