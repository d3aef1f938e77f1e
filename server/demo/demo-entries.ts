import type { BoatKey } from './demo-work.ts';
import { linesAbout, type DemoEntry } from './demo-entry.ts';
import type { PersonKey } from './demo-people.ts';
import { HICKORY_EARLIER_ENTRIES } from './entries-hickory-before.ts';
import { HICKORY_ENTRIES } from './entries-hickory.ts';
import { PENNY_EARLIER_ENTRIES } from './entries-penny-before.ts';
import { PENNY_ENTRIES } from './entries-penny.ts';
import { WIDDER_EARLIER_ENTRIES } from './entries-widder-before.ts';
import { WIDDER_ENTRIES } from './entries-widder.ts';

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

/** What the foreman logged himself, once for somebody else. */
const ORRINS_ENTRIES: DemoEntry[] = [
  ...linesAbout('widder', 'deck', [
    [
      -40,
      '16:20',
      'orrin',
      'For Hob, who has no phone with him: fetched the bronze from town and set the bearers for the coaming.',
      { hob: 6 },
    ],
  ]),
  ...linesAbout('penny', 'survey_open', [
    [
      -15,
      '16:30',
      'orrin',
      'Went over the findings with the owner on the telephone, forty minutes. She will come and look.',
      { orrin: 0.75 },
    ],
  ]),
];

export const DEMO_ENTRIES: DemoEntry[] = [
  ...WIDDER_EARLIER_ENTRIES,
  ...PENNY_EARLIER_ENTRIES,
  ...HICKORY_EARLIER_ENTRIES,
  ...PENNY_ENTRIES,
  ...WIDDER_ENTRIES,
  ...HICKORY_ENTRIES,
  ...ORRINS_ENTRIES,
];

/** Entries that were first logged somewhere else, and moved. */
export const FIRST_LOGGED: Record<string, { boat: BoatKey; stage: string }> = {
  wiped: { boat: 'penny', stage: 'frame_repair' },
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
  {
    key: 'hob/-57/15:55',
    day: -56,
    time: '07:20',
    by: 'hob',
    does: { adds: 'Starboard has one knot at frame eleven, loose but hard all round it.' },
  },
  {
    key: 'wes/-48/16:10',
    day: -47,
    time: '07:40',
    by: 'wes',
    does: { hours: { wes: 3.5 }, why: 'crane man left later than I said' },
  },
  {
    key: 'rosa/-28/15:40',
    day: -27,
    time: '07:35',
    by: 'rosa',
    does: { hours: { rosa: 6.5 }, why: 'dentist, forgot' },
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
