import fc from 'fast-check';
import { expect, test } from 'vitest';
import {
  boatLengthText,
  inchesFromMm,
  lengthText,
  mmFromInches,
  parseBoatLength,
} from '#shared/measure/length.ts';

test.each([
  ['26', 'imperial', 7925],
  ['26 ft 6 in', 'imperial', 8077],
  [`26'6"`, 'metric', 8077],
  ['26.5 ft', 'imperial', 8077],
  ['7,92 m', 'imperial', 7920],
  ['7.92', 'metric', 7920],
  ['792 cm', 'metric', 7920],
] as const)('%s in a shop with %s units is %i mm', (text, units, mm) => {
  expect(parseBoatLength(text, units)).toBe(mm);
});

test.each(['', 'long', '26 planks', '-3', '26 ft six'])('%o is no length', (text) => {
  expect(parseBoatLength(text, 'imperial')).toBeNull();
});

test.each([
  [7925, 'imperial', '26 ft'],
  [8077, 'imperial', '26 ft 6 in'],
  [254, 'imperial', '10 in'],
  [7925, 'metric', '7.93 m'],
] as const)('%i mm in %s units is written %s', (mm, units, text) => {
  expect(boatLengthText(mm, units)).toBe(text);
});

test('what is written is read back to within half an inch, or half a centimetre', () => {
  const lengths = fc.integer({ min: 13, max: 60_000 });
  fc.assert(
    fc.property(
      lengths,
      (mm) => Math.abs((parseBoatLength(boatLengthText(mm, 'imperial'), 'imperial') ?? 0) - mm) <= 13.2,
    ),
  );
  fc.assert(
    fc.property(
      lengths,
      (mm) => Math.abs((parseBoatLength(boatLengthText(mm, 'metric'), 'metric') ?? 0) - mm) <= 5,
    ),
  );
});

test.each([
  [298, 'imperial', '11 3/4 in'],
  [19, 'imperial', '3/4 in'],
  [0, 'imperial', '0 in'],
  [1283, 'imperial', '4 ft 2 1/2 in'],
  [298, 'metric', '298 mm'],
] as const)('%i mm of a part in a shop with %s units is %s', (mm, units, text) => {
  expect(lengthText(mm, units)).toBe(text);
});

test('inches and sixteenths come back from the whole millimetres that are kept', () => {
  fc.assert(
    fc.property(fc.nat(3000), fc.nat(15), (whole, sixteenths) => {
      expect(inchesFromMm(mmFromInches({ whole, sixteenths }))).toEqual({ whole, sixteenths });
    }),
  );
});
