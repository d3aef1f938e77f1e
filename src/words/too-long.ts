import { TEXT_UNITS_MAX } from '#shared/sync/op.ts';

/** That a text is longer than the record takes, by how much, and what to do; undefined where it fits. */
export function tooLongWords(text: string): string | undefined {
  const over = text.trim().length - TEXT_UNITS_MAX;
  if (over <= 0) return undefined;
  return `That is ${over} characters too many for one entry. Nothing is lost: cut the end out, log this, and put the rest into a second entry.`;
}
