// Plain JavaScript without packages: it is asked whether the packages are there.
// Ends with 0 when what is installed is what package-lock.json says, else with 1.
import { readFileSync } from 'node:fs';

function packagesOf(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8')).packages;
  } catch {
    return null;
  }
}

const wanted = packagesOf('package-lock.json');
// npm writes this file last, so an installation that was broken off has none
const present = packagesOf('node_modules/.package-lock.json');

function isThere([path, { version, optional }]) {
  return path === '' || optional || present[path]?.version === version;
}

process.exit(wanted && present && Object.entries(wanted).every(isThere) ? 0 : 1);
