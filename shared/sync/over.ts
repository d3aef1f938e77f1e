import { headsOf } from './fields.ts';
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
