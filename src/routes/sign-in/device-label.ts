import { deviceWord } from '#src/shell/device-words.ts';

const STORAGE_KEY = 'ribband.label';

/** What this device was called at its last sign-in; else what kind of device it is. */
export function firstLabel(): string {
  const word = deviceWord();
  return storage()?.getItem(STORAGE_KEY) ?? word.charAt(0).toUpperCase() + word.slice(1);
}

export function keepLabel(label: string): void {
  storage()?.setItem(STORAGE_KEY, label);
}

// a browser may refuse the very property
function storage(): Storage | null {
  try {
    return window.localStorage;
  } catch {
    return null;
  }
}
