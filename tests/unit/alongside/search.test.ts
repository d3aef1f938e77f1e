import { describe, expect, test } from 'vitest';
import { readSearch } from '#src/routes/alongside/search/read-search.ts';
import { isFound, wordsOf } from '#src/routes/alongside/search/search-words.ts';
import { entryBy, shopAtBench, type Bench } from '#tests/unit/alongside/bench.ts';

const titles = (bench: Bench, asked: string, boatId: string | null = bench.boatId) =>
  readSearch(bench.record.viewAs(bench.rosa), asked, boatId, 50).hits.map(({ title }) => title);

async function soundAt(bench: Bench, place: object, given: object = {}) {
  const { record, boatId, strip, rosa } = bench;
  const soundId = record.newId();
  await record.say(rosa, 'sound.note', { soundId, boatId, stageId: strip, place, known: 'opened', ...given });
  return soundId;
}

describe('words', () => {
  test.each([
    ['Beam FOUR, port', ['beam', '4', 'port']],
    ["Orrin's twelve", ['orrins', '12']],
    ['séance 3/4', ['seance', '3', '4']],
    ['', []],
  ])('of %o are %o', (text, words) => {
    expect(wordsOf(text)).toEqual(words);
  });

  test('are found by how they begin, figures only whole', () => {
    const known = new Set(['beams', '12', 'port']);
    expect(isFound(known, ['beam', 'po'])).toBe(true);
    expect(isFound(known, ['1'])).toBe(false);
    expect(isFound(known, ['beam', 'starboard'])).toBe(false);
  });
});

describe('the search', () => {
  test('finds what was found sound by part and number, in words or figures, by any name of the part', async () => {
    const bench = await shopAtBench();
    await soundAt(bench, { partId: 'deck_beam', number: 4 }, { about: 'rot' });
    for (const asked of ['beam four', 'beam 4', 'deck beam 4', 'sound beam', 'rot']) {
      expect(titles(bench, asked)).toEqual(['Sound: deck beam 4, no rot']);
    }
    expect(titles(bench, 'beam five')).toEqual([]);
    expect(titles(bench, 'beam 14')).toEqual([]);
  });

  test('finds each number of a range, and either side of both', async () => {
    const bench = await shopAtBench();
    await soundAt(bench, { partId: 'floor_timber', number: 6, toNumber: 9, side: 'both' });
    expect(titles(bench, 'floor 7 port')).toHaveLength(1);
    expect(titles(bench, 'floor nine starboard')).toHaveLength(1);
    expect(titles(bench, 'floor 10')).toEqual([]);
  });

  test('looks on one boat or on all, the newest first', async () => {
    const bench = await shopAtBench();
    await entryBy(bench, bench.rosa, { text: 'Reefed port seams', workDate: '2026-05-01' });
    await entryBy(bench, bench.rosa, { text: 'Reefed starboard seams' });
    await entryBy(bench, bench.wes, { text: 'Reefed hers too', boatId: bench.otherBoatId, stageId: null });
    expect(titles(bench, 'reef')).toEqual(['Reefed starboard seams', 'Reefed port seams']);
    expect(titles(bench, 'reef', null)).toHaveLength(3);
  });

  test('finds a boat by a name that she once bore', async () => {
    const bench = await shopAtBench();
    const set = { names: [{ name: 'Wild Plover' }] };
    await bench.record.say(bench.orrin, 'boat.amend', { boatId: bench.otherBoatId, set });
    const [hit] = readSearch(bench.record.viewAs(bench.rosa), 'plover', null, 50).hits;
    expect(hit).toMatchObject({
      title: 'Amber Reach, once Wild Plover',
      to: '/alongside',
      where: { boatId: bench.otherBoatId },
    });
  });

  test('finds tasks and the words under photos, several photos of one pick as one', async () => {
    const bench = await shopAtBench();
    const { record, boatId, strip, orrin } = bench;
    await record.say(orrin, 'task.add', {
      taskId: record.newId(),
      boatId,
      stageId: strip,
      title: 'Bag the chock screws',
    });
    for (const sha of ['a', 'b']) {
      await record.say(orrin, 'photo.attach', {
        photoId: record.newId(),
        boatId,
        stageId: strip,
        sha256: sha.repeat(64),
        caption: 'port chock off',
        width: 4,
        height: 3,
        bytes: 9,
      });
    }
    const { hits } = readSearch(record.viewAs(bench.rosa), 'chock', boatId, 50);
    expect(hits.map(({ what, title }) => [what, title])).toEqual([
      ['2 photos', 'Port chock off'],
      ['Task', 'Bag the chock screws'],
    ]);
  });

  test('says how many there are, also those that it does not show', async () => {
    const bench = await shopAtBench();
    for (let count = 0; count < 3; count += 1) await entryBy(bench, bench.rosa);
    const answer = readSearch(bench.record.viewAs(bench.rosa), 'reefed', null, 2);
    expect([answer.hits.length, answer.count]).toEqual([2, 3]);
    expect(readSearch(bench.record.viewAs(bench.rosa), '  ', null, 2).count).toBe(0);
  });
});
