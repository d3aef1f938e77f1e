import { describe, expect, test } from 'vitest';
import { readDaySheet } from '#src/routes/day-sheet/read-day-sheet.ts';
import { TestRecord, type Hand } from '#tests/worlds/record.ts';

const MONDAY = '2026-05-04';

async function shop() {
  const record = new TestRecord();
  const orrin = record.hand('Orrin', 'foreman');
  const [rosa, wes] = ['Rosa', 'Wes'].map((name) => record.hand(name, 'crew')) as [Hand, Hand];
  const [boatId, entryId] = [record.newId(), record.newId()];
  await record.say(orrin, 'boat.add', { boatId, name: 'Brindle' });
  const hours = [{ personId: rosa.personId, minutes: 60 }];
  const entry = { entryId, boatId, workDate: MONDAY, text: 'Sole up', spoken: false, hours };
  await record.say(rosa, 'entry.write', entry);
  const find = async (hand: Hand, more: object = {}) => {
    const findingId = record.newId();
    const said = { kind: 'rot', place: { partId: 'floor', number: 7 }, known: 'opened', certainty: 'proved' };
    await record.say(hand, 'finding.note', { findingId, boatId, ...said, text: '', ...more });
    return findingId;
  };
  const attach = (hand: Hand, more: object = {}) => {
    const picture = { sha256: 'a'.repeat(64), width: 4, height: 3, bytes: 9 };
    return record.say(hand, 'photo.attach', { photoId: record.newId(), boatId, ...picture, ...more });
  };
  const sheet = () => readDaySheet(record.viewAs(orrin), MONDAY);
  const person = (name: string) => sheet().people.find((one) => one.name === name)!;
  return { record, orrin, rosa, wes, boatId, entryId, find, attach, sheet, person };
}

describe('what was found', () => {
  test('stands beside the entry that it came with, with its photographs', async () => {
    const { rosa, entryId, find, attach, person, sheet } = await shop();
    const findingId = await find(rosa, { entryId, seenExtent: { lengthMm: 152 } });
    await attach(rosa, { findingId, entryId, set: 'before' });
    await attach(rosa, { entryId, caption: 'the sole' });
    const [line] = person('Rosa').entries;
    expect(line!.notes).toMatchObject([
      {
        title: 'Found: rot, floor 7',
        facts: ['proved, opened up', '6 in long'],
        photos: [{ words: 'before' }],
      },
    ]);
    expect(line!.photos.map(({ words }) => words)).toEqual(['the sole']);
    expect(sheet().boats[0]!.stages[0]!.entries[0]).toMatchObject({
      found: ['Found: rot, floor 7'],
      photoCount: 2,
    });
    expect(person('Rosa').alone).toEqual([]);
  });

  test('by itself stands under whoever found it, and they have not done nothing', async () => {
    const { wes, find, attach, person, sheet } = await shop();
    expect(person('Wes').nothing).not.toBeNull();
    const findingId = await find(wes);
    await attach(wes, { findingId });
    expect(person('Wes')).toMatchObject({ nothing: null, alone: [{ boatName: 'Brindle', photos: [] }] });
    expect(person('Wes').alone[0]!.notes[0]!.photos).toHaveLength(1);
    expect(sheet().boats[0]).toMatchObject({ found: ['Found: rot, floor 7 (Wes)'], photoCount: 1 });
  });

  test('is read with who struck it and why, and stands in no list by boat then', async () => {
    const { record, rosa, entryId, find, person, sheet } = await shop();
    const findingId = await find(rosa, { entryId });
    await record.say(rosa, 'finding.strike', { findingId, why: 'only dirt', saw: [] });
    expect(person('Rosa').entries[0]!.notes[0]).toMatchObject({
      mark: 'struck',
      struck: 'struck by Rosa: only dirt',
    });
    expect(sheet().boats[0]!.stages[0]!.entries[0]!.found).toEqual([]);
  });
});

test('what was found sound is told as much as what was not', async () => {
  const { record, rosa, boatId, entryId, person } = await shop();
  const place = { partId: 'stringer', side: 'port' };
  const sound = {
    soundId: record.newId(),
    boatId,
    entryId,
    place,
    known: 'probed',
    about: 'rot',
    text: 'Every two inches',
  };
  await record.say(rosa, 'sound.note', sound);
  expect(person('Rosa').entries[0]!.notes).toMatchObject([
    { entity: 'sound', title: 'Sound: stringer port, no rot', facts: ['probed'], words: 'Every two inches' },
  ]);
});

test('a photograph of another day’s finding stands on the day that it was taken', async () => {
  const { record, wes, find, attach, person } = await shop();
  const findingId = await find(wes);
  record.nowMs += 24 * 3_600_000;
  await attach(wes, { findingId, caption: 'a day on' });
  expect(person('Wes').alone[0]!.notes[0]!.photos).toHaveLength(1);
  const tuesday = readDaySheet(record.viewAs(wes), '2026-05-05').people.find(({ name }) => name === 'Wes')!;
  expect(tuesday.alone[0]!.photos.map(({ words }) => words)).toEqual(['a day on']);
});

test('less than the usual day is told out of what was expected, of the crew alone', async () => {
  const { orrin, rosa, boatId, record, person } = await shop();
  const hours = [{ personId: orrin.personId, minutes: 30 }];
  const entry = { entryId: record.newId(), boatId, workDate: MONDAY, text: 'Looked', spoken: false, hours };
  await record.say(orrin, 'entry.write', entry);
  expect(person('Rosa')).toMatchObject({ minutes: 60, usualMinutes: 480 });
  expect(person('Orrin')).toMatchObject({ minutes: 30, usualMinutes: 0 });
  expect(
    readDaySheet(record.viewAs(rosa), '2026-05-02').people.map(({ usualMinutes }) => usualMinutes),
  ).toEqual([0, 0]);
});
