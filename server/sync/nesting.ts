/** Whether a JSON value holds arrays and objects within one another beyond `levels`. */
export function isNestedDeeperThan(value: unknown, levels: number): boolean {
  if (typeof value !== 'object' || value === null) return false;
  return levels === 0 || Object.values(value).some((inner) => isNestedDeeperThan(inner, levels - 1));
}
