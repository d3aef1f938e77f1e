// Runs before the first paint, so that a screen chosen dark does not flash white. Kept in step with src/components/colour-set.ts.
try {
  const set = localStorage.getItem('ribband.set');
  if (set) document.documentElement.dataset.set = set;
} catch {
  // storage may be refused; the system's preference then stands
}
