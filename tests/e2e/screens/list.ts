import type { PersonKey } from '#server/demo/demo-people.ts';
import type { Known } from '#tests/e2e/screens/world.ts';

/** A screen of the product, by the person who uses it. */
export interface Screen {
  name: string;
  path: (known: Known) => string;
  /** Null where nobody is signed in. */
  as: PersonKey | null;
  /** In the window's title, before the product's name. */
  title: string;
  /** Read at arm's length with one free thumb: larger targets and type, 7:1. */
  isCrew: boolean;
}

type Line = [name: string, title: string, path: Screen['path']];

const at = (path: string) => () => path;

const CREW: Line[] = [
  ['alongside', 'Penny Candle', at('/alongside')],
  ['log', 'Log it', at('/log')],
  ['tasks', 'Tick off', at('/tasks')],
  ['entry', 'Entry', ({ entryId }) => `/entry/${entryId}`],
  ['photos', 'Photo', at('/photos')],
  ['found', 'Found', at('/found')],
  ['finding', 'Finding', ({ findingId }) => `/finding/${findingId}`],
  ['sound', 'Found sound', ({ soundId }) => `/sound/${soundId}`],
  ['photo', 'Photo', ({ photoId }) => `/photo/${photoId}`],
  ['search', 'Search', at('/search')],
  ['held', 'Held', at('/held')],
  ['me', 'You', at('/me')],
  ['own work', 'Order of work', at('/order')],
  ['own order of work', 'Penny Candle: order of work', ({ boatId }) => `/order/${boatId}`],
  ['own plan', 'Your plan', at('/plan')],
];

const FOREMAN: Line[] = [
  ['day sheet', 'Day sheet', at('/day')],
  ['day sheet by boat', 'Day sheet', at('/day?by=boat')],
  ['a day long ago', 'Day sheet', at('/day/2026-03-04')],
  ['week', 'Week', at('/week')],
  ['work', 'Order of work', at('/order')],
  ['order of work', 'Penny Candle: order of work', ({ boatId }) => `/order/${boatId}`],
  ['plan', 'Plan', at('/plan')],
  ['boats', 'Boats', at('/boats')],
  ['boat', 'Penny Candle', ({ boatId }) => `/boats/${boatId}`],
  ['people', 'People', at('/people')],
  ['devices', 'Devices', at('/devices')],
];

/** A sheet of a screen, by the key that opens it. */
export interface SheetOfScreen {
  screen: string;
  key: string | RegExp;
}

/** Every kind of sheet, from the foot of a phone. */
export const SHEETS: SheetOfScreen[] = [
  { screen: 'alongside', key: /, other boat$/ },
  { screen: 'alongside', key: 'Earlier days' },
  { screen: 'alongside', key: 'Hours' },
  { screen: 'found', key: /^Which part/ },
  { screen: 'found', key: /^Something else/ },
  { screen: 'found', key: /^Seen ?not measured/ },
  { screen: 'entry', key: 'Add to it' },
  { screen: 'finding', key: 'Change it' },
  { screen: 'finding', key: 'Strike it' },
  { screen: 'own work', key: 'Places' },
  { screen: 'own order of work', key: /^(To do|Started): / },
  { screen: 'day sheet', key: /^Split or move/ },
  { screen: 'day sheet', key: /^(Another day|Other)/ },
  { screen: 'day sheet', key: 'Admit' },
  { screen: 'order of work', key: /^Add a task/ },
  { screen: 'order of work', key: 'Add a stage' },
  { screen: 'order of work', key: /^Stage finished/ },
  { screen: 'order of work', key: /^Change stage/ },
  { screen: 'plan', key: 'Give Hob work' },
  { screen: 'boats', key: 'Add a boat' },
  { screen: 'boat', key: 'Change' },
  { screen: 'people', key: 'Add a person' },
  { screen: 'devices', key: /^Shut out/ },
];

const screensOf =
  (as: PersonKey | null, isCrew: boolean) =>
  ([name, title, path]: Line): Screen => ({ name, title, path, as, isCrew });

/** Every address of the product. */
export const SCREENS: Screen[] = [
  ...[
    ['sign-in', 'Sign in', at('/sign-in')] satisfies Line,
    ['first run', 'A new shop', at('/first-run')] satisfies Line,
    ['an address that leads nowhere', 'No such page', at('/nowhere/at/all')] satisfies Line,
  ].map(screensOf(null, true)),
  ...CREW.map(screensOf('rosa', true)),
  ...FOREMAN.map(screensOf('orrin', false)),
  screensOf('imelda', false)(['day sheet of the office', 'Day sheet', at('/day')]),
  screensOf('ottilie', false)(['own boats', 'My boats', at('/own-boats')]),
];
