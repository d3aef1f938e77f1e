import type { HoursKind } from '#shared/entry/hours.ts';
import type { BoatKey } from './demo-boats.ts';
import type { PersonKey } from './demo-people.ts';

/** Hours, and the kind where the author proposed one. */
export type Figure = number | [number, HoursKind];

export interface DemoEntry {
  /** the working day it was written on and is about, counted back from today */
  day: number;
  time: string;
  author: PersonKey;
  boat: BoatKey;
  stage: string;
  text: string;
  hours: Partial<Record<PersonKey, Figure>>;
  /** named where something is said about it later */
  key?: string;
}

/** What was said about a named entry later; times are as in `DemoEntry`. */
export interface DemoChange {
  key: string;
  day: number;
  time: string;
  by: PersonKey;
  does:
    | { hours: Partial<Record<PersonKey, number>>; why: string; isUnheard?: boolean }
    | { movesTo: { boat: BoatKey; stage: string }; why: string }
    | { strikes: string }
    | { adds: string };
}

type Line = [
  day: number,
  time: string,
  author: PersonKey,
  text: string,
  hours: DemoEntry['hours'],
  key?: string,
];

function linesAbout(boat: BoatKey, stage: string, lines: Line[]): DemoEntry[] {
  return lines.map(([day, time, author, text, hours, key]) => ({
    day,
    time,
    author,
    boat,
    stage,
    text,
    hours,
    ...(key ? { key } : {}),
  }));
}

const PENNY = [
  ...linesAbout('penny', 'survey', [
    [
      -20,
      '11:50',
      'rosa',
      'Port sole panels are up from the engine space back to the aft bench. Under them floor seven is soft on the outboard end, cant tell how far, it runs in behind the bilge stringer. Six and eight are hard.',
      { rosa: 4, wes: 3.5 },
    ],
    [
      -20,
      '15:55',
      'wes',
      'Cleaned out under the sole, two buckets of muck and a spoon. Limber holes were shut.',
      { wes: 4 },
    ],
    [
      -20,
      '16:00',
      'rosa',
      'Went along the engine bed with the awl, hard all the way. Tapped the planks above, port side, nothing.',
      { rosa: 3.5 },
    ],
    [
      -19,
      '15:35',
      'wes',
      'Eight sample screws out at frames 4 to 9, port. Three pink, two broke. Bagged and on the board.',
      { wes: 7.5 },
    ],
    [
      -19,
      '15:50',
      'rosa',
      'Same for starboard, frames 4 and 6 only. All four good. Rest of the day on the deck beams, one to five, all sound.',
      { rosa: 7.5 },
    ],
    [
      -18,
      '15:40',
      'rosa',
      'Took off the covering board port aft for the foreman to look. Black under the aft three feet, dry, goes no deeper than a scraper.',
      { rosa: 6, wes: 5 },
    ],
    [
      -18,
      '15:45',
      'wes',
      'Meter on frames 4 to 10 both sides, 14 to 17 except 21 at floor seven port. Fan on.',
      { wes: 2.5 },
    ],
    [
      -17,
      '10:10',
      'wes',
      'Floor seven starboard with the mirror. Looks dry. Cant get the awl to it.',
      { wes: 1.5 },
    ],
    [
      -17,
      '15:50',
      'wes',
      'One bung hole starboard over seven like Orrin said, meter says 19 and the awl went in. Lifted the one panel. Five inches, three quarters deep. Stringer is hard this side.',
      { wes: 6 },
    ],
    [
      -17,
      '15:40',
      'rosa',
      'Opened up port floor seven. Eight inches along, inch and three quarters deep, stringer behind it sixteen inches. Meter 21 at the mark.',
      { rosa: 7.5 },
    ],
    [
      -16,
      '15:30',
      'rosa',
      'Sole bearers numbered and stacked. Two are replacements, fir, the rest oak.',
      { rosa: 5 },
    ],
    [
      -16,
      '15:45',
      'wes',
      'Drew round the old floors on ply before they go out of shape. Helped Tamsin turn a hatch, half hour.',
      { wes: 7 },
    ],
    [
      -15,
      '15:50',
      'rosa',
      'Stem heel and gripe with the awl, sound. Graving piece in the stem from an earlier hand, bedded in something red.',
      { rosa: 7.5, wes: 7.5 },
    ],
    [
      -14,
      '15:20',
      'rosa',
      'Sketch is on the wall, everything soft has its size. Two places on port, one on starboard, covering board only stained.',
      { rosa: 4 },
    ],
    [
      -14,
      '15:50',
      'wes',
      'Helped on the sketch then shored under floors 6 to 8, string across. String is true.',
      { wes: 7.5 },
    ],
    [
      -14,
      '15:55',
      'rosa',
      'Oak picked for the floors with Orrin, white oak, straight, from the back rack.',
      { rosa: 3 },
    ],
  ]),
  ...linesAbout('penny', 'frames', [
    [
      -13,
      '15:55',
      'rosa',
      'Pattern for the port stringer piece and for floor seven end. Not cutting till we hear.',
      { rosa: 6 },
    ],
    [
      -13,
      '15:50',
      'wes',
      'Chased the old bolts out of floor seven starboard, both came, wire wheel and in the tin.',
      { wes: 7.5 },
    ],
    [
      -12,
      '15:55',
      'rosa',
      'Cut the rot out of port floor seven and the stringer, back to bright wood. Stringer is inch and a quarter deep in the end, stops at floor eight. Fresh face reads eighteen.',
      { rosa: [6, 'extra'], wes: [6, 'extra'] },
      'cutRot',
    ],
    [
      -11,
      '15:45',
      'wes',
      'Shaped the starboard splice, dry fitted, four goes. Scarf is tight now.',
      { wes: [7.5, 'extra'] },
    ],
    [
      -11,
      '15:50',
      'rosa',
      'Port cut reads eighteen again, tent and dehumidifier. Made the stringer piece meanwhile, fir like the old.',
      { rosa: [5, 'extra'] },
    ],
    [
      -10,
      '15:40',
      'wes',
      'Sample of old oak to new broke in the oak not the glue. Cut the bolts, fitted, all ready for tomorrow.',
      { wes: [7, 'extra'] },
    ],
    [
      -10,
      '15:50',
      'rosa',
      'Seventeen. No glue. Scarfs cut on the port pieces, dry fitted both.',
      { rosa: [6.5, 'extra'] },
    ],
    [
      -9,
      '15:30',
      'wes',
      'Spliced starboard floor seven, eight pumps, two bronze bolts, glued and clamped half past two.',
      { wes: [6.5, 'extra'] },
    ],
    [
      -9,
      '15:55',
      'rosa',
      'Ribs 8 and 9 port, measured for sisters. Bottom of 9 is cracked at the turn, old crack, paint in it.',
      { rosa: 7.5 },
    ],
    [
      -8,
      '11:05',
      'wes',
      'Starboard off the clamps at eleven, trimmed and primed. Pictures of it before we close.',
      { wes: [3, 'extra'] },
    ],
    [-8, '15:50', 'wes', 'Steam box out and lagged, new bit of pipe.', { wes: [4, 'yard'] }],
    [-8, '15:45', 'rosa', 'Port cut sixteen. One more day. Faired the sister blanks.', { rosa: 7 }],
    [
      -7,
      '15:45',
      'rosa',
      'Sixteen again so it is on. Scarfed the stringer and spliced floor seven port, twenty two pumps, glued quarter past two.',
      { rosa: [6.5, 'extra'], wes: [3, 'extra'] },
    ],
    [-7, '15:55', 'wes', 'Rest of the day ripping oak for ribs.', { wes: 4 }],
    [
      -6,
      '15:50',
      'rosa',
      'Clamps came off port half past eleven, trimmed it, primed it, eighteen bronze screws.',
      { rosa: [5.5, 'extra'] },
    ],
    [-6, '15:30', 'wes', 'Sister for frame 8, steamed, bent and clamped. It took it well.', { wes: 6.5 }],
    [
      -5,
      '15:40',
      'rosa',
      'Sister for 9, first one cracked in the bend. Second one is in and clamped.',
      { rosa: 7.5, wes: 5 },
      'sister',
    ],
    [-5, '15:50', 'wes', 'Swept up round Penny and moved the staging.', { wes: [1.5, 'yard'] }],
    [-4, '15:50', 'wes', 'Sisters riveted, 8 and 9 port, thirty one rivets, me on the dolly.', { wes: 7 }],
    [-4, '15:55', 'rosa', 'Riveting with Wes. Roves are nearly out, twenty left.', { rosa: 7 }],
    [
      -3,
      '15:30',
      'rosa',
      'Bilge scrubbed frames 4 to 10, dust out with the vac, two coats of oil and thinners on the new oak.',
      { rosa: 7.5 },
    ],
    [
      -3,
      '15:55',
      'wes',
      'Dug old compound out of the garboard seam, port, ten foot of it.',
      { wes: 7.5 },
      'garboard',
    ],
    [
      -2,
      '15:45',
      'rosa',
      'Limber holes cut through in the new floors, chain back in. Sanded for primer.',
      { rosa: 6.5, wes: 4 },
      'limber',
    ],
    [
      -2,
      '15:50',
      'wes',
      'Waited for primer, it came at one. Made up the rest sharpening.',
      { wes: [2, 'waiting'] },
    ],
    [
      -1,
      '13:00',
      'rosa',
      'First coat of primer frames 4 to 7, both sides. Gloves on so I am saying this.',
      { rosa: 4, wes: 3 },
      'primer',
    ],
    [-1, '15:55', 'wes', 'Primer frames 8 to 10 port. Starboard tomorrow, ran out of light.', { wes: 4 }],
    [0, '07:55', 'rosa', 'Primer is hard, no bloom. Rubbed back frames 4 to 7.', { rosa: 1 }],
    [0, '09:20', 'wes', 'Primer on starboard 8 to 10, done with that bit.', { wes: 1.5 }],
  ]),
];

const WIDDER = [
  ...linesAbout('widder', 'stain', [
    [
      -20,
      '14:30',
      'tamsin',
      'Test pieces done, two stains, same plank off the old deck. Number two is the one I think.',
      { tamsin: 6.5 },
    ],
    [
      -19,
      '15:40',
      'tamsin',
      'Deck wiped down with spirits, masked the hull. Small dents raised with a wet cloth along the king plank.',
      { tamsin: 7.5 },
    ],
    [
      -18,
      '15:40',
      'tamsin',
      'Stain on deck and covering boards, whole of it in one go, Lenny wiping.',
      { tamsin: 7, lenny: [5, 'teaching'] },
    ],
    [-17, '15:20', 'tamsin', 'Left to dry. Did the hatches on trestles, strip and sand.', { tamsin: 7 }],
    [
      -16,
      '14:50',
      'tamsin',
      'Two coats sealer, light rub between. Colour is even, one light patch by the cleat, left it.',
      { tamsin: 6.5 },
    ],
  ]),
  ...linesAbout('widder', 'varnish', [
    [-15, '15:10', 'tamsin', 'Coat one, cut half. 58 percent. Started ten past nine.', { tamsin: 5 }],
    [-15, '15:50', 'tamsin', 'Hatches, sealer.', { tamsin: 2.5 }],
    [-14, '15:30', 'tamsin', 'Rubbed down, three twenty. Coat two did not go on, 72 percent.', { tamsin: 6 }],
    [-13, '14:40', 'tamsin', 'Coat two, nine thirty, 57 percent. Quart and a bit.', { tamsin: 6.5 }],
    [-12, '15:35', 'tamsin', 'Rub down, whole deck, six sheets. Tacked off and covered.', { tamsin: 7.5 }],
    [
      -11,
      '14:20',
      'tamsin',
      'Coat three, 60 percent, surface was ten over the dew. Two runs by the aft hatch, mine, flatted tomorrow.',
      { tamsin: 6 },
    ],
    [
      -10,
      '15:15',
      'tamsin',
      'Flatted the runs, hour and a quarter on me. Rubbed the rest.',
      { tamsin: [1.25, 'own-fault'] },
      'runs',
    ],
    [-10, '15:50', 'tamsin', 'Rub down for four and hatch coat two.', { tamsin: 6.25 }],
    [-9, '15:30', 'tamsin', 'Called it off, 74 percent all day. Hatches only.', { tamsin: 5 }],
    [
      -8,
      '15:10',
      'tamsin',
      'Coat four on, ten past ten, 59 percent. That is the first four.',
      { tamsin: 6.5 },
    ],
    [
      -7,
      '15:30',
      'tamsin',
      'Long rub, three twenty, checked it over with the light, no bugs.',
      { tamsin: 7.5 },
    ],
    [
      -6,
      '14:30',
      'tamsin',
      'Coat five, started nine twenty, 57 percent, Rosa on the tray for an hour.',
      { tamsin: 5, rosa: 1 },
    ],
    [-6, '15:50', 'tamsin', 'Hatches, coat four both sides of two.', { tamsin: 2.5 }],
    [-5, '15:40', 'tamsin', 'Hatches on trestles in the yard, four of them.', { tamsin: 7 }],
    [
      -4,
      '15:20',
      'tamsin',
      'Six is a rub down coat. Rubbed, tacked, too damp to go on, 69.',
      { tamsin: 6.5 },
    ],
    [
      -3,
      '14:50',
      'tamsin',
      'Coat six, ten past ten, 59 percent, three hours with the rub. Quart and a quarter, four sheets.',
      { tamsin: 6 },
    ],
    [
      -2,
      '15:30',
      'tamsin',
      'Foredeck has gone milky, the heater timer. Side decks fine, hatches fine. Flatted the bloom off, dry paper.',
      { tamsin: [3, 'own-fault'] },
    ],
    [-2, '15:50', 'tamsin', 'Rubbed down the rest.', { tamsin: 4 }, 'restRub'],
    [
      -1,
      '15:15',
      'tamsin',
      'Coat seven at two o clock, 60 percent, surface sixty one. Quart and a quarter.',
      { tamsin: 6.5 },
    ],
    [
      0,
      '08:05',
      'tamsin',
      'Seven looks good, no milk. Sides under cover, too early to rub.',
      { tamsin: 0.75 },
    ],
  ]),
  ...linesAbout('widder', 'seams', [
    [-17, '15:35', 'lenny', 'Raking seams starboard side deck. Half way.', { lenny: 6 }],
    [-12, '15:40', 'lenny', 'Raked the rest of starboard and started port, broke one hook.', { lenny: 7 }],
    [
      -11,
      '15:25',
      'lenny',
      'All the seams raked and vacced. Tamsin looked, two bits to go over.',
      { lenny: 6.5, tamsin: [0.5, 'teaching'] },
    ],
    [
      -3,
      '15:20',
      'lenny',
      'Went over the seams for loose bits with a card, forward of the windshield.',
      { lenny: 4 },
    ],
  ]),
];

const HICKORY = [
  ...linesAbout('hickory', 'strip', [
    [
      -20,
      '15:45',
      'hob',
      'Port bottom, first two planks, heat and scraper. Nine coats or so. Mask on.',
      { hob: 7.5 },
    ],
    [-20, '15:55', 'lenny', 'Scraping with Hob, laps are slow.', { lenny: 7 }],
    [
      -19,
      '15:40',
      'hob',
      'Port bottom to the fourth lap. Found two rivets with no rove near rib six.',
      { hob: 7.5, lenny: 7 },
    ],
    [
      -18,
      '15:30',
      'hob',
      'Port is clean. Bit of an old name on the transom under it, photographed and left.',
      { hob: 7.5 },
    ],
    [-17, '15:45', 'hob', 'Starboard, one and two.', { hob: 7 }],
    [
      -16,
      '15:50',
      'lenny',
      'Starboard, three, by myself mostly. Gouged one lap, told Hob.',
      { lenny: 7, hob: 6.5 },
      'gouge',
    ],
    [-15, '15:50', 'lenny', 'Starboard done. Swept and bagged, it is all in the lead bin.', { lenny: 7.5 }],
    [-15, '15:30', 'hob', 'Made horses for turning, and went over Lennys laps.', { hob: [7, 'yard'] }],
    [-14, '15:40', 'hob', 'Sanded the bottom, eighty, vac on all the time.', { hob: 7.5, lenny: 7.5 }],
  ]),
  ...linesAbout('hickory', 'ribs', [
    [
      -13,
      '15:50',
      'hob',
      'Counted and chalked the ribs. Nine port is broken, eleven and twelve starboard cracked.',
      { hob: 7, lenny: 6 },
    ],
    [-12, '16:00', 'hob', 'Sistered rib nine port, three hours, twenty two rivets.', { hob: [3, 'agreed'] }],
    [-12, '16:05', 'hob', 'Rest of it steaming blanks for the others.', { hob: 4.5 }],
    [-11, '15:30', 'hob', 'Eleven starboard, old one out, bits bagged.', { hob: 7 }, 'hobEleven'],
    [
      -10,
      '15:40',
      'hob',
      'Bent a rib for eleven, sprang back, new one tomorrow out of greener stuff.',
      { hob: 6, lenny: [5, 'teaching'] },
    ],
    [
      -8,
      '15:30',
      'hob',
      'Phone went in the bilge on me. Eleven is bent and in, this is the new phone.',
      { hob: 7.5 },
    ],
    [-8, '15:45', 'lenny', 'Held the dolly for Hob, then rivets sorted by length.', { lenny: 7 }],
    [
      -7,
      '15:50',
      'hob',
      'Stem rabbet, cut out two inches by one, half deep. Piece is roughed.',
      { hob: 6.5 },
    ],
    [-7, '15:55', 'lenny', 'Bunged and pared on the practice plank. Then laps.', { lenny: [3, 'teaching'] }],
    [-6, '15:20', 'hob', 'Graving piece is in the stem, glued at ten past three.', { hob: 5 }, 'graving'],
    [-3, '15:58', 'wes', 'Held for Hob on the keel bolts, an hour.', { wes: 1 }],
    [
      -6,
      '16:05',
      'wes',
      'Went to glue the stem piece and it was already glued, wiped mine off and left it.',
      { wes: 1 },
      'wiped',
    ],
    [-5, '15:40', 'hob', 'Trimmed the graving piece, cannot see it hardly. Rib twelve out.', { hob: 7.5 }],
    [-4, '15:40', 'hob', 'Dug round the keel bolts, heads are poor. Penetrating oil on all six.', { hob: 6 }],
    [-3, '15:50', 'hob', 'Two keel bolts out, wasted to half in the middle. Ordered six.', { hob: 7 }],
    [-2, '15:30', 'hob', 'Third one out. Fourth wont shift, heat on it tomorrow.', { hob: 7.5 }],
    [-1, '11:40', 'hob', 'Fourth bolt out with heat and bad words.', { hob: 4 }],
  ]),
  ...linesAbout('hickory', 'laps', [
    [-5, '15:45', 'lenny', 'Cleaned lap three port, most of it.', { lenny: 6.5 }],
    [-4, '15:30', 'lenny', 'Lap three finished, started four.', { lenny: 7 }],
    [
      -2,
      '14:45',
      'lenny',
      'Lap four port done. Two rivets missing by rib six, chalked.',
      { lenny: 5.5 },
      'lapFour',
    ],
    [-2, '14:52', 'lenny', 'Lap four port done, two rivets missing by rib six.', { lenny: 5.5 }, 'saidAgain'],
    [-1, '15:40', 'lenny', 'Sealing the lap edges, port, with Hob showing me first.', { lenny: 6.5 }],
  ]),
];

export const DEMO_ENTRIES: DemoEntry[] = [...PENNY, ...WIDDER, ...HICKORY];

/** Entries that were first logged somewhere else, and moved. */
export const FIRST_LOGGED: Record<string, { boat: BoatKey; stage: string }> = {
  wiped: { boat: 'penny', stage: 'frames' },
};

export const DEMO_CHANGES: DemoChange[] = [
  {
    key: 'wiped',
    day: -5,
    time: '07:10',
    by: 'wes',
    does: { movesTo: { boat: 'hickory', stage: 'ribs' }, why: 'phone still had Penny Candle on it' },
  },
  {
    key: 'gouge',
    day: -15,
    time: '07:25',
    by: 'hob',
    does: { adds: 'Lap six, port side of the mark. Filled with thickened epoxy, will not show.' },
  },
  {
    key: 'sister',
    day: -5,
    time: '16:10',
    by: 'wes',
    does: { adds: 'First one had a knot on the back, should have turned it over.' },
  },
  {
    key: 'garboard',
    day: -2,
    time: '07:20',
    by: 'wes',
    does: { hours: { wes: 6.5 }, why: 'one hour was on Hickory Moon' },
  },
  {
    key: 'hobEleven',
    day: -10,
    time: '07:30',
    by: 'hob',
    does: { hours: { hob: 6.5 }, why: 'left at three' },
  },
  { key: 'saidAgain', day: -2, time: '15:10', by: 'lenny', does: { strikes: 'said it twice' } },
  {
    key: 'limber',
    day: -1,
    time: '07:05',
    by: 'rosa',
    does: { hours: { wes: 3.5 }, why: 'he fetched the primer for half an hour', isUnheard: true },
  },
  {
    key: 'limber',
    day: -1,
    time: '07:15',
    by: 'wes',
    does: { hours: { wes: 4.5 }, why: 'stayed on till half four', isUnheard: true },
  },
];
