import type { Role } from '#shared/identity/role.ts';
import type { NewShop } from '#shared/identity/shop.ts';

/** An invented shop's people, boats and phones. Every name here is made up. */
export interface DemoPerson {
  name: string;
  email: string;
  roles: Role[];
}

export interface DemoDevice {
  label: string;
  people: PersonKey[];
  replaces?: DeviceKey;
}

export type ShopWords = Omit<NewShop, 'timeZone'>;

/** Everybody's in the demo: nine letters, one hand. */
export const DEMO_PASSWORD = 'tightseam';

export const DEMO_SHOP: ShopWords = { name: 'Hornbeam Slip Boat Shop', currency: 'USD', units: 'imperial' };

export type PersonKey =
  'orrin' | 'imelda' | 'rosa' | 'wes' | 'tamsin' | 'hob' | 'lenny' | 'ottilie' | 'castor';

/** Whoever has several roles comes last: the first account that is printed for a role then has that one alone. */
export const DEMO_PEOPLE: Record<PersonKey, DemoPerson> = {
  orrin: { name: 'Orrin', email: 'orrin@hornbeam.example', roles: ['foreman'] },
  imelda: { name: 'Imelda', email: 'imelda@hornbeam.example', roles: ['office'] },
  rosa: { name: 'Rosa', email: 'rosa@hornbeam.example', roles: ['crew'] },
  wes: { name: 'Wes', email: 'wes@hornbeam.example', roles: ['crew'] },
  hob: { name: 'Hob', email: 'hob@hornbeam.example', roles: ['crew'] },
  lenny: { name: 'Lenny', email: 'lenny@hornbeam.example', roles: ['crew'] },
  ottilie: { name: 'Ottilie Framm', email: 'ottilie@framm.example', roles: ['owner'] },
  castor: { name: 'Castor Wey', email: 'castor@wey.example', roles: ['owner'] },
  tamsin: { name: 'Tamsin', email: 'tamsin@hornbeam.example', roles: ['crew', 'owner'] },
};

export type DeviceKey =
  'laptop' | 'desk' | 'rosaPhone' | 'wesPhone' | 'tamsinPhone' | 'hobOldPhone' | 'hobPhone' | 'benchTablet';

export const DEMO_DEVICES: Record<DeviceKey, DemoDevice> = {
  laptop: { label: "Orrin's laptop", people: ['orrin'] },
  desk: { label: 'Office desk', people: ['imelda'] },
  rosaPhone: { label: "Rosa's phone", people: ['rosa'] },
  wesPhone: { label: "Wes's phone", people: ['wes'] },
  tamsinPhone: { label: "Tamsin's phone", people: ['tamsin'] },
  hobOldPhone: { label: "Hob's first phone", people: ['hob'] },
  hobPhone: { label: "Hob's phone", people: ['hob'], replaces: 'hobOldPhone' },
  benchTablet: { label: 'Bench tablet', people: ['lenny', 'rosa'] },
};

/** The second shop, in which Castor Wey has another boat: one e-mail in two shops. */
export const SECOND_SHOP: ShopWords = { name: 'Teasel Quay Boats', currency: 'USD', units: 'imperial' };

export const SECOND_PEOPLE: Record<'ingrid' | 'kit' | 'castor', DemoPerson> = {
  ingrid: { name: 'Ingrid', email: 'ingrid@teaselquay.example', roles: ['foreman'] },
  kit: { name: 'Kit', email: 'kit@teaselquay.example', roles: ['crew'] },
  castor: DEMO_PEOPLE.castor,
};
