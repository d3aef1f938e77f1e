import express, { type Express, type RequestHandler } from 'express';
import { pino } from 'pino';
import { listen, type Listening } from '#server/main.ts';
import { jsonBody } from '#server/middleware/json-body.ts';
import { requestLog } from '#server/middleware/request-log.ts';
import { compressed, securityHeaders } from '#server/middleware/security.ts';
import { SYNC_BODY_BYTES_MAX, syncRequestSchema, type SyncAnswer } from '#shared/sync/protocol.ts';
import type { Sender } from '#tests/worlds/sender.ts';
import { startServer } from '#tests/worlds/server.ts';
import { bodyOf, entryOps, makeCrew, postSync, type Crew } from './crew.ts';
import { timed, type Finding, type Pair } from './measuring.ts';
import { answerIn, post, type Came } from './wire.ts';

const ROWS = 4000;
const PAGE_ROWS = 1000;
const OPS_A_BATCH = 400;
const WARM_UPS = 10;
const ROUNDS = 40;
const GOAL = 1.25;

/** One page: how it is asked for, and what came. */
interface PageAsked {
  body: Buffer;
  answer: SyncAnswer;
}

/** A fresh pull of 4,000 rows, against the same objects written as JSON and zipped by the same Express, from memory. */
export async function benchPull(): Promise<Finding> {
  const server = await startServer();
  try {
    const crew = await makeCrew(server, ['crew']);
    await fill(crew);
    const pages = await pullPages(crew, crew.foreman);
    return await comparePulls(crew, pages);
  } finally {
    await server.close();
  }
}

async function comparePulls(crew: Crew, pages: PageAsked[]): Promise<Finding> {
  const memory = await serveFromMemory(pages.map(({ answer }) => answer));
  const pairs: Pair[] = [];
  for (let round = 0; round < WARM_UPS + ROUNDS; round += 1) {
    const oursMs = await timed(() => pullThrough(pages, (body) => postSync(crew, crew.foreman, body)));
    const bareMs = await timed(() => pullThrough(pages, (body, page) => post(`${memory.url}/api/sync/${page}`, 'any', body)));
    pairs.push({ oursMs, bareMs });
  }
  await memory.close();
  return { what: `fresh pull of ${ROWS} rows, ${PAGE_ROWS} a page`, pairs: pairs.slice(WARM_UPS), goal: GOAL };
}

async function fill(crew: Crew): Promise<void> {
  for (const hand of crew.hands) await hand.send(...entryOps(hand, crew, OPS_A_BATCH));
}

// the bodies of a pull are known once it has been done: the cursors are the same each time
async function pullPages(crew: Crew, reader: Sender): Promise<PageAsked[]> {
  const pages: PageAsked[] = [];
  let cursor: string | null = null;
  for (let rows = 0; rows < ROWS; rows += PAGE_ROWS) {
    const body = bodyOf(crew, reader, { cursor, limit: PAGE_ROWS });
    const answer = answerIn(await postSync(crew, reader, body));
    if (answer.rows.length !== PAGE_ROWS) throw new Error(`A page had ${answer.rows.length} rows.`);
    pages.push({ body, answer });
    cursor = answer.cursor;
  }
  return pages;
}

async function pullThrough(pages: PageAsked[], ask: (body: Buffer, page: number) => Promise<Came>): Promise<void> {
  for (const [page, { body }] of pages.entries()) await ask(body, page);
}

/** The server's own middleware before an answer that is in memory: all that a pull costs but the pull. */
function serveFromMemory(answers: SyncAnswer[]): Promise<Listening> {
  const app: Express = express();
  app.use(requestLog(pino({ level: 'silent' })), ...securityHeaders, compressed);
  const answer: RequestHandler<{ page: string }> = (request, response) => {
    syncRequestSchema.parse(request.body);
    response.set('Cache-Control', 'no-store').type('json').end(JSON.stringify(answers[Number(request.params.page)]));
  };
  app.post('/api/sync/:page', jsonBody(SYNC_BODY_BYTES_MAX) as RequestHandler<{ page: string }>, answer);
  return listen(app, 0, '127.0.0.1');
}
