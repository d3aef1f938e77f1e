import canonicalize from 'canonicalize';

/** RFC 8785 text of a JSON value; where that cannot write it (a lone surrogate, say), its JSON.stringify. */
export function canonicalJson(value: unknown): string {
  try {
    return canonicalize(value) ?? JSON.stringify(value) ?? 'null';
  } catch {
    return JSON.stringify(value) ?? 'null';
  }
}

/** Whether two JSON values are the same, whatever the order of their keys. */
export function isSameJson(a: unknown, b: unknown): boolean {
  if (a === b || JSON.stringify(a ?? null) === JSON.stringify(b ?? null)) return true;
  return canonicalJson(a ?? null) === canonicalJson(b ?? null);
}
