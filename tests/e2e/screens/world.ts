import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { chromium, type Browser, type Page } from 'playwright-core';
import { v7 } from 'uuid';
import { DEMO_PASSWORD, DEMO_PEOPLE, type PersonKey } from '#server/demo/demo-people.ts';
import { DEMO_SHOP_ID, seedDemo } from '#server/demo/seed.ts';
import { sessionAnswerSchema } from '#shared/identity/session.ts';
import { dayAt } from '#shared/sync/day.ts';
import { syncAnswerSchema } from '#shared/sync/protocol.ts';
import { formatStamp } from '#shared/sync/stamp.ts';
import { buildSite } from '#tests/e2e/build-site.ts';
import { CHROMIUM_FLAGS, CHROMIUM_PATH, SIZES } from '#tests/e2e/gallery/open-gallery.ts';
import { startServer, type TestServer } from '#tests/worlds/server.ts';

const ZONE = 'UTC';
const realClock = { now: Date.now, set: () => {}, advance: () => {} };

/** Rows of the demo shop that screens are opened on. */
export interface Known {
  boatId: string;
  entryId: string;
  findingId: string;
  soundId: string;
  photoId: string;
}

/** The product's build over the real server with the demo shop in it, and a browser. */
export interface ScreensWorld {
  server: TestServer;
  browser: Browser;
  known: Known;
  /** A page of that person's, signed in on a device of their own, with the record there. */
  signIn: (who: PersonKey) => Promise<Page>;
  close: () => Promise<void>;
}

export async function openScreensWorld(): Promise<ScreensWorld> {
  const outDir = await mkdtemp(join(tmpdir(), 'screens-'));
  await buildSite(outDir);
  const server = await startServer({ clock: realClock, distDir: outDir });
  await seedDemo(server.database, Date.now(), ZONE);
  const known = await noteOnPenny(server);
  const browser = await chromium.launch({ executablePath: CHROMIUM_PATH, args: CHROMIUM_FLAGS });
  return {
    server,
    browser,
    known,
    signIn: (who) => signIn(browser, server.url, who),
    async close() {
      await browser.close();
      await server.close();
      await rm(outDir, { recursive: true });
    },
  };
}

async function signIn(browser: Browser, url: string, who: PersonKey): Promise<Page> {
  const context = await browser.newContext({ viewport: SIZES.desk, baseURL: url });
  const page = await context.newPage();
  await page.goto('/sign-in');
  await page.getByLabel('E-mail').fill(DEMO_PEOPLE[who].email);
  await page.getByLabel('Password', { exact: true }).fill(DEMO_PASSWORD);
  await page.getByRole('button', { name: 'Sign in' }).click();
  const shops = page.getByRole('group', { name: /shop/i });
  const goOn = page.getByRole('button', { name: 'Go on' });
  await goOn
    .or(shops)
    .or(page.getByText(/^All sent/))
    .first()
    .waitFor();
  if (await goOn.isVisible()) await goOn.click();
  await page
    .getByText(/^All sent/)
    .first()
    .waitFor();
  await page.waitForFunction(() => navigator.serviceWorker.controller?.state === 'activated');
  return page;
}

/** What Wes logs and notes today on Penny Candle: one of everything that has a page of its own. */
async function noteOnPenny(server: TestServer): Promise<Known> {
  const deviceId = v7();
  const session = sessionAnswerSchema.parse(
    await post(server, '/api/session', {
      email: DEMO_PEOPLE.wes.email,
      password: DEMO_PASSWORD,
      shopId: DEMO_SHOP_ID,
      device: { id: deviceId, label: 'Wes, spare' },
    }),
  );
  const personId = session.person.id;
  const boat = await server.database.inShop(DEMO_SHOP_ID, (transaction) =>
    server.database.models.Boat.findOne({
      where: { shopId: DEMO_SHOP_ID, name: 'Penny Candle' },
      transaction,
      rejectOnEmpty: true,
    }),
  );
  const known = { boatId: boat.id, entryId: v7(), findingId: v7(), soundId: v7(), photoId: v7() };
  const { boatId, entryId, findingId } = known;
  const ms = Date.now();
  const ops = [
    [
      'entry.write',
      {
        entryId,
        boatId,
        workDate: dayAt(ms, ZONE),
        text: 'Starboard sole panels up. Then an hour with Rosa, clearing the bench.',
        spoken: false,
        hours: [{ personId, minutes: 210 }],
      },
    ],
    [
      'finding.note',
      {
        findingId,
        boatId,
        entryId,
        kind: 'rot',
        place: { partId: 'floor', number: 7, side: 'starboard' },
        known: 'opened',
        certainty: 'proved',
        seenExtent: { lengthMm: 152, depthMm: 25 },
        text: 'Soft right through.',
      },
    ],
    [
      'sound.note',
      {
        soundId: known.soundId,
        boatId,
        entryId,
        place: { partId: 'stringer', side: 'starboard' },
        known: 'probed',
        about: 'rot',
        text: 'Every two inches.',
      },
    ],
    [
      'photo.attach',
      {
        photoId: known.photoId,
        sha256: 'b'.repeat(64),
        boatId,
        entryId,
        findingId,
        width: 800,
        height: 600,
        bytes: 999,
        caption: 'Floor 7, from aft',
      },
    ],
  ].map(([kind, data], counter) => ({
    id: v7(),
    v: 1,
    kind,
    at: formatStamp({ ms, counter }, deviceId),
    personId,
    over: {},
    data,
  }));
  const answer = syncAnswerSchema.parse(
    await post(server, '/api/sync', { deviceId, cursor: null, ops, limit: 1 }, session.accessToken),
  );
  const refused = answer.outcomes.filter(({ outcome }) => outcome !== 'kept');
  if (refused.length > 0) throw new Error(`refused: ${JSON.stringify(refused)}`);
  return known;
}

async function post(server: TestServer, path: string, body: object, token?: string): Promise<unknown> {
  const headers = new Headers({ 'Content-Type': 'application/json' });
  if (token) headers.set('Authorization', `Bearer ${token}`);
  const response = await fetch(server.url + path, { method: 'POST', headers, body: JSON.stringify(body) });
  if (!response.ok) throw new Error(`${path} answered ${response.status}: ${await response.text()}`);
  return response.json();
}
