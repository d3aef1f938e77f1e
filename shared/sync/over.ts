import type { HoursGiven } from '../entry/hours.ts';
import { HOURS_PREFIX, STAGE_FIELD, headsOf } from './fields.ts';
import type { Op } from './op.ts';
import type { Row } from './row.ts';

/**
 * What a change of `fields` replaces: the values that its author has before them, and whatever this device's unsent
 * ops on those fields named, since one of those may yet be set aside.
 */
export function overFor(row: Row, fields: string[], unsent: Op<unknown>[]): Record<string, string[]> {
  const about = (field: string) => {
    const heads = headsOf(row, field);
    const inherited = unsent.filter((op) => heads.includes(op.id)).flatMap((op) => op.over[field] ?? []);
    return [...new Set([...heads, ...inherited])];
  };
  return Object.fromEntries(fields.map((field) => [field, about(field)]));
}

/** The fields, as the law names them, that an amendment's `set` is about: boat and stage are one, hours one a person. */
export function fieldsOfSet(set: Record<string, unknown>): string[] {
  const fields = Object.entries(set).flatMap(([field, value]) => {
    if (field === 'boatId') return [STAGE_FIELD];
    if (field === 'hours') return (value as HoursGiven).map((figure) => HOURS_PREFIX + figure.personId);
    return [field];
  });
  return [...new Set(fields)];
}
