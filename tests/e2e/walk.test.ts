import { afterAll, beforeAll, describe, expect, test } from 'vitest';
import { freePort } from '#server/launch/free-port.ts';
import { Laptop } from '#tests/e2e/people/laptop.ts';
import { Phone } from '#tests/e2e/people/phone.ts';
import { readRecord, type ShopRecord } from '#tests/e2e/people/record.ts';
import { launch, makeDataFolder, type DataFolder, type Launched } from '#tests/worlds/launched.ts';

// Goal: what two people say without signal comes together into one record, whatever dies on the way.
// Method: the real `npm start` on a fresh folder, two phones and a laptop, each a browser process of its own behind a line
// of its own. The steps are one story: each goes on where the one before it ended.

const HERE = { boat: 'Penny Candle', stage: 'Framing and backbone repair' };
const TASK = 'Steam two new ribs, 11 and 12';
const PRIMER = 'First coat of primer frames 4 to 7';
const ROSA_DAY = { words: 'Rib 11 went in soft as rope, Wes on the far end', hours: '3 1/2', along: ['Wes'] };
const WES_DAY = { words: 'Cut and planed the blank for rib 12', hours: '2' };
const ROSA = { name: 'Rosa', email: 'rosa@hornbeam.example' };
const ALIVE_WITHIN_MS = 2000;
// by then they have tried in vain a few times, and each wait is up to twice the one before
const BACK_OFF_MAX_MS = 60_000;
// the first start builds the front end and makes the demo shop with its pictures
const FIRST_START_MAX_MS = 300_000;
const YEAR_MS = 365 * 24 * 60 * 60_000;
const LATER_MS = 10_000;

let folder: DataFolder;
let port: number;
let server: Launched;
let rosa: Phone;
let wes: Phone;
let laptop: Laptop;
let atFirst: ShopRecord;

beforeAll(async () => {
  folder = await makeDataFolder();
  port = await freePort();
  await startServer();
  [rosa, wes, laptop] = await Promise.all([
    Phone.unpack({ ...ROSA, label: "Rosa's new phone" }, server.url),
    Phone.unpack({ name: 'Wes', email: 'wes@hornbeam.example', label: "Wes's new phone" }, server.url),
    Laptop.unpack({ name: 'Orrin', email: 'orrin@hornbeam.example', label: 'Shop laptop' }, server.url),
  ]);
  atFirst = await readRecord(server.url);
}, FIRST_START_MAX_MS);

afterAll(async () => {
  await Promise.all([rosa, wes, laptop].map((each) => each?.device.putAway()));
  server?.kill('SIGTERM');
  await server?.exited;
  await folder.remove();
});

async function startServer(): Promise<void> {
  server = await launch(folder.path, { PORT: String(port) });
}

async function killServer(): Promise<void> {
  process.kill(await server.serverPid(), 'SIGKILL');
  await server.exited;
}

/** How long after `from` something was to be seen, in milliseconds. */
async function seenAfter(from: Promise<number>, seen: Promise<void>): Promise<number> {
  const [seenMs, fromMs] = await Promise.all([seen.then(() => performance.now()), from]);
  return seenMs - fromMs;
}

const entriesOf = (record: ShopRecord, words: string) =>
  record.entries.filter(({ text }) => text.startsWith(words));
const endsOf = (record: ShopRecord, words: string) => {
  const ids = entriesOf(record, words).map(({ id }) => id);
  return record.looseEnds.filter(({ rowId }) => ids.includes(rowId));
};
const newSetAsides = (record: ShopRecord) => record.setAsides.length - atFirst.setAsides.length;

describe('the walk', () => {
  test('1: who is signed in opens the app without signal, at any address', async () => {
    await Promise.all([rosa.device.signsIn(), wes.device.signsIn(), laptop.device.signsIn()]);
    await Promise.all([rosa.says(/^All sent/), wes.says(/^All sent/)]);
    await laptop.page.getByRole('heading', { name: 'Loose ends' }).waitFor();
    await laptop.device.picture('day-sheet-at-first', true);
    for (const phone of [rosa, wes]) {
      await phone.device.losesSignal();
      await phone.page.reload();
      await phone.page.getByRole('heading', { level: 1, name: HERE.boat }).waitFor();
      await phone.says('No signal, nothing held');
      await phone.device.picture('alongside-offline');
      await phone.opensEntry(PRIMER);
      await phone.device.startsAgain(new URL(phone.page.url()).pathname);
      await phone.page.getByRole('heading', { name: 'History' }).waitFor();
      await phone.device.picture('entry-offline', true);
    }
  });

  test('2: two log, tick and correct without signal; a phone that dies right after has it all', async () => {
    await rosa.goesAlongside(HERE);
    await rosa.logs(ROSA_DAY);
    await rosa.says('1 held on this phone');
    await rosa.device.picture('logged');

    await wes.goesAlongside(HERE);
    await wes.logs(WES_DAY);
    await wes.device.dies();
    await wes.device.start('/alongside');
    await wes.entry(WES_DAY.words).waitFor();
    await wes.says('1 held on this phone');
    await wes.device.picture('back-from-the-dead');

    await rosa.ticks(TASK);
    await rosa.device.picture('ticked');
    await wes.ticks(TASK);
    await rosa.changesHours(PRIMER, "Wes's hours", '2 1/2', 'Wes was called away at half past two');
    await wes.changesHours(PRIMER, 'Your hours', '3 1/2', 'I came back for the last bit');
    await wes.device.picture('hours-changed', true);
    for (const phone of [rosa, wes]) {
      await phone.says('3 held on this phone');
      await phone.page.goto('/held');
      await phone.page.getByRole('heading', { name: 'Held, not sent yet (3)' }).waitFor();
      await phone.device.picture('held', true);
    }
  });

  test('3: the first comes into signal, and the foreman sees it at once', async () => {
    const delayMs = seenAfter(
      rosa.device.line.nextSent(),
      laptop.person('Rosa').getByText(ROSA_DAY.words).waitFor(),
    );
    await rosa.device.findsSignal();
    await rosa.says('Nothing is held. Everything said here is with the server.');
    expect(await delayMs).toBeLessThan(ALIVE_WITHIN_MS);
    await rosa.device.picture('sent', true);
  });

  test('3: the server is killed twice in the middle of the sync of the second, and nothing is lost or doubled', async () => {
    const { line } = wes.device;
    const isCut = line.breakNextSync('asked', killServer);
    await wes.device.findsSignal();
    await isCut;
    await wes.says('Held, not sent yet (3)');
    await wes.device.picture('server-gone', true);
    const isCutAgain = line.breakNextSync('answered', killServer);
    await startServer();
    await isCutAgain;
    await wes.says('Held, not sent yet (3)');
    const isSeen = laptop.person('Wes').getByText(WES_DAY.words).waitFor({ timeout: BACK_OFF_MAX_MS });
    await startServer();
    await wes.says('Nothing is held. Everything said here is with the server.', { timeout: BACK_OFF_MAX_MS });
    await isSeen;

    const record = await readRecord(server.url);
    expect(entriesOf(record, ROSA_DAY.words)).toHaveLength(1);
    expect(entriesOf(record, WES_DAY.words)).toHaveLength(1);
    expect(record.entries).toHaveLength(atFirst.entries.length + 2);
    const tasks = record.tasks.filter(({ title }) => title === TASK);
    expect(tasks.map(({ done, twice, marks }) => ({ done, twice, marks: marks.length }))).toEqual([
      { done: true, twice: true, marks: 2 },
    ]);
    expect(endsOf(record, PRIMER).map(({ values }) => values.map(({ value }) => value))).toEqual([
      [expect.objectContaining({ minutes: 210 }), expect.objectContaining({ minutes: 150 })],
    ]);
    expect(record.looseEnds).toHaveLength(atFirst.looseEnds.length + 1);
    expect(newSetAsides(record)).toBe(0);
  });

  test('3: the foreman has all of it on the day sheet, settles the loose end, and the phones hear it', async () => {
    for (const name of ['Rosa', 'Wes']) {
      await laptop.person(name).getByText(TASK).waitFor();
      await laptop.person(name).getByText(/twice/).waitFor();
    }
    const end = laptop.looseEnds("Wes's hours", PRIMER);
    expect(await end.count()).toBe(1);
    await laptop.device.picture('day-sheet', true);
    await Promise.all([rosa.opensEntry(PRIMER), wes.opensEntry(PRIMER)]);
    await rosa.device.picture('entry-with-a-loose-end', true);
    await wes.device.picture('entry-with-a-loose-end', true);
    const questions = [rosa, wes].map((phone) => phone.page.getByRole('button', { name: /^It is/ }).first());
    await Promise.all(questions.map((question) => question.waitFor()));
    const isSent = laptop.device.line.nextSent();
    const delays = questions.map((question) => seenAfter(isSent, question.waitFor({ state: 'detached' })));
    await laptop.settles(end, '2 1/2 h of Rosa');
    for (const delayMs of await Promise.all(delays)) expect(delayMs).toBeLessThan(ALIVE_WITHIN_MS);
    await rosa.device.picture('entry-settled', true);
    await laptop.device.picture('day-sheet-settled', true);
    expect(endsOf(await readRecord(server.url), PRIMER)).toEqual([]);
  });

  test('4: a clock a year ahead wins nothing over what is said ten seconds later', async () => {
    await wes.device.losesSignal();
    await rosa.device.losesSignal();
    await rosa.device.startsAgain('/alongside', YEAR_MS);
    await rosa.changesHours(ROSA_DAY.words, "Wes's hours", '3', 'Wes came half an hour late');
    await rosa.device.picture('a-year-ahead-offline', true);
    const isSent = rosa.device.line.nextSent();
    await rosa.device.findsSignal();
    const sentMs = await isSent;
    await rosa.page.goto('/alongside');
    await rosa.says(/^The clock of this phone is .* ahead/);
    await rosa.device.picture('a-year-ahead', true);

    await new Promise((resolve) => setTimeout(resolve, sentMs + LATER_MS - performance.now()));
    await wes.changesHours(ROSA_DAY.words, 'Your hours', '4', 'I stayed for the second rib');
    await wes.device.findsSignal();
    await laptop.looseEnds("Wes's hours", ROSA_DAY.words).waitFor();
    await laptop.device.picture('day-sheet-after-the-clock', true);

    const record = await readRecord(server.url);
    const [end, ...others] = endsOf(record, ROSA_DAY.words);
    expect(others).toEqual([]);
    expect(end!.values.map(({ value, stands }) => ({ value, stands }))).toEqual([
      { value: expect.objectContaining({ minutes: 240 }) as unknown, stands: true },
      { value: expect.objectContaining({ minutes: 180 }) as unknown, stands: false },
    ]);
    expect(newSetAsides(record)).toBe(0);
  });

  test('5: a newer version comes in when the person says so, and what is held stays', async () => {
    await wes.page.goto('/alongside');
    await wes.device.findsNewerApp();
    await wes.device.losesSignal();
    await wes.logs({ words: 'Sharpened all the plane irons', hours: '1 1/4' });
    await wes.device.picture('newer-app');
    await wes.device.changesToNewerApp();
    await wes.entry('Sharpened all the plane irons').waitFor();
    await wes.says('1 held on this phone');
    await wes.device.findsSignal();
    await wes.says(/^All sent/);
    expect(entriesOf(await readRecord(server.url), 'Sharpened all the plane irons')).toHaveLength(1);
  });

  test('6: a phone that came in place of a lost one names what is missing, and the foreman sees it', async () => {
    await rosa.device.losesSignal();
    await rosa.logs({ words: 'This one goes overboard with the phone', hours: '1' });
    await rosa.device.putAway();
    rosa = await Phone.unpack({ ...ROSA, label: "Rosa's third phone" }, server.url);
    await rosa.device.signsIn("Rosa's new phone");
    await rosa.says(/^Your old device, Rosa's new phone, was last heard .* is not here\.$/);
    await rosa.entry(ROSA_DAY.words).waitFor();
    await rosa.device.picture('in-place-of-a-lost-one');
    await laptop
      .person('Rosa')
      .getByText(/Rosa's new phone/)
      .waitFor();
    await laptop.device.picture('day-sheet-with-a-gap', true);
  });

  test('7: what a phone that was shut out still sends does not count until the foreman lets it', async () => {
    const words = 'Swept the steam box out';
    await wes.device.losesSignal();
    await wes.logs({ words, hours: '1/2' });
    await laptop.shutsOut("Wes's new phone");
    await laptop.device.picture('devices', true);
    const isSent = wes.device.line.nextSent();
    await wes.device.findsSignal();
    await isSent;
    await wes.says(/^The foreman has shut this phone out/);
    await wes.device.picture('shut-out');
    await wes.page.goto('/held');
    await wes.says(/^Set aside .* shut out before it was sent/);
    await wes.device.picture('shut-out-held', true);
    expect(entriesOf(await readRecord(server.url), words)).toEqual([]);
    await laptop.admits(words, 'Wes told me so');
    await laptop.person('Wes').getByText(words).waitFor();
    await laptop.device.picture('day-sheet-admitted', true);
    expect(entriesOf(await readRecord(server.url), words)).toHaveLength(1);
  });
});
