import { describe, expect, it } from 'vitest';
import { contrastRatio } from '#shared/look/contrast.ts';
import { type ColourSet, TOKENS, type Token } from '#src/tokens.ts';

// Goal: the formula is the published one, and no pair of colours that the app puts together is too weak in any set.
// Method: published ratios on white, unrounded; then every ink on every ground that it is used on.

const PUBLISHED_ON_WHITE: readonly (readonly [string, number])[] = [
  ['#000000', 21],
  ['#777777', 4.478089],
  ['#767676', 4.542225],
  ['#949494', 3.03347],
  ['#959595', 2.9953],
  ['#595959', 7.0047],
  ['#5a5a5a', 6.8969],
  ['#ff0000', 3.998477],
  ['#0000ff', 8.5925],
  ['#008000', 5.1374],
];

/** Ink on ground as text on crew screens. */
const TEXT_PAIRS: readonly (readonly [Token, Token])[] = [
  ...(['bilge', 'slate', 'verdigris', 'mahogany', 'redlead'] as const).flatMap((ink) => [
    [ink, 'primer'] as const,
    [ink, 'plank'] as const,
  ]),
  ['on-verdigris', 'verdigris'],
  ['on-coaming', 'coaming'],
  ['on-seam', 'seam'],
  ['on-redlead', 'redlead'],
  ['on-deep', 'deep'],
];

/** Marks, rules and the edges of controls, which must be seen but are not read. */
const SHAPE_PAIRS: readonly (readonly [Token, Token])[] = [
  ['bilge', 'plank'],
  ['bilge', 'primer'],
  ['slate', 'plank'],
  ['on-coaming', 'coaming'],
];

const SETS: readonly ColourSet[] = ['light', 'dark', 'sunlight'];

describe('contrast', () => {
  it.each(PUBLISHED_ON_WHITE)('of %s on white is the published %d', (colour, ratio) => {
    expect(contrastRatio(colour, '#ffffff')).toBeCloseTo(ratio, 4);
    expect(contrastRatio('#ffffff', colour)).toBeCloseTo(ratio, 4);
  });

  it('keeps #777777 below and #595959 above their limits, unrounded', () => {
    expect(contrastRatio('#777777', '#ffffff')).toBeLessThan(4.5);
    expect(contrastRatio('#595959', '#ffffff')).toBeGreaterThanOrEqual(7);
  });

  it('refuses what is no colour', () => {
    expect(() => contrastRatio('#fff', '#000000')).toThrow('#fff');
  });

  describe.each(SETS)('in the %s set', (set) => {
    it.each(TEXT_PAIRS)('%s reads on %s at 7:1', (ink, ground) => {
      expect(contrastRatio(TOKENS[set][ink], TOKENS[set][ground])).toBeGreaterThanOrEqual(7);
    });

    it.each(SHAPE_PAIRS)('%s is seen on %s at 3:1', (shape, ground) => {
      expect(contrastRatio(TOKENS[set][shape], TOKENS[set][ground])).toBeGreaterThanOrEqual(3);
    });
  });

  it('uses black and white alone in sunlight', () => {
    expect(new Set(Object.values(TOKENS.sunlight))).toEqual(new Set(['#000000', '#FFFFFF']));
  });
});
