import { describe, expect, test } from 'vitest';
import { PARTS } from '#shared/trade/parts.ts';
import { plainPlace } from '#src/routes/alongside/place/carried.ts';
import { searchParts, withPart } from '#src/routes/alongside/place/read-parts.ts';
import { placeWords } from '#src/words/place-words.ts';

const part = (id: string) => PARTS.find((each) => each.id === id)!;

describe('a part', () => {
  test.each([
    ['beam', 'deck_beam'],
    ['floor', 'floor_timber'],
    ['rib', 'bent_rib'],
    ['seacock', 'thru_hull'],
    ['cov', 'covering_board'],
    ['deck pl', 'deck_plank'],
  ])('is found by %o', (asked, id) => {
    expect(
      searchParts(asked)
        .slice(0, 3)
        .map((each) => each.id),
    ).toContain(id);
  });

  test('that nobody has is not found, and nothing asked shows all', () => {
    expect(searchParts('flux capacitor')).toEqual([]);
    expect(searchParts(' ')).toHaveLength(PARTS.length);
  });
});

describe('another part', () => {
  test('on the centreline brings its side with it, and takes it away again', () => {
    const atKeel = withPart({ partId: 'frame', number: 7, side: 'port' }, part('keel'));
    expect(atKeel).toEqual({ partId: 'keel', side: 'centre' });
    expect(withPart(atKeel, part('frame'))).toEqual({ partId: 'frame' });
  });

  test('keeps the side and the words, and not the number of the one before', () => {
    const place = { partId: 'frame', number: 7, toNumber: 9, side: 'port' as const, words: 'aft' };
    expect(withPart(place, part('garboard'))).toEqual({ partId: 'garboard', side: 'port', words: 'aft' });
    expect(withPart(place, null)).toEqual({ side: 'port', words: 'aft' });
  });
});

test.each([
  [{ partId: 'deck_beam', number: 4, side: 'port' as const }, 'deck beam 4 port'],
  [{ partId: 'frame', number: 6, toNumber: 9, side: 'both' as const }, 'frame 6 to 9 both sides'],
  [{ partId: 'thru_hull', words: ' by the sink ' }, 'through-hull fitting, by the sink'],
  [{ words: 'two feet aft' }, 'two feet aft'],
  [{}, ''],
])('%o reads %o', (place, words) => {
  expect(placeWords(place)).toBe(words);
});

test('what a place does not say is not in it', () => {
  expect(plainPlace({ partId: undefined, side: 'port', words: '  ' })).toEqual({ side: 'port' });
});
