import { bilge, engineBed, soleLifted } from './bilge-scenes.ts';
import { hatches, mark, samples, testPieces, wastedBolt } from './bench-scenes.ts';
import { deck, rakedSeams, underCoveringBoard } from './deck-scenes.ts';
import { deckBeams, floorEnd, ribs } from './frame-scenes.ts';
import {
  alongHull,
  dugSeam,
  keel,
  laps,
  peeling,
  rotInPlank,
  rovesOnRib,
  sidePlanking,
} from './hull-scenes.ts';
import type { Scene } from './hull-scenes.ts';
import { drawFrom } from './noise.ts';
import type { Shot } from './photograph.ts';
import { gravingPiece, scarf, transom } from './piece-scenes.ts';
import { Sketch } from './sketch.ts';

const SIDE_PX = { long: 1600, short: 1200 };
const WALL = { shed: '#3d3934', yard: '#6d756c' };
const BLACK = '#120b07';
const mahogany = { grain: 'mahogany', seam: '#1a0d06' } as const;
const aged = { grain: 'aged', seam: '#0d0704' } as const;

/** What the demo's people took pictures of, by name. */
const SCENES = {
  // Penny Candle, a carvel launch
  pennyPort: alongHull('aged', 'redPrimer', 'carvel', WALL.yard),
  pennyStarboard: alongHull('aged', 'redPrimer', 'carvel', WALL.shed),
  pennyTransom: transom('aged', false, false),
  pennyNumber: mark('26-117', 'oldOak'),
  pennyDeck: deck({ grain: 'aged', seam: BLACK, count: 6, bungs: true }),
  pennyCockpit: soleLifted('aged', 'oldOak'),
  pennySide: sidePlanking({ ...aged, count: 4, bungs: 'aged' }),
  pennyPaint: peeling('redPrimer', 'grey'),
  pennyBed: engineBed('oldOak'),
  pennyBedClean: engineBed('oak'),
  pennySplit: gravingPiece('mahogany', 'mahogany', false),
  pennyStripped: sidePlanking({ ...mahogany, count: 4, bungs: 'mahogany' }),
  pennyTransomStripped: transom('mahogany', false, false),
  soleUp: soleLifted('mahogany', 'aged'),
  muck: bilge('aged', 'oldOak', 'mucky'),
  bilgeClean: bilge('mahogany', 'oldOak', 'clean'),
  floorSoft: ribs({ planks: 'aged', ribs: 'oldOak', floor: 'oldOak', isRotten: true }),
  floorOpen: floorEnd('oldOak', 'rotten', true),
  floorStarboard: floorEnd('oldOak', 'rotten'),
  stringer: rotInPlank({ ...aged, count: 3 }, 170, true),
  screws: samples(8, 3),
  screwsGood: samples(4, 0),
  beams: deckBeams('oldOak'),
  coveringBoard: underCoveringBoard('aged', true),
  floorCut: floorEnd('oldOak', 'cut out', true),
  floorSpliced: floorEnd('oldOak', 'spliced'),
  stringerScarf: scarf('aged', 'fir', true),
  ribCracked: ribs({ planks: 'aged', ribs: 'oldOak', isBroken: true }),
  sisterClamped: ribs({ planks: 'aged', ribs: 'oldOak', sister: 'oak', isClamped: true }),
  sisterRiveted: ribs({ planks: 'mahogany', ribs: 'oldOak', sister: 'oak', floor: 'oldOak' }),
  roves: rovesOnRib('mahogany', 'oak'),
  garboard: dugSeam('aged'),
  primer: ribs({ planks: 'greyPrimer', ribs: 'greyPrimer', floor: 'greyPrimer' }),
  primerBilge: bilge('greyPrimer', 'greyPrimer', 'painted'),
  // Widdershins, a varnished utility
  widderSide: sidePlanking({ ...mahogany, count: 3, bungs: 'mahogany', isProud: true }),
  widderTransom: transom('mahogany', false, false),
  dutchman: gravingPiece('mahogany', 'mahogany', true),
  widderBeams: deckBeams('oak'),
  beamRot: floorEnd('oldOak', 'rotten', true),
  beamSpliced: scarf('oldOak', 'oak', false),
  underBoards: underCoveringBoard('mahogany', false),
  deckDry: deck({ grain: 'mahogany', seam: BLACK, count: 6, bungs: true }),
  cleatStain: rotInPlank({ ...mahogany, count: 4 }, 70, false),
  bleached: deck({ grain: 'bleached', seam: BLACK, count: 7, bungs: true }),
  bleachedNear: rakedSeams('bleached'),
  stains: testPieces('mahogany', 'stained', 'varnished'),
  stainedDeck: deck({ grain: 'stained', seam: BLACK, count: 7, bungs: true }),
  raked: rakedSeams('stained'),
  hatchesCoat: hatches('varnished'),
  coatFour: deck({ grain: 'varnished', seam: BLACK, count: 7, isGlossy: true }),
  bloom: deck({ grain: 'varnished', seam: BLACK, count: 7, isMilky: true }),
  coatSeven: deck({ grain: 'varnished', seam: BLACK, count: 6, isGlossy: true }),
  transomCoat: transom('varnished', true, false),
  taped: deck({ grain: 'varnished', seam: BLACK, count: 6, isTaped: true }),
  // Hickory Moon, a lapstrake skiff
  hickoryPort: alongHull('white', 'white', 'lapped', WALL.yard),
  hickoryStarboard: alongHull('white', 'greenPaint', 'lapped', WALL.shed),
  hickoryPaint: peeling('white', 'grey'),
  hickoryInside: ribs({ planks: 'greenPaint', ribs: 'greenPaint' }),
  turned: alongHull('white', 'white', 'turned over', WALL.shed),
  oldName: transom('grey', false, true),
  lapsBare: laps('cedar', 4),
  ribNine: ribs({ planks: 'cedar', ribs: 'oldOak', isBroken: true }),
  ribSistered: ribs({ planks: 'cedar', ribs: 'oldOak', sister: 'oak' }),
  stemRabbet: rotInPlank({ grain: 'oldOak', seam: BLACK, count: 2 }, 120, true),
  stemPiece: gravingPiece('oldOak', 'oak', true),
  keelBolts: keel('oldOak', 'cedar', 'in'),
  boltsOut: keel('oldOak', 'cedar', 'out'),
  bolts: wastedBolt(),
  lapsMissing: laps('cedar', 3, 2),
} satisfies Record<string, Scene>;

export type PictureName = keyof typeof SCENES;
export const PICTURE_NAMES = Object.keys(SCENES) as PictureName[];

/** Held upright. */
const UPRIGHT: readonly PictureName[] = [
  'sisterClamped',
  'roves',
  'ribNine',
  'ribSistered',
  'floorSoft',
  'dutchman',
];

/** Seen from the other side. */
const MIRRORED: readonly PictureName[] = [
  'pennyStarboard',
  'hickoryStarboard',
  'pennyCockpit',
  'floorStarboard',
  'pennyBedClean',
  'coatSeven',
  'boltsOut',
  'beamSpliced',
];

export interface Picture {
  sketch: Sketch;
  shot: Shot;
}

/** A picture drawn, and how it was shot; the same for the same name. */
export function drawPicture(name: PictureName): Picture {
  const isUpright = UPRIGHT.includes(name);
  const { long, short } = SIDE_PX;
  const sketch = new Sketch(name, isUpright ? short : long, isUpright ? long : short);
  SCENES[name](sketch);
  const draw = drawFrom(`shot of ${name}`);
  const shot = {
    sharpAt: 0.42 + draw() * 0.2,
    blur: 0.5 + draw() * 1.3,
    warmth: 0.93 + draw() * 0.16,
    exposure: 1 + draw() * 0.18,
    tilt: draw() * 3.6 - 1.8,
    isMirrored: MIRRORED.includes(name),
  };
  return { sketch, shot };
}
