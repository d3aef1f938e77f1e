import type { ColourSet } from '#src/tokens.ts';

export type ChosenSet = ColourSet | 'system';

// public/set.js reads the same key before the first paint
const STORAGE_KEY = 'ribband.set';

/** The set chosen on this device; 'system' where none was, or where storage is refused. */
export function readChosenSet(): ChosenSet {
  const kept = storage()?.getItem(STORAGE_KEY);
  return kept === 'light' || kept === 'dark' || kept === 'sunlight' ? kept : 'system';
}

/** Puts a set in force at once and keeps it on this device. */
export function chooseSet(set: ChosenSet): void {
  if (set === 'system') {
    storage()?.removeItem(STORAGE_KEY);
    delete document.documentElement.dataset['set'];
  } else {
    storage()?.setItem(STORAGE_KEY, set);
    document.documentElement.dataset['set'] = set;
  }
}

// a browser may refuse the very property
function storage(): Storage | null {
  try {
    return window.localStorage;
  } catch {
    return null;
  }
}
