import { linesAbout, type DemoEntry } from './demo-entry.ts';

/** Hickory Moon from her arrival until her bottom was stripped, and Saturdays in the shop. */
export const HICKORY_EARLIER_ENTRIES: DemoEntry[] = [
  ...linesAbout('hickory', 'arrive', [
    [
      -29,
      '15:50',
      'hob',
      'Skiff is in. Wide pads, no twist that I can see, string says three sixteenths.',
      { hob: 6, lenny: 6 },
    ],
    [
      -28,
      '15:40',
      'hob',
      'Pictures and marks, both sides and inside. Counted seven planks a side.',
      { hob: 5, lenny: 5 },
    ],
    [
      -28,
      '15:55',
      'lenny',
      'Chalked rib numbers on the keel, one to eighteen, Hob checked.',
      { lenny: [2, 'teaching'], hob: 2 },
    ],
    [
      -27,
      '15:45',
      'hob',
      'Lead on the old paint is yes, strong. Waterline and the stripe scribed.',
      { hob: 6.5 },
    ],
    [-27, '15:50', 'lenny', 'Traced the number on the bow and the moisture, 15 to 19.', { lenny: 6 }],
  ]),
  ...linesAbout('hickory', 'strip_paint', [
    [-26, '15:50', 'hob', 'Inside, scraped the loose, wet, mask on. Port forward.', { hob: 7, lenny: 6.5 }],
    [-25, '15:45', 'hob', 'Inside port to the thwart.', { hob: 7.5 }],
    [-25, '15:55', 'lenny', 'Inside starboard forward. Green over grey over white.', { lenny: 7 }],
    [
      -24,
      '15:40',
      'hob',
      'Not done: the stern end inside. Why: bags are full and the county is shut.',
      { hob: [1, 'waiting'] },
    ],
    [-24, '15:50', 'hob', 'Thwarts out and numbered.', { hob: 6, lenny: 6.5 }],
    [-23, '15:45', 'hob', 'Inside aft, port and starboard, done bar the corners.', { hob: 7.5, lenny: 7 }],
    [
      -22,
      '15:55',
      'lenny',
      'Corners, with the little hook. Cut my thumb, plaster, carried on.',
      { lenny: 6 },
    ],
    [-22, '15:50', 'hob', 'Vacced inside. Lap edges look good from in here.', { hob: 6.5 }],
    [-21, '15:40', 'hob', 'Set up outside, sheets down, fan out of the door.', { hob: 6, lenny: 6 }],
  ]),
  ...linesAbout('hickory', 'ribs', [
    [
      'sat2',
      '11:40',
      'hob',
      'Saturday. Split rib stock out of the green oak and put it in the trough.',
      { hob: 3.5 },
    ],
  ]),
  ...linesAbout('widder', 'bleach', [
    [
      'sat5',
      '12:10',
      'tamsin',
      'Saturday, quiet. Over the hatches with the lamp and a pencil.',
      { tamsin: 3 },
    ],
  ]),
  ...linesAbout('penny', 'strip_out', [
    [
      'sat9',
      '11:50',
      'wes',
      'Saturday morning. Drained tank out of her with Hob, he was passing.',
      { wes: 3, hob: 1 },
    ],
  ]),
  ...linesAbout('widder', 'deck', [
    [
      'sat11',
      '12:00',
      'rosa',
      'Came in for the morning to shift the clamps, nothing has crept.',
      { rosa: 2.5 },
    ],
  ]),
];
