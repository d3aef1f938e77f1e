import { expect, test } from 'vitest';
import { FINDING_KINDS } from '#shared/trade/finding-kinds.ts';
import { findingWords } from '#shared/trade/finding-words.ts';
import { partWords } from '#shared/trade/part-words.ts';
import { PARTS } from '#shared/trade/parts.ts';

test('every part is called in a list as it is called where the list is not at hand', () => {
  expect(PARTS.length).toBeGreaterThan(100);
  expect(PARTS.filter(({ id, word }) => partWords(id) !== word)).toEqual([]);
});

test('parts have ids of their own, and say whether they come in pairs', () => {
  expect(new Set(PARTS.map(({ id }) => id)).size).toBe(PARTS.length);
  for (const { sides } of PARTS) expect(['sided', 'centre', 'either', 'whole']).toContain(sides);
  expect(PARTS.find(({ id }) => id === 'covering_board')).toMatchObject({
    sides: 'sided',
    isNumbered: false,
  });
  expect(PARTS.find(({ id }) => id === 'deck_beam')).toMatchObject({ isNumbered: true });
});

test('kinds of finding read as words', () => {
  const words = FINDING_KINDS.map(findingWords);
  expect(words.filter((word) => word.includes('_'))).toEqual([]);
  expect(new Set(words).size).toBe(FINDING_KINDS.length);
});
