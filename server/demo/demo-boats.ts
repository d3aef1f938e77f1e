import type { BoatAdd } from '#shared/boat/boat.ts';
import type { PersonKey } from './demo-people.ts';

export type BoatKey = 'penny' | 'widder' | 'hickory';

export interface DemoStage {
  key: string;
  name: string;
  after: string[];
  /** the working day, counted back from today, on which the foreman marked it finished */
  finished?: number;
  tasks: DemoTask[];
}

export interface DemoTask {
  title: string;
  estimateHours?: number;
  assignees?: PersonKey[];
  /** who started it, on which working day, when */
  started?: [PersonKey, number, string];
  /** who ticked it */
  ticked?: [PersonKey, number, string][];
}

export interface DemoBoat {
  particulars: Omit<BoatAdd, 'boatId' | 'arrivedOn'>;
  /** calendar days before today */
  arrivedDaysAgo: number;
  owner: PersonKey;
  stages: DemoStage[];
}

const FT_MM = 304.8;
const feet = (count: number) => Math.round(count * FT_MM);

const PENNY: DemoBoat = {
  particulars: {
    name: 'Penny Candle',
    type: 'launch, carvel',
    lengthMm: feet(26),
    beamMm: feet(7),
    hullNumber: '26-117',
    builder: 'Quillon and Daughters, Saltmarsh',
    builtYear: 1934,
    numbering: 'frames and floors from the stem, planks from the keel',
  },
  arrivedDaysAgo: 79,
  owner: 'ottilie',
  stages: [
    { key: 'arrive', name: 'Arrival and record', after: [], finished: -21, tasks: [] },
    { key: 'stripOut', name: 'Strip out', after: ['arrive'], finished: -21, tasks: [] },
    {
      key: 'survey',
      name: 'Open up and survey',
      after: ['stripOut'],
      finished: -13,
      tasks: [
        { title: 'Lift the port sole panels', estimateHours: 8, ticked: [['rosa', -20, '11:50']] },
        {
          title: 'Pull eight sample screws, frames 4 to 9',
          estimateHours: 4,
          ticked: [['wes', -19, '15:35']],
        },
        {
          title: 'Look at floor 7 starboard, mirror first',
          estimateHours: 1,
          ticked: [['wes', -17, '10:10']],
        },
        { title: 'Sketch of what is soft, with sizes', estimateHours: 3, ticked: [['rosa', -14, '15:20']] },
      ],
    },
    {
      key: 'frames',
      name: 'Frames and floors',
      after: ['survey'],
      tasks: [
        { title: 'Cut the rot out of floor 7, port', estimateHours: 6, ticked: [['rosa', -12, '15:55']] },
        { title: 'Scarf the port bilge stringer', estimateHours: 10, ticked: [['rosa', -7, '15:45']] },
        { title: 'Splice floor 7, starboard', estimateHours: 8, ticked: [['wes', -9, '15:30']] },
        {
          title: 'Sister frames 8 and 9, port',
          estimateHours: 9,
          ticked: [
            ['wes', -4, '15:50'],
            ['rosa', -4, '15:52'],
          ],
        },
        {
          title: 'Prime the bilge, frames 4 to 10',
          estimateHours: 6,
          assignees: ['wes'],
          started: ['wes', -1, '13:05'],
        },
        { title: 'Steam two new ribs, 11 and 12', estimateHours: 7, assignees: ['rosa', 'wes'] },
        { title: 'Photographs before the sole goes back', estimateHours: 1 },
      ],
    },
    {
      key: 'topsides',
      name: 'Topsides',
      after: ['frames'],
      tasks: [
        { title: 'Dutchman in plank 5, port, at the quarter', estimateHours: 4 },
        { title: 'Refasten where the samples failed', estimateHours: 16 },
      ],
    },
    {
      key: 'machinery',
      name: 'Engine and shaft',
      after: ['frames'],
      tasks: [{ title: 'Engine bed painted', estimateHours: 3 }],
    },
  ],
};

const WIDDER: DemoBoat = {
  particulars: {
    name: 'Widdershins',
    type: 'utility',
    lengthMm: feet(24),
    beamMm: feet(7.5),
    hullNumber: 'W 24 09',
    builder: 'Pargeter Boat Works, Loon Bend',
    builtYear: 1951,
    numbering: 'deck planks from the king plank, outboard',
  },
  arrivedDaysAgo: 162,
  owner: 'tamsin',
  stages: [
    { key: 'fair', name: 'Fair and sand', after: [], finished: -21, tasks: [] },
    {
      key: 'stain',
      name: 'Stain and seal',
      after: ['fair'],
      finished: -16,
      tasks: [
        { title: 'Test piece, same wood, two stains', estimateHours: 2, ticked: [['tamsin', -20, '14:30']] },
        { title: 'Stain deck and covering boards', estimateHours: 7, ticked: [['tamsin', -18, '15:40']] },
        { title: 'Two coats of sealer', estimateHours: 5, ticked: [['tamsin', -16, '14:50']] },
      ],
    },
    {
      key: 'varnish',
      name: 'Varnish',
      after: ['stain'],
      tasks: [
        { title: 'Coats 1 to 4', estimateHours: 24, ticked: [['tamsin', -8, '15:10']] },
        { title: 'Coats 5 to 8', estimateHours: 24, started: ['tamsin', -7, '09:20'] },
        {
          title: 'Hatches, both sides, six coats',
          estimateHours: 14,
          assignees: ['tamsin'],
          started: ['tamsin', -5, '08:10'],
        },
        { title: 'Rub down and finish coats', estimateHours: 16 },
      ],
    },
    {
      key: 'seams',
      name: 'Pay the deck seams',
      after: ['stain'],
      tasks: [
        { title: 'Rake and clean the seams', estimateHours: 8, ticked: [['lenny', -11, '15:25']] },
        { title: 'Mask, pay and pull the tape', estimateHours: 10 },
      ],
    },
    {
      key: 'hardware',
      name: 'Hardware and glass',
      after: ['varnish', 'seams'],
      tasks: [{ title: 'Bed the windshield feet', estimateHours: 4 }],
    },
  ],
};

const HICKORY: DemoBoat = {
  particulars: {
    name: 'Hickory Moon',
    type: 'skiff, lapstrake, painted',
    lengthMm: feet(19),
    beamMm: feet(5.5),
    hullNumber: 'none found',
    builtYear: 1948,
    numbering: 'ribs from the stem, planks from the keel, and so when she is turned',
  },
  arrivedDaysAgo: 41,
  owner: 'castor',
  stages: [
    { key: 'hickArrive', name: 'Arrival and record', after: [], finished: -21, tasks: [] },
    {
      key: 'strip',
      name: 'Strip the paint',
      after: ['hickArrive'],
      finished: -14,
      tasks: [
        { title: 'Bottom and laps, port', estimateHours: 12, ticked: [['hob', -18, '15:30']] },
        { title: 'Bottom and laps, starboard', estimateHours: 12, ticked: [['lenny', -15, '15:50']] },
      ],
    },
    {
      key: 'ribs',
      name: 'Ribs and keel',
      after: ['strip'],
      tasks: [
        { title: 'Sister rib 9, port', estimateHours: 4, ticked: [['hob', -12, '16:00']] },
        {
          title: 'Graving piece, stem rabbet',
          estimateHours: 3,
          ticked: [
            ['hob', -6, '15:20'],
            ['wes', -6, '15:58'],
          ],
        },
        { title: 'Keel bolts out and looked at', estimateHours: 5, started: ['hob', -1, '07:45'] },
        { title: 'Ribs 11 and 12, starboard', estimateHours: 6, assignees: ['hob'] },
      ],
    },
    {
      key: 'laps',
      name: 'Laps and rivets',
      after: ['ribs'],
      tasks: [
        {
          title: 'Clean laps 3 and 4, port',
          estimateHours: 4,
          assignees: ['lenny'],
          ticked: [['lenny', -2, '14:45']],
        },
        { title: 'Missing rivets, port, ribs 5 to 8', estimateHours: 3, assignees: ['lenny'] },
      ],
    },
    { key: 'paint', name: 'Paint', after: ['laps'], tasks: [] },
  ],
};

export const DEMO_BOATS: Record<BoatKey, DemoBoat> = { penny: PENNY, widder: WIDDER, hickory: HICKORY };
