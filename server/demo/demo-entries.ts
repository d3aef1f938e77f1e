import type { BoatKey } from './demo-boats.ts';
import type { DemoEntry } from './demo-entry.ts';
import type { PersonKey } from './demo-people.ts';
import { HICKORY_ENTRIES } from './entries-hickory.ts';
import { PENNY_ENTRIES } from './entries-penny.ts';
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

export const DEMO_ENTRIES: DemoEntry[] = [...PENNY_ENTRIES, ...WIDDER_ENTRIES, ...HICKORY_ENTRIES];

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
