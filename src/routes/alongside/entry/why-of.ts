/** A reason as an op carries it: left out where none was given. */
export function whyOf(why: string): { why?: string } {
  return why.trim() === '' ? {} : { why: why.trim() };
}
