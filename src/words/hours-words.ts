import type { HoursKind } from '#shared/entry/hours.ts';

/** The kinds of hours in the shop's words, in the order in which they are offered. */
export const HOURS_KIND_WORDS: Record<HoursKind, string> = {
  agreed: 'agreed work',
  extra: 'extra work',
  waiting: 'waiting',
  'own-fault': 'own fault, not charged',
  teaching: 'teaching',
  yard: 'yard work',
};

/** The same where there is little room. */
export const HOURS_KIND_SHORT_WORDS: Record<HoursKind, string> = {
  ...HOURS_KIND_WORDS,
  'own-fault': 'own fault',
};

export const HOURS_KINDS = Object.keys(HOURS_KIND_WORDS) as HoursKind[];
