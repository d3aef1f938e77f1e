import type { Point } from './sketch.ts';

/** Letters and figures as they are cut with a chisel: strokes apart by commas, points (across, down) in a box of 4 by 6. */
const STROKES: Readonly<Record<string, string>> = {
  '0': '10 30 41 45 36 16 05 01 10',
  '1': '11 20 26,16 36',
  '2': '01 10 30 41 42 06 46',
  '4': '36 30 04 44',
  '6': '41 30 10 01 05 16 36 45 44 33 13 04',
  '7': '00 40 16',
  '9': '05 16 36 45 41 30 10 01 02 13 33 42',
  '-': '03 43',
  D: '00 06 26 45 41 20 00',
  I: '20 26',
  L: '00 06 46',
  N: '06 00 46 40',
  U: '00 05 16 36 45 40',
  W: '00 16 22 36 40',
};

/** The strokes of a text whose letters are `tall` px; a letter that has none is a gap. */
export function strokesOf(text: string, [x, y]: Point, tall: number): Point[][] {
  const unit = tall / 6;
  return [...text].flatMap((letter, index) =>
    (STROKES[letter]?.split(',') ?? []).map((stroke) =>
      stroke.split(' ').map((point): Point => {
        const [across, down] = [Number(point[0]), Number(point[1])];
        return [x + (index * 6 + across) * unit, y + down * unit];
      }),
    ),
  );
}
