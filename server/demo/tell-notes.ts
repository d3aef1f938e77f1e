import { DEMO_ENTRIES } from './demo-entries.ts';
import { nameOf, type DemoEntry } from './demo-entry.ts';
import { DEMO_FINDINGS, FINDINGS_LATER } from './demo-findings.ts';
import type { FindingLater } from './demo-notes.ts';
import { DEMO_PHOTOS } from './demo-photos.ts';
import { DEMO_SOUNDS } from './demo-sounds.ts';
import type { Pictures } from './pictures/develop.ts';
import type { SaidOp, Telling } from './telling.ts';

const MINUTE_MS = 60_000;
const NOTED_AFTER_MINUTES = 1;
const ATTACHED_AFTER_MINUTES = 2;

/** Tells what was found, what was found sound, and the pictures that were taken, each with its entry. */
export function tellNotes(telling: Telling, pictures: Pictures): void {
  const entries = new Map(DEMO_ENTRIES.map((entry) => [nameOf(entry), entry]));
  const noted = (name: string, op: (entry: DemoEntry) => SaidOp, minutes: number) => {
    const entry = entries.get(name);
    if (!entry) throw new Error(`the demo has no entry ${name}`);
    telling.say(entry.author, entry.day, entry.time, () => op(entry), minutes);
  };
  for (const { key, with: name, ...said } of DEMO_FINDINGS) {
    const findingId = telling.id(`finding/${key}`);
    const data = (entry: DemoEntry) => ({ findingId, ...placed(telling, entry), ...said });
    const op = (entry: DemoEntry) => ({ kind: 'finding.note', makes: findingId, data: data(entry) });
    noted(name, op, NOTED_AFTER_MINUTES);
  }
  for (const [index, { with: name, ...said }] of DEMO_SOUNDS.entries()) {
    const soundId = telling.id(`sound/${index}`);
    const data = (entry: DemoEntry) => ({ soundId, ...placed(telling, entry), ...said });
    noted(name, (entry) => ({ kind: 'sound.note', makes: soundId, data: data(entry) }), NOTED_AFTER_MINUTES);
  }
  for (const later of FINDINGS_LATER)
    telling.say(later.by, later.day, later.time, () => laterOp(telling, later));
  for (const [index, photo] of DEMO_PHOTOS.entries()) {
    if (!pictures.has(photo.of)) continue;
    noted(photo.with, (entry) => photoOp(telling, pictures, photo, entry, index), ATTACHED_AFTER_MINUTES);
  }
}

function placed(telling: Telling, entry: DemoEntry) {
  return {
    boatId: telling.id(entry.boat),
    stageId: telling.id(`${entry.boat}/${entry.stage}`),
    entryId: telling.id(`entry/${nameOf(entry)}`),
  };
}

function laterOp(telling: Telling, { key, does }: FindingLater): SaidOp {
  const findingId = telling.id(`finding/${key}`);
  if ('strikes' in does) {
    const data = { findingId, why: does.strikes, saw: [telling.script.makerOf(findingId)] };
    return { kind: 'finding.strike', data, sets: { rowId: findingId, fields: ['struck'] } };
  }
  const { set, why } = does;
  const data = { findingId, set, ...(why ? { why } : {}) };
  return { kind: 'finding.amend', data, sets: { rowId: findingId, fields: Object.keys(set) } };
}

function photoOp(
  telling: Telling,
  pictures: Pictures,
  { of, with: _with, finding, ...said }: (typeof DEMO_PHOTOS)[number],
  entry: DemoEntry,
  index: number,
): SaidOp {
  const { sha256, width, height, jpeg } = pictures.get(of)!;
  const photoId = telling.id(`photo/${of}`);
  // taken at some time in the hour before it was logged
  const takenMs = telling.at(entry.day, entry.time) - (4 + ((index * 13) % 51)) * MINUTE_MS;
  const data = {
    photoId,
    sha256,
    ...placed(telling, entry),
    ...(finding ? { findingId: telling.id(`finding/${finding}`) } : {}),
    ...said,
    takenAt: new Date(takenMs).toISOString(),
    width,
    height,
    bytes: jpeg.length,
  };
  return { kind: 'photo.attach', makes: photoId, data };
}
